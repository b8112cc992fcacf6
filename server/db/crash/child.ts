/**
 * The process that is killed. Waits for a line on its input, then writes as fast as it can and prints a line for each
 * write that was acknowledged: a pipe takes it at once, so what is printed has been promised.
 */
import { createInterface } from 'node:readline';
import { pino } from 'pino';
import { DataSource } from 'typeorm';
import { addOwner, designRow } from '../../testing/rows.js';
import { type FaultyCall, watchedFileSystem } from '../../testing/faulty-file-system.js';
import { Account, Design, ENTITIES } from '../entities/index.js';
import { diskFileSystem } from '../file-system.js';
import { MIGRATIONS } from '../migrations/index.js';
import { openDatabase } from '../open-database.js';
import { type Order, orderSchema } from './order.js';

const PADDING = JSON.stringify({ padding: 'x'.repeat(2000) });

process.stdout.write('ready\n');
for await (const line of createInterface({ input: process.stdin })) {
  const order = orderSchema.parse(JSON.parse(line));
  await (order.kind === 'queue' ? writeThroughQueue(order) : writeThroughDriver(order));
}

/** Many writers at once, each adding designs and saving each of them once more. */
async function writeThroughQueue(order: Order): Promise<void> {
  const { units } = await openDatabase({
    folder: order.folder,
    log: pino({ level: 'silent' }),
    files: watchedFileSystem(diskFileSystem, dieAt(order.dieAt)),
  });
  await units.write(async (manager) => {
    if ((await manager.count(Account)) === 0) {
      await addOwner(manager);
      // Some weight, so that a snapshot takes as long as it does in use.
      await insertFiller(300, (row) => manager.insert(Design, row));
    }
    // What earlier runs added was checked after each of them.
    await manager.delete(Design, { searchKey: 'run' });
  });
  await Promise.all(
    Array.from({ length: 32 }, async (_, writer) => {
      for (let n = 0; ; n += 1) {
        const id = `${order.run}-${writer}-${n}`;
        await units.write((manager) => manager.insert(Design, runRow(id)));
        process.stdout.write(`${id} 1\n`);
        await units.write((manager) => manager.increment(Design, { id }, 'revision', 1));
        process.stdout.write(`${id} 2\n`);
      }
    }),
  );
}

/** One writer on the driver's own saving, which is what the queue and the snapshots replace. */
async function writeThroughDriver(order: Order): Promise<void> {
  const source = await new DataSource({
    type: 'sqljs',
    location: order.folder,
    autoSave: true,
    entities: ENTITIES,
    migrations: [...MIGRATIONS],
  }).initialize();
  await source.runMigrations({ transaction: 'each' });
  if ((await source.manager.count(Account)) === 0) {
    await source.transaction(async (manager) => {
      await addOwner(manager);
      await insertFiller(1000, (row) => manager.insert(Design, row));
    });
  }
  for (let n = 0; ; n += 1) {
    const id = `${order.run}-0-${n}`;
    await source.manager.insert(Design, runRow(id));
    process.stdout.write(`${id} 1\n`);
  }
}

function runRow(id: string): ReturnType<typeof designRow> {
  return designRow(id, { searchKey: 'run', documentJson: PADDING });
}

async function insertFiller(
  count: number,
  insert: (rows: ReturnType<typeof designRow>[]) => Promise<unknown>,
) {
  const rows = Array.from({ length: count }, (_, n) => designRow(`filler-${n}`, { documentJson: PADDING }));
  for (let from = 0; from < count; from += 50) await insert(rows.slice(from, from + 50));
}

/** Ends the process, as a power cut would, ahead of the nth call of a kind. */
function dieAt(point: Order['dieAt']): (call: FaultyCall) => void {
  let count = 0;
  return (call) => {
    if (call !== point?.call) return;
    count += 1;
    if (count < point.nth) return;
    // The half of a file that a write leaves behind is written by whoever catches this.
    if (call === 'write') setImmediate(die);
    else die();
    throw new Error('This process is ending.');
  };
}

function die(): void {
  process.kill(process.pid, 'SIGKILL');
}
