/** What the reader measures with: millimetres, kilograms and °C, or inches, pounds and °F. */
export const UNIT_SYSTEMS = ['mm', 'inch'] as const;
export type UnitSystem = (typeof UNIT_SYSTEMS)[number];

/** One inch, exactly. **Source**: definition of the international inch (1959). */
export const MM_PER_INCH = 25.4;

/** One foot, exactly. */
export const MM_PER_FOOT = 12 * MM_PER_INCH;

/** One avoirdupois pound, exactly. **Source**: definition of the international pound (1959). */
export const KG_PER_POUND = 0.45359237;

/** One avoirdupois ounce, exactly. */
export const KG_PER_OUNCE = KG_PER_POUND / 16;

/** One cubic inch in mm³, exactly. */
export const MM3_PER_CUBIC_INCH = MM_PER_INCH ** 3;

/** The finest division of a shop's inch rule that lengths are kept to. */
export const FINEST_INCH_DIVISION = 64;
