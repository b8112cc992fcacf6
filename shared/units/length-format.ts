import {
  decimalsBySize,
  formatNumber,
  joinParts,
  type NumberOptions,
  type QuantityParts,
} from './number-text.js';
import { FINEST_INCH_DIVISION, MM_PER_INCH, type UnitSystem } from './unit-system.js';

/** How a length is written. */
export interface LengthOptions extends NumberOptions {
  /** `slash` 1 3/8 (can be typed back in), `built` 1³⁄₈ (for the eye). `slash` when absent. */
  readonly fractionStyle?: FractionStyle;
  /** `in`, or the mark ″. `in` when absent. */
  readonly inchSign?: 'in' | '″';
}

export type FractionStyle = 'slash' | 'built';

/** A length in inches as whole and fraction in lowest terms; `numerator` 0 means none. */
export interface InchFraction {
  readonly whole: number;
  readonly numerator: number;
  readonly denominator: number;
}

/** How far from a mark of the inch rule a length may lie and still be called by it, inches. */
const ON_GRID_INCH = 1e-9;

/** Millimetres: one decimal from 10 mm on, two below, more where two would hide a thin band. */
const MM_DIGITS = [
  [10, 1],
  [0.1, 2],
  [0.01, 3],
  [0.001, 4],
  [0, 5],
] as const;
/** Inches: thousandths, as the trade says them, and finer where those would hide a thin band. */
const INCH_DIGITS = [
  [0.01, 3],
  [0.001, 4],
  [0, 5],
] as const;

/**
 * The fraction that a length stands on, or null when it lies between two marks.
 * @param mm finite, ≥ 0
 * @param denominator marks per inch, a power of two up to 64
 */
export function inchFraction(mm: number, denominator: number = FINEST_INCH_DIVISION): InchFraction | null {
  const marks = Math.round((mm * denominator) / MM_PER_INCH);
  const offMm = Math.abs(mm - (127 * marks) / (5 * denominator));
  return offMm <= ON_GRID_INCH * MM_PER_INCH ? fractionOf(marks, denominator) : null;
}

/** The mark of the rule nearest to a length (mm ≥ 0), with `denominator` marks per inch. */
export function nearestInchFraction(mm: number, denominator: number): InchFraction {
  return fractionOf(Math.round((mm * denominator) / MM_PER_INCH), denominator);
}

/**
 * A length in the reader's system: `2.4 mm`, `240 mm`; `3/32 in`, `1 3/8 in`, or `0.094 in` between two marks of the
 * sixty-fourths rule. What comes out (style `slash`) is read back by `parseLength`; a length on a mark exactly.
 * @param mm finite; anything else gives `–`
 */
export function formatLength(mm: number, system: UnitSystem, options: LengthOptions = {}): string {
  return joinParts(lengthParts(mm, system, options));
}

/** As {@link formatLength}, number and unit apart. */
export function lengthParts(mm: number, system: UnitSystem, options: LengthOptions = {}): QuantityParts {
  if (system === 'mm')
    return { number: formatNumber(mm, decimalsBySize(mm, MM_DIGITS), options), unit: 'mm' };
  return { number: inchNumber(mm, options), unit: options.inchSign ?? 'in' };
}

/**
 * A length in inches to the nearest 1/`denominator`, as for rough shop work: `1 3/8 in`. Less than half a mark but
 * more than nothing is `< 1/16 in`.
 * @param mm finite, ≥ 0
 * @param denominator 2, 4, 8, 16, 32 or 64
 */
export function formatLengthFraction(mm: number, denominator: number, options: LengthOptions = {}): string {
  return joinParts(lengthFractionParts(mm, denominator, options));
}

/** As {@link formatLengthFraction}, number and unit apart. */
export function lengthFractionParts(
  mm: number,
  denominator: number,
  options: LengthOptions = {},
): QuantityParts {
  const unit = options.inchSign ?? 'in';
  if (!Number.isFinite(mm)) return { number: '–', unit };
  const nearest = nearestInchFraction(Math.abs(mm), denominator);
  const style = options.fractionStyle;
  if (nearest.whole === 0 && nearest.numerator === 0 && mm !== 0) {
    return { number: `< ${fractionText({ whole: 0, numerator: 1, denominator }, style)}`, unit };
  }
  return { number: (mm < 0 ? '−' : '') + fractionText(nearest, style), unit };
}

/**
 * Three sides as one text with the unit once: `150 × 25 × 50 mm`, `6 × 1 × 1 31/32 in`.
 * @param sidesMm any number of lengths, mm
 */
export function formatSize(
  sidesMm: readonly number[],
  system: UnitSystem,
  options: LengthOptions = {},
): string {
  const parts = sidesMm.map((mm) => lengthParts(mm, system, options));
  return joinParts({ number: parts.map((part) => part.number).join(' × '), unit: parts[0]?.unit ?? '' });
}

/** `1 3/8` or `1³⁄₈`. */
export function fractionText(fraction: InchFraction, style: FractionStyle = 'slash'): string {
  const { whole, numerator, denominator } = fraction;
  if (numerator === 0) return String(whole);
  if (style === 'slash') return `${whole === 0 ? '' : `${whole} `}${numerator}/${denominator}`;
  return `${whole === 0 ? '' : whole}${raised(numerator)}⁄${lowered(denominator)}`;
}

function inchNumber(mm: number, options: LengthOptions): string {
  if (!Number.isFinite(mm)) return '–';
  const fraction = options.digits === undefined ? inchFraction(Math.abs(mm)) : null;
  if (fraction !== null) return (mm < 0 ? '−' : '') + fractionText(fraction, options.fractionStyle);
  const inches = mm / MM_PER_INCH;
  return formatNumber(inches, decimalsBySize(inches, INCH_DIGITS), options);
}

function fractionOf(marks: number, denominator: number): InchFraction {
  const whole = Math.floor(marks / denominator);
  let numerator = marks - whole * denominator;
  let lowest = denominator;
  while (numerator % 2 === 0 && lowest % 2 === 0 && numerator !== 0) {
    numerator /= 2;
    lowest /= 2;
  }
  return { whole, numerator, denominator: numerator === 0 ? 1 : lowest };
}

function raised(value: number): string {
  return digitsFrom(value, '⁰¹²³⁴⁵⁶⁷⁸⁹');
}

function lowered(value: number): string {
  return digitsFrom(value, '₀₁₂₃₄₅₆₇₈₉');
}

function digitsFrom(value: number, alphabet: string): string {
  return String(value).replace(/\d/g, (digit) => alphabet[Number(digit)] ?? digit);
}
