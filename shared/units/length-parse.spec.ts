import fc from 'fast-check';
import { formatLength } from './length-format.js';
import { parseLength, readLengthField } from './length-parse.js';
import type { UnitSystem } from './unit-system.js';

/**
 * Typed text, the reader's system, and the length in mm. Expected values are worked by hand from 1 in = 25.4 mm: the
 * decimal number that is written here is exact, so the parsed length must be the very double nearest to it.
 */
const NOTATIONS: readonly (readonly [string, UnitSystem, number])[] = [
  // Fractions, which are inches whoever types them
  ['3/32', 'inch', 2.38125],
  ['3/32', 'mm', 2.38125],
  ['3/32"', 'mm', 2.38125],
  ['3/32 in', 'mm', 2.38125],
  ['3/32in.', 'mm', 2.38125],
  ['3/32 inch', 'mm', 2.38125],
  ['3 / 32 inches', 'mm', 2.38125],
  ['3⁄32', 'mm', 2.38125],
  ['3∕32″', 'mm', 2.38125],
  ['³⁄₃₂', 'mm', 2.38125],
  ['³/₃₂”', 'mm', 2.38125],
  ['⅟₁₆', 'inch', 1.5875],
  ['35/32', 'inch', 27.78125],
  ['1/3 in', 'inch', 25.4 / 3],
  // Whole and fraction
  ['1 3/8', 'inch', 34.925],
  ['1-3/8', 'inch', 34.925],
  ['1 - 3/8"', 'mm', 34.925],
  ['1–3/8', 'inch', 34.925],
  ['1+3/8', 'inch', 34.925],
  ['1 and 3/8 in', 'inch', 34.925],
  ['1⅜', 'inch', 34.925],
  ['1 ⅜', 'mm', 34.925],
  ['1-⅜″', 'mm', 34.925],
  ['⅜', 'mm', 9.525],
  ['1³⁄₃₂', 'inch', 27.78125],
  ['1\u00a03/8\u202fin', 'mm', 34.925],
  ['  1   3/8  ', 'inch', 34.925],
  // Decimal inches
  ['0.094 in', 'mm', 2.3876],
  ['.094"', 'mm', 2.3876],
  ['.094', 'inch', 2.3876],
  ['0,094 in', 'mm', 2.3876],
  ["0.094''", 'mm', 2.3876],
  ['0.094 INCH', 'mm', 2.3876],
  ['94 thou', 'mm', 2.3876],
  ['94 mil', 'mm', 2.3876],
  ['2', 'inch', 50.8],
  ['2.', 'inch', 50.8],
  ['0', 'inch', 0],
  // Metric
  ['2.4 mm', 'inch', 2.4],
  ['2,4 mm', 'inch', 2.4],
  ['2.4mm', 'inch', 2.4],
  ['2.4 MM', 'inch', 2.4],
  ['2.4', 'mm', 2.4],
  ['2,4', 'mm', 2.4],
  [',5', 'mm', 0.5],
  ['35mm', 'inch', 35],
  ['35 millimetres', 'inch', 35],
  ['1 millimeter', 'inch', 1],
  ['1 1/2 mm', 'inch', 1.5],
  ['1.5 cm', 'mm', 15],
  ['1,5cm', 'inch', 15],
  ['½ cm', 'inch', 5],
  ['0.25 m', 'mm', 250],
  ['50 µm', 'mm', 0.05],
  ['50 μm', 'mm', 0.05],
  ['50 microns', 'mm', 0.05],
  ['1,234.5 mm', 'mm', 1234.5],
  ['1.234,5 mm', 'mm', 1234.5],
  ['２．４ mm', 'mm', 2.4],
  // Feet
  ["5'", 'inch', 1524],
  ['5 ft', 'mm', 1524],
  ['1 foot', 'mm', 304.8],
  ['2 feet', 'mm', 609.6],
  ["1/2'", 'mm', 152.4],
  ['1\' 3 1/2"', 'inch', 393.7],
  ['1\'3½"', 'mm', 393.7],
  ['1\'-3 1/2"', 'mm', 393.7],
  ['1′ 3 1/2″', 'mm', 393.7],
  ['1’ 3 1/2”', 'mm', 393.7],
  ['1 ft 3.5 in', 'mm', 393.7],
  ['1ft. 3.5in.', 'mm', 393.7],
  ['1 foot and 3 1/2 inches', 'mm', 393.7],
  ["1' 3", 'mm', 381],
];

/** Typed text, and what the reason must name. */
const NONSENSE: readonly (readonly [string, RegExp])[] = [
  ['', /nothing is typed/i],
  ['   ', /nothing is typed/i],
  ['abc', /“abc” has no number/],
  ['"', /“"” has no number/],
  ['mm', /“mm” has no number/],
  ['3/', /“3\/” has a stroke without a number/],
  ['/32', /“\/32” has a stroke without a number/],
  ['3/0', /“3\/0” divides by nothing/],
  ['3/32/4', /“3\/32\/4”/],
  ['1 35/32', /“1 35\/32” has a whole number beside 35\/32/],
  ['-3', /“-3” is less than nothing/],
  ['−3 mm', /“−3 mm” is less than nothing/],
  ['2 bananas', /“bananas” in “2 bananas” is no unit/],
  ['2 kg', /“kg” in “2 kg” is no unit/],
  ['2 constructor', /“constructor”.* is no unit/],
  ['1 2', /“1 2” has two numbers/],
  ['1 2 mm', /“1 2 mm” has two numbers/],
  ['1 234', /“1 234” has two numbers/],
  ['1,234', /“1,234” could mean 1\.234 or 1234/],
  ['1.2.3 mm', /“1\.2\.3” is not a number/],
  ['1.5 3/8', /“1\.5 3\/8”/],
  ['2 mm 3 in', /“2 mm 3 in”/],
  ['1e3', /“1e3”/],
  ['NaN', /“NaN” has no number/],
  ['Infinity', /“Infinity” has no number/],
  ['9'.repeat(400), /^“9{39}…” is too long/],
  ['8'.repeat(30), /“8{30}” is too long\. The most is 100 m/],
  ['101 m', /“101 m” is too long\. The most is 100 m/],
  ['<script>1</script>', /“<script>1<\/script>”/],
];

describe('parseLength', () => {
  it('knows at least forty notations', () => {
    expect(NOTATIONS.length).toBeGreaterThanOrEqual(40);
  });

  for (const [text, system, mm] of NOTATIONS) {
    it(`reads ${JSON.stringify(text)} of a reader in ${system} as ${String(mm)} mm`, () => {
      expect(parseLength(text, system)).toEqual({ ok: true, mm });
    });
  }

  for (const [text, reason] of NONSENSE) {
    it(`refuses ${JSON.stringify(text.slice(0, 20))} and says why`, () => {
      for (const system of ['mm', 'inch'] as const) {
        const parsed = parseLength(text, system);
        expect(parsed.ok).toBeFalse();
        if (!parsed.ok) expect(parsed.reason).toMatch(reason);
      }
    });
  }

  it('never throws and never gives anything but a length or a reason', () => {
    const pieces = fc.constantFrom(
      '0',
      '1',
      '2',
      '3',
      '4',
      '6',
      '8',
      '9',
      '.',
      ',',
      '/',
      ' ',
      '-',
      '"',
      "'",
      'in',
      'mm',
      'ft',
      '⅜',
      '³⁄₃₂',
      '½',
      '″',
      'x',
      '\u00a0',
    );
    const typed = fc.oneof(
      fc.string({ unit: 'grapheme' }),
      fc.array(pieces, { maxLength: 12 }).map((parts) => parts.join('')),
    );
    fc.assert(
      fc.property(typed, fc.constantFrom<UnitSystem>('mm', 'inch'), (text, system) => {
        const parsed = parseLength(text, system);
        if (parsed.ok) {
          expect(Number.isFinite(parsed.mm)).toBeTrue();
          expect(parsed.mm).toBeGreaterThanOrEqual(0);
        } else {
          expect(parsed.reason.length).toBeGreaterThan(10);
        }
      }),
      { seed: 20, numRuns: 20_000 },
    );
  });

  it('takes no more than linear time for a hostile entry', () => {
    for (const unit of ['1 ', '1/', "1'", '1,', '-', '½', ' ', '9']) {
      const parsed = parseLength(`${unit.repeat(20_000)}x`, 'mm');
      expect(parsed.ok).toBeFalse();
    }
  });
});

/** 100 000 lengths in all, as the product's figures ask for. */
const RUNS = 50_000;

describe('a length written and read back', () => {
  it('is the very same for every fraction of an inch, in whatever terms it was typed', () => {
    const denominators = fc.constantFrom(2, 4, 8, 16, 32, 64);
    fc.assert(
      fc.property(fc.nat(400), fc.nat(63), denominators, (whole, part, denominator) => {
        const numerator = part % denominator;
        const typed = `${String(whole)} ${String(numerator)}/${String(denominator)}`;
        const first = parseLength(typed, 'inch');
        if (!first.ok) throw new Error(first.reason);
        // The nearest double to 25.4·n/64, worked in whole numbers: 127·n/320.
        const sixtyFourths = whole * 64 + (numerator * 64) / denominator;
        return (
          first.mm === (127 * sixtyFourths) / 320 &&
          (['slash', 'built'] as const).every((fractionStyle) => comesBack(first.mm, fractionStyle))
        );
      }),
      { seed: 254, numRuns: RUNS },
    );
  });

  it('is the very same for millimetres as finely as they are shown', () => {
    // Hundredths under 10 mm, tenths from there on.
    const shown = fc.oneof(
      fc.integer({ min: 10, max: 999 }).map((n) => n / 100),
      fc.integer({ min: 100, max: 999_999 }).map((n) => n / 10),
    );
    fc.assert(
      fc.property(shown, fc.constantFrom<'.' | ','>('.', ','), (mm, decimalSeparator) => {
        const again = parseLength(formatLength(mm, 'mm', { decimalSeparator }), 'inch');
        return again.ok && again.mm === mm;
      }),
      { seed: 64, numRuns: RUNS },
    );
  });

  it('comes back within half a unit of the last digit from decimal inches', () => {
    fc.assert(
      fc.property(fc.double({ min: 0.3, max: 5000, noNaN: true }), (mm) => {
        const again = parseLength(formatLength(mm, 'inch'), 'inch');
        expect(again.ok && Math.abs(again.mm - mm)).toBeLessThanOrEqual(0.0005 * 25.4 + 1e-9);
      }),
      { seed: 32, numRuns: 5000 },
    );
  });

  it('stays what it was in a field that was only looked at', () => {
    const shown = { text: formatLength(2.4, 'inch'), mm: 2.4 };
    expect(shown.text).toBe('0.094 in');
    expect(readLengthField(' 0.094 in ', shown, 'inch')).toEqual({ ok: true, mm: 2.4 });
    expect(readLengthField('0.095 in', shown, 'inch')).toEqual({ ok: true, mm: 2.413 });
    expect(readLengthField('x', shown, 'inch').ok).toBeFalse();
    expect(readLengthField('', { text: '', mm: NaN }, 'inch').ok).toBeFalse();
  });
});

/** Written in inches and read back: the same length, and the same text again. */
function comesBack(mm: number, fractionStyle: 'slash' | 'built'): boolean {
  const text = formatLength(mm, 'inch', { fractionStyle });
  const again = parseLength(text, 'mm');
  return again.ok && again.mm === mm && formatLength(again.mm, 'inch', { fractionStyle }) === text;
}
