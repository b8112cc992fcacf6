import type { Response } from 'supertest';
import { TooMuchWorkError } from '../compute/tasks.js';
import { Design } from '../db/entities/index.js';
import { aDesign, impossibleDesign } from '../testing/designs.js';
import { expectProblem } from '../testing/problem-answers.js';
import { type Browser, type TestSite, testSite } from '../testing/test-site.js';
import { UNDELETE_MS } from './design-service.js';

describe('designs', () => {
  let site: TestSite;
  let ada: Browser;
  let nowMs: number;

  beforeEach(async () => {
    nowMs = Date.parse('2026-03-01T08:00:00Z');
    site = await testSite({ now: () => new Date((nowMs += 1000)) });
    ada = await site.member('Ada');
  });

  afterEach(() => site.close());

  it('are kept, opened again, and listed without their documents, the last changed first', async () => {
    const document = aDesign('First');
    const first = await ada.send('POST', '/api/designs', { document });
    const second = await ada.send('POST', '/api/designs', { document: aDesign('Second') });

    expect(first.status).toBe(201);
    expect(first.body).toEqual({
      id: jasmine.any(String),
      name: 'First',
      revision: 1,
      createdAt: jasmine.stringMatching(/^2026-03-01T08:00:\d\d\.000Z$/),
      updatedAt: first.body.createdAt,
      summary: {
        layers: jasmine.any(Number),
        bars: 1,
        startMassKg: jasmine.any(Number),
        endMassKg: jasmine.any(Number),
      },
      document: JSON.parse(JSON.stringify(document)),
    });
    expect(first.headers['location']).toBe(`/api/designs/${first.body.id}`);
    const opened = await ada.get(`/api/designs/${first.body.id}`);
    expect(opened.body).toEqual(first.body);
    expect(opened.headers['etag']).toBe(first.headers['etag']);

    const list = await ada.get('/api/designs');
    const { document: _document, createdAt: _createdAt, ...listed } = second.body;
    expect(list.body[0]).toEqual(listed);
    expect(list.body.map(({ name }: { name: string }) => name)).toEqual(['Second', 'First']);
  });

  it('are answered 304 to whoever has that revision already', async () => {
    const { body, headers } = await keep('Known');
    const answer = await ada.get(`/api/designs/${body.id}`, { 'If-None-Match': headers['etag'] as string });

    expect([answer.status, answer.text]).toEqual([304, '']);
  });

  it('are found by a part of their name, whatever its capitals', async () => {
    for (const name of ['Kitchen knife', 'Große KLINGE', '100 % layers', 'Under_score']) await keep(name);
    const found = async (q: string) =>
      (await ada.get(`/api/designs?q=${encodeURIComponent(q)}`)).body.map(
        ({ name }: { name: string }) => name,
      );

    expect(await found('KNIFE')).toEqual(['Kitchen knife']);
    expect(await found('große')).toEqual(['Große KLINGE']);
    expect(await found(' ')).toHaveSize(4);
    expect(await found('100 %')).toEqual(['100 % layers']);
    expect(await found('%')).toEqual(['100 % layers']);
    expect(await found('_')).toEqual(['Under_score']);
    expect(await found("'; DROP TABLE design; --")).toEqual([]);
  });

  it('are saved over the revision that was changed', async () => {
    const kept = await keep('Before');
    const saved = await save(kept, 'After');

    expect(saved.status).toBe(200);
    expect([saved.body.name, saved.body.revision, saved.body.createdAt]).toEqual([
      'After',
      2,
      kept.body.createdAt,
    ]);
    expect(saved.headers['etag']).not.toBe(kept.headers['etag']);
    expect((await ada.get(`/api/designs/${kept.body.id}`)).body).toEqual(saved.body);
  });

  it('are not saved over a revision that nobody named', async () => {
    const { body } = await keep('Kept');
    for (const headers of [{}, { 'If-Match': '*' }, { 'If-Match': '' }, { 'If-Match': '1' }] as Record<
      string,
      string
    >[]) {
      const document = aDesign('Lost');
      expectProblem(
        await ada.send('PUT', `/api/designs/${body.id}`, { document }, headers),
        'revision-required',
      );
      expectProblem(
        await ada.send('DELETE', `/api/designs/${body.id}`, undefined, headers),
        'revision-required',
      );
    }
    expect((await ada.get(`/api/designs/${body.id}`)).body.revision).toBe(1);
  });

  it('are not saved over somebody’s newer revision, and the answer says which that is', async () => {
    const kept = await keep('Kept');
    const saved = await save(kept, 'Theirs');
    const stale = await save(kept, 'Mine');

    expectProblem(stale, 'stale-revision');
    expect(stale.headers['etag']).toBe(saved.headers['etag']);
    expect(stale.body).toEqual(
      jasmine.objectContaining({
        revision: 2,
        updatedAt: saved.body.updatedAt,
        etag: saved.headers['etag'],
      }),
    );
    expect((await ada.get(`/api/designs/${kept.body.id}`)).body.name).toBe('Theirs');
  });

  it('have one winner for each revision when fifty save at once', async () => {
    let current = await keep('Revision 1');
    for (let round = 0; round < 20; round += 1) {
      const answers = await Promise.all(
        Array.from({ length: 50 }, (_, editor) => save(current, `Round ${round}, editor ${editor}`)),
      );
      const winners = answers.filter(({ status }) => status === 200);
      expect(winners.length).withContext(`round ${round}`).toBe(1);
      expect(answers.filter(({ status }) => status === 412).length)
        .withContext(`round ${round}`)
        .toBe(49);
      current = winners[0]!;
      expect((await ada.get(`/api/designs/${current.body.id}`)).body).toEqual(current.body);
    }
    expect(current.body.revision).toBe(21);
  });

  it('are deleted and brought back', async () => {
    const kept = await keep('Kept');
    const path = `/api/designs/${kept.body.id}`;
    const deleted = await ada.send('DELETE', path, undefined, { 'If-Match': kept.headers['etag'] as string });

    expect(deleted.status).toBe(204);
    expect((await ada.get('/api/designs')).body).toEqual([]);
    expectProblem(await ada.get(path), 'not-found');
    expectProblem(await save(kept, 'Late'), 'not-found');

    const restored = await ada.send('POST', `${path}/restore`);
    expect([restored.status, restored.body.revision, restored.body.name]).toEqual([200, 3, 'Kept']);
    expect((await ada.get(path)).headers['etag']).toBe(restored.headers['etag']);
    expect((await ada.send('POST', `${path}/restore`)).body).toEqual(restored.body);
    expectProblem(await save(kept, 'Late'), 'stale-revision');
  });

  it('are gone for good a month after they were deleted', async () => {
    const kept = await keep('Kept');
    const path = `/api/designs/${kept.body.id}`;
    await ada.send('DELETE', path, undefined, { 'If-Match': kept.headers['etag'] as string });
    await site.housekeeping.run();
    expect(await rows()).toHaveSize(1);

    nowMs += UNDELETE_MS;
    await site.housekeeping.run();

    expect(await rows()).toEqual([]);
  });

  it('are kept though a step of theirs cannot be done, or takes too long to work out', async () => {
    const impossible = await ada.send('POST', '/api/designs', { document: impossibleDesign() });
    expect(impossible.status).toBe(201);
    expect(impossible.body.summary).toEqual({ layers: null, bars: 1, startMassKg: null, endMassKg: null });

    const slow = await testSite({ compute: { run: () => Promise.reject(new TooMuchWorkError('too long')) } });
    const ben = await slow.member('Ben');
    const kept = await ben.send('POST', '/api/designs', { document: aDesign() });
    expect([kept.status, kept.body.summary.layers]).toEqual([201, null]);
    await slow.close();
  });

  it('are refused with each wrong field named by a pointer', async () => {
    const { name: _name, ...nameless } = aDesign();
    const answer = await ada.send('POST', '/api/designs', { document: { ...nameless, colour: 'blue' } });

    expectProblem(answer, 'invalid-request');
    const pointers = answer.body.issues.map(({ pointer }: { pointer: string }) => pointer).sort();
    expect(pointers).toEqual(['/document/colour', '/document/name']);
    expect(await rows()).toEqual([]);
  });

  it('of a newer version are refused, and leave what is there alone', async () => {
    const newer = { ...aDesign('Newer'), version: 99, invention: true };
    expectProblem(await ada.send('POST', '/api/designs', { document: newer }), 'newer-document');
    const kept = await keep('Kept');
    const path = `/api/designs/${kept.body.id}`;
    const headers = { 'If-Match': kept.headers['etag'] as string };

    expectProblem(await ada.send('PUT', path, { document: newer }, headers), 'newer-document');
    expect((await ada.get(path)).body).toEqual(kept.body);
  });

  it('that a newer program has stored are shown as they are and not overwritten', async () => {
    const kept = await keep('Kept');
    const newer = { ...aDesign('Newer'), version: 99, invention: true };
    const documentJson = JSON.stringify(newer);
    await site.queue.write((manager) => manager.update(Design, { id: kept.body.id }, { documentJson }));

    expectProblem(await save(kept, 'Older'), 'newer-stored-document');
    expect((await ada.get(`/api/designs/${kept.body.id}`)).body.document).toEqual(newer);
  });

  it('take five statements a request at most', async () => {
    const kept = await keep('Kept');
    const source = (await site.queue.read((manager) => Promise.resolve(manager))).dataSource;
    const statements: string[] = [];
    const { logger } = source;
    source.logger = { ...logger, logQuery: (query: string) => void statements.push(query) };
    const counted = async (call: () => Promise<Response>): Promise<number> => {
      statements.length = 0;
      await call();
      return statements.filter((query) => !/^(BEGIN|COMMIT|ROLLBACK|PRAGMA)/.test(query)).length;
    };

    expect(await counted(() => ada.get('/api/designs'))).toBeLessThanOrEqual(3);
    expect(await counted(() => ada.get(`/api/designs/${kept.body.id}`))).toBeLessThanOrEqual(4);
    expect(await counted(() => save(kept, 'Saved'))).toBeLessThanOrEqual(5);
  });

  function keep(name: string): Promise<Response> {
    return ada.send('POST', '/api/designs', { document: aDesign(name) });
  }

  function save(over: Response, name: string): Promise<Response> {
    const headers = { 'If-Match': over.headers['etag'] as string };
    return ada.send('PUT', `/api/designs/${over.body.id}`, { document: aDesign(name) }, headers);
  }

  function rows(): Promise<Design[]> {
    return site.queue.read((manager) => manager.find(Design));
  }
});
