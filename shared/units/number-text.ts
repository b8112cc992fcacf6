/** How numbers are written, whatever they measure. Nothing here asks the machine for its language. */
export interface NumberOptions {
  /** Digits after the decimal sign, 0–12. Each kind of quantity has its own habit when absent. */
  readonly digits?: number;
  /** Drop zeros at the end of the decimals (`2.40` → `2.4`). True when absent; false for columns. */
  readonly trim?: boolean;
  /** Decimal sign; `.` when absent. */
  readonly decimalSeparator?: '.' | ',';
}

/** A number and its unit apart, so that a page can set them in different type. */
export interface QuantityParts {
  /** Digits, sign and fraction, without the unit. */
  readonly number: string;
  /** Unit symbol; empty for a bare number. */
  readonly unit: string;
}

const MINUS = '−';
const NO_BREAK_SPACE = '\u00a0';

/**
 * A number with a fixed count of decimals.
 * @param value finite, or the result is `–`
 * @param digits decimals when `options` has none
 */
export function formatNumber(value: number, digits: number, options: NumberOptions = {}): string {
  if (!Number.isFinite(value)) return '–';
  const wanted = options.digits ?? digits;
  let text = Math.abs(value).toFixed(wanted);
  if (options.trim !== false && text.includes('.')) text = text.replace(/\.?0+$/, '');
  if (options.decimalSeparator === ',') text = text.replace('.', ',');
  return value < 0 && /[1-9]/.test(text) ? MINUS + text : text;
}

/** A whole number; from 10 000 on in groups of three, parted by a space that doesn't break. */
export function formatCount(count: number): string {
  const text = formatNumber(count, 0);
  const digits = text.replace(MINUS, '');
  if (digits.length < 5 || !/^\d+$/.test(digits)) return text;
  return (text.startsWith(MINUS) ? MINUS : '') + digits.replace(/\B(?=(\d{3})+$)/g, NO_BREAK_SPACE);
}

/** Number and unit as one text: `2.4 mm`, `3 %`; marks such as ″ follow without a space. */
export function joinParts(parts: QuantityParts): string {
  if (parts.unit === '') return parts.number;
  return parts.unit === '″' || parts.unit === '′'
    ? parts.number + parts.unit
    : `${parts.number} ${parts.unit}`;
}

/** From this size on, so many decimals. */
export type DecimalHabit = readonly (readonly [from: number, digits: number])[];

/**
 * Decimals by the size of what is shown. What the next finer habit would round up to a limit belongs above it: 9.996
 * is 10, not 10.00.
 * @param habit largest size first, the last one from 0
 */
export function decimalsBySize(value: number, habit: DecimalHabit): number {
  const size = Math.abs(value);
  let digits = 0;
  for (let i = 0; i < habit.length; i++) {
    const [from, here] = habit[i] as DecimalHabit[number];
    digits = here;
    const finer = habit[i + 1]?.[1] ?? here;
    if (Number(size.toFixed(finer)) >= from) break;
  }
  return digits;
}
