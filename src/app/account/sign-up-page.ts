import { ChangeDetectionStrategy, Component, inject, input, signal } from '@angular/core';
import { NonNullableFormBuilder, ReactiveFormsModule } from '@angular/forms';
import { MatButton } from '@angular/material/button';
import { MatError, MatFormField, MatHint, MatLabel } from '@angular/material/form-field';
import { MatInput } from '@angular/material/input';
import { RouterLink } from '@angular/router';
import { VisitorDrafts } from '../core/drafts/visitor-drafts';
import { problemWords } from '../core/errors/problem-words';
import { ProblemError } from '../core/http/problem-error';
import { SessionStore } from '../core/session/session-store';
import { Entrance } from './entrance';
import { atLeast, emailLike, errorWords, filledIn, focusFirstInvalid, showIssues } from './field-errors';
import { PasswordField } from './password-field';

/** As the server asks for. */
const PASSWORD_LENGTH = 8;

@Component({
  selector: 'lw-sign-up-page',
  imports: [
    MatButton,
    MatError,
    MatFormField,
    MatHint,
    MatInput,
    MatLabel,
    PasswordField,
    ReactiveFormsModule,
    RouterLink,
  ],
  templateUrl: './sign-up-page.html',
  styleUrl: './entrance-page.scss',
  host: { class: 'lw-page' },
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class SignUpPage {
  private readonly session = inject(SessionStore);
  private readonly entrance = inject(Entrance);
  protected readonly visitor = inject(VisitorDrafts);
  /** Where to go afterwards, from the query. */
  readonly to = input<string>();

  protected readonly form = inject(NonNullableFormBuilder).group({
    name: ['', [filledIn('Say what you are called here.')]],
    email: [
      '',
      [
        filledIn('Your e-mail address is needed to sign in.'),
        emailLike('An e-mail address has an @ in it: you@example.org.'),
      ],
    ],
    password: [
      '',
      [
        filledIn('Choose a password.'),
        atLeast(PASSWORD_LENGTH, `Use at least ${PASSWORD_LENGTH} characters; several words do well.`),
      ],
    ],
  });
  protected readonly passwordHint = `At least ${PASSWORD_LENGTH} characters. Several words do well.`;
  protected readonly isBusy = signal(false);
  protected readonly failure = signal<string | undefined>(undefined);
  protected readonly isTaken = signal(false);
  protected readonly errorWords = errorWords;

  constructor() {
    void this.visitor.load();
  }

  protected submit(element: HTMLElement): void {
    if (this.isBusy()) return;
    this.failure.set(undefined);
    this.isTaken.set(false);
    this.form.markAllAsTouched();
    if (this.form.invalid) {
      focusFirstInvalid(element);
      return;
    }
    this.isBusy.set(true);
    const { name, email, password } = this.form.getRawValue();
    this.session.signUp({ name: name.trim(), email: email.trim(), password }).subscribe({
      next: () => void this.entrance.enter(this.to()),
      error: (error: unknown) => {
        this.isBusy.set(false);
        this.explain(error, element);
      },
    });
  }

  private explain(error: unknown, element: HTMLElement): void {
    if (error instanceof ProblemError) {
      if (error.code === 'email-taken') {
        this.form.controls.email.setErrors({ server: 'There is an account with this e-mail address.' });
        this.isTaken.set(true);
        focusFirstInvalid(element);
        return;
      }
      if (showIssues(this.form, error)) {
        focusFirstInvalid(element);
        return;
      }
    }
    this.failure.set(problemWords(error));
  }
}
