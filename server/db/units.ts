import type { EntityManager } from 'typeorm';

export type Unit<T> = (manager: EntityManager) => Promise<T>;

/**
 * The only way to the data: nothing else holds a connection, a repository or an entity manager.
 *
 * A unit holds everyone else up, so it does nothing but read and write rows: no hashing, no mail, no requests.
 */
export interface Units {
  /** Reads from one consistent state that is safe on disk. The unit may run twice, so it has no side effects. */
  read<T>(unit: Unit<T>): Promise<T>;

  /**
   * Runs all of the unit or nothing of it, and gives its result once what it wrote is safe on disk. Called within
   * another unit, it becomes part of that one.
   */
  write<T>(unit: Unit<T>): Promise<T>;
}

/** What was asked for could not be put on disk, so it did not happen; everything stored before is untouched. */
export class StorageUnavailableError extends Error {
  override readonly name = 'StorageUnavailableError';

  constructor(cause: unknown) {
    super('The database could not be written to disk.', { cause });
  }
}
