import fc from 'fast-check';
import { type LayerRow, type Rgb, lightOf, toneRows } from './tone-rows';

const SEED = { seed: 20_267 };
const BLACK: Rgb = [0, 0, 0];
const WHITE: Rgb = [255, 255, 255];

function row(thicknesses: readonly number[], tones?: readonly number[]): LayerRow {
  return {
    count: thicknesses.length,
    thicknessMm: (i) => thicknesses[i] as number,
    tone: (i) => tones?.[i] ?? i % 2,
  };
}

describe('rows of tones', () => {
  it('keep layers apart that fill whole rows', () => {
    expect(toneRows(row([2, 1, 3]), [BLACK, WHITE], 0, 6, 6)).toEqual([
      { from: 0, to: 2, rgb: BLACK },
      { from: 2, to: 3, rgb: WHITE },
      { from: 3, to: 6, rgb: BLACK },
    ]);
  });

  it('mix by light where layers are finer than a row: half black and half white is sRGB 188', () => {
    // IEC 61966-2-1: a linear value of 0.5 encodes to 0.7354, 188 of 255.
    const fine = row(Array.from({ length: 200 }, () => 0.05));
    expect(toneRows(fine, [BLACK, WHITE], 0, 10, 10)).toEqual([{ from: 0, to: 10, rgb: [188, 188, 188] }]);
  });

  it('give a row that two layers share the part of each', () => {
    // A quarter white: linear 0.25 encodes to 0.5371, 137 of 255.
    const runs = toneRows(row([1.75, 2.25]), [BLACK, WHITE], 0, 4, 4);
    expect(runs[1]).toEqual({ from: 1, to: 2, rgb: [137, 137, 137] });
  });

  it('draw only what is asked for', () => {
    expect(toneRows(row([2, 1, 3]), [BLACK, WHITE], 2, 3, 1)).toEqual([{ from: 0, to: 1, rgb: WHITE }]);
    expect(toneRows(row([2]), [BLACK], 2, 4, 2)).toEqual([]);
  });

  it('keep the light: the mean over all rows is the mean over the layers', () => {
    fc.assert(
      fc.property(
        fc.array(fc.double({ min: 0.01, max: 3, noNaN: true }), { minLength: 1, maxLength: 80 }),
        fc.integer({ min: 20, max: 400 }),
        (thicknesses, rows) => {
          const totalMm = thicknesses.reduce((sum, mm) => sum + mm, 0);
          const runs = toneRows(row(thicknesses), [BLACK, WHITE], 0, totalMm, rows);
          const drawn = runs.reduce((sum, run) => sum + (run.to - run.from) * lightOf(run.rgb)[0], 0) / rows;
          const white = thicknesses.reduce((sum, mm, i) => sum + (i % 2 ? mm : 0), 0) / totalMm;
          // Each row is rounded to one of 256 tones; the steps are widest near white, 1/114 of the light.
          expect(Math.abs(drawn - white)).toBeLessThan(1 / 114);
        },
      ),
      SEED,
    );
  });
});
