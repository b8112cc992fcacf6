import {
  decimalsBySize,
  formatNumber,
  joinParts,
  type DecimalHabit,
  type NumberOptions,
  type QuantityParts,
} from './number-text.js';
import { KG_PER_OUNCE, KG_PER_POUND, MM3_PER_CUBIC_INCH, type UnitSystem } from './unit-system.js';

/** °C to °F. */
export function fahrenheitOf(temperatureC: number): number {
  return (temperatureC * 9) / 5 + 32;
}

/** °F to °C. */
export function celsiusOf(temperatureF: number): number {
  return ((temperatureF - 32) * 5) / 9;
}

/** How a temperature is written. */
export interface TemperatureOptions extends NumberOptions {
  /** Round to a multiple of this many degrees of the unit shown; for estimates, 5 or 10. */
  readonly step?: number;
}

/** A mass: `1.47 kg`, `350 g`; `3.24 lb`, `5.3 oz`. @param kg finite */
export function formatMass(kg: number, system: UnitSystem, options: NumberOptions = {}): string {
  return joinParts(massParts(kg, system, options));
}

/** As {@link formatMass}, number and unit apart. */
export function massParts(kg: number, system: UnitSystem, options: NumberOptions = {}): QuantityParts {
  const size = Math.abs(kg);
  if (system === 'mm') {
    // A rounded 1000 g would be a kilogram said badly.
    const isSmall = size > 0 && Math.round(size * 1000) < 1000;
    return isSmall ? part(kg * 1000, GRAM_DIGITS, 'g', options) : part(kg, LARGE_DIGITS, 'kg', options);
  }
  const isSmall = size > 0 && Number((size / KG_PER_OUNCE).toFixed(1)) < 16;
  return isSmall
    ? part(kg / KG_PER_OUNCE, OUNCE_DIGITS, 'oz', options)
    : part(kg / KG_PER_POUND, LARGE_DIGITS, 'lb', options);
}

/** A temperature: `850 °C`, `1562 °F`. Not for differences: see {@link formatTemperatureDifference}. */
export function formatTemperature(
  temperatureC: number,
  system: UnitSystem,
  options: TemperatureOptions = {},
): string {
  return joinParts(temperatureParts(temperatureC, system, options));
}

/** As {@link formatTemperature}, number and unit apart. */
export function temperatureParts(
  temperatureC: number,
  system: UnitSystem,
  options: TemperatureOptions = {},
): QuantityParts {
  const shown = system === 'mm' ? temperatureC : fahrenheitOf(temperatureC);
  return { number: formatNumber(stepped(shown, options.step), 0, options), unit: degreeSign(system) };
}

/** A difference of temperatures: 25 K is `25 °C` or `45 °F`. */
export function formatTemperatureDifference(
  deltaK: number,
  system: UnitSystem,
  options: TemperatureOptions = {},
): string {
  return joinParts(temperatureDifferenceParts(deltaK, system, options));
}

/** As {@link formatTemperatureDifference}, number and unit apart. */
export function temperatureDifferenceParts(
  deltaK: number,
  system: UnitSystem,
  options: TemperatureOptions = {},
): QuantityParts {
  const shown = system === 'mm' ? deltaK : (deltaK * 9) / 5;
  return { number: formatNumber(stepped(shown, options.step), 0, options), unit: degreeSign(system) };
}

/** A volume given in mm³: `187.5 cm³`, `11.44 in³`. */
export function formatVolume(volumeMm3: number, system: UnitSystem, options: NumberOptions = {}): string {
  return joinParts(volumeParts(volumeMm3, system, options));
}

/** As {@link formatVolume}, number and unit apart. */
export function volumeParts(
  volumeMm3: number,
  system: UnitSystem,
  options: NumberOptions = {},
): QuantityParts {
  return system === 'mm'
    ? part(volumeMm3 / 1000, VOLUME_DIGITS, 'cm³', options)
    : part(volumeMm3 / MM3_PER_CUBIC_INCH, VOLUME_DIGITS, 'in³', options);
}

/** A fraction 0–1 as percent with one decimal: 0.125 is `12.5 %`. */
export function formatPercent(fraction: number, options: NumberOptions = {}): string {
  return joinParts(percentParts(fraction, options));
}

/** As {@link formatPercent}, number and sign apart. */
export function percentParts(fraction: number, options: NumberOptions = {}): QuantityParts {
  return { number: formatNumber(fraction * 100, 1, options), unit: '%' };
}

/** A time given in minutes: `40 s`, `4.5 min`, `45 min`, `1 h 20 min`. @param minutes finite, ≥ 0 */
export function formatDuration(minutes: number, options: NumberOptions = {}): string {
  if (!Number.isFinite(minutes)) return '–';
  const seconds = Math.round(minutes * 60);
  if (seconds < 60) return `${seconds} s`;
  if (minutes < 10) return `${formatNumber(minutes, 1, options)} min`;
  const whole = Math.round(minutes);
  if (whole < 60) return `${whole} min`;
  const rest = whole % 60;
  return `${Math.floor(whole / 60)} h${rest === 0 ? '' : ` ${rest} min`}`;
}

const LARGE_DIGITS = [
  [100, 1],
  [0, 2],
] as const;
const GRAM_DIGITS = [
  [100, 0],
  [10, 1],
  [1, 2],
  [0, 3],
] as const;
const OUNCE_DIGITS = [
  [1, 1],
  [0.1, 2],
  [0, 3],
] as const;
const VOLUME_DIGITS = [
  [1000, 0],
  [100, 1],
  [1, 2],
  [0, 3],
] as const;

function part(value: number, digits: DecimalHabit, unit: string, options: NumberOptions): QuantityParts {
  return { number: formatNumber(value, decimalsBySize(value, digits), options), unit };
}

function stepped(value: number, step: number | undefined): number {
  return step === undefined ? value : Math.round(value / step) * step;
}

function degreeSign(system: UnitSystem): string {
  return system === 'mm' ? '°C' : '°F';
}
