import { type StepPlan, LOSSLESS, barFrom, designOf, stackOf } from '../../forging/testing/designs.js';
import type { Design } from '../../design/index.js';
import { randomFrom } from '../testing/random.js';
import { programOf } from '../testing/tracing.js';
import { referenceTracer } from '../reference/tracer.js';

const SAMPLES = 400_000;
/** Three standard deviations of the volume share of a tenth of a bar, over that share. */
const NOISE = 3 * Math.sqrt((0.1 * 0.9) / SAMPLES) * 10;

/** Ten layers of 2 mm, a steel for each pair, in a bar of 120 × 20 × 20 mm. */
function tenLayers(plans: readonly StepPlan[]): Design {
  const layers = Array.from({ length: 10 }, (_, i) => ({
    steel: ['1084', '15n20'][i % 2] as string,
    thicknessMm: 2,
  }));
  return designOf([barFrom('billet', stackOf(layers, 120, 20), plans)], { allowances: LOSSLESS });
}

/** Volume of each layer in the finished bar, mm³, by counting points. */
function layerVolumes(design: Design): readonly number[] {
  const program = programOf(design);
  const tracer = referenceTracer(program);
  const random = randomFrom(11);
  const counts = new Array<number>(10).fill(0);
  let left = SAMPLES;
  while (left > 0) {
    const count = Math.min(left, tracer.capacity);
    for (let i = 0; i < count; i++) {
      tracer.x[i] = random() * program.lengthMm;
      tracer.y[i] = random() * program.widthMm;
      tracer.z[i] = random() * program.thicknessMm;
    }
    tracer.run(count);
    for (let i = 0; i < count; i++) {
      const place = program.layerPlace[tracer.layer[i] as number] as number;
      counts[place] = (counts[place] as number) + 1;
    }
    left -= count;
  }
  const volume = program.lengthMm * program.widthMm * program.thicknessMm;
  return counts.map((count) => (count / SAMPLES) * volume);
}

/** What each layer had before: 120 × 20 × 2 mm. */
const LAYER_MM3 = 4_800;

describe('the volume of each layer, by Monte Carlo', () => {
  const kept: Readonly<Record<string, readonly StepPlan[]>> = {
    'a draw': [{ kind: 'draw', widthMm: 15, thicknessMm: 8 }],
    'a wedge': [{ kind: 'wedge', dragMm: 8, reachMm: 3 }],
    'a twist': [{ kind: 'twist', turns: 5.3, hand: 'right', reversals: 1 }],
    'a corner': [{ kind: 'corner' }],
    'a twist, a corner, a draw and another twist': [
      { kind: 'twist', turns: 2.2, hand: 'left', reversals: 0 },
      { kind: 'corner' },
      { kind: 'draw', widthMm: 14, thicknessMm: 14 },
      { kind: 'twist', turns: 3.1, hand: 'right', reversals: 2 },
    ],
    'a lossless restack and fold': [
      { kind: 'restack', pieces: 3, turnAlternate: true },
      { kind: 'fold' },
      { kind: 'turn', onto: 'edge' },
    ],
  };
  for (const [name, plans] of Object.entries(kept)) {
    it(`is kept by ${name}`, () => {
      for (const volume of layerVolumes(tenLayers(plans))) {
        expect(Math.abs(volume / LAYER_MM3 - 1)).toBeLessThan(NOISE);
      }
    });
  }

  // Metal moves straight up and down here, not sideways, so that only the whole is kept exactly.
  for (const [faces, boundPercent] of [
    ['top', 3],
    ['bothStaggered', 2],
    ['bothOpposed', 6],
  ] as const) {
    it(`is kept by grooves in ${faces} forged flat, less what is cut, within ${boundPercent} % of a layer`, () => {
      const depthMm = 3;
      const radiusMm = 3.5;
      const plan: StepPlan = {
        kind: 'groove',
        pitchMm: 12,
        depthMm,
        radiusMm,
        angleDeg: 0,
        faces,
        finish: 'forgeFlat',
      };
      const volumes = layerVolumes(tenLayers([plan]));
      // Of a layer between depths a and b below the face, each of ten grooves takes the part of its segment in between.
      const cutOf = (fromMm: number, toMm: number): number =>
        10 * 20 * segmentBetween(radiusMm, depthMm, fromMm, toMm);
      volumes.forEach((volume, i) => {
        const fromTop = cutOf(20 - 2 * (i + 1), 20 - 2 * i);
        const fromBottom = faces === 'top' ? 0 : cutOf(2 * i, 2 * (i + 1));
        const expected = LAYER_MM3 - fromTop - fromBottom;
        const deviationPercent = (Math.abs(volume - expected) / LAYER_MM3) * 100;
        expect(deviationPercent).withContext(`layer ${i}`).toBeLessThan(boundPercent);
      });
      const total = volumes.reduce((sum, volume) => sum + volume, 0);
      const cut = 10 * 20 * segmentBetween(radiusMm, depthMm, 0, depthMm) * (faces === 'top' ? 1 : 2);
      expect(total).toBeCloseTo(48_000 - cut, 3);
    });
  }
});

/** Area in mm² of a circular segment's part between two depths below the face, the deepest point lying at `depthMm`. */
function segmentBetween(radiusMm: number, depthMm: number, fromMm: number, toMm: number): number {
  const below = (heightMm: number): number => {
    // Area of the segment up to a height over its deepest point: r² acos(1 − v/r) − (r − v)√(2rv − v²).
    const v = Math.max(0, Math.min(depthMm, heightMm));
    return radiusMm ** 2 * Math.acos(1 - v / radiusMm) - (radiusMm - v) * Math.sqrt(2 * radiusMm * v - v * v);
  };
  return below(depthMm - fromMm) - below(depthMm - toMm);
}
