import type { Logger } from 'pino';
import type { SessionStore } from './auth/session-store.js';
import type { DesignRepository } from './designs/design-repository.js';
import { UNDELETE_MS } from './designs/design-service.js';

const HOUR_MS = 60 * 60_000;

interface HousekeepingParts {
  readonly store: SessionStore;
  readonly designs: DesignRepository;
  readonly log: Logger;
  readonly now: () => Date;
}

/** Clears away what is over, now and then: the database stays as small as what is in it. */
export class Housekeeping {
  #timer: NodeJS.Timeout | null = null;

  constructor(private readonly parts: HousekeepingParts) {}

  start(): void {
    this.#timer = setInterval(() => void this.run(), HOUR_MS);
    this.#timer.unref();
    void this.run();
  }

  stop(): void {
    if (this.#timer) clearInterval(this.#timer);
  }

  async run(): Promise<void> {
    const { store, designs, log, now } = this.parts;
    try {
      await store.removeExpired();
      await designs.removeDeletedBefore(new Date(now().getTime() - UNDELETE_MS).toISOString());
    } catch (error) {
      log.warn({ err: error }, 'What is over could not be cleared away; it is tried again in an hour');
    }
  }
}
