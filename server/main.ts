import { ConfigError, configFrom } from './config.js';
import { NewerDatabaseError } from './db/open-database.js';
import { FolderInUseError } from './db/process-lock.js';
import { DamagedDatabaseError } from './db/snapshot-store.js';
import { errorCode } from './db/file-system.js';
import { createLog } from './log.js';
import { type RunningServer, startServer } from './start-server.js';

/** After this the process ends whatever is still under way, ms. */
const LAST_RESORT_MS = 10_000;

try {
  await run();
} catch (error) {
  process.stderr.write(`${explained(error)}\n`);
  process.exit(1);
}

async function run(): Promise<void> {
  const config = configFrom(process.env);
  const log = createLog(config.logLevel);
  const server = await startServer(config, log, (error) => {
    log.fatal(
      { err: error },
      'The database cannot go on: ending, so that the next start takes what is on disk',
    );
    process.exit(1);
  });
  for (const signal of ['SIGTERM', 'SIGINT'] as const) process.once(signal, () => void end(server));
}

async function end(server: RunningServer): Promise<void> {
  setTimeout(() => process.exit(1), LAST_RESORT_MS).unref();
  try {
    await server.stop();
    process.exit(0);
  } catch (error) {
    process.stderr.write(`${explained(error)}\n`);
    process.exit(1);
  }
}

/** What whoever started the program can do something about is said without a trace. */
function explained(error: unknown): string {
  const isPlain = [ConfigError, FolderInUseError, DamagedDatabaseError, NewerDatabaseError].some(
    (kind) => error instanceof kind,
  );
  if (!(error instanceof Error)) return String(error);
  if (errorCode(error) === 'EADDRINUSE') {
    return `${error.message}\nAnother program listens there: end it, or set PORT to another number.`;
  }
  return isPlain ? error.message : (error.stack ?? error.message);
}
