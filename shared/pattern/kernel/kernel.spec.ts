import { MOST_KERNEL_FOLDS, tracerFor } from '../engine.js';
import type { Program } from '../program/program.js';
import { referenceTracer } from '../reference/tracer.js';
import { foldedDesign } from '../testing/folded-design.js';
import { randomDesign } from '../testing/random-design.js';
import { randomFrom } from '../testing/random.js';
import { origins, pointsIn, programOf } from '../testing/tracing.js';
import type { Tracer } from '../tracer.js';
import { bytesOfBase64 } from './base64.js';
import { type Kernel, kernelOf, kernelTracer } from './kernel.js';

function theKernel(): Kernel {
  const kernel = kernelOf();
  if (kernel === null) throw new Error('This host does not run the kernel.');
  return kernel;
}

/** Number of points, out of `count`, that two tracers put on different layers. */
function differing(a: Tracer, b: Tracer, count: number, seed: number): number {
  const points = pointsIn(a.program, randomFrom(seed), count);
  const other = origins(b, points);
  return origins(a, points).filter(({ bar, layer }, i) => bar !== other[i]?.bar || layer !== other[i].layer)
    .length;
}

/** 50 designs: random ones with everything in them, and stacks folded up to twelve times. */
function goldenPrograms(): readonly Program[] {
  const random = Array.from({ length: 38 }, (_, i) =>
    programOf(randomDesign(5_000 + i, { bars: 5, steps: 14, folds: 8 })),
  );
  const folded = Array.from({ length: 12 }, (_, i) => programOf(foldedDesign(i + 1)));
  return [...random, ...folded];
}

describe('the kernel', () => {
  it('puts at most 0.1 % of points on another layer than the reference, on each of 50 designs', () => {
    const kernel = theKernel();
    const engines = new Map<string, number>();
    goldenPrograms().forEach((program, i) => {
      const tracer = tracerFor(program, kernel);
      engines.set(tracer.engine, (engines.get(tracer.engine) ?? 0) + 1);
      const count = 10_000;
      const wrong = differing(tracer, referenceTracer(program), count, i);
      expect(wrong / count)
        .withContext(`design ${i} on ${tracer.engine}`)
        .toBeLessThanOrEqual(0.001);
    });
    expect(engines.get('kernel-f32')).toBeGreaterThan(25);
    expect(engines.get('kernel-f64')).toBeGreaterThan(0);
  });

  it('in double precision agrees with the reference to a thousandth of that', () => {
    const kernel = theKernel();
    let wrong = 0;
    goldenPrograms().forEach((program, i) => {
      wrong += differing(kernelTracer(kernel, program, 'f64'), referenceTracer(program), 2_000, 100 + i);
    });
    expect(wrong / 100_000).toBeLessThanOrEqual(1e-5);
  });

  it('gives the places in the stack as well, in the order of the points', () => {
    const kernel = theKernel();
    for (const seed of [5, 8, 12, 31, 77, 104]) {
      const program = programOf(randomDesign(seed, { bars: 5, steps: 5, folds: 2 }));
      const points = pointsIn(program, randomFrom(seed), 3_000);
      const expected = origins(referenceTracer(program), points);
      const found = origins(kernelTracer(kernel, program, 'f64', 700), points);
      const apart = found.filter(
        (origin, i) =>
          Math.abs(origin.x - (expected[i]?.x ?? NaN)) > 1e-6 ||
          Math.abs(origin.y - (expected[i]?.y ?? NaN)) > 1e-6 ||
          Math.abs(origin.z - (expected[i]?.z ?? NaN)) > 1e-6,
      );
      expect(apart.length).withContext(`seed ${seed}`).toBeLessThanOrEqual(3);
    }
  });

  it('leaves the reference to work past twelve folds, and wherever it is not there', () => {
    const kernel = theKernel();
    expect(tracerFor(programOf(foldedDesign(MOST_KERNEL_FOLDS)), kernel).engine).not.toBe('reference');
    expect(tracerFor(programOf(foldedDesign(MOST_KERNEL_FOLDS + 1)), kernel).engine).toBe('reference');
    expect(tracerFor(programOf(foldedDesign(2)), null).engine).toBe('reference');
  });

  it('counts the ops that it carries out, as the reference does', () => {
    const kernel = theKernel();
    for (const seed of [3, 4, 9, 21]) {
      const program = programOf(randomDesign(seed, { bars: 4, steps: 8, folds: 3 }));
      const points = pointsIn(program, randomFrom(seed), 500);
      const counted = [kernelTracer(kernel, program, 'f64'), referenceTracer(program)].map((tracer) => {
        points.forEach(([x, y, z], i) => {
          tracer.x[i] = x;
          tracer.y[i] = y;
          tracer.z[i] = z;
        });
        return tracer.run(points.length);
      });
      expect(counted[0]).toBe(counted[1] as number);
    }
  });

  it('goes on from where it was stopped', () => {
    const kernel = theKernel();
    const program = programOf(foldedDesign(4));
    for (const tracer of [kernelTracer(kernel, program, 'f32'), referenceTracer(program)]) {
      const points = pointsIn(program, randomFrom(9), 64);
      const fill = (): void =>
        points.forEach(([x, y, z], i) => {
          tracer.x[i] = x;
          tracer.y[i] = y;
          tracer.z[i] = z;
        });
      fill();
      tracer.run(64);
      const whole = Array.from(tracer.layer.subarray(0, 64));
      fill();
      tracer.begin(64, 5);
      tracer.run(64, 5);
      expect(Array.from(tracer.layer.subarray(0, 64))).toEqual(whole);
    }
  });

  it('reads base64 [RFC 4648, section 10]', () => {
    const text = (bytes: Uint8Array): string => String.fromCharCode(...bytes);
    expect(text(bytesOfBase64(''))).toBe('');
    expect(text(bytesOfBase64('Zg=='))).toBe('f');
    expect(text(bytesOfBase64('Zm8='))).toBe('fo');
    expect(text(bytesOfBase64('Zm9v'))).toBe('foo');
    expect(text(bytesOfBase64('Zm9vYmFy'))).toBe('foobar');
  });
});
