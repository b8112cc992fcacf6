import { Problem } from '../http/problem.js';
import { invalidRequest } from '../http/validate.js';
import type { AccountRepository, ShopMembership } from './account-repository.js';
import { weaknessOf } from './password-rules.js';
import type { Passwords } from './passwords.js';
import type { SignedInAccount } from './signed-in-account.js';

/** What it takes to make an account; the address trimmed and in lower case. */
export interface Registration {
  readonly name: string;
  readonly email: string;
  readonly password: string;
}

/** Who is signed in, and in which shops. */
export interface SignedIn {
  readonly account: SignedInAccount;
  readonly shops: readonly ShopMembership[];
}

interface AuthParts {
  readonly accounts: AccountRepository;
  readonly passwords: Passwords;
  readonly now: () => Date;
  readonly newId: () => string;
}

/** Accounts: making one, proving that it is one's own. */
export class AuthService {
  constructor(private readonly parts: AuthParts) {}

  /** Makes an account and its shop. */
  async register({ name, email, password }: Registration): Promise<SignedInAccount> {
    const { accounts, passwords, newId, now } = this.parts;
    const weakness = weaknessOf(password, { name, email });
    if (weakness) throw invalidRequest([{ pointer: '/password', ...weakness }]);
    const passwordHash = await passwords.hash(password);
    const account = { id: newId(), name, email };
    const shop = { id: newId(), name: `${name}’s shop` };
    const isAdded = await accounts.addWithShop(
      { ...account, passwordHash, createdAt: now().toISOString() },
      shop,
    );
    if (isAdded) return account;
    throw new Problem('email-taken', {
      detail: 'Sign in with it, or take another address.',
      issues: [{ pointer: '/email', code: 'email-taken', message: 'There is an account with this address.' }],
    });
  }

  /** The account if the password is right, else null; an unknown address takes as long as a wrong password. */
  async authenticate(email: string, password: string): Promise<SignedInAccount | null> {
    const found = await this.parts.accounts.findByEmail(email);
    const isRight = await this.parts.passwords.isRight(password, found?.passwordHash ?? null);
    return isRight && found ? { id: found.id, name: found.name, email: found.email } : null;
  }

  find(id: string): Promise<SignedInAccount | null> {
    return this.parts.accounts.find(id);
  }

  async signedIn({ id, name, email }: SignedInAccount): Promise<SignedIn> {
    return { account: { id, name, email }, shops: await this.parts.accounts.shopsOf(id) };
  }
}
