import { COMMON_PASSWORDS } from './common-passwords.js';

export const MIN_PASSWORD_LENGTH = 8;
/** Long enough for any phrase; a limit, so that hashing has one. */
export const MAX_PASSWORD_LENGTH = 256;

/** Why a password would be guessed at once. */
export interface WeakPassword {
  readonly code: 'password-common' | 'password-personal';
  readonly message: string;
}

/** What makes a password easy to guess for someone who knows the account; null when nothing does. */
export function weaknessOf(password: string, owner: { name: string; email: string }): WeakPassword | null {
  const plain = password.toLowerCase();
  if (COMMON_PASSWORDS.has(plain)) {
    return {
      code: 'password-common',
      message: 'This password is among the first that are tried. Take another.',
    };
  }
  const own = [owner.name, owner.email, owner.email.split('@')[0] ?? ''].map((word) => word.toLowerCase());
  if (own.includes(plain)) {
    return { code: 'password-personal', message: 'This is your own name or address. Take something else.' };
  }
  return null;
}
