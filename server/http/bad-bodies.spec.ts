import { aDesign } from '../testing/designs.js';
import { expectProblemDocument } from '../testing/problem-answers.js';
import { seededRandom } from '../testing/seeded-random.js';
import { type Browser, type TestSite, testSite } from '../testing/test-site.js';
import type { RegisteredRoute } from './routes.js';

const BODIES = 2000;

/** No request is to take longer than this, whatever is in it. */
const LIMIT_MS = 2000;

describe('bad bodies', () => {
  let site: TestSite;
  let member: Browser;

  beforeAll(async () => {
    site = await testSite();
    member = await site.member('Ada');
  });

  afterAll(() => site.close());

  it(`are answered by problem documents and bring nothing down: ${BODIES} seeded ones over all routes`, async () => {
    const kept = await member.send('POST', '/api/designs', { document: aDesign() });
    const ownHeaders = { 'If-Match': kept.headers['etag'] as string, 'Content-Type': 'application/json' };
    const registered = site.routes.registered.filter(({ path }) => path !== '/api/auth/logout');
    const withBody = registered.filter(({ body }) => body !== null);
    const random = seededRandom(20_260);
    const statuses = new Map<number, number>();
    let slowestMs = 0;
    for (let n = 0; n < BODIES; n += 1) {
      // Each route has its share; those that read a body have most of it.
      const route = n % 8 === 0 ? registered[(n / 8) % registered.length]! : pick(random, withBody);
      const path = route.path.replace(':id', kept.body.id as string) + badQuery(random);
      const body = badBody(random, route);
      const context = `${n}: ${route.method} ${path} ${body.slice(0, 300)}`;
      const from = process.cpuUsage();
      const answer = await member.send(
        route.method,
        path,
        route.method === 'GET' ? undefined : body,
        ownHeaders,
      );
      // Time on the processor: on a busy machine a request waits through no fault of its own.
      const { user, system } = process.cpuUsage(from);
      slowestMs = Math.max(slowestMs, (user + system) / 1000);
      statuses.set(answer.status, (statuses.get(answer.status) ?? 0) + 1);
      expect(answer.status).withContext(context).toBeLessThan(500);
      if (answer.status >= 400) expectProblemDocument(answer, context);
    }
    expect(slowestMs).toBeLessThan(LIMIT_MS);
    // Otherwise the generator would be too kind.
    expect(statuses.get(400) ?? 0).toBeGreaterThan(BODIES / 4);
    expect(site.log.filter((line) => line.includes('"level":50'))).toEqual([]);
  }, 120_000);
});

type Random = () => number;

const WORDS = [
  '',
  ' ',
  'bar',
  '../../etc/passwd',
  '\u0000',
  '<script>',
  'ß'.repeat(300),
  "' OR 1=1 --",
  '𝒳',
  '__proto__',
];
const NUMBERS = [0, -1, 1e308, -0.5, 1e-9, 2 ** 53, 4_294_967_296, 3.7, 60, 400];

/** Text that is sent as a body: valid JSON mostly, often a valid body that was damaged. */
function badBody(random: Random, route: RegisteredRoute): string {
  const kind = random();
  if (kind < 0.1) return damagedText(random, JSON.stringify(validBody(route)));
  if (kind < 0.75) return JSON.stringify(damaged(random, validBody(route)));
  if (kind < 0.8) return '{"__proto__": {"isAdmin": true}, "constructor": {"prototype": {}}}';
  if (kind < 0.85) return '['.repeat(1 + Math.floor(random() * 20_000));
  return JSON.stringify(anything(random, 4));
}

function validBody(route: RegisteredRoute): unknown {
  if (route.path.startsWith('/api/designs')) return { document: aDesign() };
  if (route.path === '/api/evaluate') return aDesign();
  return route.operation.bodyExample ?? {};
}

function badQuery(random: Random): string {
  if (random() < 0.7) return '';
  const queries = [
    '?q=%00',
    '?q[]=1',
    '?q=1&q=2',
    `?q=${'x'.repeat(500)}`,
    '?__proto__=1',
    '?q=%F0%9F%94%A5',
    '?paper=no',
  ];
  return pick(random, queries);
}

/** The same JSON with one to three places changed into something else. */
function damaged(random: Random, json: unknown): unknown {
  let result = json;
  for (let n = 0; n <= random() * 3; n += 1) result = changedSomewhere(random, result);
  return result;
}

function changedSomewhere(random: Random, json: unknown): unknown {
  if (typeof json !== 'object' || json === null || random() < 0.1) return anything(random, 2);
  if (Array.isArray(json)) {
    if (json.length === 0 || random() < 0.1) return [...json, anything(random, 2)];
    const at = Math.floor(random() * json.length);
    return json.map((item: unknown, index) => (index === at ? changedSomewhere(random, item) : item));
  }
  const entries = Object.entries(json);
  const kind = random();
  if (kind < 0.15) return { ...json, [pick(random, WORDS)]: anything(random, 2) };
  const at = Math.floor(random() * entries.length);
  if (kind < 0.3) return Object.fromEntries(entries.filter((_, index) => index !== at));
  return Object.fromEntries(
    entries.map(([key, value], index) => [key, index === at ? changedSomewhere(random, value) : value]),
  );
}

function anything(random: Random, depth: number): unknown {
  const kind = random();
  if (kind < 0.15) return null;
  if (kind < 0.25) return random() < 0.5;
  if (kind < 0.5) return pick(random, NUMBERS);
  if (kind < 0.75 || depth === 0) return pick(random, WORDS);
  const items = Array.from({ length: Math.floor(random() * 4) }, () => anything(random, depth - 1));
  return kind < 0.87 ? items : Object.fromEntries(items.map((item) => [pick(random, WORDS), item]));
}

function damagedText(random: Random, text: string): string {
  const at = Math.floor(random() * text.length);
  return random() < 0.5
    ? text.slice(0, at)
    : `${text.slice(0, at)}${pick(random, WORDS)}"${text.slice(at + 1)}`;
}

function pick<T>(random: Random, items: readonly T[]): T {
  return items[Math.floor(random() * items.length)]!;
}
