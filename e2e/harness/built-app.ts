import { spawn, type ChildProcess } from 'node:child_process';
import { existsSync } from 'node:fs';
import { mkdtemp, rm } from 'node:fs/promises';
import { createServer } from 'node:net';
import { tmpdir } from 'node:os';
import { join } from 'node:path';

const root = join(import.meta.dirname, '..', '..');
const mainFile = join(root, 'dist', 'server', 'server', 'main.js');

/** How long the server may take to answer, or to end when asked to, ms. */
const patienceMs = 30_000;

/** The built application on a free loopback port with a data folder of its own. */
export class BuiltApp {
  private child: ChildProcess | undefined;
  private said = '';

  private constructor(
    readonly url: string,
    readonly dataDir: string,
    private readonly env: NodeJS.ProcessEnv,
  ) {}

  /** Starts it. `env` adds settings to the ones a journey needs; demo data is off unless asked for. */
  static async start(env: NodeJS.ProcessEnv = {}): Promise<BuiltApp> {
    if (!existsSync(mainFile)) throw new Error('The application is not built: npm run build');
    const port = await freePort();
    const dataDir = await mkdtemp(join(tmpdir(), 'layerwright-journey-'));
    const url = `http://127.0.0.1:${port}`;
    const app = new BuiltApp(url, dataDir, {
      ...process.env,
      NODE_ENV: 'production',
      HOST: '127.0.0.1',
      PORT: String(port),
      DATA_DIR: dataDir,
      SEED_DEMO: '0',
      ...env,
    });
    await app.launch();
    return app;
  }

  /** Everything the server wrote so far. */
  get log(): string {
    return this.said;
  }

  /** Ends the server as a power cut would, and starts it again on the same data. */
  async crashAndRestart(): Promise<void> {
    await this.end('SIGKILL');
    await this.launch();
  }

  /** Asks the server to end, starts it again on the same data. */
  async restart(): Promise<void> {
    await this.end('SIGTERM');
    await this.launch();
  }

  /** Ends the server and removes its data. */
  async stop(): Promise<void> {
    await this.end('SIGTERM');
    await rm(this.dataDir, { recursive: true, force: true });
  }

  private async launch(): Promise<void> {
    const child = spawn(process.execPath, [mainFile], {
      cwd: root,
      env: this.env,
      stdio: ['ignore', 'pipe', 'pipe'],
    });
    this.child = child;
    child.stdout.on('data', (part: Buffer) => (this.said += part.toString()));
    child.stderr.on('data', (part: Buffer) => (this.said += part.toString()));
    process.once('exit', () => child.kill('SIGKILL'));
    const until = Date.now() + patienceMs;
    while (!(await this.answers())) {
      if (child.exitCode !== null) throw new Error(`The server ended with ${child.exitCode}:\n${this.said}`);
      if (Date.now() > until) throw new Error(`The server does not answer:\n${this.said}`);
      await pause(50);
    }
  }

  private async answers(): Promise<boolean> {
    try {
      const answer = await fetch(`${this.url}/api/health`, { signal: AbortSignal.timeout(2000) });
      return answer.ok;
    } catch {
      return false;
    }
  }

  private async end(signal: NodeJS.Signals): Promise<void> {
    const child = this.child;
    this.child = undefined;
    if (child === undefined || child.exitCode !== null || child.signalCode !== null) return;
    const ended = new Promise<boolean>((resolve) => child.once('close', () => resolve(true)));
    child.kill(signal);
    if (await Promise.race([ended, pause(patienceMs).then(() => false)])) return;
    child.kill('SIGKILL');
    throw new Error(`The server did not end on ${signal}:\n${this.said}`);
  }
}

/** A loopback port that nobody listens on right now. */
export function freePort(): Promise<number> {
  return new Promise((resolve, reject) => {
    const server = createServer();
    server.once('error', reject);
    server.listen(0, '127.0.0.1', () => {
      const address = server.address();
      const port = typeof address === 'object' && address !== null ? address.port : 0;
      server.close(() => resolve(port));
    });
  });
}

function pause(ms: number): Promise<void> {
  return new Promise((resolve) => setTimeout(resolve, ms).unref());
}
