import type { FileSystem } from '../db/file-system.js';

/** The calls that change something on disk, each of which can be made to fail. */
export const FAULTY_CALLS = ['create', 'write', 'sync', 'close', 'rename', 'syncFolder', 'remove'] as const;
export type FaultyCall = (typeof FAULTY_CALLS)[number];

/** An error as the operating system gives it. */
export function systemError(code: string): NodeJS.ErrnoException {
  return Object.assign(new Error(`${code}: made to fail by a spec`), { code });
}

/** A file system that asks `before` ahead of each call; what that throws is the call's failure. */
export function watchedFileSystem(
  inner: FileSystem,
  before: (call: FaultyCall) => void | Promise<void>,
): FileSystem {
  return {
    ensureFolder: (path) => inner.ensureFolder(path),
    list: (folder) => inner.list(folder),
    read: (path) => inner.read(path),
    async create(path) {
      await before('create');
      const file = await inner.create(path);
      return {
        async write(bytes) {
          try {
            await before('write');
          } catch (error) {
            // A full disk takes what still fits.
            await file.write(bytes.subarray(0, bytes.length >> 1));
            throw error;
          }
          await file.write(bytes);
        },
        async sync() {
          await before('sync');
          await file.sync();
        },
        async close() {
          await file.close();
          await before('close');
        },
      };
    },
    async rename(from, to) {
      await before('rename');
      await inner.rename(from, to);
    },
    async remove(path) {
      await before('remove');
      await inner.remove(path);
    },
    async syncFolder(folder) {
      await before('syncFolder');
      await inner.syncFolder(folder);
    },
  };
}
