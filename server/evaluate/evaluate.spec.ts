import { evaluationSchema } from '../../shared/checks/index.js';
import { STARTERS } from '../../shared/design/index.js';
import { ComputePool } from '../compute/compute-pool.js';
import { TooMuchWorkError } from '../compute/tasks.js';
import { aDesign, impossibleDesign } from '../testing/designs.js';
import { expectProblem } from '../testing/problem-answers.js';
import { type TestSite, testSite } from '../testing/test-site.js';

describe('working a design out', () => {
  let site: TestSite;

  beforeAll(async () => {
    site = await testSite();
  });

  afterAll(() => site.close());

  it('gives every starter as the documentation says, without an account', async () => {
    for (const { id, design } of STARTERS) {
      const answer = await site.browser().raw('POST', '/api/evaluate', design);
      expect(answer.status).withContext(id).toBe(200);
      expect(evaluationSchema.safeParse(answer.body).error).withContext(id).toBeUndefined();
      expect(answer.body.bars[design.result].states.length).withContext(id).toBeGreaterThan(1);
    }
  });

  it('refuses a step that cannot be done, naming it, the field and both numbers', async () => {
    const answer = await site.browser().raw('POST', '/api/evaluate', impossibleDesign());

    expectProblem(answer, 'refused-step');
    expect(answer.body).toEqual(
      jasmine.objectContaining({
        bar: impossibleDesign().result,
        stepId: 'too-much',
        field: 'perEndMm',
        asked: 4000,
        available: jasmine.any(Number),
        unit: 'mm',
      }),
    );
    expect(answer.body.available).toBeLessThan(4000);
    expect(answer.body.detail).toMatch(/^“Trim.*” in “.*”: .* takes 4000 mm of [\d.]+ mm/);
  });

  it('refuses a document of a newer version by a problem of its own', async () => {
    const newer = { ...aDesign(), version: 2 };
    expectProblem(await site.browser().raw('POST', '/api/evaluate', newer), 'newer-document');
  });

  it('names each wrong field by a pointer', async () => {
    const answer = await site.browser().raw('POST', '/api/evaluate', { ...aDesign(), result: 'nowhere' });

    expectProblem(answer, 'invalid-request');
    expect(answer.body.issues).toEqual([
      { pointer: '/result', code: 'bar-unknown', message: jasmine.stringContaining('nowhere') },
    ]);
  });

  it('says so when it takes too long', async () => {
    const slow = await testSite({ compute: { run: () => Promise.reject(new TooMuchWorkError('too long')) } });
    expectProblem(await slow.browser().raw('POST', '/api/evaluate', aDesign()), 'too-much-work');
    await slow.close();
  });

  it('gives the same on a thread of its own', async () => {
    const compute = new ComputePool();
    const threaded = await testSite({ compute });
    const [one, other] = await Promise.all(
      [site, threaded].map((where) => where.browser().raw('POST', '/api/evaluate', aDesign())),
    );

    expect(other!.body).toEqual(one!.body);
    await threaded.close();
    await compute.close();
  });
});
