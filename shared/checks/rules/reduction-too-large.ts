import type { Format } from '../../units/index.js';
import { type Finding, check } from '../check.js';
import { counted } from '../say.js';
import { allWorkedSteps } from '../walk.js';

type Values = {
  side: 'thickness' | 'width';
  fromMm: number;
  toMm: number;
  reduction: number;
  /** Heats of the step; 1 where it gives none. */
  heats: number;
  hasHeats: 'yes' | 'no';
  perHeat: number;
  allowed: number;
  heatsNeeded: number;
};

/** A draw or weld that presses further than its heats allow. */
export const reductionTooLarge = check<Values>({
  code: 'reduction-too-large',
  source:
    'The shop’s limit for one heat, compounded over the heats of the step. Where the design sets none: common practice, ' +
    'no source, a press takes a third to two fifths of the thickness before the heat is gone',
  find: (forging) =>
    allWorkedSteps(forging).flatMap(({ bar, step, before, after }): Finding<Values>[] => {
      if (step.kind !== 'draw' && step.kind !== 'weld') return [];
      const perHeat = forging.limits.reductionPerHeat;
      const heats = Math.max(1, after.heats);
      const scaleMm = 2 * after.heats * forging.allowances.scaleMmPerHeat;
      const sides = (['thickness', 'width'] as const).map((side) => {
        const fromMm = (side === 'thickness' ? before.thicknessMm : before.widthMm) - scaleMm;
        const toMm = side === 'thickness' ? after.bar.thicknessMm : after.bar.widthMm;
        return { side, fromMm, toMm, left: toMm / fromMm };
      });
      const [worst] = sides.sort((a, b) => a.left - b.left);
      const leastLeft = (1 - perHeat) ** heats;
      // A draw to exactly what the heats allow must not fail on the last digit.
      if (worst === undefined || worst.left >= leastLeft * (1 - 1e-9)) return [];
      const { side, fromMm, toMm, left } = worst;
      const values: Values = {
        side,
        fromMm,
        toMm,
        reduction: 1 - left,
        heats,
        hasHeats: after.heats > 0 ? 'yes' : 'no',
        perHeat,
        allowed: 1 - leastLeft,
        heatsNeeded: Math.ceil(Math.log(left) / Math.log(1 - perHeat) - 1e-9),
      };
      return [{ severity: 'caution', bar: bar.id, stepId: step.id, values }];
    }),
  words: (values, _severity, format) => ({
    message:
      `From ${format.length(values.fromMm)} to ${format.length(values.toMm)} is ${format.percent(values.reduction)} of the ${values.side}; ` +
      `${allowance(values, format)} allow${values.heats === 1 ? 's' : ''} ${format.percent(values.allowed)}. ` +
      'Pressed further, the bar is forged too cold and seams shear.',
    remedy: `Plan at least ${counted(values.heatsNeeded, 'heat', 'heats', format)} for this step.`,
  }),
});

function allowance({ heats, hasHeats, perHeat }: Values, format: Format): string {
  if (hasHeats === 'no') return 'the step gives no heats, and one';
  return heats === 1 ? 'one heat' : `${format.count(heats)} heats at ${format.percent(perHeat)} each`;
}
