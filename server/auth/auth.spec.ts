import { SessionRow } from '../db/entities/index.js';
import { aDesign } from '../testing/designs.js';
import { expectProblem } from '../testing/problem-answers.js';
import { Browser, PASSWORD, type TestSite, emailOf, testSite } from '../testing/test-site.js';
import { SESSION_ABSOLUTE_MS, SESSION_IDLE_MS } from './session-store.js';

const SESSION = 'layerwright.session';
const MINUTE_MS = 60_000;

describe('accounts', () => {
  let site: TestSite;
  let nowMs: number;

  beforeEach(async () => {
    nowMs = Date.parse('2026-03-01T08:00:00Z');
    site = await testSite({ now: () => new Date(nowMs) });
  });

  afterEach(() => site.close());

  it('begin with a shop of their own, signed in', async () => {
    const browser = site.browser();
    const answer = await browser.register('Ada');

    expect(answer.status).toBe(201);
    expect(answer.body.account).toEqual({ id: jasmine.any(String), name: 'Ada', email: 'ada@forge.example' });
    expect(answer.body.shops).toEqual([{ id: jasmine.any(String), name: 'Ada’s shop', role: 'owner' }]);
    expect((await browser.get('/api/auth/me')).body).toEqual(answer.body);
  });

  it('are told apart by their address, whatever its capitals', async () => {
    await site.member('Ada');
    const again = { name: 'Other', email: '  ADA@Forge.Example ', password: PASSWORD };

    expectProblem(await site.browser().send('POST', '/api/auth/register', again), 'email-taken');
  });

  it('are made once when two ask for the same address at once', async () => {
    const answers = await Promise.all(Array.from({ length: 5 }, () => site.browser().register('Ada')));

    expect(answers.map(({ status }) => status).sort()).toEqual([201, 409, 409, 409, 409]);
  });

  it('are opened by the right password only, an unknown address being answered like a wrong one', async () => {
    await site.member('Ada');
    const wrong = await site.browser().signIn('Ada', 'a wrong password');
    const unknown = await site.browser().signIn('Nobody', 'a wrong password');

    expectProblem(wrong, 'wrong-credentials');
    expect({ ...unknown.body, instance: '' }).toEqual({ ...wrong.body, instance: '' });
    expect((await site.browser().signIn('Ada')).status).toBe(200);
  });

  it('take about as long to refuse an unknown address as a wrong password', async () => {
    await site.member('Ada');
    const known: number[] = [];
    const unknown: number[] = [];
    for (let n = 0; n < 9; n += 1) {
      known.push(await timed(() => site.auth.authenticate(emailOf('Ada'), 'a wrong password')));
      unknown.push(await timed(() => site.auth.authenticate(emailOf(`Nobody ${n}`), 'a wrong password')));
    }

    // No measure of the machine: without the hash of nobody the second is a hundredth of the first.
    expect(median(unknown)).toBeGreaterThan(median(known) / 3);
  });

  it('refuse passwords that everyone tries, that are short, or that are one’s own name', async () => {
    const cases: readonly (readonly [string, string])[] = [
      ['Password1', 'password-common'],
      ['bladesmith', 'password-common'],
      ['adalbert@forge.example', 'password-personal'],
      ['Adalbert', 'password-personal'],
      ['seven77', 'too-small'],
      ['x'.repeat(257), 'too-big'],
    ];
    for (const [password, code] of cases) {
      const answer = await site.browser().register('Adalbert', password);
      expectProblem(answer, 'invalid-request', password);
      expect(answer.body.issues.map((issue: { code: string }) => issue.code))
        .withContext(password)
        .toEqual([code]);
    }
    expect((await site.browser().register('Adalbert', 'x'.repeat(256))).status).toBe(201);
  });

  it('hold passwords as argon2id hashes of 19 MiB and two passes', async () => {
    await site.member('Ada');
    const rows = await site.queue.read((manager) =>
      manager.query<{ passwordHash: string }[]>('SELECT * FROM account'),
    );

    expect(rows[0]?.passwordHash).toMatch(/^\$argon2id\$v=19\$m=19456,t=2,p=1\$/);
  });
});

describe('sessions', () => {
  let site: TestSite;
  let nowMs: number;

  beforeEach(async () => {
    nowMs = Date.parse('2026-03-01T08:00:00Z');
    site = await testSite({ now: () => new Date(nowMs) });
  });

  afterEach(() => site.close());

  it('get a new number at every sign-in, and the old one opens nothing', async () => {
    const browser = await site.member('Ada');
    const before = await sessionOf(browser);
    const after = Browser.cookieIn(await browser.signIn('Ada'), SESSION);

    expect(after).toBeDefined();
    expect(after).not.toBe(before);
    expectProblem(await withCookie(`${SESSION}=${before}`), 'sign-in-required');
    expect((await withCookie(`${SESSION}=${after}`)).status).toBe(200);
  });

  it('cannot be given to someone before they sign in', async () => {
    await site.member('Ada');
    const planted = site.browser();
    planted.agent.jar.setCookie(`${SESSION}=s%3Aplanted.signature; Path=/`);

    const answer = await planted.signIn('Ada');

    expect(Browser.cookieIn(answer, SESSION)).not.toContain('planted');
  });

  it('end at once, here and on the server', async () => {
    const browser = await site.member('Ada');
    const cookie = await sessionOf(browser);
    expect((await browser.signOut()).status).toBe(204);

    expectProblem(await browser.get('/api/auth/me'), 'sign-in-required');
    expectProblem(await withCookie(`${SESSION}=${cookie}`), 'sign-in-required');
    expect(await sessionRows()).toEqual([]);
  });

  it('are not made for visitors', async () => {
    const visitor = site.browser();
    const snapshots = site.queue.snapshots;
    await visitor.newToken();
    expectProblem(await visitor.get('/api/auth/me'), 'sign-in-required');
    expectProblem(await visitor.signIn('Nobody'), 'wrong-credentials');
    expect((await visitor.signOut()).status).toBe(204);

    expect(await sessionRows()).toEqual([]);
    expect(site.queue.snapshots).toBe(snapshots);
  });

  it('have cookies that scripts and other sites do not see', async () => {
    const answer = await site.browser().register('Ada');
    const lines = answer.headers['set-cookie'] as unknown as string[];

    for (const line of lines) {
      expect(line).withContext(line).toContain('HttpOnly');
      expect(line).withContext(line).toContain('SameSite=Lax');
      expect(line).withContext(line).not.toContain('Secure');
    }
  });

  it('are bound to HTTPS and to this very host where people come by HTTPS', async () => {
    const secure = await testSite({ publicOrigin: 'https://forge.example' });
    const visitor = secure.browser();
    const { body, headers } = await visitor.get('/api/auth/csrf');
    const cookies = (headers['set-cookie'] as unknown as string[])
      .map((line) => line.split(';')[0])
      .join('; ');
    const answer = await visitor.raw(
      'POST',
      '/api/auth/register',
      { name: 'Ada', email: emailOf('Ada'), password: PASSWORD },
      { Cookie: cookies, 'x-csrf-token': body.token },
    );

    const lines = answer.headers['set-cookie'] as unknown as string[];
    expect(
      lines.filter((line) => line.startsWith('__Host-layerwright.') && line.includes('Secure')).length,
    ).toBe(2);
    await secure.close();
  });

  it('are written down once a minute at most while they are used', async () => {
    const browser = await site.member('Ada');
    const snapshots = site.queue.snapshots;
    for (let n = 0; n < 20; n += 1) await browser.get('/api/auth/me');
    expect(site.queue.snapshots).toBe(snapshots);

    nowMs += MINUTE_MS;
    for (let n = 0; n < 20; n += 1) await browser.get('/api/auth/me');
    expect(site.queue.snapshots).toBe(snapshots + 1);
  });

  it('end when they are not used for long, or have lasted too long', async () => {
    const idle = await site.member('Ada');
    nowMs += SESSION_IDLE_MS - MINUTE_MS;
    expect((await idle.get('/api/auth/me')).status).toBe(200);
    nowMs += SESSION_IDLE_MS + MINUTE_MS;
    expectProblem(await idle.get('/api/auth/me'), 'sign-in-required');

    const used = await site.member('Ben');
    for (
      const end = nowMs + SESSION_ABSOLUTE_MS;
      nowMs < end - SESSION_IDLE_MS;
      nowMs += SESSION_IDLE_MS / 2
    ) {
      expect((await used.get('/api/auth/me')).status).toBe(200);
    }
    nowMs += SESSION_IDLE_MS;
    expectProblem(await used.get('/api/auth/me'), 'sign-in-required');

    await site.housekeeping.run();
    expect(await sessionRows()).toEqual([]);
  });

  it('go with their account', async () => {
    const browser = await site.member('Ada');
    await site.queue.write((manager) => manager.query('DELETE FROM account'));

    expectProblem(await browser.get('/api/auth/me'), 'sign-in-required');
  });

  it('keep their secret out of the database', async () => {
    const browser = await site.member('Ada');
    const cookie = decodeURIComponent((await sessionOf(browser)) ?? '');
    const secret = /^s:([^.]+)\./.exec(cookie)?.[1] ?? '';

    expect(secret.length).toBeGreaterThanOrEqual(32);
    expect(JSON.stringify(await sessionRows())).not.toContain(secret);
  });

  async function sessionOf(browser: Browser): Promise<string | undefined> {
    return Browser.cookieIn(await browser.get('/api/auth/me'), SESSION);
  }

  function withCookie(cookie: string) {
    return site.browser().get('/api/auth/me', { Cookie: cookie });
  }

  function sessionRows(): Promise<SessionRow[]> {
    return site.queue.read((manager) => manager.find(SessionRow));
  }
});

describe('guessing passwords', () => {
  let site: TestSite;
  let nowMs: number;

  beforeEach(async () => {
    nowMs = Date.parse('2026-03-01T08:00:00Z');
    site = await testSite({ now: () => new Date(nowMs) });
  });

  afterEach(() => site.close());

  it('is stopped after ten wrong ones, from however many browsers, for a quarter of an hour', async () => {
    await site.member('Ada');
    for (let n = 0; n < 10; n += 1) {
      expectProblem(await site.browser().signIn('Ada', `wrong guess ${n}`), 'wrong-credentials');
    }
    expectProblem(await site.browser().signIn('Ada', 'wrong guess'), 'too-many-requests');
    expectProblem(await site.browser().signIn('Ada'), 'too-many-requests');

    nowMs += 16 * MINUTE_MS;
    expect((await site.browser().signIn('Ada')).status).toBe(200);
  });

  it('never locks the owner out of a browser that they use', async () => {
    const own = await site.member('Ada');
    for (let n = 0; n < 100; n += 1) await site.browser().signIn('Ada', `wrong guess ${n}`);
    await own.signOut();

    expect((await own.signIn('Ada')).status).toBe(200);
    expect((await own.send('POST', '/api/designs', { document: aDesign() })).status).toBe(201);
  });

  it('is counted by browser only for a mark that we gave, for that account', async () => {
    await site.member('Ada');
    const answer = await site.browser().register('Ben');
    const mark = Browser.cookieIn(answer, 'layerwright.device') ?? '';
    for (let n = 0; n < 10; n += 1) await site.browser().signIn('Ada', `wrong guess ${n}`);

    for (const device of [mark, 'made.up', '']) {
      const guesser = site.browser();
      guesser.agent.jar.setCookie(`layerwright.device=${device}; Path=/`);
      expectProblem(await guesser.signIn('Ada', 'wrong guess'), 'too-many-requests', device);
    }
  });
});

async function timed(task: () => Promise<unknown>): Promise<number> {
  const from = performance.now();
  await task();
  return performance.now() - from;
}

function median(values: number[]): number {
  return values.sort((a, b) => a - b)[values.length >> 1] ?? 0;
}
