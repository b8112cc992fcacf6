import { mkdir, writeFile } from 'node:fs/promises';
import { join } from 'node:path';
import { aDesign } from '../testing/designs.js';
import { expectProblem } from '../testing/problem-answers.js';
import { systemError } from '../testing/faulty-file-system.js';
import { removeTemporaryFolders, temporaryFolder } from '../testing/temporary-folder.js';
import { PASSWORD, type TestSite, testSite } from '../testing/test-site.js';

const JSON_TYPE = { 'Content-Type': 'application/json' };

describe('every error', () => {
  let site: TestSite;

  beforeEach(async () => {
    site = await testSite();
  });

  afterEach(() => site.close());

  it('is a problem document: an address that leads nowhere, a method that is not there', async () => {
    const visitor = site.browser();
    expectProblem(await visitor.get('/api/nowhere'), 'not-found');
    expectProblem(await visitor.get('/api/designs/%ff'), 'invalid-request');

    const patched = await visitor.agent.patch('/api/designs/1');
    expectProblem(patched, 'method-not-allowed');
    expect(patched.headers['allow']).toBe('GET, PUT, DELETE');
  });

  it('is a problem document: a body that is no JSON, of another type, or too large', async () => {
    const visitor = site.browser();
    const evaluate = (body: string, headers: Record<string, string>) =>
      visitor.agent.post('/api/evaluate').set(headers).send(body);
    expectProblem(await evaluate('{"half":', JSON_TYPE), 'malformed-json');
    expectProblem(
      await evaluate('a=b', { 'Content-Type': 'application/x-www-form-urlencoded' }),
      'unsupported-media-type',
    );
    expectProblem(
      await evaluate('{}', { ...JSON_TYPE, 'Content-Encoding': 'rot13' }),
      'unsupported-media-type',
    );
    expectProblem(
      await evaluate('{}', { 'Content-Type': 'application/json; charset=x' }),
      'unsupported-media-type',
    );
    expectProblem(await evaluate(JSON.stringify('x'.repeat(1_100_000)), JSON_TYPE), 'body-too-large');
  });

  it('names each field that is wrong by a pointer', async () => {
    const answer = await site
      .browser()
      .send('POST', '/api/auth/register', { name: '', email: 'x', extra: 1 });

    expectProblem(answer, 'invalid-request');
    const pointers = answer.body.issues.map(({ pointer }: { pointer: string }) => pointer).sort();
    expect(pointers).toEqual(['/email', '/extra', '/name', '/password']);
  });

  it('says nothing of what went wrong inside, but its number leads to the log', async () => {
    site.routes.router.get('/api/broken', () => {
      throw new Error('a secret detail');
    });

    const answer = await site.browser().get('/api/broken');

    expectProblem(answer, 'internal-error');
    expect(answer.text).not.toContain('secret');
    const line = site.log.find((entry) => entry.includes('a secret detail'));
    expect(line).toContain(answer.headers['x-request-id']);
  });

  it('has no password, cookie or token in the log', async () => {
    const member = await site.member('Ada');
    await site.browser().signIn('Ada', 'a wrong password');
    const token = await member.newToken();
    await member.send('POST', '/api/designs', { document: aDesign() });

    site.routes.router.get('/api/broken', async () => {
      await site.queue.write((manager) =>
        manager.query('INSERT INTO nowhere VALUES (?)', ['$argon2id$v=19']),
      );
    });
    await member.get('/api/broken?q=sought');

    const log = site.log.join('');
    expect(log).toContain('/api/auth/register');
    expect(log).toContain('no such table: nowhere');
    for (const secret of [
      PASSWORD,
      'a wrong password',
      token,
      'layerwright.session=',
      's%3A',
      'argon2',
      'sought',
    ]) {
      expect(log).withContext(secret).not.toContain(secret);
    }
  });
});

describe('a disk that fails', () => {
  it('is answered 503, while reading goes on and health says so', async () => {
    let isFull = false;
    const site = await testSite(
      {},
      {
        retryMs: 20,
        save: () => (isFull ? Promise.reject(systemError('ENOSPC')) : Promise.resolve()),
      },
    );
    const member = await site.member('Ada');
    const kept = await member.send('POST', '/api/designs', { document: aDesign('Kept') });
    isFull = true;

    expectProblem(
      await member.send('POST', '/api/designs', { document: aDesign('Lost') }),
      'storage-unavailable',
    );
    const list = await member.get('/api/designs');
    expect(list.body.map(({ id }: { id: string }) => id)).toEqual([kept.body.id]);
    const health = await member.get('/api/health');
    expect([health.status, health.body.checks.disk]).toEqual([503, false]);
    expect((await member.get('/api/health/live')).status).toBe(200);

    isFull = false;
    await new Promise((resolve) => setTimeout(resolve, 200));
    expect((await member.get('/api/health')).status).toBe(200);
    expect((await member.send('POST', '/api/designs', { document: aDesign('After') })).status).toBe(201);
    await site.close();
  });
});

describe('requests from other sites', () => {
  let site: TestSite;

  beforeEach(async () => {
    site = await testSite({ publicOrigin: 'http://forge.example' });
  });

  afterEach(() => site.close());

  const foreign: readonly Record<string, string>[] = [
    { 'Sec-Fetch-Site': 'cross-site' },
    { 'Sec-Fetch-Site': 'same-site' },
    { Origin: 'https://elsewhere.example' },
    { Origin: 'null' },
  ];

  for (const headers of foreign) {
    it(`change nothing, even with a token: ${JSON.stringify(headers)}`, async () => {
      const member = await site.member('Ada');
      const answer = await member.send('POST', '/api/designs', { document: aDesign() }, headers);

      expectProblem(answer, 'cross-site');
      expect((await member.get('/api/designs')).body).toEqual([]);
    });
  }

  it('are told from those of our own page', async () => {
    const member = await site.member('Ada');
    const own: readonly Record<string, string>[] = [
      { 'Sec-Fetch-Site': 'same-origin' },
      { Origin: 'http://forge.example' },
      { Origin: site.url },
    ];
    for (const headers of own) {
      const answer = await member.send('POST', '/api/designs', { document: aDesign() }, headers);
      expect(answer.status).withContext(JSON.stringify(headers)).toBe(201);
    }
  });

  it('change nothing without the token, with a wrong one, or with another session’s', async () => {
    const member = await site.member('Ada');
    const other = await (await site.member('Ben')).newToken();
    for (const headers of [{}, { 'x-csrf-token': 'x.y' }, { 'x-csrf-token': other }] as Record<
      string,
      string
    >[]) {
      expectProblem(await member.raw('POST', '/api/designs', { document: aDesign() }, headers), 'csrf-token');
    }
    expect((await member.get('/api/designs')).body).toEqual([]);
  });

  it('need no token where nothing is changed', async () => {
    expect((await site.browser().raw('POST', '/api/evaluate', aDesign())).status).toBe(200);
  });
});

describe('an address that asks too often', () => {
  it('is told to wait', async () => {
    const few = { count: 2, windowMs: 60_000 };
    const site = await testSite({ limits: { signIns: few, registrations: few, computations: few } });
    const visitor = site.browser();
    for (let n = 0; n < 2; n += 1) await visitor.raw('POST', '/api/evaluate', aDesign());

    const answer = await visitor.raw('POST', '/api/evaluate', aDesign());

    expectProblem(answer, 'too-many-requests');
    expect(Number(answer.headers['retry-after'])).toBeGreaterThan(0);
    await site.close();
  });
});

describe('the built page', () => {
  let site: TestSite;

  beforeEach(async () => {
    const folder = await temporaryFolder();
    await mkdir(join(folder, 'media'));
    await writeFile(join(folder, 'index.html'), '<!doctype html><title>The page</title>');
    await writeFile(join(folder, 'main-5XZQ2R7A.js'), 'export {}');
    await writeFile(join(folder, 'favicon.svg'), '<svg/>');
    site = await testSite({ webFolder: folder });
  });

  afterEach(async () => {
    await site.close();
    await removeTemporaryFolders();
  });

  it('is served at every address that a browser may open', async () => {
    for (const path of ['/', '/index.html', '/bench', '/designs/1/edit']) {
      const answer = await site.browser().get(path, { Accept: 'text/html' });
      expect([answer.status, answer.headers['cache-control']]).withContext(path).toEqual([200, 'no-cache']);
      expect(answer.text).withContext(path).toContain('The page');
    }
  });

  it('lets a browser keep for ever only what is named after its content', async () => {
    const hashed = await site.browser().get('/main-5XZQ2R7A.js');
    expect(hashed.headers['cache-control']).toBe('public, max-age=31536000, immutable');
    expect((await site.browser().get('/favicon.svg')).headers['cache-control']).toBe('no-cache');
  });

  it('is not served in the place of a file or a route that is not there', async () => {
    const html = { Accept: 'text/html' };
    for (const path of ['/chunk-AAAAAAAA.js', '/api/nowhere', '/api', '/%2e%2e/package.json']) {
      const answer = await site.browser().get(path, html);
      expect(answer.text).withContext(path).not.toContain('The page');
      expect(answer.status).withContext(path).toBe(404);
    }
  });

  it('runs under a policy that lets no code be made from strings', async () => {
    const { headers } = await site.browser().get('/');
    expect(headers['content-security-policy']).toBe(
      "default-src 'self';script-src 'self' 'wasm-unsafe-eval';script-src-attr 'none';style-src 'self' 'unsafe-inline';" +
        "img-src 'self' data: blob:;font-src 'self';connect-src 'self';worker-src 'self';object-src 'none';" +
        "base-uri 'self';frame-ancestors 'none';form-action 'self'",
    );
    expect(headers['x-content-type-options']).toBe('nosniff');
    expect(headers['x-powered-by']).toBeUndefined();
    expect(headers['strict-transport-security']).toBeUndefined();
  });

  it('asks browsers to come by HTTPS only where people do', async () => {
    const secure = await testSite({ publicOrigin: 'https://forge.example' });
    const answer = await secure.browser().get('/api/health/live');
    expect(answer.headers['strict-transport-security']).toContain('max-age=31536000');
    await secure.close();
  });
});
