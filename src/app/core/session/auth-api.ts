import { HttpClient } from '@angular/common/http';
import { inject, Injectable } from '@angular/core';
import { map, type Observable } from 'rxjs';

export interface Account {
  readonly id: string;
  readonly name: string;
  readonly email: string;
}

export type Role = 'owner' | 'smith' | 'student';

/** A shop that the account belongs to, and as what. */
export interface ShopMembership {
  readonly id: string;
  readonly name: string;
  readonly role: Role;
}

/** Who is signed in. */
export interface SignedIn {
  readonly account: Account;
  readonly shops: readonly ShopMembership[];
}

export interface Credentials {
  readonly email: string;
  readonly password: string;
}

export interface Registration extends Credentials {
  readonly name: string;
}

/** Accounts and sessions over HTTP. */
@Injectable({ providedIn: 'root' })
export class AuthApi {
  private readonly http = inject(HttpClient);

  /** Who is signed in; null when nobody is. */
  session(): Observable<SignedIn | null> {
    return this.http
      .get<{ signedIn: SignedIn | null }>('/api/auth/session')
      .pipe(map(({ signedIn }) => signedIn));
  }

  register(registration: Registration): Observable<SignedIn> {
    return this.http.post<SignedIn>('/api/auth/register', registration);
  }

  login(credentials: Credentials): Observable<SignedIn> {
    return this.http.post<SignedIn>('/api/auth/login', credentials);
  }

  logout(): Observable<void> {
    return this.http.post<void>('/api/auth/logout', {});
  }
}
