import { AsyncResource } from 'node:async_hooks';
import { type EntityManager, Like } from 'typeorm';
import { EmbeddedDatabase } from './embedded-database.js';
import { Design, Shop } from './entities/index.js';
import { StorageUnavailableError } from './units.js';
import { type WriteQueue } from './write-queue.js';
import { emptyImage, memoryQueue } from '../testing/memory-database.js';
import { addOwner, designRow } from '../testing/rows.js';
import { systemError } from '../testing/faulty-file-system.js';
import { seededRandom } from '../testing/seeded-random.js';

const PLANNED = new Error('this unit is meant to fail');

describe('WriteQueue', () => {
  let queue: WriteQueue;

  beforeEach(async () => {
    queue = await memoryQueue();
    await queue.write((manager) => addOwner(manager));
  });

  afterEach(() => queue.close());

  it('keeps what one unit wrote when another, begun before it, fails', async () => {
    const results = await Promise.allSettled([
      queue.write((manager) => slowInserts(manager, ['a-1', 'a-2'], PLANNED)),
      queue.write((manager) => slowInserts(manager, ['b-1', 'b-2'])),
    ]);

    expect(results.map(({ status }) => status)).toEqual(['rejected', 'fulfilled']);
    expect(await names(queue)).toEqual(['b-1', 'b-2']);
  });

  it('answers as many of 500 overlapping units as there are rows, for 20 seeds', async () => {
    const insert = 'INSERT INTO shop (id, name, "createdAt") VALUES (?, ?, ?)';
    for (let seed = 1; seed <= 20; seed += 1) {
      const random = seededRandom(seed);
      const results = await Promise.allSettled(
        Array.from({ length: 500 }, (_, index) => {
          const isSlow = random() < 0.1;
          return queue.write(async (manager) => {
            await manager.query(insert, [`${seed}-${index}`, 'A forge', '2026']);
            if (isSlow) await pause();
            if (index % 5 === 0) throw PLANNED;
          });
        }),
      );
      const acknowledged = results.filter(({ status }) => status === 'fulfilled').length;
      const rows = await queue.read((manager) => manager.countBy(Shop, { id: Like(`${seed}-%`) }));
      expect([acknowledged, rows]).withContext(`seed ${seed}`).toEqual([400, 400]);
    }
  });

  it('shows a reader no row that was not committed', async () => {
    const reads: Promise<string[]>[] = [];
    const writes = Array.from({ length: 50 }, (_, index) =>
      queue.write(async (manager) => {
        await manager.insert(Design, designRow(`row-${index}`));
        for (let n = 0; n < 20; n += 1) reads.push(queueless(() => names(queue)));
        await pause();
        throw PLANNED;
      }),
    );

    await Promise.allSettled(writes);

    expect(reads.length).toBe(1000);
    expect(new Set((await Promise.all(reads)).flat())).toEqual(new Set());
  });

  it('makes a unit within a unit part of it', async () => {
    await expectAsync(
      queue.write(async (manager) => {
        await manager.insert(Design, designRow('outer'));
        await queue.write((inner) => inner.insert(Design, designRow('inner')));
        expect(await names(queue)).toEqual(['inner', 'outer']);
        throw PLANNED;
      }),
    ).toBeRejectedWith(PLANNED);

    expect(await names(queue)).toEqual([]);
  });

  it('refuses a write within a read, and a read that writes', async () => {
    await expectAsync(
      queue.read(() => queue.write((manager) => addOwner(manager, 'x', 'y'))),
    ).toBeRejectedWithError(/cannot contain one that writes/);
    await expectAsync(queue.read((manager) => addOwner(manager, 'x', 'y'))).toBeRejectedWithError(
      /has written/,
    );
  });

  it('refuses what is left running after its unit is over', async () => {
    let late: Promise<unknown> = Promise.resolve();
    await queue.write((manager) => {
      late = pause().then(() => queue.write(() => manager.insert(Design, designRow('late'))));
      late.catch(() => undefined);
      return Promise.resolve();
    });

    await expectAsync(late).toBeRejectedWithError(/something in it was not awaited/);
    expect(await names(queue)).toEqual([]);
  });

  it('lets 100 writers share few snapshots, and writes none for a unit that changed nothing', async () => {
    const before = queue.snapshots;
    await Promise.all(
      Array.from({ length: 100 }, (_, n) =>
        queue.write((manager) => manager.insert(Design, designRow(`n-${n}`))),
      ),
    );
    const shared = queue.snapshots - before;
    expect(shared).toBeGreaterThan(0);
    expect(shared).toBeLessThanOrEqual(3);

    await queue.write((manager) => manager.update(Design, { id: 'absent' }, { name: 'x' }));
    await queue.read((manager) => manager.find(Design));
    expect(queue.snapshots - before).toBe(shared);
  });

  it('keeps foreign keys biting after a hundred snapshots', async () => {
    for (let n = 0; n < 100; n += 1)
      await queue.write((manager) => manager.insert(Design, designRow(`n-${n}`)));
    expect(queue.snapshots).toBeGreaterThanOrEqual(100);

    await expectAsync(
      queue.write((manager) => manager.insert(Design, designRow('orphan', { ownerId: 'nobody' }))),
    ).toBeRejectedWithError(/FOREIGN KEY constraint failed/);
  });

  it('accepts nothing more once it is closing', async () => {
    const last = queue.write((manager) => manager.insert(Design, designRow('last')));
    const closed = queue.close();

    await expectAsync(last).toBeResolved();
    await expectAsync(
      queue.write((manager) => manager.insert(Design, designRow('late'))),
    ).toBeRejectedWithError(StorageUnavailableError);
    await closed;
  });
});

describe('WriteQueue when a snapshot fails', () => {
  let queue: WriteQueue;
  let fails: boolean;
  let saving: (() => Promise<void>) | null;

  beforeEach(async () => {
    fails = false;
    saving = null;
    queue = await memoryQueue({
      retryMs: 20,
      save: async () => {
        await saving?.();
        if (fails) throw systemError('ENOSPC');
      },
    });
    await queue.write((manager) => addOwner(manager));
    await queue.write((manager) => manager.insert(Design, designRow('kept')));
  });

  afterEach(() => queue.close());

  it('tells everyone who waited, shows nobody what was lost, and recovers by itself', async () => {
    fails = true;
    const writes = await Promise.allSettled([
      queue.write((manager) => manager.insert(Design, designRow('lost-1'))),
      queue.write((manager) => manager.update(Design, { id: 'kept' }, { name: 'changed' })),
    ]);
    expect(
      writes.map((write) => write.status === 'rejected' && write.reason instanceof StorageUnavailableError),
    ).toEqual([true, true]);
    expect(queue.isHealthy).toBeFalse();
    expect(await names(queue)).toEqual(['kept']);

    fails = false;
    await pause(100);
    expect(queue.isHealthy).toBeTrue();
    await queue.write((manager) => manager.insert(Design, designRow('after')));
    expect(await names(queue)).toEqual(['after', 'kept']);
  });

  it('reads again when the state that was read turns out not to be kept', async () => {
    const gate = manualGate();
    saving = () => gate.opened;
    const write = queue.write((manager) => manager.insert(Design, designRow('phantom')));
    write.catch(() => undefined);
    const read = names(queue);
    fails = true;
    gate.open();

    expect(await read).toEqual(['kept']);
    await expectAsync(write).toBeRejectedWithError(StorageUnavailableError);
  });

  it('rejects also a unit that was committed while the failing snapshot was written', async () => {
    const gate = manualGate();
    saving = () => gate.opened;
    const first = queue.write((manager) => manager.insert(Design, designRow('first')));
    await pause(20);
    const second = queue.write((manager) => manager.insert(Design, designRow('second')));
    await pause(20);
    fails = true;
    gate.open();

    const results = await Promise.allSettled([first, second]);
    expect(results.map(({ status }) => status)).toEqual(['rejected', 'rejected']);
    expect(await names(queue)).toEqual(['kept']);
  });
});

describe('TypeORM on sql.js without the queue', () => {
  // The reason for the queue. When this fails, the driver has learnt to keep transactions apart.
  it('loses the row of a unit that succeeded beside one that failed', async () => {
    const database = await EmbeddedDatabase.open(await emptyImage());
    await addOwner(database.manager);

    const results = await Promise.allSettled([
      database.transaction((manager) => slowInserts(manager, ['a-1', 'a-2'], PLANNED)),
      database.transaction((manager) => slowInserts(manager, ['b-1', 'b-2'])),
    ]);

    const rows = (await database.manager.find(Design)).map(({ id }) => id).sort();
    const isRight = results[1].status === 'fulfilled' && rows.join() === 'b-1,b-2';
    expect(isRight).toBeFalse();
    await database.close();
  });
});

async function slowInserts(manager: EntityManager, ids: readonly string[], error?: Error): Promise<void> {
  for (const id of ids) {
    await manager.insert(Design, designRow(id));
    await pause();
  }
  if (error) throw error;
}

async function names(queue: WriteQueue): Promise<string[]> {
  const rows = await queue.read((manager) =>
    manager.find(Design, { select: { id: true }, order: { id: 'ASC' } }),
  );
  return rows.map(({ id }) => id);
}

function pause(ms = 0): Promise<void> {
  return new Promise((resolve) => setTimeout(resolve, ms));
}

/** Calls `task` as another request would, outside the unit of work that runs at this moment. */
const outside = new AsyncResource('another request');
function queueless<T>(task: () => Promise<T>): Promise<T> {
  return outside.runInAsyncScope(task);
}

function manualGate(): { readonly opened: Promise<void>; readonly open: () => void } {
  let open = (): void => undefined;
  const opened = new Promise<void>((resolve) => (open = resolve));
  return { opened, open };
}
