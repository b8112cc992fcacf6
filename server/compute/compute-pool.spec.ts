import { STARTERS } from '../../shared/design/index.js';
import { ComputePool } from './compute-pool.js';
import { TASKS, TooMuchWorkError } from './tasks.js';
import { largeDesign } from '../testing/large-design.js';

describe('ComputePool', () => {
  let pool: ComputePool;

  afterEach(() => pool.close());

  it('gives what the task gives on the main thread, for many at once', async () => {
    pool = new ComputePool();
    const answers = await Promise.all(STARTERS.map(({ design }) => pool.run('evaluation', design)));

    expect(answers).toEqual(STARTERS.map(({ design }) => TASKS.evaluation(design)));
  });

  it('ends a task that takes too long, and goes on with the next', async () => {
    pool = new ComputePool({ threads: 1, limitMs: 500 });
    const from = performance.now();
    await expectAsync(pool.run('summary', largeDesign())).toBeRejectedWithError(TooMuchWorkError);

    expect(performance.now() - from).toBeLessThan(10_000);
    const [starter] = STARTERS;
    expect(await pool.run('summary', starter!.design)).toEqual(TASKS.summary(starter!.design));
  });

  it('turns work away when too much is waiting', async () => {
    pool = new ComputePool({ threads: 1, limitMs: 20_000 });
    const waiting = Array.from({ length: 102 }, () => pool.run('summary', STARTERS[0]!.design));
    const results = await Promise.allSettled(waiting);

    expect(results.map(({ status }) => status).filter((status) => status === 'rejected').length).toBe(1);
  });
});
