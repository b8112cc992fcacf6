import { spawn } from 'node:child_process';
import { readdir, stat, writeFile } from 'node:fs/promises';
import { join } from 'node:path';
import { fileURLToPath } from 'node:url';
import { pino } from 'pino';
import { type Config, configFrom } from './config.js';
import { startServer } from './start-server.js';
import { aDesign } from './testing/designs.js';
import { removeTemporaryFolders, temporaryFolder } from './testing/temporary-folder.js';

const PASSWORD = 'three hammers and a tong';
const SILENT = pino({ level: 'silent' });

describe('the server', () => {
  let config: Config;

  beforeEach(async () => {
    const folder = await temporaryFolder();
    config = { ...configFrom({ DATA_DIR: folder, PORT: '0', SEED_DEMO: '0' }), webFolder: null };
  });

  afterEach(removeTemporaryFolders);

  function start() {
    return startServer(config, SILENT, fail);
  }

  it('fills a new database with the demonstration, once', async () => {
    config = { ...config, hasDemo: true };
    for (let n = 0; n < 2; n += 1) {
      const server = await start();
      const visitor = await Visitor.at(server.url);
      const answer = await visitor.post('/api/auth/login', {
        email: 'smith@two-rivers.example',
        password: 'borax-and-flux',
      });
      expect(answer.status).toBe(200);
      expect((await visitor.get<unknown[]>('/api/designs')).length).toBe(2);
      await server.stop();
    }
  });

  it('makes a secret that nobody else can read, and keeps people signed in over a restart', async () => {
    const first = await start();
    const visitor = await Visitor.at(first.url);
    await visitor.post('/api/auth/register', { name: 'Ada', email: 'ada@forge.example', password: PASSWORD });
    await first.stop();
    const { mode } = await stat(join(config.dataFolder, 'session-secret'));
    expect(mode & 0o777).toBe(0o600);

    const second = await start();
    const me = await visitor.at(second.url).get<{ account: { name: string } }>('/api/auth/me');
    expect(me.account.name).toBe('Ada');
    await second.stop();
  });

  it('breaks no answer and loses nothing when it ends under load', async () => {
    const server = await start();
    const people = await Promise.all(
      Array.from({ length: 10 }, async (_, n) => {
        const visitor = await Visitor.at(server.url);
        await visitor.post('/api/auth/register', {
          name: 'A',
          email: `a${n}@forge.example`,
          password: PASSWORD,
        });
        return visitor;
      }),
    );
    const kept = new Set<string>();
    const broken: unknown[] = [];
    let hasToEnd = false;
    const isEnding = (): boolean => hasToEnd;
    const work = people.flatMap((visitor) =>
      Array.from({ length: 5 }, async () => {
        while (!isEnding()) {
          try {
            const answer = await visitor.post('/api/designs', { document: aDesign() });
            if (answer.status === 201) kept.add((answer.body as { id: string }).id);
            else if (answer.status !== 503) broken.push(answer);
          } catch (error) {
            // Once it is ending a connection may be refused, but none that was accepted may break.
            const cause = error instanceof Error ? (error.cause as { code?: string } | undefined) : undefined;
            if (!isEnding() || cause?.code !== 'ECONNREFUSED') broken.push(cause ?? error);
          }
        }
      }),
    );
    await new Promise((resolve) => setTimeout(resolve, 500));
    hasToEnd = true;
    const from = performance.now();
    await server.stop();
    const tookMs = performance.now() - from;
    await Promise.all(work);

    expect(broken).toEqual([]);
    expect(tookMs).toBeLessThan(10_000);
    expect(kept.size).toBeGreaterThan(0);
    const again = await start();
    const found = (
      await Promise.all(people.map((visitor) => visitor.at(again.url).get<{ id: string }[]>('/api/designs')))
    ).flat();
    expect(new Set(found.map(({ id }) => id))).toEqual(kept);
    await again.stop();
  });

  it('lets nobody else at its folder while it runs, nor leaves it locked when it could not start', async () => {
    const first = await start();
    await expectAsync(start()).toBeRejectedWithError(/is in use by process/);
    const taken = { ...config, dataFolder: await temporaryFolder(), port: Number(new URL(first.url).port) };
    await expectAsync(startServer(taken, SILENT, fail)).toBeRejectedWithError(/EADDRINUSE/);
    expect(await readdir(taken.dataFolder)).not.toContain('layerwright.lock');
    await first.stop();
  });
});

describe('the program', () => {
  afterEach(removeTemporaryFolders);

  it('says what is local, ends on SIGTERM within ten seconds, and leaves the folder unlocked', async () => {
    const folder = await temporaryFolder();
    const program = run({ DATA_DIR: folder, PORT: '0' });
    await program.says('Layerwright is ready');
    expect(program.output()).toContain('"database":"local: embedded');
    expect(program.output()).toContain('"sessionSecret":"local: in the data folder"');
    const from = performance.now();
    program.signal('SIGTERM');

    expect(await program.ended).toBe(0);
    expect(performance.now() - from).toBeLessThan(10_000);
    expect(program.output()).toContain('everything is on disk');
    expect(await readdir(folder)).not.toContain('layerwright.lock');
  });

  it('says in one line what is wrong with a setting, and with a database', async () => {
    const misspelt = run({ PORT: 'http' });
    expect(await misspelt.ended).toBe(1);
    expect(misspelt.output()).toBe('PORT is "http"; it has to be a whole number from 0 to 65535.\n');

    const folder = await temporaryFolder();
    await writeFile(join(folder, `layerwright-0000000001-${'0'.repeat(64)}.sqlite`), 'no database');
    const damaged = run({ DATA_DIR: folder, PORT: '0' });
    expect(await damaged.ended).toBe(1);
    expect(damaged.output()).toContain('None of the database snapshots');
    expect(damaged.output()).not.toContain('    at ');
  });
});

interface Program {
  readonly output: () => string;
  readonly says: (text: string) => Promise<void>;
  readonly signal: (signal: NodeJS.Signals) => void;
  readonly ended: Promise<number | null>;
}

/** The program as it is started in development. */
function run(environment: Readonly<Record<string, string>>): Program {
  const main = fileURLToPath(import.meta.resolve('./main.ts'));
  const child = spawn(process.execPath, ['--import', import.meta.resolve('tsx'), main], {
    env: {
      ...process.env,
      TSX_TSCONFIG_PATH: fileURLToPath(import.meta.resolve('./tsconfig.json')),
      ...environment,
    },
    stdio: ['ignore', 'pipe', 'pipe'],
  });
  let output = '';
  for (const stream of [child.stdout, child.stderr])
    stream.setEncoding('utf8').on('data', (text: string) => (output += text));
  return {
    output: () => output,
    says: async (text) => {
      while (!output.includes(text)) {
        if (child.exitCode !== null) throw new Error(output);
        await new Promise((resolve) => setTimeout(resolve, 50));
      }
    },
    signal: (signal) => child.kill(signal),
    ended: new Promise((resolve) => child.once('close', resolve)),
  };
}

/** A browser over real connections. */
class Visitor {
  #token = '';

  private constructor(
    private readonly url: string,
    private readonly cookies: Map<string, string>,
  ) {}

  static async at(url: string): Promise<Visitor> {
    const visitor = new Visitor(url, new Map());
    await visitor.#newToken();
    return visitor;
  }

  at(url: string): Visitor {
    return new Visitor(url, this.cookies);
  }

  async get<T>(path: string): Promise<T> {
    return (await this.#fetch(path)).json() as Promise<T>;
  }

  async post(path: string, body: object): Promise<{ status: number; body: unknown }> {
    const answer = await this.#fetch(path, {
      method: 'POST',
      headers: { 'Content-Type': 'application/json', 'x-csrf-token': this.#token },
      body: JSON.stringify(body),
    });
    const read: unknown = await answer.json();
    if (path.startsWith('/api/auth/')) await this.#newToken();
    return { status: answer.status, body: read };
  }

  async #newToken(): Promise<void> {
    this.#token = (await this.get<{ token: string }>('/api/auth/csrf')).token;
  }

  async #fetch(path: string, options: RequestInit = {}): Promise<Response> {
    const cookie = [...this.cookies].map(([name, value]) => `${name}=${value}`).join('; ');
    const answer = await fetch(this.url + path, {
      ...options,
      headers: { ...options.headers, Cookie: cookie },
    });
    for (const line of answer.headers.getSetCookie()) {
      const [, name = '', value = ''] = /^([^=]+)=([^;]*)/.exec(line) ?? [];
      this.cookies.set(name, value);
    }
    return answer;
  }
}
