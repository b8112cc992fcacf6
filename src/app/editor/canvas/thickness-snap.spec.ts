import fc from 'fast-check';
import { snappedThickness, stockTicks, thicknessStepMm } from './thickness-snap';

const SEED = { seed: 20_263 };
const STOCK = [0.5, 1, 1.5, 2, 2.5, 3, 4, 5, 6, 8, 10];

describe('snapping to stock', () => {
  it('stands on a stock thickness within 7 px of it', () => {
    // 10 px a millimetre: 7 px are 0.7 mm, but never more than 12 % of the thickness, 0.36 mm of 3.
    expect(snappedThickness(3.3, STOCK, 10, 'mm', false)).toEqual({ thicknessMm: 3, stockMm: 3 });
    expect(snappedThickness(3.4, STOCK, 10, 'mm', false)).toEqual({ thicknessMm: 3.4, stockMm: null });
    // 100 px a millimetre: 7 px are 0.07 mm.
    expect(snappedThickness(3.06, STOCK, 100, 'mm', false)).toEqual({ thicknessMm: 3, stockMm: 3 });
    expect(snappedThickness(3.08, STOCK, 100, 'mm', false)).toEqual({ thicknessMm: 3.08, stockMm: null });
  });

  it('is freed by Alt', () => {
    expect(snappedThickness(3.1, STOCK, 10, 'mm', true)).toEqual({ thicknessMm: 3.1, stockMm: null });
    expect(snappedThickness(3, STOCK, 10, 'mm', true)).toEqual({ thicknessMm: 3, stockMm: null });
  });

  it('else takes round figures of the reader, none finer than a pixel', () => {
    expect(thicknessStepMm('mm', 10)).toBe(0.1);
    expect(thicknessStepMm('mm', 15)).toBe(0.1);
    expect(thicknessStepMm('mm', 1000)).toBe(0.01);
    expect(thicknessStepMm('mm', 0.5)).toBe(2);
    expect(thicknessStepMm('inch', 3)).toBeCloseTo(25.4 / 64, 12);
    expect(thicknessStepMm('inch', 1.5)).toBeCloseTo(25.4 / 32, 12);
    // Past a quarter of a sixty-fourth a pixel, thousandths.
    expect(thicknessStepMm('inch', 20)).toBeCloseTo(0.0254, 12);
    expect(snappedThickness(7.123, [], 10, 'mm', false).thicknessMm).toBe(7.1);
    expect(snappedThickness(2.3, [], 3, 'inch', false).thicknessMm).toBeCloseTo((6 * 25.4) / 64, 9);
  });

  it('always gives a thickness that a document may hold, and a snap is a stock thickness', () => {
    fc.assert(
      fc.property(
        fc.double({ min: -100, max: 2000, noNaN: true }),
        fc.double({ min: 0.1, max: 2000, noNaN: true }),
        fc.constantFrom('mm' as const, 'inch' as const),
        fc.boolean(),
        (askedMm, pxPerMm, system, isFree) => {
          const { thicknessMm, stockMm } = snappedThickness(askedMm, STOCK, pxPerMm, system, isFree);
          expect(thicknessMm).toBeGreaterThanOrEqual(0.01);
          expect(thicknessMm).toBeLessThanOrEqual(500);
          if (stockMm !== null) {
            expect(STOCK).toContain(stockMm);
            expect(thicknessMm).toBe(stockMm);
            expect(isFree).toBeFalse();
          }
        },
      ),
      SEED,
    );
  });

  it('can reach the values between two stock thicknesses', () => {
    const reached = new Set<number>();
    for (let mm = 2; mm <= 2.5; mm += 0.005) {
      reached.add(snappedThickness(mm, STOCK, 40, 'mm', false).thicknessMm);
    }
    expect(reached).toContain(2.25);
  });
});

describe('marks of stock thicknesses', () => {
  it('are those within the window, with figures where there is room, first where the edge is', () => {
    const ticks = stockTicks(STOCK, 3, 10, 30, 16);
    expect(ticks.map((tick) => tick.stockMm)).toEqual([0.5, 1, 1.5, 2, 2.5, 3, 4, 5, 6]);
    // 16 px are 1.6 mm: 3, then the nearest that keep their distance from it and from each other.
    expect(ticks.filter((tick) => tick.hasFigure).map((tick) => tick.stockMm)).toEqual([1, 3, 5]);
  });

  it('never write two figures nearer than asked', () => {
    fc.assert(
      fc.property(
        fc.array(fc.double({ min: 0.05, max: 50, noNaN: true }), { maxLength: 40 }),
        fc.double({ min: 0.05, max: 50, noNaN: true }),
        fc.double({ min: 1, max: 200, noNaN: true }),
        (stock, currentMm, pxPerMm) => {
          const written = stockTicks(stock, currentMm, pxPerMm, 160, 16).filter((tick) => tick.hasFigure);
          for (let i = 1; i < written.length; i++) {
            const apartMm = (written[i]?.stockMm ?? 0) - (written[i - 1]?.stockMm ?? 0);
            expect(apartMm * pxPerMm).toBeGreaterThanOrEqual(16 - 1e-9);
          }
        },
      ),
      SEED,
    );
  });
});
