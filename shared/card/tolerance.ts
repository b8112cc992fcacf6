import type { Axis } from '../bar/index.js';

/**
 * How near to its target a size should come at the anvil, ± mm: sections within 2 %, not closer than 0.3 mm;
 * lengths within 3 %, not closer than 2 mm.
 *
 * Common practice, no source: what a press with stops and a careful hammer hold.
 * @param sizeMm the target, > 0
 */
export function forgingToleranceMm(axis: Axis, sizeMm: number): number {
  return axis === 'length' ? Math.max(2, 0.03 * sizeMm) : Math.max(0.3, 0.02 * sizeMm);
}
