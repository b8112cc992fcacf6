import fc from 'fast-check';
import {
  formatLength,
  formatLengthFraction,
  formatSize,
  inchFraction,
  lengthFractionParts,
  lengthParts,
  nearestInchFraction,
} from './length-format.js';

describe('formatLength in millimetres', () => {
  const cases: readonly (readonly [number, string])[] = [
    [0, '0 mm'],
    [2.4, '2.4 mm'],
    [2.456, '2.46 mm'],
    [9.994, '9.99 mm'],
    [9.996, '10 mm'],
    [10.04, '10 mm'],
    [34.925, '34.9 mm'],
    [240, '240 mm'],
    [1234.56, '1234.6 mm'],
    [0.157, '0.16 mm'],
    [0.0156, '0.016 mm'],
    [0.00123, '0.0012 mm'],
    [0.000126, '0.00013 mm'],
    [-2.4, '−2.4 mm'],
    [-0.0000001, '0 mm'],
    [NaN, '– mm'],
    [Infinity, '– mm'],
  ];
  for (const [mm, text] of cases)
    it(`writes ${String(mm)} as ${text}`, () => expect(formatLength(mm, 'mm')).toBe(text));

  it('keeps zeros for columns, takes a count of digits and a decimal comma', () => {
    expect(formatLength(2.4, 'mm', { trim: false })).toBe('2.40 mm');
    expect(formatLength(240, 'mm', { trim: false })).toBe('240.0 mm');
    expect(formatLength(9.996, 'mm', { trim: false })).toBe('10.0 mm');
    expect(formatLength(2.456, 'mm', { digits: 1 })).toBe('2.5 mm');
    expect(formatLength(240, 'mm', { digits: 0 })).toBe('240 mm');
    expect(formatLength(2.4, 'mm', { decimalSeparator: ',' })).toBe('2,4 mm');
  });

  it('gives number and unit apart', () => {
    expect(lengthParts(2.4, 'mm')).toEqual({ number: '2.4', unit: 'mm' });
    expect(lengthParts(34.925, 'inch')).toEqual({ number: '1 3/8', unit: 'in' });
  });
});

describe('formatLength in inches', () => {
  // 1/64 in = 0.396875 mm exactly.
  const cases: readonly (readonly [number, string])[] = [
    [0, '0 in'],
    [25.4, '1 in'],
    [2.38125, '3/32 in'],
    [34.925, '1 3/8 in'],
    [0.396875, '1/64 in'],
    [25.003125, '63/64 in'],
    [50.8, '2 in'],
    [2.4, '0.094 in'],
    [6, '0.236 in'],
    [150, '5.906 in'],
    [0.1, '0.0039 in'],
    [0.01, '0.00039 in'],
    [34.925 + 2e-8, '1 3/8 in'],
    [34.925 + 2e-4, '1.375 in'],
    [-34.925, '−1 3/8 in'],
    [NaN, '– in'],
  ];
  for (const [mm, text] of cases) {
    it(`writes ${String(mm)} mm as ${text}`, () => expect(formatLength(mm, 'inch')).toBe(text));
  }

  it('builds fractions for the eye and takes the inch mark', () => {
    expect(formatLength(34.925, 'inch', { fractionStyle: 'built' })).toBe('1³⁄₈ in');
    expect(formatLength(34.925, 'inch', { fractionStyle: 'built', inchSign: '″' })).toBe('1³⁄₈″');
    expect(formatLength(25.003125, 'inch', { fractionStyle: 'built' })).toBe('⁶³⁄₆₄ in');
    expect(formatLength(50.8, 'inch', { inchSign: '″' })).toBe('2″');
  });

  it('writes decimals when a count of digits is asked for', () => {
    expect(formatLength(34.925, 'inch', { digits: 2 })).toBe('1.38 in');
    expect(formatLength(34.925, 'inch', { digits: 3 })).toBe('1.375 in');
    expect(formatLength(2.4, 'inch', { decimalSeparator: ',' })).toBe('0,094 in');
  });

  it('calls a length by its mark within a thousand-millionth of an inch, no further', () => {
    expect(inchFraction(25.4 + 0.9 * 25.4e-9)).toEqual({ whole: 1, numerator: 0, denominator: 1 });
    expect(inchFraction(25.4 + 1.2 * 25.4e-9)).toBeNull();
  });
});

describe('formatLengthFraction', () => {
  const cases: readonly (readonly [number, number, string])[] = [
    [2.4, 64, '3/32 in'],
    [2.4, 16, '1/8 in'],
    [100, 64, '3 15/16 in'],
    [100, 16, '3 15/16 in'],
    [6, 64, '15/64 in'],
    [6, 16, '1/4 in'],
    [25.3, 16, '1 in'],
    [0.2, 16, '< 1/16 in'],
    [0.2, 64, '1/64 in'],
    [0, 16, '0 in'],
  ];
  for (const [mm, denominator, text] of cases) {
    it(`writes ${String(mm)} mm to the nearest 1/${String(denominator)} as ${text}`, () =>
      expect(formatLengthFraction(mm, denominator)).toBe(text));
  }

  it('has parts and styles too', () => {
    expect(lengthFractionParts(100, 16, { fractionStyle: 'built', inchSign: '″' })).toEqual({
      number: '3¹⁵⁄₁₆',
      unit: '″',
    });
    expect(formatLengthFraction(NaN, 16)).toBe('– in');
  });

  it('is never further off than half a mark, and in lowest terms', () => {
    fc.assert(
      fc.property(
        fc.double({ min: 0, max: 3000, noNaN: true }),
        fc.constantFrom(8, 16, 32, 64),
        (mm, marks) => {
          const { whole, numerator, denominator } = nearestInchFraction(mm, marks);
          const off = Math.abs((whole + numerator / denominator) * 25.4 - mm);
          expect(off).toBeLessThanOrEqual(25.4 / marks / 2 + 1e-9);
          expect(numerator < denominator && (numerator === 0 || numerator % 2 === 1)).toBeTrue();
        },
      ),
      { seed: 16, numRuns: 5000 },
    );
  });
});

describe('formatSize', () => {
  it('says the unit once', () => {
    expect(formatSize([150, 25, 50.04], 'mm')).toBe('150 × 25 × 50 mm');
    expect(formatSize([152.4, 25.4, 50.00625], 'inch')).toBe('6 × 1 × 1 31/32 in');
    expect(formatSize([], 'mm')).toBe('');
  });
});
