import { HttpErrorResponse, type HttpInterceptorFn } from '@angular/common/http';
import { inject } from '@angular/core';
import { catchError, switchMap, throwError } from 'rxjs';
import { CsrfToken } from './csrf-token';
import { problemOf } from './problem-of';

const SAFE_METHODS = ['GET', 'HEAD', 'OPTIONS'];

/** Gives changing requests the session's token; when it is refused as outdated, fetches a new one and tries once more. */
export const csrfInterceptor: HttpInterceptorFn = (request, next) => {
  if (SAFE_METHODS.includes(request.method) || !request.url.startsWith('/api/')) return next(request);
  const csrf = inject(CsrfToken);
  const attempt = () =>
    csrf.get().pipe(switchMap((token) => next(request.clone({ setHeaders: { 'x-csrf-token': token } }))));
  return attempt().pipe(
    catchError((error: unknown) => {
      if (!isOutdated(error)) return throwError(() => error);
      csrf.forget();
      return attempt();
    }),
  );
};

function isOutdated(error: unknown): boolean {
  return error instanceof HttpErrorResponse && error.status === 403 && problemOf(error).code.includes('csrf');
}
