import { evaluate } from '../../forging/index.js';
import { movedToResult, stacksOf } from '../testing/forward.js';
import { randomDesign } from '../testing/random-design.js';
import { between, oneOf, randomFrom } from '../testing/random.js';
import { originOf, programOfForging } from '../testing/tracing.js';

describe('steps that cut, stack and press', () => {
  it('give back the place in the stack of points that a forward simulation moved', () => {
    const wrong: unknown[] = [];
    let compared = 0;
    let assemblies = 0;
    for (let seed = 1; seed <= 150; seed++) {
      const design = randomDesign(seed, { bars: 4, steps: 8, folds: 4, isStraight: true });
      const forging = evaluate(design);
      const program = programOfForging(forging);
      const random = randomFrom(seed);
      const stacks = stacksOf(design);
      for (let i = 0; i < 60; i++) {
        const { bar, tops } = oneOf(random, stacks);
        const size = forging.bars.find(({ id }) => id === bar)?.states[0]?.bar;
        if (!size) continue;
        const from = {
          x: between(random, 0, size.lengthMm),
          y: between(random, 0, size.widthMm),
          z: between(random, 0, size.thicknessMm),
        };
        const moved = movedToResult(forging, bar, from);
        if (moved === null) continue;
        const origin = originOf(program, moved.x, moved.y, moved.z);
        const isSamePlace =
          origin.bar === bar &&
          Math.abs(origin.x - from.x) < 1e-6 &&
          Math.abs(origin.y - from.y) < 1e-6 &&
          Math.abs(origin.z - from.z) < 1e-6;
        const isOnBorder = tops.some((top) => Math.abs(top - from.z) < 1e-6);
        const isSameLayer = isOnBorder || origin.layer === tops.filter((top) => top <= from.z).length;
        if (!isSamePlace || !isSameLayer) wrong.push({ seed, bar, from, origin });
        compared += 1;
        if (design.result !== bar) assemblies += 1;
      }
    }
    expect(wrong).toEqual([]);
    expect(compared).toBeGreaterThan(2_000);
    expect(assemblies).toBeGreaterThan(500);
  });
});
