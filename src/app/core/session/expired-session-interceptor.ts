import type { HttpInterceptorFn } from '@angular/common/http';
import { inject } from '@angular/core';
import { tap } from 'rxjs';
import { ProblemError } from '../http/problem-error';
import { SessionStore } from './session-store';

/** Where an answer of 401 says something else than that the session is over. */
const AUTH_PATH = '/api/auth/';

/** When the server says that nobody is signed in any more, the page knows it too. */
export const expiredSessionInterceptor: HttpInterceptorFn = (request, next) => {
  if (request.url.startsWith(AUTH_PATH)) return next(request);
  const session = inject(SessionStore);
  return next(request).pipe(
    tap({
      error: (error: unknown) => {
        if (error instanceof ProblemError && error.status === 401) session.ended();
      },
    }),
  );
};
