import type { DataSource } from 'typeorm';
import { createDataSource } from '../embedded-database.js';
import { Design, SessionRow } from '../entities/index.js';
import { addOwner, designRow } from '../../testing/rows.js';
import { MIGRATIONS } from './index.js';

describe('migrations', () => {
  let source: DataSource;

  beforeEach(async () => {
    source = await createDataSource().initialize();
  });

  afterEach(() => source.destroy());

  it('give exactly the tables that the entities describe', async () => {
    await source.runMigrations({ transaction: 'each' });

    const difference = await source.driver.createSchemaBuilder().log();

    expect(difference.upQueries.map(({ query }) => query)).toEqual([]);
  });

  it('go up, down and up again on a filled database', async () => {
    await source.runMigrations({ transaction: 'each' });
    await fill(source);

    for (const _ of MIGRATIONS) await source.undoLastMigration({ transaction: 'each' });
    const tables = await source.query<{ name: string }[]>(
      "SELECT name FROM sqlite_master WHERE type = 'table' AND name NOT IN ('migrations', 'sqlite_sequence')",
    );
    expect(tables).toEqual([]);

    await source.runMigrations({ transaction: 'each' });
    await fill(source);
    expect(await source.manager.count(Design)).toBe(2);
    expect(await source.manager.count(SessionRow)).toBe(1);
  });

  it('leave foreign keys switched on', async () => {
    await source.runMigrations({ transaction: 'each' });

    expect(await source.query('PRAGMA foreign_keys')).toEqual([{ foreign_keys: 1 }]);
    await expectAsync(
      source.manager.insert(Design, designRow('orphan', { ownerId: 'nobody' })),
    ).toBeRejectedWithError(/FOREIGN KEY constraint failed/);
  });
});

async function fill(source: DataSource): Promise<void> {
  const time = '2026-01-01T00:00:00.000Z';
  await addOwner(source.manager);
  await source.manager.insert(Design, [designRow('one'), designRow('two', { deletedAt: time })]);
  await source.manager.insert(SessionRow, {
    id: 'a'.repeat(64),
    accountId: 'owner-1',
    dataJson: '{}',
    createdAt: time,
    expiresAt: time,
  });
}
