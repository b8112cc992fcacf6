import { type Server, createServer } from 'node:http';
import type { AddressInfo } from 'node:net';
import { setTimeout as sleep } from 'node:timers/promises';
import type { Logger } from 'pino';
import { ComputePool } from './compute/compute-pool.js';
import { compose } from './composition.js';
import type { Config } from './config.js';
import { openDatabase } from './db/open-database.js';
import type { Health } from './health/health.js';
import { sessionSecretIn } from './session-secret.js';

/** The server goes on answering until nobody has come for this long, or until the second time is over. */
const GOODBYE_MS = 400;
const GOODBYE_MAX_MS = 3_000;

/** How long answers that are under way may take when the server ends. */
const PATIENCE_MS = 8_000;

/** A server that listens. */
export interface RunningServer {
  readonly url: string;
  /** Takes nothing new, finishes what it has, puts the last state on disk, gives the folder free. */
  readonly stop: () => Promise<void>;
}

/** Opens the database, puts the application together and listens. */
export async function startServer(
  config: Config,
  log: Logger,
  onBroken: (error: unknown) => void,
): Promise<RunningServer> {
  const database = await openDatabase({ folder: config.dataFolder, log, onBroken });
  const compute = new ComputePool();
  // The first request is not to wait for it; should it fail, that request says why.
  compute.warmUp().catch((error: unknown) => log.warn({ err: error }, 'A thread could not be started'));
  try {
    const secret = config.sessionSecret ?? (await sessionSecretIn(config.dataFolder));
    const { express, health, housekeeping, seed } = compose({
      ...config,
      log,
      secret,
      compute,
      units: database.units,
      canStore: database.isHealthy,
      now: () => new Date(),
    });
    if (database.isNew && config.hasDemo) await seed();
    const server = createServer(express);
    await listen(server, config);
    housekeeping.start();
    const url = urlOf(server, config.host);
    log.info(
      {
        url,
        publicUrl: config.publicOrigin ?? 'not set',
        database: `local: embedded, in ${config.dataFolder}`,
        sessions: 'local: in the database',
        sessionSecret: config.sessionSecret === null ? 'local: in the data folder' : 'from the settings',
        page: config.webFolder ?? 'not built: the API alone',
        demo: config.hasDemo ? 'in a new database' : 'none',
      },
      'Layerwright is ready',
    );
    return {
      url,
      stop: async () => {
        log.info('Layerwright is ending');
        housekeeping.stop();
        await finish(server, health);
        await compute.close();
        await database.close();
        log.info('Layerwright has ended; everything is on disk');
      },
    };
  } catch (error) {
    await compute.close();
    await database.close();
    throw error;
  }
}

async function listen(server: Server, { port, host }: Config): Promise<void> {
  await new Promise<void>((resolve, reject) => {
    server.once('error', reject);
    server.listen(port, host, () => {
      server.off('error', reject);
      resolve();
    });
  });
}

function urlOf(server: Server, host: string): string {
  const { port } = server.address() as AddressInfo;
  return `http://${host.includes(':') ? `[${host}]` : host}:${port}`;
}

/**
 * Lets answers that are under way be finished, but not for ever. While requests still come in, each answer says that its
 * connection ends here: one that is simply closed may have a request on its way to us.
 */
async function finish(server: Server, health: Health): Promise<void> {
  let lastRequest = performance.now();
  server.on('request', () => (lastRequest = performance.now()));
  health.stopping();
  const patience = setTimeout(() => server.closeAllConnections(), PATIENCE_MS);
  const latest = performance.now() + GOODBYE_MAX_MS;
  do await sleep(GOODBYE_MS / 4);
  while (performance.now() < latest && performance.now() - lastRequest < GOODBYE_MS);
  const sweep = setInterval(() => server.closeIdleConnections(), 100);
  await new Promise<void>((resolve) => server.close(() => resolve()));
  clearInterval(sweep);
  clearTimeout(patience);
}
