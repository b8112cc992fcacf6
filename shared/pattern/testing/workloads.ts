import { STARTERS } from '../../design/index.js';
import { evaluate } from '../../forging/index.js';
import { type StepPlan, alternating, billet } from '../../forging/testing/designs.js';
import { tracerFor } from '../engine.js';
import { type Kernel, kernelOf, kernelTracer } from '../kernel/kernel.js';
import { PLAIN_LOOK, USUAL_LOOK } from '../picture/look.js';
import { paint } from '../picture/paint.js';
import { Picture } from '../picture/picture.js';
import type { PictureRequest } from '../picture/request.js';
import { entryOps } from '../program/program.js';
import { layerAt } from '../reference/layers.js';
import { referenceTracer } from '../reference/tracer.js';
import type { Tracer } from '../tracer.js';
import { fifteenClosures, fifteenOps } from './fifteen-ops.js';
import { randomFrom } from './random.js';
import { simplexNoise } from './simplex-noise.js';
import { programOfForging } from './tracing.js';

/** Samples of one run of an engine. */
const SAMPLES = 200_000;

/** What `npm run bench` measures; it brings the clock. */
export interface Workloads {
  /** The kernel, typed arrays, closures, and one call of noise for each sample. */
  readonly engines: readonly { readonly run: () => unknown; readonly operations: number }[];
  readonly pictures: readonly {
    readonly name: string;
    readonly run: () => unknown;
    readonly targetMs: number;
  }[];
  readonly counts: () => readonly {
    readonly name: string;
    readonly value: string;
    readonly target: string;
  }[];
}

export function workloads(): Workloads {
  const kernel = kernelOf();
  if (kernel === null) throw new RangeError('workloads: this host does not run the kernel');
  return { engines: engineLoads(kernel), pictures: pictureLoads(kernel), counts: () => countsOf(kernel) };
}

function engineLoads(kernel: Kernel): Workloads['engines'] {
  const program = fifteenOps();
  const random = randomFrom(1);
  const x = Float64Array.from({ length: SAMPLES }, () => random() * program.lengthMm);
  const y = Float64Array.from({ length: SAMPLES }, () => random() * program.widthMm);
  const z = Float64Array.from({ length: SAMPLES }, () => random() * program.thicknessMm);
  const traced = (tracer: Tracer): (() => void) => {
    // Each engine gets its points in its own precision.
    const own = (numbers: Float64Array): Float32Array | Float64Array =>
      tracer.x instanceof Float32Array ? Float32Array.from(numbers) : numbers;
    const [ownX, ownY, ownZ] = [own(x), own(y), own(z)];
    return () => {
      for (let from = 0; from < SAMPLES; from += tracer.capacity) {
        const to = Math.min(SAMPLES, from + tracer.capacity);
        tracer.x.set(ownX.subarray(from, to));
        tracer.y.set(ownY.subarray(from, to));
        tracer.z.set(ownZ.subarray(from, to));
        tracer.run(to - from);
      }
    };
  };
  const back = fifteenClosures();
  const noise = simplexNoise(1);
  const operations = SAMPLES * entryOps(program);
  return [
    { run: traced(kernelTracer(kernel, program, 'f32')), operations },
    { run: traced(referenceTracer(program)), operations },
    {
      run: () => {
        let sum = 0;
        for (let i = 0; i < SAMPLES; i++) {
          const origin = back({ x: x[i] as number, y: y[i] as number, z: z[i] as number });
          sum += layerAt(program.layerTopMm, 0, program.layerTopMm.length, origin.z);
        }
        return sum;
      },
      operations,
    },
    {
      run: () => {
        let sum = 0;
        for (let i = 0; i < SAMPLES; i++) {
          sum += noise((x[i] as number) * 0.1, (y[i] as number) * 0.1, (z[i] as number) * 0.1);
        }
        return sum;
      },
      operations: SAMPLES,
    },
  ];
}

/** A plan of 25 steps with every kind of bending in it, on the bench and in the first sight's target. */
export function twentyFiveSteps(): PictureRequest {
  const draw = (widthMm: number, thicknessMm: number): StepPlan => ({
    kind: 'draw',
    heats: 2,
    widthMm,
    thicknessMm,
  });
  const restack: StepPlan = { kind: 'restack', pieces: 3, turnAlternate: false, grindPerFaceMm: 0.3 };
  const plans: StepPlan[] = [
    { kind: 'weld', heats: 2 },
    draw(36, 16),
    restack,
    { kind: 'weld', heats: 2 },
    draw(30, 14),
    { kind: 'fold' },
    draw(24, 24),
    { kind: 'corner', heats: 1 },
    draw(22, 22),
    { kind: 'twist', heats: 2, turns: 4, hand: 'right', reversals: 1 },
    draw(40, 12),
    { kind: 'grind', perFaceMm: 0.3, faces: 'flats' },
    restack,
    { kind: 'weld', heats: 1 },
    draw(36, 16),
    { kind: 'wedge', heats: 1, dragMm: 5, reachMm: 5 },
    draw(38, 12),
    {
      kind: 'groove',
      heats: 1,
      pitchMm: 14,
      depthMm: 2.5,
      radiusMm: 4,
      angleDeg: 20,
      faces: 'bothStaggered',
      finish: 'forgeFlat',
    },
    draw(40, 9),
    {
      kind: 'dimple',
      heats: 1,
      pitchMm: 14,
      rowPitchMm: 12,
      depthMm: 1.5,
      radiusMm: 4,
      layout: 'staggered',
      seed: 1,
      faces: 'bothStaggered',
      finish: 'forgeFlat',
    },
    draw(42, 7.5),
    {
      kind: 'groove',
      heats: 1,
      pitchMm: 17,
      depthMm: 1.5,
      radiusMm: 5,
      angleDeg: 0,
      faces: 'top',
      finish: 'grindFlat',
    },
    draw(44, 5),
    { kind: 'grind', perFaceMm: 0.2, faces: 'flats' },
    { kind: 'trim', perEndMm: 5 },
  ];
  const forging = evaluate(billet(alternating(13), plans, { unevenness: 0.2 }));
  return {
    program: programOfForging(forging),
    steels: forging.steels,
    surface: { kind: 'face', face: 'top', depthMm: 1 },
    widthPx: 1200,
    heightPx: 300,
    samples: 16,
  };
}

function pictureLoads(kernel: Kernel): Workloads['pictures'] {
  const request = twentyFiveSteps();
  const ops = entryOps(request.program);
  const draw =
    (rest: Partial<PictureRequest>, isCoarse = false) =>
    (): void => {
      const picture = new Picture({ ...request, ...rest }, tracerFor(request.program, kernel));
      if (isCoarse) while (picture.stage === 'blocks') picture.advance();
      else picture.finish();
      paint(picture.samples, request.program, request.steels, USUAL_LOOK, picture.pixelMm);
    };
  const what = `1200 × 300, 25 steps (${ops} ops)`;
  return [
    { name: `first sight, painted: ${what}`, run: draw({}, true), targetMs: 50 },
    { name: `4 samples in every pixel: ${what}`, run: draw({ samples: 4, isUniform: true }), targetMs: 250 },
    { name: `16 samples in every pixel: ${what}`, run: draw({ isUniform: true }), targetMs: 1000 },
    { name: `16 samples where needed: ${what}`, run: draw({}), targetMs: 1000 },
  ];
}

function countsOf(kernel: Kernel): ReturnType<Workloads['counts']> {
  const rows: { name: string; value: string; target: string }[] = [];
  const percent = (share: number): string => `${(100 * share).toFixed(1)} %`;
  for (const { title, design } of STARTERS) {
    const forging = evaluate(design);
    const request: PictureRequest = {
      program: programOfForging(forging),
      steels: forging.steels,
      surface: { kind: 'blade', side: 'left' },
      ...(design.blank && { blank: design.blank }),
      widthPx: 1200,
      heightPx: 160,
      samples: 16,
    };
    const byNeed = new Picture(request, tracerFor(request.program, kernel)).finish();
    const uniform = new Picture({ ...request, isUniform: true }, tracerFor(request.program, kernel)).finish();
    const error = meanError(painted(byNeed), painted(uniform));
    rows.push({
      name: `samples by need, blade of “${title}”`,
      value: `${percent(byNeed.counters.samples / uniform.counters.samples)}, error ${error.toFixed(2)}/255`,
      target: '≤ 45 %, ≤ 1/255',
    });
  }
  return rows;
}

function painted(picture: Picture): Uint8ClampedArray {
  const { program, steels } = picture.request;
  return paint(picture.samples, program, steels, PLAIN_LOOK, picture.pixelMm).rgba;
}

/** Mean difference of two pictures' grey where there is metal, of 255. */
export function meanError(a: Uint8ClampedArray, b: Uint8ClampedArray): number {
  let sum = 0;
  let count = 0;
  for (let i = 0; i < a.length; i += 4) {
    if (a[i + 3] === 0 && b[i + 3] === 0) continue;
    sum += Math.abs((a[i] as number) - (b[i] as number));
    count += 1;
  }
  return sum / count;
}
