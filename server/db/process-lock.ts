import { randomUUID } from 'node:crypto';
import { link, readFile, rename, stat, unlink, utimes, writeFile } from 'node:fs/promises';
import { hostname } from 'node:os';
import { join } from 'node:path';
import { z } from 'zod';
import { errorCode } from './file-system.js';

const FILE = 'layerwright.lock';

/** How often the holder shows that it is alive, and after how long a silent holder elsewhere counts as gone. */
const BEAT_MS = 5_000;
const SILENT_MS = 30_000;

const holderSchema = z.object({
  pid: z.number().int(),
  host: z.string(),
  /** Tells a process from a later one with the same number; null where the system does not say. */
  birth: z.string().nullable(),
  token: z.string(),
  since: z.string(),
});

type Holder = z.infer<typeof holderSchema>;

/** Another running process works with the same data folder. */
export class FolderInUseError extends Error {
  override readonly name = 'FolderInUseError';

  constructor(folder: string, holder: Holder | null) {
    const who = holder
      ? `process ${holder.pid} on ${holder.host}, since ${holder.since}`
      : 'a process that is starting';
    super(
      `The data folder ${folder} is in use by ${who}. One folder serves one process: stop the other one, ` +
        'or point DATA_DIR at another folder.',
    );
  }
}

/** Another process has taken the folder from this one, which must not write to it any more. */
export class FolderTakenError extends Error {
  override readonly name = 'FolderTakenError';

  constructor(path: string) {
    super(`The lock ${path} is no longer held by this process.`);
  }
}

/** Keeps a second process out of the data folder. Left behind by a crash, it is taken over. */
export class ProcessLock {
  readonly #path: string;
  readonly #beat: NodeJS.Timeout;

  private constructor(
    path: string,
    readonly token: string,
  ) {
    this.#path = path;
    this.#beat = setInterval(() => {
      const now = new Date();
      // A missed beat matters to nobody but a taker on another machine; `check` is what guards the data.
      utimes(path, now, now).catch(() => undefined);
    }, BEAT_MS);
    this.#beat.unref();
  }

  /** Takes the folder, which must exist. Throws {@link FolderInUseError}. */
  static async take(folder: string): Promise<ProcessLock> {
    const path = join(folder, FILE);
    const holder: Holder = {
      pid: process.pid,
      host: hostname(),
      birth: await birthOf(process.pid),
      token: randomUUID(),
      since: new Date().toISOString(),
    };
    for (let attempt = 0; attempt < 3; attempt += 1) {
      try {
        await writeFile(path, JSON.stringify(holder), { flag: 'wx', mode: 0o600 });
        return new ProcessLock(path, holder.token);
      } catch (error) {
        if (errorCode(error) !== 'EEXIST') throw error;
      }
      await removeStale(folder, path);
    }
    throw new FolderInUseError(folder, null);
  }

  /** Throws {@link FolderTakenError} when the folder has been taken from this process. */
  async check(): Promise<void> {
    const holder = await readHolder(this.#path);
    if (holder?.token !== this.token) throw new FolderTakenError(this.#path);
  }

  async release(): Promise<void> {
    clearInterval(this.#beat);
    const holder = await readHolder(this.#path);
    if (holder?.token === this.token) await unlink(this.#path);
  }
}

/** Clears the lock of a process that is gone. Throws {@link FolderInUseError} when it is not gone. */
async function removeStale(folder: string, path: string): Promise<void> {
  const holder = await readHolder(path);
  if (await isAlive(path, holder)) throw new FolderInUseError(folder, holder);
  // Another taker may have come first, so what is moved away is looked at again, and put back if it is a live one.
  const moved = `${path}.${randomUUID()}`;
  try {
    await rename(path, moved);
  } catch (error) {
    if (errorCode(error) === 'ENOENT') return;
    throw error;
  }
  const found = await readHolder(moved);
  if (found?.token !== holder?.token) await link(moved, path).catch(() => undefined);
  await unlink(moved);
}

async function readHolder(path: string): Promise<Holder | null> {
  try {
    return holderSchema.parse(JSON.parse(await readFile(path, 'utf8')));
  } catch (error) {
    const isUnreadable =
      error instanceof SyntaxError || error instanceof z.ZodError || errorCode(error) === 'ENOENT';
    if (isUnreadable) return null;
    throw error;
  }
}

async function isAlive(path: string, holder: Holder | null): Promise<boolean> {
  // A lock without a holder is being written at this moment, or its writer died doing so.
  if (holder === null || holder.host !== hostname()) return (await silentForMs(path)) < SILENT_MS;
  const birth = await birthOf(holder.pid);
  if (birth !== null && holder.birth !== null) return birth === holder.birth;
  return isRunning(holder.pid);
}

async function silentForMs(path: string): Promise<number> {
  try {
    return Date.now() - (await stat(path)).mtimeMs;
  } catch (error) {
    if (errorCode(error) === 'ENOENT') return Number.POSITIVE_INFINITY;
    throw error;
  }
}

function isRunning(pid: number): boolean {
  try {
    process.kill(pid, 0);
    return true;
  } catch (error) {
    return errorCode(error) === 'EPERM';
  }
}

/** Boot and start time of a process on Linux; null elsewhere, or when there is no such process. */
async function birthOf(pid: number): Promise<string | null> {
  try {
    const [boot, status] = await Promise.all([
      readFile('/proc/sys/kernel/random/boot_id', 'utf8'),
      readFile(`/proc/${pid}/stat`, 'utf8'),
    ]);
    // The name, in brackets, may hold anything; the start time is the 20th field after it.
    const started = status.slice(status.lastIndexOf(')') + 2).split(' ')[19];
    return started === undefined ? null : `${boot.trim()}/${started}`;
  } catch {
    return null;
  }
}
