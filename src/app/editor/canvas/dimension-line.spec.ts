import fc from 'fast-check';
import { dimensionLine } from './dimension-line';

const SEED = { seed: 20_265 };
const SEEN = [0, 600] as const;

describe('dimension line', () => {
  it('has arrows inside and the figure in the middle of the line, where there is room', () => {
    const line = dimensionLine(100, 300, 40, SEEN);
    expect(line?.figurePx).toBe(200);
    expect(line?.arrows).toEqual([
      { atPx: 100, points: 'back' },
      { atPx: 300, points: 'forth' },
    ]);
    expect(line?.lines).toEqual([
      [100, 175],
      [225, 300],
    ]);
    expect(line?.extensions).toEqual([100, 300]);
  });

  it('puts the arrows outside, pointing in, where only the figure fits between', () => {
    const line = dimensionLine(100, 150, 40, SEEN);
    expect(line?.figurePx).toBe(125);
    expect(line?.arrows).toEqual([
      { atPx: 100, points: 'forth' },
      { atPx: 150, points: 'back' },
    ]);
  });

  it('puts the figure beside the line where it does not fit: after it, or before it at the end of the sheet', () => {
    expect(dimensionLine(100, 110, 40, SEEN)?.figurePx).toBeGreaterThan(110 + 20);
    expect(dimensionLine(580, 590, 40, SEEN)?.figurePx).toBeLessThan(580 - 20);
  });

  it('leaves away what is off the sheet, with its arrow, and keeps the figure in sight', () => {
    const line = dimensionLine(-500, 300, 40, SEEN);
    expect(line?.extensions).toEqual([300]);
    expect(line?.arrows).toEqual([{ atPx: 300, points: 'forth' }]);
    expect(line?.figurePx).toBe(150);
    expect(dimensionLine(-500, 5000, 40, SEEN)?.arrows).toEqual([]);
    expect(dimensionLine(700, 900, 40, SEEN)).toBeNull();
    expect(dimensionLine(-50, -10, 40, SEEN)).toBeNull();
  });

  it('measures only what it says: every arrow has its tip at an end, and the figure is on the sheet', () => {
    fc.assert(
      fc.property(
        fc.double({ min: -1000, max: 1500, noNaN: true }),
        fc.double({ min: 0.01, max: 2000, noNaN: true }),
        fc.integer({ min: 10, max: 90 }),
        (fromPx, lengthPx, figurePx) => {
          const toPx = fromPx + lengthPx;
          const line = dimensionLine(fromPx, toPx, figurePx, SEEN);
          if (line === null) {
            expect(toPx < 0 || fromPx > 600).toBeTrue();
            return;
          }
          for (const arrow of line.arrows) expect([fromPx, toPx]).toContain(arrow.atPx);
          for (const extension of line.extensions) {
            expect(extension).toBeGreaterThanOrEqual(0);
            expect(extension).toBeLessThanOrEqual(600);
          }
          expect(line.figurePx - figurePx / 2).toBeGreaterThanOrEqual(-1e-6);
          expect(line.figurePx + figurePx / 2).toBeLessThanOrEqual(600 + 1e-6);
        },
      ),
      SEED,
    );
  });
});
