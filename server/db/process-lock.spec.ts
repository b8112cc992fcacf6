import { readFile, utimes, writeFile } from 'node:fs/promises';
import { hostname } from 'node:os';
import { join } from 'node:path';
import { FolderInUseError, ProcessLock } from './process-lock.js';
import { removeTemporaryFolders, temporaryFolder } from '../testing/temporary-folder.js';

describe('ProcessLock', () => {
  let folder: string;

  beforeEach(async () => {
    folder = await temporaryFolder();
  });

  afterEach(removeTemporaryFolders);

  it('lets one in, and the next one when it is released', async () => {
    const lock = await ProcessLock.take(folder);
    await expectAsync(ProcessLock.take(folder)).toBeRejectedWithError(
      FolderInUseError,
      /is in use by process \d+/,
    );

    await lock.release();
    await (await ProcessLock.take(folder)).release();
  });

  it('lets one of twenty in that come at once', async () => {
    const taken = await Promise.allSettled(Array.from({ length: 20 }, () => ProcessLock.take(folder)));
    const winners = taken.flatMap((result) => (result.status === 'fulfilled' ? [result.value] : []));

    expect(winners.length).toBe(1);
    await winners[0]!.release();
  });

  it('takes over from a process that is gone, also when its number is in use again', async () => {
    for (const gone of [{ pid: 2 ** 22 + 1 }, { birth: 'another boot/1' }]) {
      await leaveLock(gone);
      const lock = await ProcessLock.take(folder);
      await expectAsync(lock.check()).toBeResolved();
      await lock.release();
    }
  });

  it('lets one of twenty take over at once', async () => {
    await leaveLock({ pid: 2 ** 22 + 1 });
    const taken = await Promise.allSettled(Array.from({ length: 20 }, () => ProcessLock.take(folder)));
    const holding = await Promise.all(
      taken.map(async (result) => {
        if (result.status === 'rejected') return false;
        return result.value.check().then(
          () => true,
          () => false,
        );
      }),
    );

    expect(holding.filter(Boolean).length).toBe(1);
    for (const result of taken) if (result.status === 'fulfilled') await result.value.release();
  });

  it('takes over from another machine only after it has been silent', async () => {
    await leaveLock({ host: `not-${hostname()}` });
    await expectAsync(ProcessLock.take(folder)).toBeRejectedWithError(FolderInUseError);

    const before = new Date(Date.now() - 60_000);
    await utimes(join(folder, 'layerwright.lock'), before, before);
    await (await ProcessLock.take(folder)).release();
  });

  it('notices that the folder was taken from it, and leaves the taker alone', async () => {
    const lock = await ProcessLock.take(folder);
    await leaveLock({ token: 'another' });

    await expectAsync(lock.check()).toBeRejectedWithError(/no longer held/);
    await lock.release();
    expect(await readFile(join(folder, 'layerwright.lock'), 'utf8')).toContain('another');
  });

  async function leaveLock(more: object): Promise<void> {
    const holder = {
      pid: process.pid,
      host: hostname(),
      birth: null,
      token: 'old',
      since: '2026-01-01',
      ...more,
    };
    await writeFile(join(folder, 'layerwright.lock'), JSON.stringify(holder));
  }
});
