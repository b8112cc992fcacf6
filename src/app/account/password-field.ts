import { ChangeDetectionStrategy, Component, input, signal } from '@angular/core';
import { type FormControl, ReactiveFormsModule } from '@angular/forms';
import { MatIconButton } from '@angular/material/button';
import { MatError, MatFormField, MatHint, MatLabel, MatSuffix } from '@angular/material/form-field';
import { MatIcon } from '@angular/material/icon';
import { MatInput } from '@angular/material/input';
import { errorWords } from './field-errors';

/** A password that can be shown while it is typed; made for password managers and for pasting. */
@Component({
  selector: 'lw-password-field',
  imports: [
    MatError,
    MatFormField,
    MatHint,
    MatIcon,
    MatIconButton,
    MatInput,
    MatLabel,
    MatSuffix,
    ReactiveFormsModule,
  ],
  template: `
    <mat-form-field appearance="outline" subscriptSizing="dynamic">
      <mat-label>Password</mat-label>
      <input
        matInput
        name="password"
        required
        [type]="isShown() ? 'text' : 'password'"
        [formControl]="control()"
        [autocomplete]="autocomplete()"
        autocapitalize="none"
        spellcheck="false"
      />
      <button
        type="button"
        mat-icon-button
        matSuffix
        aria-label="Show the password"
        [attr.aria-pressed]="isShown()"
        (click)="isShown.set(!isShown())"
      >
        <mat-icon [svgIcon]="isShown() ? 'hide' : 'show'" />
      </button>
      @if (hint(); as words) {
        <mat-hint>{{ words }}</mat-hint>
      }
      <mat-error>{{ errorWords(control().errors) }}</mat-error>
    </mat-form-field>
  `,
  styles: `
    :host,
    mat-form-field {
      display: block;
    }
    button {
      margin-right: 6px;
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class PasswordField {
  readonly control = input.required<FormControl<string>>();
  readonly autocomplete = input.required<'current-password' | 'new-password'>();
  readonly hint = input<string>();
  protected readonly isShown = signal(false);
  protected readonly errorWords = errorWords;
}
