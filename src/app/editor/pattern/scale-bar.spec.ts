import { formatFor } from '@shared/units';
import { scaleBar } from './scale-bar';

describe('scaleBar', () => {
  it('is the longest of 1, 2, 5 times a power of ten that fits', () => {
    const mm = formatFor('mm');
    const cases: readonly (readonly [number, number, string])[] = [
      [3.2, 20, '20 mm'],
      [1, 100, '100 mm'],
      [1.41, 50, '50 mm'],
      [70, 2, '2 mm'],
      [141, 0.5, '0.5 mm'],
      [1400, 0.1, '0.1 mm'],
      [2000, 0.05, '0.05 mm'],
    ];
    for (const [pxPerMm, lengthMm, label] of cases) {
      const bar = scaleBar(pxPerMm, 140, mm);
      expect(bar.lengthMm).withContext(label).toBeCloseTo(lengthMm, 12);
      expect(bar.label).toBe(label);
      expect(bar.widthPx).toBeCloseTo(lengthMm * pxPerMm, 9);
      expect(bar.widthPx).toBeLessThanOrEqual(140 + 1e-9);
    }
  });

  it('is a mark of the inch rule where there is one, thousandths below it', () => {
    const inch = formatFor('inch');
    const label = (pxPerInch: number): string => scaleBar(pxPerInch / 25.4, 140, inch).label;
    expect(label(60)).toBe('2 in');
    expect(label(140)).toBe('1 in');
    expect(label(200)).toBe('1/2 in');
    expect(label(1200)).toBe('1/16 in');
    expect(label(8900)).toBe('1/64 in');
    expect(label(14_000)).toBe('0.01 in');
    expect(label(50_000)).toBe('0.002 in');
  });
});
