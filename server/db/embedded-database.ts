import 'reflect-metadata';
import { DataSource, type EntityManager, type Logger, type MigrationInterface } from 'typeorm';
import type { SqljsDriver } from 'typeorm/driver/sqljs/SqljsDriver.js';
import type { Database as RawDatabase } from 'sql.js';
import { ENTITIES } from './entities/index.js';
import { MIGRATIONS } from './migrations/index.js';

export type MigrationClass = new () => MigrationInterface;

/** What fails is thrown, and logged where it is caught; the driver's own lines would end up on the console. */
const quiet: Logger = {
  log: () => undefined,
  logMigration: () => undefined,
  logQuery: () => undefined,
  logQueryError: () => undefined,
  logQuerySlow: () => undefined,
  logSchemaBuild: () => undefined,
};

/** A data source on sql.js that saves nothing by itself: the whole database is in memory. */
export function createDataSource(
  image?: Uint8Array,
  migrations: readonly MigrationClass[] = MIGRATIONS,
): DataSource {
  return new DataSource({
    type: 'sqljs',
    autoSave: false,
    synchronize: false,
    migrationsRun: false,
    logger: quiet,
    entities: ENTITIES,
    migrations: [...migrations],
    ...(image ? { database: image } : {}),
  });
}

/**
 * The embedded database: one connection in memory, and its image as bytes. It does no locking; everything but
 * start-up goes through the write queue.
 */
export class EmbeddedDatabase {
  private constructor(readonly dataSource: DataSource) {}

  /** Opens the database in `image`, or an empty one. */
  static async open(image?: Uint8Array, migrations?: readonly MigrationClass[]): Promise<EmbeddedDatabase> {
    const dataSource = createDataSource(image, migrations);
    await dataSource.initialize();
    return new EmbeddedDatabase(dataSource);
  }

  get manager(): EntityManager {
    return this.dataSource.manager;
  }

  /** Runs `unit` in a transaction. */
  transaction<T>(unit: (manager: EntityManager) => Promise<T>): Promise<T> {
    return this.dataSource.transaction(unit);
  }

  /** Rows inserted, changed and deleted since the connection was opened: unequal before and after means dirty. */
  totalChanges(): number {
    return Number(this.#raw.exec('SELECT total_changes()')[0]?.values[0]?.[0] ?? 0);
  }

  /** The database as the bytes of an SQLite file. Throws while a transaction is open. */
  exportImage(): Uint8Array {
    return this.#raw.export();
  }

  /** Goes back to an earlier image; whatever was committed since then is gone. */
  async restoreImage(image: Uint8Array): Promise<void> {
    const old = this.#raw;
    await this.dataSource.sqljsManager.loadDatabase(image);
    old.close();
  }

  async close(): Promise<void> {
    if (this.dataSource.isInitialized) await this.dataSource.destroy();
  }

  get #raw(): RawDatabase {
    return (this.dataSource.driver as SqljsDriver).databaseConnection as RawDatabase;
  }
}
