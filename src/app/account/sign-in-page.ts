import { ChangeDetectionStrategy, Component, inject, input, signal } from '@angular/core';
import { NonNullableFormBuilder, ReactiveFormsModule } from '@angular/forms';
import { MatButton } from '@angular/material/button';
import { MatError, MatFormField, MatLabel } from '@angular/material/form-field';
import { MatInput } from '@angular/material/input';
import { RouterLink } from '@angular/router';
import { problemWords } from '../core/errors/problem-words';
import { SessionStore } from '../core/session/session-store';
import { Entrance } from './entrance';
import { emailLike, errorWords, filledIn, focusFirstInvalid } from './field-errors';
import { PasswordField } from './password-field';

@Component({
  selector: 'lw-sign-in-page',
  imports: [
    MatButton,
    MatError,
    MatFormField,
    MatInput,
    MatLabel,
    PasswordField,
    ReactiveFormsModule,
    RouterLink,
  ],
  templateUrl: './sign-in-page.html',
  styleUrl: './entrance-page.scss',
  host: { class: 'lw-page' },
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class SignInPage {
  private readonly session = inject(SessionStore);
  private readonly entrance = inject(Entrance);
  /** Where to go afterwards, from the query. */
  readonly to = input<string>();

  protected readonly form = inject(NonNullableFormBuilder).group({
    email: [
      '',
      [
        filledIn('Fill in your e-mail address.'),
        emailLike('An e-mail address has an @ in it: you@example.org.'),
      ],
    ],
    password: ['', [filledIn('Fill in your password.')]],
  });
  protected readonly isBusy = signal(false);
  protected readonly failure = signal<string | undefined>(undefined);
  protected readonly errorWords = errorWords;

  protected submit(element: HTMLElement): void {
    if (this.isBusy()) return;
    this.failure.set(undefined);
    this.form.markAllAsTouched();
    if (this.form.invalid) {
      focusFirstInvalid(element);
      return;
    }
    this.isBusy.set(true);
    const { email, password } = this.form.getRawValue();
    this.session.signIn({ email: email.trim(), password }).subscribe({
      next: () => void this.entrance.enter(this.to()),
      error: (error: unknown) => {
        this.isBusy.set(false);
        this.failure.set(problemWords(error));
      },
    });
  }
}
