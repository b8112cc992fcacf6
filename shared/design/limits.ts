/** What the shop's machines can take. */
export interface ShopLimits {
  /** Opening of the press or the hammer, mm: no taller stack goes in. */
  readonly pressOpeningMm: number;
  /** Length that the forge heats, mm. */
  readonly forgeLengthMm: number;
  /** Largest reduction of the thickness in one heat, 0–1 of what was there. */
  readonly reductionPerHeat: number;
}

/** Defaults for a small shop. Common practice, no source; each shop sets its own. */
export const LIMIT_DEFAULTS: {
  readonly [name in keyof ShopLimits]: {
    readonly value: number;
    readonly min: number;
    readonly max: number;
    readonly label: string;
    readonly source: string;
  };
} = {
  pressOpeningMm: {
    value: 100,
    min: 1,
    max: 2_000,
    label: 'Opening of the press or hammer, mm',
    source: 'Common practice, no source: a small shop press opens 100–150 mm between the dies',
  },
  forgeLengthMm: {
    value: 500,
    min: 10,
    max: 10_000,
    label: 'Length the forge heats, mm',
    source:
      'Common practice, no source: a two-burner forge open at both ends heats a bar of about 500 mm by sections',
  },
  reductionPerHeat: {
    value: 0.4,
    min: 0.01,
    max: 0.95,
    label: 'Largest reduction of thickness in one heat, 0–1',
    source:
      'Common practice, no source: a press takes a third to two fifths of the thickness before the heat is gone',
  },
};

export const DEFAULT_LIMITS: ShopLimits = {
  pressOpeningMm: LIMIT_DEFAULTS.pressOpeningMm.value,
  forgeLengthMm: LIMIT_DEFAULTS.forgeLengthMm.value,
  reductionPerHeat: LIMIT_DEFAULTS.reductionPerHeat.value,
};
