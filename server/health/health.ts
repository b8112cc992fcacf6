import { setTimeout as sleep } from 'node:timers/promises';
import type { Units } from '../db/units.js';

const PATIENCE_MS = 2000;

export interface HealthChecks {
  readonly database: boolean;
  readonly disk: boolean;
  readonly accepting: boolean;
}

interface HealthParts {
  readonly units: Units;
  readonly canStore: () => boolean;
}

/** Whether the server can do its work. */
export class Health {
  #isStopping = false;

  constructor(private readonly parts: HealthParts) {}

  get isStopping(): boolean {
    return this.#isStopping;
  }

  /** From now on the server says that it is not ready, so that nothing new is sent to it. */
  stopping(): void {
    this.#isStopping = true;
  }

  async checks(): Promise<HealthChecks> {
    return {
      database: await this.#canRead(),
      disk: this.parts.canStore(),
      accepting: !this.#isStopping,
    };
  }

  #canRead(): Promise<boolean> {
    const read = this.parts.units
      .read((manager) => manager.query('SELECT 1'))
      .then(
        () => true,
        () => false,
      );
    // Whoever asks wants an answer also when the queue has come to a stop.
    return Promise.race([read, sleep(PATIENCE_MS, false, { ref: false })]);
  }
}
