import { type Hatch, type Steel, distinctHatches, toneOf } from '@shared/steels';
import type { SteelInk } from './draw-layers';

/** A steel that is not known: a middle grey with a grid, which no steel of the catalogue of usual partners has. */
const UNKNOWN_INK: SteelInk = { rgb: [128, 128, 128], brightness: 0.5, hatch: 'grid' };

/**
 * Tone and hatch for each of the steels that are drawn together, in their order: no two have the same hatch.
 * @param hatches hatches already given to steels by id; the others get their own
 */
export function inksOf(
  steels: readonly (Steel | undefined)[],
  hatches?: ReadonlyMap<string, Hatch>,
): readonly SteelInk[] {
  const known = steels.filter((steel) => steel !== undefined);
  const distinct = new Map(distinctHatches(known).map((hatch, i) => [known[i], hatch]));
  return steels.map((steel) => {
    if (steel === undefined) return UNKNOWN_INK;
    const { rgb, brightness, hatch } = toneOf(steel);
    return { rgb, brightness, hatch: hatches?.get(steel.id) ?? distinct.get(steel) ?? hatch };
  });
}
