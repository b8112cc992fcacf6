import { type ErrorHandler, inject, Injectable, signal } from '@angular/core';

/** What no page dealt with; the shell tells the reader. */
@Injectable({ providedIn: 'root' })
export class UnexpectedErrors {
  private readonly last = signal<unknown>(undefined);
  readonly latest = this.last.asReadonly();

  report(error: unknown): void {
    this.last.set(error);
  }

  dismiss(): void {
    this.last.set(undefined);
  }
}

/** The one error handler: into the browser's log for whoever looks into it, and to the reader. */
@Injectable()
export class AppErrorHandler implements ErrorHandler {
  private readonly errors = inject(UnexpectedErrors);

  handleError(error: unknown): void {
    // eslint-disable-next-line no-console -- the one place where an unexpected error leaves a trace
    console.error(error);
    this.errors.report(error);
  }
}
