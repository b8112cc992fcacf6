import { MM_PER_INCH, type UnitSystem } from '@shared/units';

/**
 * Thicknesses of flat bar that merchants keep, mm: an edge that is drawn with the pointer snaps to them.
 * Common practice, no source: metric and inch bar as usually listed.
 */
const STOCK_MM: Readonly<Record<UnitSystem, readonly number[]>> = {
  mm: [0.5, 1, 1.5, 2, 2.5, 3, 4, 5, 6, 8, 10, 12, 15, 20],
  inch: [1 / 32, 1 / 16, 3 / 32, 1 / 8, 5 / 32, 3 / 16, 1 / 4, 5 / 16, 3 / 8, 1 / 2, 3 / 4].map(
    (inch) => inch * MM_PER_INCH,
  ),
};

export function stockThicknessesMm(system: UnitSystem): readonly number[] {
  return STOCK_MM[system];
}
