import type { Allowances } from './step-kind.js';

/** An allowance's default, how far it may be set, and where the figure comes from. */
export interface AllowanceDefault {
  readonly value: number;
  readonly min: number;
  readonly max: number;
  readonly unit: 'mm' | '°C' | 'min';
  readonly label: string;
  readonly source: string;
}

/**
 * Planning figures for a gas forge with flux. All are habits of the trade and are meant to be replaced by the shop's
 * own measurements.
 */
export const ALLOWANCE_DEFAULTS: { readonly [name in keyof Allowances]: AllowanceDefault } = {
  scaleMmPerHeat: {
    value: 0.08,
    min: 0,
    max: 1,
    unit: 'mm',
    label: 'Scale per face and heat',
    source:
      'Common practice, no source: 0.05–0.15 mm a face and heat at welding temperature in a gas forge; agrees with 0.3–0.6 of the parabolic oxidation of iron in air',
  },
  kerfMm: {
    value: 1.5,
    min: 0,
    max: 10,
    unit: 'mm',
    label: 'Saw kerf',
    source:
      'Common practice, no source: shop band saw 1.3–1.6 mm, thin cutting disc 1.0–1.6 mm, chop saw 2.5–3.2 mm',
  },
  seamGrindMm: {
    value: 0.5,
    min: 0,
    max: 5,
    unit: 'mm',
    label: 'Clean-up grind per face before a seam',
    source: 'Common practice, no source: 0.3–0.8 mm a face before each restack',
  },
  forgeTemperatureC: {
    value: 1100,
    min: 700,
    max: 1300,
    unit: '°C',
    label: 'Forging heat',
    source:
      'Common practice, no source: orange to yellow; keep below the forging maximum of every steel in the bar',
  },
  weldTemperatureC: {
    value: 1200,
    min: 900,
    max: 1350,
    unit: '°C',
    label: 'Welding heat',
    source:
      'Common practice, no source: usual flux weld 1150–1260 °C; 1200 °C suits most carbon and nickel steels',
  },
  minutesPerHeat: {
    value: 5,
    min: 0,
    max: 120,
    unit: 'min',
    label: 'Minutes at temperature in each heat',
    source: 'Common practice, no source: about 1 min for each mm of half-thickness once at heat',
  },
};

/** The defaults as plain figures. */
export const DEFAULT_ALLOWANCES: Allowances = {
  scaleMmPerHeat: ALLOWANCE_DEFAULTS.scaleMmPerHeat.value,
  kerfMm: ALLOWANCE_DEFAULTS.kerfMm.value,
  seamGrindMm: ALLOWANCE_DEFAULTS.seamGrindMm.value,
  forgeTemperatureC: ALLOWANCE_DEFAULTS.forgeTemperatureC.value,
  weldTemperatureC: ALLOWANCE_DEFAULTS.weldTemperatureC.value,
  minutesPerHeat: ALLOWANCE_DEFAULTS.minutesPerHeat.value,
};
