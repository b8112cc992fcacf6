import { hash, verify } from '@node-rs/argon2';
import { Bounded } from '../http/bounded.js';

/** Argon2id: 19 MiB, two passes, one lane, the least that OWASP's cheat sheet on storing passwords advises. */
const COST = { memoryCost: 19_456, timeCost: 2, parallelism: 1 };

/** Hashes one core each: more at once would starve everything else. */
const AT_ONCE = 2;
const MAY_WAIT = 200;

/** Makes and checks password hashes, few at a time. */
export class Passwords {
  readonly #bounded = new Bounded(AT_ONCE, MAY_WAIT);
  readonly #nobodys: Promise<string>;

  constructor() {
    this.#nobodys = hash('the password of nobody', COST);
  }

  hash(password: string): Promise<string> {
    return this.#bounded.run(() => hash(normal(password), COST));
  }

  /** Whether it is the password; with no hash at all it takes as long to say no. */
  async isRight(password: string, passwordHash: string | null): Promise<boolean> {
    const compared = passwordHash ?? (await this.#nobodys);
    const isSame = await this.#bounded.run(() => verify(compared, normal(password)));
    return isSame && passwordHash !== null;
  }
}

/** The same letters typed on another keyboard are the same password. */
function normal(password: string): string {
  return password.normalize('NFKC');
}
