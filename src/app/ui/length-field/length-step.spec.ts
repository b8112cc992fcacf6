import { MM_PER_INCH } from '@shared/units';
import { steppedLengthMm } from './length-step';

describe('steppedLengthMm', () => {
  const inch = (numerator: number, denominator: number) => (numerator * 127) / (5 * denominator);

  it('goes by the marks of the metric rule, finer where lengths are small', () => {
    expect(steppedLengthMm(2.4, 1, false, 'mm')).toBe(2.5);
    expect(steppedLengthMm(12, 1, false, 'mm')).toBe(12.5);
    expect(steppedLengthMm(40, -1, false, 'mm')).toBe(39);
    expect(steppedLengthMm(240, 1, false, 'mm')).toBe(245);
  });

  it('first puts a length between two marks onto one of them', () => {
    expect(steppedLengthMm(353.7, 1, false, 'mm')).toBe(355);
    expect(steppedLengthMm(353.7, -1, false, 'mm')).toBe(350);
    expect(steppedLengthMm(2.4, 1, false, 'inch')).toBe(inch(7, 64));
    expect(steppedLengthMm(2.4, -1, false, 'inch')).toBe(inch(6, 64));
  });

  it('goes by sixty-fourths, thirty-seconds, sixteenths and eighths of an inch', () => {
    expect(steppedLengthMm(inch(3, 32), 1, false, 'inch')).toBe(inch(7, 64));
    expect(steppedLengthMm(inch(1, 2), 1, false, 'inch')).toBe(inch(17, 32));
    expect(steppedLengthMm(inch(3, 2), 1, false, 'inch')).toBe(inch(25, 16));
    expect(steppedLengthMm(8 * MM_PER_INCH, -1, false, 'inch')).toBe(inch(63, 8));
  });

  it('takes ten marks at a time when asked, and never goes below nothing', () => {
    expect(steppedLengthMm(40, 1, true, 'mm')).toBe(50);
    expect(steppedLengthMm(0.3, -1, true, 'mm')).toBe(0);
    expect(steppedLengthMm(0, -1, false, 'inch')).toBe(0);
  });

  it('comes back where it was, up and down again', () => {
    for (const system of ['mm', 'inch'] as const) {
      for (const from of [0, 1.5, 5, 20, 200, MM_PER_INCH / 4, MM_PER_INCH, 6 * MM_PER_INCH]) {
        const start = steppedLengthMm(from, 1, false, system);
        const there = steppedLengthMm(start, 1, false, system);
        expect(steppedLengthMm(there, -1, false, system))
          .withContext(`${from} ${system}`)
          .toBeCloseTo(start, 9);
      }
    }
  });
});
