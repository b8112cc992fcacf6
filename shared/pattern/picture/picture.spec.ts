import { type Design, STARTERS, swapSteel } from '../../design/index.js';
import { evaluate } from '../../forging/index.js';
import {
  type StepPlan,
  alternating,
  barFrom,
  billet,
  designOf,
  stackOf,
} from '../../forging/testing/designs.js';
import { tracerFor } from '../engine.js';
import { kernelOf } from '../kernel/kernel.js';
import { entryOps } from '../program/program.js';
import { referenceTracer } from '../reference/tracer.js';
import type { Surface } from '../surfaces/surface.js';
import { programOfForging } from '../testing/tracing.js';
import { PLAIN_LOOK, USUAL_LOOK } from './look.js';
import { paint, paintSteelIndex } from './paint.js';
import { Picture } from './picture.js';
import type { PictureRequest } from './request.js';
import { NO_METAL } from './samples.js';

const TOP: Surface = { kind: 'face', face: 'top', depthMm: 1 };
const kernel = kernelOf();

function requestOf(design: Design, rest: Partial<PictureRequest> = {}): PictureRequest {
  const forging = evaluate(design);
  return {
    program: programOfForging(forging),
    steels: forging.steels,
    surface: TOP,
    ...(design.blank && { blank: design.blank }),
    widthPx: 120,
    heightPx: 30,
    samples: 16,
    ...rest,
  };
}

function pictureOf(request: PictureRequest, before: Picture | null = null, isHeld = false): Picture {
  return new Picture(request, tracerFor(request.program, kernel), before, isHeld).finish();
}

function starter(id: string): Design {
  const found = STARTERS.find((candidate) => candidate.id === id);
  if (!found) throw new Error(`There is no starter "${id}".`);
  return found.design;
}

/** Mean difference of two pictures' grey, of 255. */
function meanError(a: Uint8ClampedArray, b: Uint8ClampedArray): number {
  let sum = 0;
  let count = 0;
  for (let i = 0; i < a.length; i += 4) {
    if (a[i + 3] === 0 && b[i + 3] === 0) continue;
    sum += Math.abs((a[i] as number) - (b[i] as number));
    count += 1;
  }
  return sum / count;
}

/** A plan of fifteen bending and folding steps, at constant volume, that begins with a twist. */
function longPlan(turns: number): Design {
  const draw = (widthMm: number, thicknessMm: number): StepPlan => ({ kind: 'draw', widthMm, thicknessMm });
  const plans: StepPlan[] = [
    { kind: 'twist', turns, hand: 'right', reversals: 0 },
    draw(30, 20),
    { kind: 'corner' },
    draw(28, 14),
    { kind: 'wedge', dragMm: 4, reachMm: 5 },
    draw(30, 10),
    { kind: 'fold' },
    draw(30, 10),
    { kind: 'twist', turns: 1, hand: 'left', reversals: 1 },
    draw(30, 12),
    { kind: 'fold' },
    draw(34, 10),
    { kind: 'corner' },
    draw(30, 8),
    { kind: 'wedge', dragMm: 2, reachMm: 4 },
  ];
  return billet(alternating(9), plans);
}

describe('a picture', () => {
  it('goes from blocks to pixels to softened borders, each a whole picture, and counts what it traced', () => {
    const request = requestOf(starter('laddered'), { widthPx: 160, heightPx: 40 });
    const picture = new Picture(request, tracerFor(request.program, kernel));
    const ops = entryOps(request.program);
    const pixels = 160 * 40;
    expect(picture.stage).toBe('blocks');
    while (picture.stage === 'blocks') picture.advance(64);
    expect(picture.counters.samples).toBe(pixels / 16);
    expect(picture.counters.stepEvaluations).toBe((pixels / 16) * ops);
    // Coarse: at most a twentieth of the full work.
    expect(picture.counters.samples / (pixels * 16)).toBeLessThan(0.05);
    expect(picture.samples.layer).not.toContain(NO_METAL);
    while (picture.stage === 'pixels') picture.advance(1_000);
    expect(picture.counters.samples).toBe(pixels);
    expect(picture.stage).toBe('borders');
    picture.finish();
    expect(picture.counters.samples).toBeGreaterThan(pixels);
    expect(picture.advance()).toBe('done');
  });

  it('needs less than 45 % of the samples of uniform pictures and differs from it by less than 1/255 on average', () => {
    let spent = 0;
    let uniformly = 0;
    for (const { id, design } of STARTERS) {
      const request = requestOf(design, {
        surface: { kind: 'blade', side: 'left' },
        // A third of a picture of 1200 × 160 pixels, the point in it.
        window: { left: 0.67, bottom: 0, right: 1, top: 1 },
        widthPx: 400,
        heightPx: 160,
      });
      const picture = pictureOf(request);
      const uniform = pictureOf({ ...request, isUniform: true });
      const share = picture.counters.samples / uniform.counters.samples;
      spent += picture.counters.samples;
      uniformly += uniform.counters.samples;
      const grey = (of: Picture): Uint8ClampedArray =>
        paint(of.samples, request.program, request.steels, PLAIN_LOOK, of.pixelMm).rgba;
      expect(meanError(grey(picture), grey(uniform)))
        .withContext(id)
        .toBeLessThan(1);
      expect(share).withContext(id).toBeLessThan(0.5);
    }
    expect(spent / uniformly).toBeLessThan(0.45);
  });

  it('is the same each time, and the same on the kernel as on the reference but for 0.1 % of pixels', () => {
    const request = requestOf(starter('five-bars'), { samples: 1, widthPx: 300, heightPx: 80 });
    const picture = pictureOf(request);
    expect(pictureOf(request).samples.layer).toEqual(picture.samples.layer);
    const reference = new Picture(request, referenceTracer(request.program)).finish();
    const wrong = picture.samples.layer.filter((layer, i) => layer !== reference.samples.layer[i]).length;
    expect(wrong / (300 * 80)).toBeLessThanOrEqual(0.001);
  });

  it('traces nothing when a steel is exchanged for another', () => {
    const design = starter('raindrop');
    const request = requestOf(design);
    const picture = pictureOf(request);
    const recoloured = requestOf(swapSteel(design, '15n20', 'nickel-200'));
    const after = pictureOf(recoloured, picture);
    expect(after.counters.samples).toBe(0);
    expect(after.counters.stepEvaluations).toBe(0);
    expect(after.samples.layer).toEqual(picture.samples.layer);
    const fresh = pictureOf(recoloured);
    const painted = (of: Picture): Uint8ClampedArray =>
      paint(of.samples, recoloured.program, recoloured.steels, USUAL_LOOK, of.pixelMm).rgba;
    expect(painted(after)).toEqual(painted(fresh));
  });

  it('redoes at most 55 % of the step evaluations when an early step changes, and comes out as from the start', () => {
    const request = requestOf(longPlan(3), { samples: 1 });
    expect(entryOps(request.program)).toBeGreaterThanOrEqual(14);
    const picture = pictureOf(request, null, true);
    const changed = requestOf(longPlan(3.5), { samples: 1 });
    const after = pictureOf(changed, picture, true);
    const fresh = pictureOf(changed);
    expect(after.samples.layer).toEqual(fresh.samples.layer);
    expect(after.counters.stepEvaluations).toBeLessThanOrEqual(0.55 * fresh.counters.stepEvaluations);
  });

  it('redoes less still when the same step changes again, softened borders and all', () => {
    const first = pictureOf(requestOf(longPlan(3)), null, true);
    const second = pictureOf(requestOf(longPlan(3.2)), first, true);
    const request = requestOf(longPlan(3.4));
    const third = pictureOf(request, second, true);
    const fresh = pictureOf(request);
    expect(third.samples.fineLayer.subarray(0, 16 * third.samples.slots)).toEqual(
      fresh.samples.fineLayer.subarray(0, 16 * fresh.samples.slots),
    );
    expect(third.counters.stepEvaluations).toBeLessThanOrEqual(0.45 * fresh.counters.stepEvaluations);
  });

  it('takes nothing over where places or later steps differ', () => {
    const request = requestOf(longPlan(3));
    const picture = pictureOf(request, null, true);
    const elsewhere = pictureOf({ ...request, surface: { kind: 'face', face: 'top', depthMm: 2 } }, picture);
    expect(elsewhere.counters.reused).toBe(0);
    const zoomed = pictureOf(
      { ...request, window: { left: 0.2, bottom: 0.2, right: 0.4, top: 0.4 } },
      picture,
    );
    expect(zoomed.counters.reused).toBe(0);
  });

  it('shows in a window what the whole shows there', () => {
    const request = requestOf(starter('twisted'), { samples: 1, widthPx: 200, heightPx: 40 });
    const whole = pictureOf(request).samples;
    const window = { left: 0.5, bottom: 0.25, right: 0.75, top: 0.75 };
    const part = pictureOf({ ...request, window, widthPx: 50, heightPx: 20 }).samples;
    let wrong = 0;
    for (let row = 0; row < 20; row++) {
      for (let column = 0; column < 50; column++) {
        if (part.layer[row * 50 + column] !== whole.layer[(row + 10) * 200 + column + 100]) wrong += 1;
      }
    }
    expect(wrong).toBeLessThanOrEqual(1);
  });
});

describe('painting', () => {
  const layers = [
    { steel: '1095', thicknessMm: 2 },
    { steel: 'wrought-iron', thicknessMm: 2 },
    { steel: '15n20', thicknessMm: 2 },
  ];
  const end: Surface = { kind: 'section', across: 'length', atMm: 50 };

  it('names the steels by their index in the document, in the middle of each pixel and nothing else', () => {
    const request = requestOf(billet(layers, []), { surface: end, samples: 1, widthPx: 5, heightPx: 6 });
    const { rgba } = paintSteelIndex(pictureOf(request).samples, request.program);
    const rows = Array.from({ length: 6 }, (_, row) => Array.from(rgba.subarray(row * 20, row * 20 + 4)));
    expect(rows).toEqual([
      [2, 0, 0, 255],
      [2, 0, 0, 255],
      [1, 0, 0, 255],
      [1, 0, 0, 255],
      [0, 0, 0, 255],
      [0, 0, 0, 255],
    ]);
  });

  it('leaves empty what is no metal', () => {
    const design = { ...starter('straight') };
    const request = requestOf(design, { surface: { kind: 'blade', side: 'left' }, samples: 4 });
    const picture = pictureOf(request);
    const { rgba } = paint(picture.samples, request.program, request.steels, USUAL_LOOK, picture.pixelMm);
    expect(rgba[4 * 119 + 3]).toBe(0);
    expect(rgba[4 * (15 * 120) + 3]).toBe(255);
  });

  it('paints steels from dark to bright as they etch, grey, the iron streaked with slag along the bar', () => {
    const request = requestOf(billet(layers, []), { surface: end, widthPx: 90, heightPx: 90 });
    const picture = pictureOf(request);
    const { rgba } = paint(picture.samples, request.program, request.steels, PLAIN_LOOK, picture.pixelMm);
    const at = (column: number, row: number): number => rgba[4 * (row * 90 + column)] as number;
    const spread = (row: number): number => {
      const greys = Array.from({ length: 90 }, (_, column) => at(column, row));
      return Math.max(...greys) - Math.min(...greys);
    };
    expect(at(40, 75)).toBeLessThan(at(40, 10));
    expect(spread(75)).toBe(0);
    expect(spread(10)).toBe(0);
    expect(spread(45)).toBeGreaterThan(20);
    for (let i = 0; i < rgba.length; i += 4) {
      expect(rgba[i] === rgba[i + 1] && rgba[i] === rgba[i + 2]).toBeTrue();
    }
  });

  it('shows slag as lines along the iron and not across', () => {
    const iron = designOf([barFrom('iron', stackOf([{ steel: 'wrought-iron', thicknessMm: 6 }], 60, 60))]);
    const request = requestOf(iron, { widthPx: 240, heightPx: 240 });
    const { slag } = pictureOf(request).samples;
    let along = 0;
    let across = 0;
    for (let row = 1; row < 240; row++) {
      for (let column = 1; column < 240; column++) {
        const own = slag[row * 240 + column] as number;
        along += Math.abs(own - (slag[row * 240 + column - 1] as number));
        across += Math.abs(own - (slag[(row - 1) * 240 + column] as number));
      }
    }
    expect(along).toBeGreaterThan(0);
    expect(across).toBeGreaterThan(4 * along);
  });

  it('loses its contrast without an etch', () => {
    const request = requestOf(starter('laddered'));
    const picture = pictureOf(request);
    const greys = (etch: number): readonly number[] => {
      const look = { etch, relief: 0, grit: 0 };
      const { rgba } = paint(picture.samples, request.program, request.steels, look, picture.pixelMm);
      const reds = Array.from(rgba).filter((_, i) => i % 4 === 0);
      return [Math.min(...reds), Math.max(...reds)];
    };
    const [least, most] = greys(0) as [number, number];
    expect(most - least).toBe(0);
    const [dark, bright] = greys(1) as [number, number];
    const [half, halfBright] = greys(0.5) as [number, number];
    expect(bright - dark).toBeGreaterThan(halfBright - half + 30);
  });
});
