import { HttpErrorResponse, type HttpInterceptorFn, HttpResponse } from '@angular/common/http';
import { inject } from '@angular/core';
import { catchError, tap, throwError } from 'rxjs';
import { ConnectionStore } from './connection-store';
import { ProblemError } from './problem-error';
import { problemOf } from './problem-of';

/** Turns every failed request into a {@link ProblemError}, and keeps track of whether the server can be reached. */
export const problemInterceptor: HttpInterceptorFn = (request, next) => {
  const connection = inject(ConnectionStore);
  return next(request).pipe(
    tap((event) => {
      if (event instanceof HttpResponse) connection.answered();
    }),
    catchError((error: unknown) => {
      const problem = error instanceof HttpErrorResponse ? problemOf(error) : error;
      if (!(problem instanceof ProblemError)) return throwError(() => problem);
      if (problem.isOffline) connection.failed();
      else connection.answered();
      return throwError(() => problem);
    }),
  );
};
