import { Problem } from './problem.js';

/** Lets a few tasks run at once, some more wait, and turns the rest away. */
export class Bounded {
  #running = 0;
  readonly #waiting: (() => void)[] = [];

  constructor(
    private readonly atOnce: number,
    private readonly mayWait: number,
  ) {}

  async run<T>(task: () => Promise<T>): Promise<T> {
    if (this.#running < this.atOnce) {
      this.#running += 1;
    } else {
      if (this.#waiting.length >= this.mayWait) {
        throw new Problem('too-busy', {
          detail: 'Try again in a few seconds.',
          headers: { 'Retry-After': '5' },
        });
      }
      // Whoever leaves hands the place over, so it is never counted as free in between.
      await new Promise<void>((resolve) => this.#waiting.push(resolve));
    }
    try {
      return await task();
    } finally {
      const next = this.#waiting.shift();
      if (next) next();
      else this.#running -= 1;
    }
  }
}
