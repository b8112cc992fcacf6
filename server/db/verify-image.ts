import initSqlJs from 'sql.js';

/** What SQLite itself finds wrong with an image of a database, in a few words; null when it is sound. */
export async function verifyImage(image: Uint8Array): Promise<string | null> {
  const { Database } = await initSqlJs();
  const database = new Database(image);
  try {
    const check = database.exec('PRAGMA quick_check(1)')[0]?.values[0]?.[0];
    if (check !== 'ok') return `SQLite says: ${String(check)}`;
    const orphans = database.exec('PRAGMA foreign_key_check')[0]?.values.length ?? 0;
    return orphans === 0 ? null : `${orphans} rows refer to rows that are not there`;
  } catch (error) {
    return `SQLite says: ${error instanceof Error ? error.message : String(error)}`;
  } finally {
    database.close();
  }
}
