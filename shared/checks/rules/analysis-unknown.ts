import { isForeignToWelding, isCopper, isPureNickel } from '../../metallurgy/index.js';
import { type Steel, isReclaimed } from '../../steels/index.js';
import { type Finding, check } from '../check.js';
import { firstBarWith } from '../walk.js';

type Values = { steel: string; steelName: string };

/** Scrap, or a steel without a stated carbon content. */
export const analysisUnknown = check<Values>({
  code: 'analysis-unknown',
  source:
    'Common practice, no source: plan scrap as the worst of the steels that it may be, and test a coupon first',
  find: (forging) =>
    forging.steels.filter(isUnknown).flatMap((steel): Finding<Values>[] => {
      const bar = firstBarWith(forging, steel.id);
      const values = { steel: steel.id, steelName: steel.name };
      return bar === undefined ? [] : [{ severity: 'caution', bar, stepId: null, values }];
    }),
  words: ({ steelName }) => ({
    message: `The analysis of ${steelName} is a guess: welding range, carbon and hardening may be far from what is shown.`,
    remedy:
      'Forge, harden and break a coupon first. No galvanised, plated or painted scrap in the fire; burn no oil off in a closed can.',
  }),
});

function isUnknown(steel: Steel): boolean {
  if (isReclaimed(steel)) return true;
  const isNoSteel = isForeignToWelding(steel) || isCopper(steel) || isPureNickel(steel);
  return !isNoSteel && steel.composition.C === undefined;
}
