import { join } from 'node:path';
import type { Logger } from 'pino';
import { EmbeddedDatabase, type MigrationClass } from './embedded-database.js';
import { type FileSystem, diskFileSystem, writeSynced } from './file-system.js';
import { MIGRATIONS } from './migrations/index.js';
import { FolderTakenError, ProcessLock } from './process-lock.js';
import { SnapshotStore } from './snapshot-store.js';
import type { Units } from './units.js';
import { verifyImage } from './verify-image.js';
import { WriteQueue } from './write-queue.js';

/** The data was written by a later version of the program. */
export class NewerDatabaseError extends Error {
  override readonly name = 'NewerDatabaseError';

  constructor(unknown: readonly string[]) {
    super(
      `The database was written by a newer version of Layerwright (it knows ${unknown.join(', ')}). ` +
        'Nothing was changed. Start the newer version again.',
    );
  }
}

export interface OpenOptions {
  readonly folder: string;
  readonly log: Logger;
  readonly files?: FileSystem;
  readonly migrations?: readonly MigrationClass[];
  readonly retryMs?: number;
  /** The database cannot go on: the folder was taken by another process, or memory cannot go back to what is on disk. */
  readonly onBroken?: (error: unknown) => void;
}

/** A database in use. */
export interface OpenedDatabase {
  readonly units: Units;
  /** There was nothing in the folder before. */
  readonly isNew: boolean;
  /** False while what is written cannot be put on disk. */
  readonly isHealthy: () => boolean;
  /** Puts the last state on disk and gives the folder free. */
  readonly close: () => Promise<void>;
}

/**
 * Opens the database of a folder: keeps other processes out, loads the newest snapshot that is whole, brings it up to
 * date. Throws, having changed nothing, when the folder is in use, is damaged beyond use, or belongs to a newer version.
 */
export async function openDatabase(options: OpenOptions): Promise<OpenedDatabase> {
  const { folder, log, files = diskFileSystem } = options;
  await files.ensureFolder(folder);
  const lock = await ProcessLock.take(folder);
  try {
    const store = new SnapshotStore({
      folder,
      files,
      verify: verifyImage,
      checkLock: () => lock.check(),
      onTidyFailure: (error) => log.warn({ err: error }, 'Old database snapshots could not be cleared away'),
    });
    const loaded = await store.load();
    if (loaded.damaged.length > 0) {
      log.error(
        { damaged: loaded.damaged, generation: loaded.generation },
        'THE NEWEST DATABASE SNAPSHOT IS DAMAGED: an older one is used, changes made after it are missing. ' +
          'The damaged file was kept beside it.',
      );
    }
    const { database, image } = await migrated(loaded.image, loaded.generation, store, options);
    const report = sparing((error: unknown) =>
      log.error({ err: error }, 'The database could not be written: changes are refused until it can'),
    );
    const queue = new WriteQueue(database, {
      save: (bytes) => store.save(bytes),
      durableImage: image,
      ...(options.retryMs === undefined ? {} : { retryMs: options.retryMs }),
      ...(options.onBroken ? { onBroken: options.onBroken } : {}),
      onFailure: (error) => {
        if (error instanceof FolderTakenError) options.onBroken?.(error);
        else report(error);
      },
      onRecovery: () => log.info('The database can be written again'),
    });
    return {
      units: queue,
      isNew: loaded.image === null,
      isHealthy: () => queue.isHealthy,
      close: async () => {
        await queue.close();
        await store.idle();
        await lock.release();
      },
    };
  } catch (error) {
    await lock.release();
    throw error;
  }
}

/** Calls `tell` at most once a minute: a full disk stays full for a while, and every attempt to write says so. */
function sparing(tell: (error: unknown) => void): (error: unknown) => void {
  let nextMs = 0;
  return (error) => {
    const nowMs = performance.now();
    if (nowMs < nextMs) return;
    nextMs = nowMs + 60_000;
    tell(error);
  };
}

/** The database brought up to date, and its image as it is on disk. */
async function migrated(
  found: Uint8Array | null,
  generation: number,
  store: SnapshotStore,
  options: OpenOptions,
): Promise<{ database: EmbeddedDatabase; image: Uint8Array }> {
  const { files = diskFileSystem, folder, log, migrations = MIGRATIONS } = options;
  const database = await EmbeddedDatabase.open(found ?? undefined, migrations);
  try {
    const done = found ? await executedMigrations(database) : [];
    const known = new Set(migrations.map((migration) => migration.name));
    const unknown = done.filter((name) => !known.has(name));
    if (unknown.length > 0) throw new NewerDatabaseError(unknown);
    if (found && done.length === known.size) return { database, image: found };
    if (found) await keepBackup(files, folder, `generation-${generation}.sqlite`, found);
    const ran = await database.dataSource.runMigrations({ transaction: 'each' });
    const image = database.exportImage();
    await store.save(image);
    log.info({ migrations: ran.map((migration) => migration.name) }, 'The database was brought up to date');
    return { database, image };
  } catch (error) {
    await database.close();
    throw error;
  }
}

async function executedMigrations(database: EmbeddedDatabase): Promise<string[]> {
  const runner = database.dataSource.createQueryRunner();
  if (!(await runner.hasTable('migrations'))) return [];
  const rows = (await runner.query('SELECT name FROM migrations ORDER BY id')) as readonly { name: string }[];
  return rows.map((row) => row.name);
}

/** Keeps the image as it was before a migration touched it, for as long as nobody deletes it. */
async function keepBackup(files: FileSystem, folder: string, name: string, image: Uint8Array): Promise<void> {
  const backups = join(folder, 'before-migration');
  await files.ensureFolder(backups);
  const there = await files.list(backups);
  if (there.includes(name)) return;
  const temporary = join(backups, `${name}.tmp`);
  if (there.includes(`${name}.tmp`)) await files.remove(temporary);
  await writeSynced(files, temporary, image);
  await files.rename(temporary, join(backups, name));
  await files.syncFolder(backups);
}
