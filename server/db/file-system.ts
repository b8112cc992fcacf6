import { constants } from 'node:fs';
import { mkdir, open, readFile, readdir, rename, unlink } from 'node:fs/promises';

/** A new file that is being written. */
export interface NewFile {
  write(bytes: Uint8Array): Promise<void>;
  /** Resolves when what was written has reached the disk itself. */
  sync(): Promise<void>;
  close(): Promise<void>;
}

/**
 * What the snapshots ask of a disk: few calls, each of which can fail, so that the specs can make each of them fail.
 * Errors carry the `code` of the operating system.
 */
export interface FileSystem {
  ensureFolder(path: string): Promise<void>;
  list(folder: string): Promise<readonly string[]>;
  read(path: string): Promise<Uint8Array>;
  /** Creates a file that only its owner may read; it must not exist. */
  create(path: string): Promise<NewFile>;
  rename(from: string, to: string): Promise<void>;
  remove(path: string): Promise<void>;
  /** Makes the names in a folder as safe as the contents of its files. */
  syncFolder(folder: string): Promise<void>;
}

/** The disk of this machine. */
export const diskFileSystem: FileSystem = {
  async ensureFolder(path) {
    await mkdir(path, { recursive: true, mode: 0o700 });
  },

  async list(folder) {
    return readdir(folder);
  },

  async read(path) {
    return readFile(path);
  },

  async create(path) {
    const handle = await open(path, constants.O_CREAT | constants.O_EXCL | constants.O_WRONLY, 0o600);
    return {
      write: (bytes) => handle.writeFile(bytes),
      sync: () => handle.sync(),
      close: () => handle.close(),
    };
  },

  async rename(from, to) {
    await rename(from, to);
  },

  async remove(path) {
    await unlink(path);
  },

  async syncFolder(folder) {
    // Windows can neither open nor sync a folder, and keeps names safe without it.
    if (process.platform === 'win32') return;
    const handle = await open(folder, constants.O_RDONLY);
    try {
      await handle.sync();
    } finally {
      await handle.close();
    }
  },
};

/** The operating system's code of an error, as `ENOENT`; undefined if it is another kind of error. */
export function errorCode(error: unknown): string | undefined {
  return error instanceof Error && 'code' in error && typeof error.code === 'string' ? error.code : undefined;
}

/** Writes a new file and waits until its content has reached the disk. */
export async function writeSynced(files: FileSystem, path: string, bytes: Uint8Array): Promise<void> {
  const file = await files.create(path);
  try {
    await file.write(bytes);
    await file.sync();
  } finally {
    await file.close();
  }
}
