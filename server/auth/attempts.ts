import { createHmac, randomBytes, timingSafeEqual } from 'node:crypto';
import { Problem } from '../http/problem.js';

const MAX_FAILURES = 10;
const WINDOW_MS = 15 * 60_000;
/** Accounts and devices that are remembered at most. */
const MAX_REMEMBERED = 50_000;

interface Failures {
  readonly count: number;
  readonly until: number;
}

/**
 * Slows down guessing at one account, from however many addresses. A browser that has signed in before carries a mark
 * of its own and is counted by itself, so whoever guesses from elsewhere cannot lock the owner out.
 */
export class Attempts {
  readonly #failures = new Map<string, Failures>();

  constructor(
    private readonly secret: string,
    private readonly now: () => number,
  ) {}

  /** Throws when there have been too many wrong guesses. Gives the key to report how this one went. */
  begin(email: string, mark: string | undefined): string {
    const key = mark !== undefined && this.#isMarkOf(email, mark) ? `mark ${mark}` : `account ${email}`;
    const failures = this.#failures.get(key);
    if (failures && failures.until > this.now() && failures.count >= MAX_FAILURES) {
      const seconds = Math.ceil((failures.until - this.now()) / 1000);
      throw new Problem('too-many-requests', {
        detail: `Too many wrong passwords for this account. Try again in ${Math.ceil(seconds / 60)} minutes.`,
        headers: { 'Retry-After': String(seconds) },
      });
    }
    return key;
  }

  failed(key: string): void {
    const now = this.now();
    const earlier = this.#failures.get(key);
    const isOver = earlier === undefined || earlier.until <= now;
    this.#failures.delete(key);
    this.#failures.set(
      key,
      isOver ? { count: 1, until: now + WINDOW_MS } : { ...earlier, count: earlier.count + 1 },
    );
    const [oldest] = this.#failures.keys();
    if (this.#failures.size > MAX_REMEMBERED && oldest !== undefined) this.#failures.delete(oldest);
  }

  succeeded(key: string): void {
    this.#failures.delete(key);
  }

  /** A mark for the browser that has just signed in to the account. */
  markFor(email: string): string {
    const nonce = randomBytes(16).toString('base64url');
    return `${nonce}.${this.#sign(email, nonce)}`;
  }

  #isMarkOf(email: string, mark: string): boolean {
    const [nonce = '', signature = ''] = mark.split('.');
    const expected = Buffer.from(this.#sign(email, nonce));
    const given = Buffer.from(signature);
    return expected.length === given.length && timingSafeEqual(expected, given);
  }

  #sign(email: string, nonce: string): string {
    return createHmac('sha256', this.secret).update(`device\n${email}\n${nonce}`).digest('base64url');
  }
}
