import { randomBytes } from 'node:crypto';
import { type Server, createServer } from 'node:http';
import type { AddressInfo } from 'node:net';
import request, { type Response } from 'supertest';
import { type Composition, type Materials, compose } from '../composition.js';
import { type Compute, TASKS } from '../compute/tasks.js';
import { createLog } from '../log.js';
import type { Method } from '../auth/policy.js';
import type { WriteQueue, WriteQueueOptions } from '../db/write-queue.js';
import { memoryQueue } from './memory-database.js';

const MANY = { count: 1_000_000, windowMs: 60_000 };

/** Does tasks at once, on the thread of the spec. */
export const directCompute: Compute = {
  run: async (name, input) => (await (TASKS[name] as (input: unknown) => unknown)(input)) as never,
};

/** The whole application on a fresh database in memory, listening on a port of its own. */
export interface TestSite extends Composition {
  readonly url: string;
  readonly queue: WriteQueue;
  /** A browser that nobody has used yet. */
  readonly browser: () => Browser;
  /** A browser whose owner has just made an account. */
  readonly member: (name: string) => Promise<Browser>;
  /** Lines of the log so far. */
  readonly log: readonly string[];
  readonly close: () => Promise<void>;
}

export async function testSite(
  more: Partial<Materials> = {},
  queueOptions: Partial<WriteQueueOptions> = {},
): Promise<TestSite> {
  const queue = await memoryQueue(queueOptions);
  const log: string[] = [];
  const composition = compose({
    log: createLog('debug', { write: (line: string) => log.push(line) }),
    units: queue,
    canStore: () => queue.isHealthy,
    compute: directCompute,
    secret: randomBytes(32).toString('hex'),
    publicOrigin: null,
    trustedProxies: 0,
    limits: { signIns: MANY, registrations: MANY, computations: MANY },
    webFolder: null,
    now: () => new Date(),
    ...more,
  });
  const server = createServer(composition.express);
  await new Promise<void>((resolve) => server.listen(0, '127.0.0.1', resolve));
  const browser = (): Browser => new Browser(server);
  return {
    ...composition,
    url: `http://127.0.0.1:${(server.address() as AddressInfo).port}`,
    queue,
    browser,
    member: async (name) => {
      const owned = browser();
      await owned.register(name);
      return owned;
    },
    log,
    close: async () => {
      composition.housekeeping.stop();
      await new Promise((resolve) => {
        server.close(resolve);
        server.closeAllConnections();
      });
      await queue.close();
    },
  };
}

export const PASSWORD = 'three hammers and a tong';

type Headers = Readonly<Record<string, string>>;

/** Keeps cookies, and gets the token that changes need, as our own page does. */
export class Browser {
  readonly agent: ReturnType<typeof request.agent>;
  #token: string | null = null;

  constructor(server: Server) {
    this.agent = request.agent(server);
  }

  get(path: string, headers: Headers = {}): Promise<Response> {
    return this.send('GET', path, undefined, headers);
  }

  /** A request with the token that it needs. */
  async send(method: Method, path: string, body?: unknown, headers: Headers = {}): Promise<Response> {
    const token: Headers =
      method === 'GET' ? {} : { 'x-csrf-token': (this.#token ??= await this.newToken()) };
    return this.raw(method, path, body, { ...token, ...headers });
  }

  /** A request just as it is given. */
  async raw(method: Method, path: string, body?: unknown, headers: Headers = {}): Promise<Response> {
    const call = this.agent[method.toLowerCase() as 'get' | 'post' | 'put' | 'delete'](path).set(headers);
    if (body === undefined) return call;
    if (typeof body === 'string')
      return call.set({ 'Content-Type': 'application/json', ...headers }).send(body);
    return call.send(body as object);
  }

  async register(name: string, password = PASSWORD): Promise<Response> {
    const answer = await this.send('POST', '/api/auth/register', { name, email: emailOf(name), password });
    this.#token = null;
    return answer;
  }

  async signIn(name: string, password = PASSWORD): Promise<Response> {
    const answer = await this.send('POST', '/api/auth/login', { email: emailOf(name), password });
    this.#token = null;
    return answer;
  }

  async signOut(): Promise<Response> {
    const answer = await this.send('POST', '/api/auth/logout');
    this.#token = null;
    return answer;
  }

  async newToken(): Promise<string> {
    const { body } = await this.agent.get('/api/auth/csrf');
    return (body as { token: string }).token;
  }

  /** The value of one of the cookies that an answer sets. */
  static cookieIn(answer: Response, name: string): string | undefined {
    const lines = (answer.headers['set-cookie'] ?? []) as unknown as readonly string[];
    return lines.find((line) => line.startsWith(`${name}=`))?.split(/[=;]/)[1];
  }
}

export function emailOf(name: string): string {
  return `${name.toLowerCase().replace(/\W+/g, '.')}@forge.example`;
}
