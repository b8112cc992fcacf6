import type { AbstractControl, FormGroup, ValidationErrors, ValidatorFn } from '@angular/forms';
import type { ProblemError } from '../core/http/problem-error';

/** What is wrong with a field, in words; the field's own validators put them there. */
export function errorWords(errors: ValidationErrors | null): string {
  const first: unknown = Object.values(errors ?? {})[0];
  return typeof first === 'string' ? first : '';
}

/** A validator that says its words when the text, without blanks around it, is empty. */
export function filledIn(words: string): ValidatorFn {
  return ({ value }: AbstractControl<string>) => (value.trim() === '' ? { filledIn: words } : null);
}

/** Something before and after one @, and no blanks: whether it exists only a message to it could tell. */
export function emailLike(words: string): ValidatorFn {
  return ({ value }: AbstractControl<string>) =>
    value.trim() === '' || /^[^\s@]+@[^\s@]+$/.test(value.trim()) ? null : { emailLike: words };
}

export function atLeast(characters: number, words: string): ValidatorFn {
  return ({ value }: AbstractControl<string>) =>
    value === '' || value.length >= characters ? null : { atLeast: words };
}

/**
 * Puts what the server said about fields beside them, until they are changed.
 * @returns whether any field took a message
 */
export function showIssues(form: FormGroup, problem: ProblemError): boolean {
  let isShown = false;
  for (const [name, control] of Object.entries(form.controls)) {
    const words = problem.issueAt(`/${name}`);
    if (words === undefined) continue;
    control.setErrors({ server: words });
    control.markAsTouched();
    isShown = true;
  }
  return isShown;
}

/** Brings the keyboard to the first field that is not in order. */
export function focusFirstInvalid(form: HTMLElement): void {
  // Once the fields have been marked.
  requestAnimationFrame(() => form.querySelector<HTMLElement>('input[aria-invalid="true"]')?.focus());
}
