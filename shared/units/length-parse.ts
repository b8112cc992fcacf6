import type { UnitSystem } from './unit-system.js';
import { LONGEST_ENTRY, plainText, quoted, readNumber, type Refusal } from './typed-text.js';

/** A length that was understood, or why it wasn't, in words for whoever typed it. */
export type ParsedLength = { readonly ok: true; readonly mm: number } | Refusal;

/** Longer than this is a slip of the fingers, not a bar. */
const LONGEST_MM = 100_000;

/** Size of each unit in mm as a fraction of whole numbers, so that nothing is rounded before the last division. */
const UNITS: Readonly<Record<string, Ratio>> = {
  ...named(['mm', 'millimetre', 'millimetres', 'millimeter', 'millimeters'], 1, 1),
  ...named(['cm', 'centimetre', 'centimetres', 'centimeter', 'centimeters'], 10, 1),
  ...named(['m', 'metre', 'metres', 'meter', 'meters'], 1000, 1),
  ...named(['μm', 'um', 'micron', 'microns'], 1, 1000),
  ...named(['in', 'inch', 'inches', '"'], 127, 5),
  ...named(['thou', 'mil', 'mils'], 127, 5000),
  ...named(['ft', 'foot', 'feet', "'"], 1524, 5),
};

/** A value as a fraction of whole numbers. */
interface Ratio {
  readonly numerator: number;
  readonly denominator: number;
}

function named(names: readonly string[], numerator: number, denominator: number): Record<string, Ratio> {
  return Object.fromEntries(names.map((name) => [name, { numerator, denominator }]));
}

const NUMBER = String.raw`(?:\d+(?:[.,]\d+)*[.,]?|[.,]\d+)`;
const FRACTION = String.raw`(?:\d+(?:\s*[-+]\s*|\s+(?:and\s+)?))?\d+\s*/\s*\d+`;
const QUANTITY = `(${FRACTION}|${NUMBER})`;
const UNIT = String.raw`("|'|[\p{L}]+\.?)`;
const ONE = new RegExp(`^${QUANTITY}\\s*${UNIT}?$`, 'u');
const FEET_AND_INCHES = new RegExp(
  `^${QUANTITY}\\s*('|ft\\.?|foot|feet)\\s*(?:[-+]\\s*|and\\s+)?${QUANTITY}\\s*("|in\\.?|inch|inches)?$`,
  'u',
);
const MIXED = /^(?:(\d+)(?:\s*[-+]\s*|\s+(?:and\s+)?))?(\d+)\s*\/\s*(\d+)$/u;

/**
 * Reads a length as people type it: `3/32`, `3/32"`, `1 3/8`, `1-3/8`, `1⅜`, `³⁄₃₂`, `.094 in`, `94 thou`, `2.4 mm`,
 * `2,4 mm`, `1.5 cm`, `50 µm`, `5'`, `1' 3 1/2"`. A bare number is in the reader's system; a bare fraction is inches
 * in either, since nobody divides a millimetre into thirty-seconds. Fractions are exact: n/64 inch is 25.4·n/64 mm.
 * Refuses what is empty, negative or no length, naming what was typed.
 */
export function parseLength(text: string, system: UnitSystem): ParsedLength {
  const typed = text.trim();
  if (typed.length > LONGEST_ENTRY) return refuse(`${quoted(typed)} is too long for a length.`);
  const plain = plainText(text);
  if (plain === '') return refuse('Nothing is typed. Give a length, such as 3/32 or 2.4 mm.');
  if (/^-/.test(plain)) return refuse(`${quoted(typed)} is less than nothing. A length can't be negative.`);

  const both = FEET_AND_INCHES.exec(plain);
  if (both) {
    const feet = readQuantity(both[1] as string, typed);
    const inches = readQuantity(both[3] as string, typed);
    if (!feet.ok) return feet;
    if (!inches.ok) return inches;
    const sum: Ratio = {
      numerator: 12 * feet.numerator * inches.denominator + inches.numerator * feet.denominator,
      denominator: feet.denominator * inches.denominator,
    };
    return lengthOf(sum, 'in', typed);
  }

  const one = ONE.exec(plain);
  if (!one) return refuse(explain(plain, typed));
  const quantity = readQuantity(one[1] as string, typed);
  if (!quantity.ok) return quantity;
  const unit = one[2]?.replace(/\.$/, '') ?? (system === 'inch' || quantity.isFraction ? 'in' : 'mm');
  if (!Object.hasOwn(UNITS, unit)) {
    return refuse(`“${unit}” in ${quoted(typed)} is no unit of length here. Use mm, cm, m, in or ft.`);
  }
  return lengthOf(quantity, unit, typed);
}

/**
 * What a field holds after it was left: the very same length if its text is still the one that was shown, so that
 * looking at 2.4 mm in inches doesn't make it 0.094 in; else what {@link parseLength} reads.
 * @param shown what stood in the field and the length behind it; NaN for a field that held none
 */
export function readLengthField(
  text: string,
  shown: { readonly text: string; readonly mm: number },
  system: UnitSystem,
): ParsedLength {
  const isUntouched = Number.isFinite(shown.mm) && text.trim() === shown.text.trim();
  return isUntouched ? { ok: true, mm: shown.mm } : parseLength(text, system);
}

interface Quantity extends Ratio {
  readonly ok: true;
  /** Typed with a stroke. */
  readonly isFraction: boolean;
}

function readQuantity(text: string, typed: string): Quantity | Refusal {
  const mixed = MIXED.exec(text);
  if (!mixed) {
    const number = readNumber(text, typed);
    return number.ok ? { ...number, isFraction: false } : number;
  }
  const whole = Number(mixed[1] ?? 0);
  const numerator = Number(mixed[2]);
  const denominator = Number(mixed[3]);
  if (denominator === 0)
    return refuse(`${quoted(typed)} divides by nothing. Put a number above 0 under the stroke.`);
  if (mixed[1] !== undefined && numerator >= denominator) {
    return refuse(
      `${quoted(typed)} has a whole number beside ${numerator}/${denominator}, which is 1 or more by itself.`,
    );
  }
  return { ok: true, numerator: whole * denominator + numerator, denominator, isFraction: true };
}

/** One division of whole numbers: the nearest length there is to what was typed, in whatever terms it was typed. */
function lengthOf(quantity: Ratio, unit: string, typed: string): ParsedLength {
  const size = UNITS[unit] as Ratio;
  const mm = (quantity.numerator * size.numerator) / (quantity.denominator * size.denominator);
  return mm <= LONGEST_MM ? { ok: true, mm } : refuse(`${quoted(typed)} is too long. The most is 100 m.`);
}

function explain(plain: string, typed: string): string {
  if (!/\d/.test(plain))
    return `${quoted(typed)} has no number in it. Give a length, such as 3/32 or 2.4 mm.`;
  if (/\d\s*\/\s*(?!\s*\d)|(?<!\d\s*)\//u.test(plain))
    return `${quoted(typed)} has a stroke without a number on both sides. Write 3/32.`;
  if (/\d\s+[\d.,]/.test(plain))
    return `${quoted(typed)} has two numbers and no unit between them. Write 1 3/8 or 1.375.`;
  return `${quoted(typed)} can't be read as a length. Write it like 3/32, 1 3/8 in or 2.4 mm.`;
}

function refuse(reason: string): Refusal {
  return { ok: false, reason };
}
