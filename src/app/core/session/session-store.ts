import { computed, inject, Injectable, signal } from '@angular/core';
import { type Observable, tap } from 'rxjs';
import { DraftStore } from '../drafts/draft-store';
import { CsrfToken } from '../http/csrf-token';
import { AuthApi, type Credentials, type Registration, type SignedIn } from './auth-api';

/** Who is at the bench: not known yet, nobody with an account, a member, or the server could not say. */
export type SessionState =
  | { readonly status: 'loading' }
  | { readonly status: 'visitor' }
  | ({ readonly status: 'member' } & SignedIn)
  | { readonly status: 'failed'; readonly error: unknown };

/** The one account signed in here. */
@Injectable({ providedIn: 'root' })
export class SessionStore {
  private readonly api = inject(AuthApi);
  private readonly csrf = inject(CsrfToken);
  private readonly drafts = inject(DraftStore);
  private readonly current = signal<SessionState>({ status: 'loading' });
  private hasAsked = false;

  readonly state = this.current.asReadonly();
  readonly account = computed(() => {
    const state = this.current();
    return state.status === 'member' ? state.account : undefined;
  });

  /** Asks who is signed in, once; later calls ask only while the server could not say. */
  load(): void {
    if (this.hasAsked && this.current().status !== 'failed') return;
    this.hasAsked = true;
    this.current.set({ status: 'loading' });
    this.api.session().subscribe({
      next: (signedIn) =>
        this.current.set(signedIn ? { status: 'member', ...signedIn } : { status: 'visitor' }),
      error: (error: unknown) => this.current.set({ status: 'failed', error }),
    });
  }

  signUp(registration: Registration): Observable<SignedIn> {
    return this.api.register(registration).pipe(tap((signedIn) => this.enter(signedIn)));
  }

  signIn(credentials: Credentials): Observable<SignedIn> {
    return this.api.login(credentials).pipe(tap((signedIn) => this.enter(signedIn)));
  }

  signOut(): Observable<void> {
    return this.api.logout().pipe(
      tap(() => {
        this.ended();
        // Whoever uses this browser next is not to find the designs of this account in it.
        void this.drafts.removeSaved();
      }),
    );
  }

  /** The session is over: signed out here or elsewhere, or expired. */
  ended(): void {
    this.csrf.forget();
    this.current.set({ status: 'visitor' });
  }

  private enter(signedIn: SignedIn): void {
    // The session's id is new now, and with it the token.
    this.csrf.forget();
    this.hasAsked = true;
    this.current.set({ status: 'member', ...signedIn });
  }
}
