import type { Forging } from '../forging/index.js';
import { nominalPercent } from '../steels/index.js';

/** A hazard where the work meets it, with whom to defer to. */
export interface Caution {
  readonly code: string;
  readonly text: string;
}

/** Stands on every card. */
export const GENERAL_CAUTION =
  'This plan is a calculation aid. Local law, the manual of your equipment, the safety data sheet of every product and ' +
  'the advice of a qualified person come first. If you cannot meet them, do not do the step.';

const FORGE: Caution = {
  code: 'forge',
  text: 'Run the forge only with open ventilation and a carbon monoxide alarm at head height. Shaded eyewear against infrared; local gas code; licensed fitter for fixed lines.',
};
const FLUX: Caution = {
  code: 'flux',
  text: 'Flux and scale fly at the weld blow: full-face shield, leather, bystanders back. Plain borax outdoors or under a hood; no fluoride flux without extraction and its safety data sheet.',
};
const PRESS: Caution = {
  code: 'press',
  text: 'Press and hammer: never hold work by hand between the dies, keep out of line with them, guard treadle and hoses; the machine’s manual comes first.',
};
const CAN: Caution = {
  code: 'sealed-can',
  text: 'Sealed cans burst: leave a vent hole until heat has driven out moisture, never heat a can that holds liquid or oil, stand aside at the first heat.',
};
const GRINDING: Caution = {
  code: 'grinding',
  text: 'Grinding and sawing: eyes, ears and lungs protected, rated wheels and belts, guards on, work clamped, no gloves near belts.',
};
const NICKEL: Caution = {
  code: 'nickel-chromium-dust',
  text: 'Nickel and chromium dust can sensitise and may cause cancer: extracted or wet grinding, fitted respirator, no food in the shop.',
};
const UNKNOWN: Caution = {
  code: 'unknown-stock',
  text: 'Unknown or reclaimed stock: nothing galvanised, plated or painted goes into the fire. Zinc fume makes ill, cadmium fume kills.',
};

/**
 * The cautions that this very plan calls for.
 *
 * Source: workplace-safety practice as named in each text; limits and standards change, so they are pointed to, not
 * copied.
 */
export function cautionsFor(forging: Forging): readonly Caution[] {
  const steps = forging.bars
    .filter((bar) => bar.endsInResult)
    .flatMap((bar) => bar.states.map((state) => state.step));
  const has = (...kinds: readonly string[]): boolean =>
    steps.some((step) => step !== null && !step.isOff && kinds.includes(step.kind));
  const isSealed = steps.some((step) => step?.kind === 'weld' && !step.isOff && step.method === 'sealed');
  const hasNickelOrChromium = forging.steels.some(
    (steel) => nominalPercent(steel, 'Ni') >= 1 || nominalPercent(steel, 'Cr') >= 1,
  );
  const isReclaimed = forging.steels.some((steel) => steel.kind === 'reclaimed');
  return [
    FORGE,
    ...(has('weld') ? [FLUX] : []),
    ...(has('weld', 'draw', 'groove', 'dimple', 'corner', 'twist', 'wedge') ? [PRESS] : []),
    ...(isSealed ? [CAN] : []),
    ...(has('grind', 'restack', 'fold', 'slice', 'groove', 'dimple', 'trim') ? [GRINDING] : []),
    ...(hasNickelOrChromium ? [NICKEL] : []),
    ...(isReclaimed ? [UNKNOWN] : []),
  ];
}
