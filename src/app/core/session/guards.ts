import { inject } from '@angular/core';
import { toObservable } from '@angular/core/rxjs-interop';
import { type CanActivateFn, Router } from '@angular/router';
import { filter, map, type Observable, take } from 'rxjs';
import { type SessionState, SessionStore } from './session-store';

/** Lets members in; sends everyone else to sign in, and back here afterwards. */
export const memberGuard: CanActivateFn = (_route, { url }) => {
  const router = inject(Router);
  return knownSession().pipe(
    map(({ status }) =>
      status === 'member' ? true : router.createUrlTree(['/account/sign-in'], { queryParams: { to: url } }),
    ),
  );
};

/** Whoever is signed in has no use for the pages before that. */
export const visitorGuard: CanActivateFn = () => {
  const router = inject(Router);
  return knownSession().pipe(map(({ status }) => (status === 'member' ? router.createUrlTree(['/']) : true)));
};

/** Who is signed in, once that is known. */
function knownSession(): Observable<SessionState> {
  const session = inject(SessionStore);
  session.load();
  return toObservable(session.state).pipe(
    filter(({ status }) => status !== 'loading'),
    take(1),
  );
}
