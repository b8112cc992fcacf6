import { Bounded } from './bounded.js';
import { Problem } from './problem.js';

describe('Bounded', () => {
  it('never lets more run at once than it may, and serves in the order of coming', async () => {
    const bounded = new Bounded(3, 100);
    const order: number[] = [];
    let running = 0;
    let most = 0;
    await Promise.all(
      Array.from({ length: 50 }, (_, n) =>
        bounded.run(async () => {
          order.push(n);
          running += 1;
          most = Math.max(most, running);
          await new Promise((resolve) => setTimeout(resolve, 1));
          running -= 1;
        }),
      ),
    );

    expect(most).toBe(3);
    expect(order).toEqual(Array.from({ length: 50 }, (_, n) => n));
  });

  it('turns away whom it has no room for, and gives the place of one that failed to the next', async () => {
    const bounded = new Bounded(1, 1);
    const failing = bounded.run(() => Promise.reject(new Error('failed')));
    const waiting = bounded.run(() => Promise.resolve('done'));

    await expectAsync(bounded.run(() => Promise.resolve('late'))).toBeRejectedWithError(Problem);
    await expectAsync(failing).toBeRejectedWithError('failed');
    expect(await waiting).toBe('done');
    expect(await bounded.run(() => Promise.resolve('after'))).toBe('after');
  });
});
