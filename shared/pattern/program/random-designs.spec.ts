import { evaluate } from '../../forging/index.js';
import { randomDesign } from '../testing/random-design.js';
import { randomFrom } from '../testing/random.js';
import { origins, pointsIn, programOfForging } from '../testing/tracing.js';
import { referenceTracer } from '../reference/tracer.js';

describe('1 000 random designs', () => {
  it('lead every point to a layer that exists, inside its stack and its steel, and never to NaN', () => {
    const wrong: unknown[] = [];
    const kinds = new Set<string>();
    let assemblies = 0;
    for (let seed = 1; seed <= 1_000; seed++) {
      const design = randomDesign(seed);
      const forging = evaluate(design);
      const program = programOfForging(forging);
      for (const bar of design.bars) for (const step of bar.steps) kinds.add(step.kind);
      if (design.bars.some((bar) => bar.start.kind === 'assembly')) assemblies += 1;
      const points = pointsIn(program, randomFrom(seed), 40);
      for (const origin of origins(referenceTracer(program), points)) {
        const bar = design.bars.find(({ id }) => id === origin.bar);
        const start = bar?.start.kind === 'stack' ? bar.start : undefined;
        const height = start?.layers.reduce((sum, layer) => sum + layer.thicknessMm, 0) ?? -1;
        const isInside =
          isWithin(origin.x, start?.lengthMm) &&
          isWithin(origin.y, start?.widthMm) &&
          isWithin(origin.z, height);
        if (start?.layers[origin.layer]?.steel !== origin.steel || !isInside) wrong.push({ seed, origin });
      }
    }
    expect(wrong).toEqual([]);
    expect(kinds.size).toBe(13);
    expect(assemblies).toBeGreaterThan(200);
  });
});

/** Whether a coordinate is a number from 0 to `size`, give or take rounding. */
function isWithin(value: number, size: number | undefined): boolean {
  return size !== undefined && value >= -1e-6 && value <= size + 1e-6;
}
