import { AsyncLocalStorage } from 'node:async_hooks';
import type { EntityManager } from 'typeorm';
import type { EmbeddedDatabase } from './embedded-database.js';
import { FifoLock } from './fifo-lock.js';
import { StorageUnavailableError, type Unit, type Units } from './units.js';

/** The unit of work that the running code is part of. */
interface OpenUnit {
  readonly manager: EntityManager;
  readonly isWrite: boolean;
  isOver: boolean;
}

/** Someone who is answered when the state numbered `version` is on disk. */
interface Waiting {
  readonly version: number;
  readonly resolve: () => void;
  readonly reject: (error: StorageUnavailableError) => void;
}

type Outcome<T> = { readonly ok: true; readonly value: T } | { readonly ok: false; readonly error: unknown };

export interface WriteQueueOptions {
  /** Puts an image on disk; resolves when it is safe there. Never called twice at once. */
  readonly save: (image: Uint8Array) => Promise<void>;
  /** What is on disk at the start. */
  readonly durableImage: Uint8Array;
  /** How long after a failed save to try again, ms. */
  readonly retryMs?: number;
  readonly onFailure?: (error: unknown) => void;
  readonly onRecovery?: () => void;
  /** Memory could not go back to what is on disk: nothing works any more but a restart. */
  readonly onBroken?: (error: unknown) => void;
}

/**
 * One queue for everything that touches the embedded database.
 *
 * All callers share a single connection, on which overlapping transactions would become parts of each other; so units
 * run one at a time, first come, first served. What a unit wrote is in memory until a snapshot of the whole database is
 * on disk; only then is its caller answered, and all units that finish while a snapshot is being written share the next.
 *
 * A state is numbered, and no answer is given from a state that is not on disk, not even to a reader or to a unit that
 * failed. When a snapshot fails, memory goes back to the last one that is on disk, everyone who was waiting is told that
 * nothing was stored, and until a snapshot succeeds again, which a timer keeps trying, writes are refused and reads go on.
 */
export class WriteQueue implements Units {
  readonly #database: EmbeddedDatabase;
  readonly #options: WriteQueueOptions;
  readonly #lock = new FifoLock();
  readonly #context = new AsyncLocalStorage<OpenUnit>();
  #durableImage: Uint8Array;
  #version = 0;
  #durableVersion = 0;
  #waiting: Waiting[] = [];
  #pumping: Promise<void> | null = null;
  #retry: NodeJS.Timeout | null = null;
  /** Why the last snapshot failed; null if it did not. */
  #failure: Error | null = null;
  #isBroken = false;
  #isClosed = false;
  #snapshots = 0;

  constructor(database: EmbeddedDatabase, options: WriteQueueOptions) {
    this.#database = database;
    this.#options = options;
    this.#durableImage = options.durableImage;
  }

  /** False from a failed snapshot until one succeeds. */
  get isHealthy(): boolean {
    return this.#failure === null && !this.#isClosed;
  }

  /** Snapshots put on disk since the start. */
  get snapshots(): number {
    return this.#snapshots;
  }

  async read<T>(unit: Unit<T>): Promise<T> {
    const outer = this.#joined();
    if (outer) return unit(outer.manager);
    for (;;) {
      const { outcome, durable } = await this.#lock.run(async () => {
        if (this.#isBroken) throw new StorageUnavailableError(this.#failure);
        const before = this.#database.totalChanges();
        const outcome = await this.#run(unit, this.#database.manager, false);
        if (this.#database.totalChanges() === before) return { outcome, durable: this.#whenDurable() };
        // It is in memory for good, so it has to be numbered like any other change before the mistake is reported.
        this.#version += 1;
        return {
          outcome: failed(new Error('A unit that was to read only has written.')),
          durable: this.#whenDurable(),
        };
      });
      if (await isKept(durable)) return settled(outcome);
    }
  }

  async write<T>(unit: Unit<T>): Promise<T> {
    const outer = this.#joined();
    if (outer && !outer.isWrite) throw new Error('A unit that reads cannot contain one that writes.');
    if (outer) return unit(outer.manager);
    const { outcome, durable } = await this.#lock.run(async () => {
      if (this.#isClosed) throw new StorageUnavailableError(new Error('The database is closing.'));
      if (this.#failure) throw new StorageUnavailableError(this.#failure);
      const before = this.#database.totalChanges();
      const outcome = await this.#transaction(unit);
      if (outcome.ok && this.#database.totalChanges() !== before) this.#version += 1;
      return { outcome, durable: this.#whenDurable() };
    });
    await durable;
    return settled(outcome);
  }

  /** Ends the work: refuses new writes, waits for those that run, puts the last state on disk, lets go of it all. */
  async close(): Promise<void> {
    await this.#lock.run(() => {
      this.#isClosed = true;
    });
    if (this.#retry) clearTimeout(this.#retry);
    await this.#pumping;
    // A snapshot that failed just now is not tried again: memory is what is on disk.
    await this.#lock.run(() => this.#database.close());
  }

  #joined(): OpenUnit | undefined {
    const unit = this.#context.getStore();
    if (unit?.isOver) throw new Error('The unit of work is over: something in it was not awaited.');
    return unit;
  }

  async #run<T>(unit: Unit<T>, manager: EntityManager, isWrite: boolean): Promise<Outcome<T>> {
    const open: OpenUnit = { manager, isWrite, isOver: false };
    try {
      return { ok: true, value: await this.#context.run(open, () => unit(manager)) };
    } catch (error) {
      return failed(error);
    } finally {
      open.isOver = true;
    }
  }

  async #transaction<T>(unit: Unit<T>): Promise<Outcome<T>> {
    try {
      return await this.#database.transaction(async (manager) => {
        const outcome = await this.#run(unit, manager, true);
        // Only an error thrown from here makes the transaction roll back.
        settled(outcome);
        return outcome;
      });
    } catch (error) {
      return failed(error);
    }
  }

  /** Called with the lock held, so that a failing snapshot finds everyone who depends on it. */
  #whenDurable(): Promise<void> {
    const version = this.#version;
    if (version <= this.#durableVersion) return Promise.resolve();
    const durable = new Promise<void>((resolve, reject) => {
      this.#waiting.push({ version, resolve, reject });
    });
    this.#pump();
    // The caller awaits it in a moment; until then a rejection is not a stray one.
    durable.catch(() => undefined);
    return durable;
  }

  #pump(): void {
    this.#pumping ??= (async () => {
      try {
        do await this.#snapshot();
        while (this.#waiting.length > 0);
      } finally {
        this.#pumping = null;
      }
    })();
  }

  async #snapshot(): Promise<void> {
    try {
      const { image, version } = await this.#lock.run(() => ({
        image: this.#database.exportImage(),
        version: this.#version,
      }));
      await this.#options.save(image);
      this.#kept(image, version);
    } catch (error) {
      await this.#lock.run(() => this.#rollBack(error));
    }
  }

  #kept(image: Uint8Array, version: number): void {
    this.#durableImage = image;
    this.#durableVersion = version;
    this.#snapshots += 1;
    const done = this.#waiting.filter((waiting) => waiting.version <= version);
    this.#waiting = this.#waiting.filter((waiting) => waiting.version > version);
    for (const waiting of done) waiting.resolve();
    if (this.#failure === null) return;
    this.#failure = null;
    this.#options.onRecovery?.();
  }

  async #rollBack(error: unknown): Promise<void> {
    this.#failure = error instanceof Error ? error : new Error(String(error));
    this.#options.onFailure?.(error);
    const lost = this.#waiting;
    this.#waiting = [];
    try {
      await this.#database.restoreImage(this.#durableImage);
      this.#durableVersion = this.#version;
      this.#scheduleRetry();
    } catch (restoreError) {
      this.#isBroken = true;
      this.#options.onBroken?.(restoreError);
    }
    for (const waiting of lost) waiting.reject(new StorageUnavailableError(error));
  }

  #scheduleRetry(): void {
    if (this.#isClosed) return;
    this.#retry = setTimeout(() => {
      if (!this.#isClosed) this.#pump();
    }, this.#options.retryMs ?? 500);
    this.#retry.unref();
  }
}

/** False when the state that was read has been rolled back meanwhile. */
async function isKept(durable: Promise<void>): Promise<boolean> {
  try {
    await durable;
    return true;
  } catch (error) {
    if (error instanceof StorageUnavailableError) return false;
    throw error;
  }
}

function failed(error: unknown): { readonly ok: false; readonly error: unknown } {
  return { ok: false, error };
}

function settled<T>(outcome: Outcome<T>): T {
  if (outcome.ok) return outcome.value;
  throw outcome.error;
}
