import {
  formatLength,
  formatLengthFraction,
  formatSize,
  lengthParts,
  type LengthOptions,
} from './length-format.js';
import { formatCount, formatNumber, type NumberOptions, type QuantityParts } from './number-text.js';
import {
  formatDuration,
  formatMass,
  formatPercent,
  formatTemperature,
  formatTemperatureDifference,
  formatVolume,
  massParts,
  temperatureParts,
  type TemperatureOptions,
} from './quantity-format.js';
import type { UnitSystem } from './unit-system.js';

/** Everything the reader is told in figures, in the reader's units. Options given here outdo those of {@link formatFor}. */
export interface Format {
  readonly system: UnitSystem;
  /** `2.4 mm`; `3/32 in`. */
  readonly length: (mm: number, options?: LengthOptions) => string;
  readonly lengthParts: (mm: number, options?: LengthOptions) => QuantityParts;
  /** For rough work: whole millimetres, or the nearest sixteenth of an inch. */
  readonly roughLength: (mm: number, options?: LengthOptions) => string;
  /** `150 × 25 × 50 mm`. */
  readonly size: (sidesMm: readonly number[], options?: LengthOptions) => string;
  readonly mass: (kg: number, options?: NumberOptions) => string;
  readonly massParts: (kg: number, options?: NumberOptions) => QuantityParts;
  readonly temperature: (temperatureC: number, options?: TemperatureOptions) => string;
  readonly temperatureParts: (temperatureC: number, options?: TemperatureOptions) => QuantityParts;
  readonly temperatureDifference: (deltaK: number, options?: TemperatureOptions) => string;
  /** From mm³: `187.5 cm³`; `11.44 in³`. */
  readonly volume: (volumeMm3: number, options?: NumberOptions) => string;
  /** From a fraction 0–1: `12.5 %`. */
  readonly percent: (fraction: number, options?: NumberOptions) => string;
  readonly count: (count: number) => string;
  /** A bare number, two decimals unless told otherwise. */
  readonly number: (value: number, options?: NumberOptions) => string;
  /** From minutes: `1 h 20 min`. */
  readonly duration: (minutes: number, options?: NumberOptions) => string;
}

/**
 * The reader's format.
 * @param habits what holds for every figure: the decimal sign, the style of fractions
 */
export function formatFor(
  system: UnitSystem,
  habits: Pick<LengthOptions, 'decimalSeparator' | 'fractionStyle' | 'inchSign'> = {},
): Format {
  return {
    system,
    length: (mm, options) => formatLength(mm, system, { ...habits, ...options }),
    lengthParts: (mm, options) => lengthParts(mm, system, { ...habits, ...options }),
    roughLength: (mm, options) =>
      system === 'mm'
        ? formatLength(mm, system, { digits: 0, ...habits, ...options })
        : formatLengthFraction(mm, 16, { ...habits, ...options }),
    size: (sidesMm, options) => formatSize(sidesMm, system, { ...habits, ...options }),
    mass: (kg, options) => formatMass(kg, system, { ...habits, ...options }),
    massParts: (kg, options) => massParts(kg, system, { ...habits, ...options }),
    temperature: (temperatureC, options) =>
      formatTemperature(temperatureC, system, { ...habits, ...options }),
    temperatureParts: (temperatureC, options) =>
      temperatureParts(temperatureC, system, { ...habits, ...options }),
    temperatureDifference: (deltaK, options) =>
      formatTemperatureDifference(deltaK, system, { ...habits, ...options }),
    volume: (volumeMm3, options) => formatVolume(volumeMm3, system, { ...habits, ...options }),
    percent: (fraction, options) => formatPercent(fraction, { ...habits, ...options }),
    count: formatCount,
    number: (value, options) => formatNumber(value, 2, { ...habits, ...options }),
    duration: (minutes, options) => formatDuration(minutes, { ...habits, ...options }),
  };
}
