import { webcrypto } from 'node:crypto';
import { join } from 'node:path';
import { type FileSystem, errorCode, writeSynced } from './file-system.js';

/** Older generations that are kept beside the newest. */
const KEPT_GENERATIONS = 3;

const NAME = /^layerwright-(\d{10})-([0-9a-f]{64})\.sqlite$/;
const SET_ASIDE = /^layerwright-.*\.sqlite\.damaged$/;
const TEMPORARY = /^layerwright-\d{10}-[0-9a-f]{64}\.sqlite\.tmp$/;

/** A snapshot that was found but cannot be used. */
export interface DamagedSnapshot {
  readonly name: string;
  readonly reason: string;
}

/** What is on disk: the newest usable image, if there is any, and what had to be passed over for it. */
export interface LoadedSnapshot {
  readonly image: Uint8Array | null;
  readonly generation: number;
  readonly damaged: readonly DamagedSnapshot[];
}

/** There is a database, and none of its generations can be used. It is never replaced by an empty one. */
export class DamagedDatabaseError extends Error {
  override readonly name = 'DamagedDatabaseError';

  constructor(
    readonly folder: string,
    readonly damaged: readonly DamagedSnapshot[],
  ) {
    const list = damaged.map(({ name, reason }) => `  ${name}: ${reason}`).join('\n');
    super(
      `None of the database snapshots in ${folder} can be used:\n${list}\n` +
        'Nothing was changed. Put a good snapshot back into the folder, or point DATA_DIR at another one.',
    );
  }
}

export interface SnapshotStoreOptions {
  readonly folder: string;
  readonly files: FileSystem;
  /** Gives what is wrong with an image, or null. */
  readonly verify: (image: Uint8Array) => Promise<string | null>;
  /** Throws when this process may no longer write to the folder. */
  readonly checkLock?: () => Promise<void>;
  readonly onTidyFailure?: (error: unknown) => void;
}

/**
 * Keeps whole images of the database as numbered generations in one folder. Each is an ordinary SQLite file whose name
 * holds its number and the SHA-256 of its content, and is never written to again: it appears under its name complete
 * and synced, or not at all. So a generation copied elsewhere is a backup, and copied back is a restore.
 */
export class SnapshotStore {
  readonly #options: SnapshotStoreOptions;
  #generation = 0;
  #tidying: Promise<void> = Promise.resolve();

  constructor(options: SnapshotStoreOptions) {
    this.#options = options;
  }

  /**
   * The newest generation that is whole. Damaged ones are moved aside, not deleted, once an older one has been found
   * good. Throws {@link DamagedDatabaseError} when there are generations but no good one.
   */
  async load(): Promise<LoadedSnapshot> {
    const { folder, files } = this.#options;
    await files.ensureFolder(folder);
    const names = await files.list(folder);
    const damaged: DamagedSnapshot[] = [];
    for (const name of newestFirst(names)) {
      const { image, reason } = await this.#examine(name);
      if (image === null) {
        damaged.push({ name, reason });
        continue;
      }
      this.#generation = generationOf(newestFirst(names)[0] ?? name);
      await this.#setAside(damaged, names);
      return { image, generation: generationOf(name), damaged };
    }
    for (const name of names)
      if (SET_ASIDE.test(name)) damaged.push({ name, reason: 'was found damaged before' });
    if (damaged.length > 0) throw new DamagedDatabaseError(folder, damaged);
    await this.#setAside([], names);
    return { image: null, generation: 0, damaged };
  }

  /** Puts an image on disk as the newest generation; resolves when it would survive a power cut. */
  async save(image: Uint8Array): Promise<void> {
    const { folder, files } = this.#options;
    await this.#tidying;
    // The number is used up even if this fails: a name never stands for two images.
    this.#generation += 1;
    const name = nameOf(this.#generation, await sha256(image));
    const path = join(folder, name);
    const temporary = `${path}.tmp`;
    let leftOver = temporary;
    try {
      await writeSynced(files, temporary, image);
      await this.#options.checkLock?.();
      await files.rename(temporary, path);
      leftOver = path;
      await files.syncFolder(folder);
    } catch (error) {
      // Whoever waits is told that this state was not stored, so it should not turn up after a crash either.
      await files.remove(leftOver).catch(() => undefined);
      throw error;
    }
    this.#tidying = this.#tidy().catch((error: unknown) => this.#options.onTidyFailure?.(error));
  }

  /** Resolves when old generations have been cleared away. */
  async idle(): Promise<void> {
    await this.#tidying;
  }

  async #examine(name: string): Promise<{ image: Uint8Array; reason: '' } | { image: null; reason: string }> {
    let image: Uint8Array;
    try {
      image = await this.#options.files.read(join(this.#options.folder, name));
    } catch (error) {
      // A sector that cannot be read is damage. Anything else (rights, too many files) may leave the file sound: going
      // back to an older one would lose what it holds.
      if (errorCode(error) === 'EIO') return { image: null, reason: 'the disk cannot read it' };
      throw error;
    }
    const sum = await sha256(image);
    if (sum !== NAME.exec(name)?.[2])
      return { image: null, reason: `its ${image.byteLength} bytes have another checksum` };
    const reason = await this.#options.verify(image);
    return reason === null ? { image, reason: '' } : { image: null, reason };
  }

  async #setAside(damaged: readonly DamagedSnapshot[], names: readonly string[]): Promise<void> {
    const { folder, files } = this.#options;
    for (const { name } of damaged) await files.rename(join(folder, name), join(folder, `${name}.damaged`));
    for (const name of names) if (TEMPORARY.test(name)) await files.remove(join(folder, name));
  }

  async #tidy(): Promise<void> {
    const { folder, files } = this.#options;
    const old = newestFirst(await files.list(folder)).slice(1 + KEPT_GENERATIONS);
    for (const name of old) await files.remove(join(folder, name));
  }
}

function newestFirst(names: readonly string[]): string[] {
  return names.filter((name) => NAME.test(name)).sort((a, b) => generationOf(b) - generationOf(a));
}

function generationOf(name: string): number {
  return Number(NAME.exec(name)?.[1] ?? 0);
}

function nameOf(generation: number, sum: string): string {
  return `layerwright-${String(generation).padStart(10, '0')}-${sum}.sqlite`;
}

/** SHA-256 in hexadecimal, worked out off the main thread. */
async function sha256(bytes: Uint8Array): Promise<string> {
  return Buffer.from(await webcrypto.subtle.digest('SHA-256', bytes)).toString('hex');
}
