import { type Source, type Steel, isReclaimed, nominalPercent } from '../steels/index.js';
import { isCopper, isForeignToWelding, solidusOf } from './solidus.js';

/** How the air is kept out of a seam. */
export type WeldMethod = 'flux' | 'dry' | 'sealed';

/** Where the welding range comes from. */
export const WELDING_WINDOW_SOURCE: Source = {
  text:
    'ceiling 100 °C below the lowest solidus (150 °C with an unknown analysis or more than 0.035 % P or S), at most ' +
    '1290 °C; lower end 1100 °C with flux, 1050 °C dry under a press, 1000 °C sealed; 1200–1300 °C is quoted for a ' +
    'flux weld in a knife-maker’s web guide',
  status: 'common practice, no source',
};

/** Below the solidus by this much, K: burning starts earlier, since films rich in P and S and the case melt first. */
const MARGIN_K = 100;
const WIDE_MARGIN_K = 150;
/** P or S above this (wt%, nominal) takes the wide margin. */
const DIRTY_PERCENT = 0.035;
/** No hotter, whatever the steels. */
export const SHOP_CAP_C = 1290;
/** Copper melts at 1085 °C. From memory: source to be confirmed. */
const COPPER_CEILING_C = 1020;

/** Lower end of the welding range by method, °C. Common practice, no source. */
export const WELDING_FLOOR_C: Readonly<Record<WeldMethod, number>> = { flux: 1100, dry: 1050, sealed: 1000 };

/** Smiths aim here when the range allows it, °C, else so far under the ceiling, K. */
const USUAL_AIM_C = 1200;
const AIM_BELOW_CEILING_K = 20;

/** The range of temperatures in which a set of materials can be welded together. */
export interface WeldingWindow {
  /** Hottest that every material stands, °C. */
  readonly ceilingC: number;
  /** Coolest at which the method welds, °C. */
  readonly floorC: number;
  /** Ceiling less lower end; negative when there is no common range. */
  readonly widthK: number;
  /** Suggested aim, °C; null when there is no common range. */
  readonly aimC: number | null;
  /** Solidus of the material that sets the ceiling, °C. */
  readonly solidusC: number;
  /** How far the ceiling lies below that solidus. */
  readonly marginK: number;
  /** Id of the material that sets the ceiling (its own, or before the shop's cap). */
  readonly limitedBy: string;
}

/**
 * The common welding range of a set of materials.
 *
 * Ceiling: the lowest of each material's solidus less 100 °C, at most 1290 °C (copper: 1020 °C). The margin is 150 °C
 * for all of them while any analysis is unknown, and for a material of its own with more than 0.035 % P or S. Films
 * rich in P or S belong to the material that holds them, so clean wrought-iron partners keep their own ceiling.
 *
 * **Source**: {@link WELDING_WINDOW_SOURCE}. **Accuracy**: a guide; fire, atmosphere and clock decide.
 * @returns null when none of the materials has a place in a forge weld
 */
export function weldingWindow(steels: readonly Steel[], method: WeldMethod): WeldingWindow | null {
  const isUnknown = steels.some(isReclaimed);
  let lowest: { ceilingC: number; solidusC: number; id: string } | null = null;
  for (const steel of steels) {
    const solidus = isForeignToWelding(steel) ? null : solidusOf(steel);
    if (solidus === null) continue;
    const isDirty = nominalPercent(steel, 'P') > DIRTY_PERCENT || nominalPercent(steel, 'S') > DIRTY_PERCENT;
    const ceilingC = isCopper(steel)
      ? COPPER_CEILING_C
      : solidus.temperatureC - (isUnknown || isDirty ? WIDE_MARGIN_K : MARGIN_K);
    if (lowest === null || ceilingC < lowest.ceilingC) {
      lowest = { ceilingC, solidusC: solidus.temperatureC, id: steel.id };
    }
  }
  if (lowest === null) return null;
  const ceilingC = Math.min(SHOP_CAP_C, lowest.ceilingC);
  const floorC = WELDING_FLOOR_C[method];
  return {
    ceilingC,
    floorC,
    widthK: ceilingC - floorC,
    aimC: aimOf(floorC, ceilingC),
    solidusC: lowest.solidusC,
    marginK: lowest.solidusC - lowest.ceilingC,
    limitedBy: lowest.id,
  };
}

/** Rounded to 5 °C: nobody reads a fire closer. */
function aimOf(floorC: number, ceilingC: number): number | null {
  if (ceilingC <= floorC) return null;
  const below = Math.round((ceilingC - AIM_BELOW_CEILING_K) / 5) * 5;
  return below >= floorC ? Math.min(USUAL_AIM_C, below) : Math.round((floorC + ceilingC) / 10) * 5;
}
