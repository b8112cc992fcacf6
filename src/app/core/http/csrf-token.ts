import { HttpBackend, HttpClient, type HttpErrorResponse } from '@angular/common/http';
import { inject, Injectable } from '@angular/core';
import { catchError, map, type Observable, shareReplay, tap, throwError } from 'rxjs';
import { problemOf } from './problem-of';

/** The token that every changing request carries; it belongs to the session and is fetched anew when that changes. */
@Injectable({ providedIn: 'root' })
export class CsrfToken {
  // Past the interceptors: they ask for this token.
  private readonly http = new HttpClient(inject(HttpBackend));
  private pending: Observable<string> | undefined;

  /** The token at hand, else a new one. */
  get(): Observable<string> {
    this.pending ??= this.http.get<{ readonly token: string }>('/api/auth/csrf').pipe(
      map(({ token }) => token),
      tap({ error: () => this.forget() }),
      catchError((error: HttpErrorResponse) => throwError(() => problemOf(error))),
      shareReplay(1),
    );
    return this.pending;
  }

  /** After sign-in, sign-out or a refused token. */
  forget(): void {
    this.pending = undefined;
  }
}
