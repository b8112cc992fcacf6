import type { BarState } from '../bar/index.js';
import {
  DEFAULT_ALLOWANCES,
  STEP_KINDS,
  STEP_KIND_NAMES,
  isRefused,
  kindOf,
  stepSchema,
  type Step,
} from './index.js';

const bar: BarState = {
  lengthMm: 240,
  widthMm: 40,
  thicknessMm: 12,
  densityKgM3: 7850,
  layers: 1,
  lie: 'thickness',
  section: null,
  openSeams: 0,
};

function cutMm3(step: Step, of: BarState = bar): number {
  const forged = kindOf(step).forge(of, step, DEFAULT_ALLOWANCES);
  return isRefused(forged) ? NaN : forged.lossesMm3.cutting;
}

const groove = (rest: Partial<Extract<Step, { kind: 'groove' }>>): Step => ({
  id: 'g',
  kind: 'groove',
  pitchMm: 12,
  depthMm: 3,
  radiusMm: 5,
  angleDeg: 0,
  faces: 'top',
  finish: 'forgeFlat',
  ...rest,
});

const dimple = (rest: Partial<Extract<Step, { kind: 'dimple' }>>): Step => ({
  id: 'd',
  kind: 'dimple',
  pitchMm: 12,
  rowPitchMm: 10,
  depthMm: 1.2,
  radiusMm: 5,
  layout: 'square',
  seed: 1,
  faces: 'top',
  finish: 'forgeFlat',
  ...rest,
});

/** Area of a circular segment of height h, mm² (closed form of elementary geometry). */
const segmentArea = (r: number, h: number): number =>
  r * r * Math.acos((r - h) / r) - (r - h) * Math.sqrt(2 * r * h - h * h);

describe('volume cut by grooves and dimples', () => {
  it('20 straight grooves cut 20 circular segments', () => {
    expect(cutMm3(groove({}))).toBeCloseTo(20 * segmentArea(5, 3) * 40, 6);
  });

  it('grooves deeper than their radius have upright walls: half a circle and a slot', () => {
    const area = (Math.PI * 4) / 2 + 2 * 2 * 1.5;
    expect(cutMm3(groove({ radiusMm: 2, depthMm: 3.5 }))).toBeCloseTo(20 * area * 40, 6);
  });

  it('both faces cut twice as much; staggered by half a pitch over whole pitches too', () => {
    const one = cutMm3(groove({}));
    expect(cutMm3(groove({ faces: 'bothOpposed' }))).toBeCloseTo(2 * one, 6);
    expect(cutMm3(groove({ faces: 'bothStaggered' }))).toBeCloseTo(2 * one, 6);
  });

  it('slanted grooves at one pitch along the bar are narrower across and longer: the same over whole pitches', () => {
    // Each groove: segment area × length 40/cos; pitch across the grooves 12·cos, so area per mm² is the same / cos.
    const straight = cutMm3(groove({}));
    const slanted = cutMm3(groove({ angleDeg: 30 }));
    expect(Math.abs(slanted * Math.cos(Math.PI / 6) - straight)).toBeLessThan(1e-3 * straight);
  });

  it('dimples cut spherical caps, πd²(3R - d)/3 each; the rows at the border are cut by it', () => {
    // Rows at mid-width and ±10 mm are whole (rim radius 3.25 mm), those at ±20 mm are halved by the sides.
    const cap = (Math.PI * 1.2 ** 2 * (15 - 1.2)) / 3;
    const expected = 20 * (3 + 2 * 0.5) * cap;
    expect(Math.abs(cutMm3(dimple({})) - expected)).toBeLessThan(0.005 * expected);
  });

  it('scattering them leaves the volume nearly the same', () => {
    const wide = { ...bar, widthMm: 200, lengthMm: 600 };
    const square = cutMm3(dimple({}), wide);
    const scattered = cutMm3(dimple({ layout: 'scattered' }), wide);
    expect(Math.abs(scattered - square)).toBeLessThan(0.03 * square);
  });

  it('pressed and ground flat, the depth comes off as grinding', () => {
    const forged = STEP_KINDS.groove.forge(
      bar,
      groove({ finish: 'grindFlat', faces: 'bothOpposed' }) as never,
      DEFAULT_ALLOWANCES,
    );
    expect(isRefused(forged)).toBeFalse();
    if (isRefused(forged)) return;
    expect(forged.bar.thicknessMm).toBeCloseTo(6, 12);
    expect(forged.lossesMm3.grinding).toBeCloseTo(6 * 240 * 40, 6);
    expect(forged.lossesMm3.cutting).toBe(0);
  });

  it('refuses relief that meets in the middle, with both numbers', () => {
    const forged = STEP_KINDS.groove.forge(
      bar,
      groove({ depthMm: 6, faces: 'bothOpposed' }) as never,
      DEFAULT_ALLOWANCES,
    );
    expect(forged).toEqual({
      refusal: { code: 'cut-too-deep', field: 'depthMm', asked: 12, available: 12, unit: 'mm' },
    });
  });
});

describe('the table of step kinds', () => {
  it('proposes for any bar a step that its own schema takes', () => {
    const bars: readonly BarState[] = [
      bar,
      { ...bar, widthMm: 12 },
      { ...bar, lengthMm: 8, widthMm: 3, thicknessMm: 1 },
    ];
    for (const name of STEP_KIND_NAMES) {
      for (const state of bars) {
        const proposed = { id: 'new', ...STEP_KINDS[name].propose(state) };
        expect(stepSchema.safeParse(proposed).success)
          .withContext(`${name} for ${state.lengthMm} mm`)
          .toBeTrue();
      }
    }
  });

  it('every field of a kind has a label, and no kind knows a field twice', () => {
    for (const name of STEP_KIND_NAMES) {
      for (const field of Object.values(STEP_KINDS[name].fields))
        expect(field.label.length).toBeGreaterThan(2);
      expect(STEP_KINDS[name].kind).toBe(name);
    }
  });
});
