import { readdir, unlink, writeFile } from 'node:fs/promises';
import { join } from 'node:path';
import { pino } from 'pino';
import type { MigrationInterface, QueryRunner } from 'typeorm';
import { Design } from './entities/index.js';
import { type FileSystem, diskFileSystem } from './file-system.js';
import { MIGRATIONS } from './migrations/index.js';
import { NewerDatabaseError, type OpenOptions, type OpenedDatabase, openDatabase } from './open-database.js';
import { FolderInUseError, FolderTakenError } from './process-lock.js';
import type { Units } from './units.js';
import {
  FAULTY_CALLS,
  type FaultyCall,
  systemError,
  watchedFileSystem,
} from '../testing/faulty-file-system.js';
import { addOwner, designRow } from '../testing/rows.js';
import { removeTemporaryFolders, temporaryFolder } from '../testing/temporary-folder.js';

describe('openDatabase', () => {
  let folder: string;

  beforeEach(async () => {
    folder = await temporaryFolder();
  });

  afterEach(removeTemporaryFolders);

  function open(more: Partial<OpenOptions> = {}): Promise<OpenedDatabase> {
    return openDatabase({ folder, log: pino({ level: 'silent' }), retryMs: 20, ...more });
  }

  it('finds again what was written, and says whether there was anything', async () => {
    const first = await open();
    expect(first.isNew).toBeTrue();
    await first.units.write((manager) => addOwner(manager));
    await first.units.write((manager) => manager.insert(Design, designRow('kept')));
    await first.close();

    const second = await open();
    expect(second.isNew).toBeFalse();
    expect(await names(second.units)).toEqual(['kept']);
    await second.close();
  });

  it('keeps a second process out and gives the folder free again', async () => {
    const first = await open();
    await expectAsync(open()).toBeRejectedWithError(FolderInUseError);
    await first.close();
    await (await open()).close();
  });

  it('stops at once when another process has taken the folder, and disturbs nothing there', async () => {
    const broken: unknown[] = [];
    const first = await open({ onBroken: (error) => broken.push(error) });
    await first.units.write((manager) => addOwner(manager));
    await unlink(join(folder, 'layerwright.lock'));
    const second = await open();
    const before = await snapshots();

    await expectAsync(write(first.units, 'late')).toBeRejected();

    expect(broken).toEqual([jasmine.any(FolderTakenError)]);
    expect(await snapshots()).toEqual(before);
    await second.close();
    await first.close();
  });

  it('says loudly that it fell back to an older snapshot', async () => {
    const first = await open();
    await first.units.write((manager) => addOwner(manager));
    await first.units.write((manager) => manager.insert(Design, designRow('older')));
    await first.units.write((manager) => manager.insert(Design, designRow('newest')));
    await first.close();
    const newest = (await snapshots()).at(-1)!;
    await writeFile(join(folder, newest), 'no database');

    const lines: string[] = [];
    const second = await open({
      log: pino({ level: 'error' }, { write: (line: string) => lines.push(line) }),
    });

    expect(await names(second.units)).toEqual(['older']);
    expect(lines.join('')).toContain('THE NEWEST DATABASE SNAPSHOT IS DAMAGED');
    await second.close();
  });

  it('refuses a folder with nothing but damage, and gives the lock back', async () => {
    await (await open()).close();
    for (const name of await snapshots()) await writeFile(join(folder, name), 'no database');

    await expectAsync(open()).toBeRejectedWithError(/None of the database snapshots/);
    expect(await readdir(folder)).not.toContain('layerwright.lock');
  });

  it('keeps the file as it was before a migration changes it', async () => {
    await (await open()).close();
    const second = await open({ migrations: [...MIGRATIONS, Later9999999999998] });
    await second.close();

    expect(await readdir(join(folder, 'before-migration'))).toEqual(['generation-1.sqlite']);
  });

  it('leaves the data of a newer version alone', async () => {
    await (await open({ migrations: [...MIGRATIONS, Later9999999999998] })).close();
    const before = await readdir(folder);

    await expectAsync(open()).toBeRejectedWithError(NewerDatabaseError, /newer version of Layerwright/);
    expect(await readdir(folder)).toEqual(before);
  });

  it('changes nothing on disk when a migration fails', async () => {
    await (await open()).close();
    const before = await snapshots();

    await expectAsync(
      open({ migrations: [...MIGRATIONS, Later9999999999998, Failing9999999999999] }),
    ).toBeRejectedWithError(/cannot be done/);
    expect(await snapshots()).toEqual(before);
    await (await open()).close();
  });

  it('never acknowledges falsely, keeps reading and recovers, whichever call fails and when', async () => {
    for (const call of FAULTY_CALLS) {
      for (const [nth, code] of [
        [1, 'ENOSPC'],
        [2, 'EIO'],
        [5, 'EMFILE'],
      ] as const) {
        await failNth(call, nth, code);
      }
    }
  });

  it('holds out while every call fails, and works again when the disk does', async () => {
    let isBroken = false;
    const files = watchedFileSystem(diskFileSystem, () => {
      if (isBroken) throw systemError('ENOSPC');
    });
    const database = await open({ files });
    await database.units.write((manager) => addOwner(manager));
    isBroken = true;
    for (let n = 0; n < 10; n += 1) {
      await expectAsync(write(database.units, `lost-${n}`)).toBeRejected();
      expect(await names(database.units)).toEqual([]);
      expect(database.isHealthy()).toBeFalse();
    }
    isBroken = false;
    await healthy(database);
    await write(database.units, 'after');
    await database.close();

    const again = await open();
    expect(await names(again.units)).toEqual(['after']);
    await again.close();
  });

  /** Writes ten designs while the nth call of a kind fails, then compares what was acknowledged with what is there. */
  async function failNth(call: FaultyCall, nth: number, code: string): Promise<void> {
    const context = `${call} ${nth} ${code}`;
    let count = -Infinity;
    const files: FileSystem = watchedFileSystem(diskFileSystem, (made) => {
      if (made !== call) return;
      count += 1;
      if (count === nth) throw systemError(code);
    });
    folder = await temporaryFolder();
    const database = await open({ files });
    await database.units.write((manager) => addOwner(manager));
    count = 0;
    const acknowledged: string[] = [];
    for (let n = 0; n < 10; n += 1) {
      await write(database.units, `d-${n}`).then(
        () => acknowledged.push(`d-${n}`),
        () => undefined,
      );
      expect(await names(database.units))
        .withContext(context)
        .toEqual(acknowledged);
      if (!database.isHealthy()) await healthy(database);
    }
    expect(acknowledged.length).withContext(context).toBeGreaterThanOrEqual(9);
    await database.close();

    const again = await open();
    expect(await names(again.units))
      .withContext(context)
      .toEqual(acknowledged);
    await again.close();
  }

  async function snapshots(): Promise<string[]> {
    return (await readdir(folder)).filter((name) => name.endsWith('.sqlite')).sort();
  }
});

class Later9999999999998 implements MigrationInterface {
  async up(runner: QueryRunner): Promise<void> {
    await runner.query('CREATE TABLE later (id integer)');
  }

  async down(runner: QueryRunner): Promise<void> {
    await runner.dropTable('later');
  }
}

class Failing9999999999999 implements MigrationInterface {
  up(): Promise<void> {
    return Promise.reject(new Error('this cannot be done'));
  }

  down(): Promise<void> {
    return Promise.resolve();
  }
}

async function write(units: Units, id: string): Promise<void> {
  await units.write((manager) => manager.insert(Design, designRow(id)));
}

async function names(units: Units): Promise<string[]> {
  const rows = await units.read((manager) =>
    manager.find(Design, { select: { id: true }, order: { id: 'ASC' } }),
  );
  return rows.map(({ id }) => id);
}

async function healthy(database: OpenedDatabase): Promise<void> {
  for (let waitedMs = 0; !database.isHealthy(); waitedMs += 10) {
    if (waitedMs > 5000) throw new Error('The database did not recover within 5 s.');
    await new Promise((resolve) => setTimeout(resolve, 10));
  }
}
