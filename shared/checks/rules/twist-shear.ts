import { isPureNickel, steelsOfBar, twistShear as shearOf } from '../../metallurgy/index.js';
import { type Finding, check } from '../check.js';
import { counted } from '../say.js';
import { allWorkedSteps } from '../walk.js';

type Values = {
  turns: number;
  diameterMm: number;
  lengthMm: number;
  shear: number;
  heats: number;
  shearPerHeat: number;
  limit: number;
  /** What lowers the limit; empty when nothing does. */
  tender: string;
  heatsNeeded: number;
};

/** Shear at the surface that carbon steel takes in one heat, and with nickel or slag-bearing iron in it. */
const LIMIT = 2.5;
const TENDER_LIMIT = 1.5;

/** More twist in one heat than the skin of the bar takes. */
export const twistShear = check<Values>({
  code: 'twist-shear',
  source:
    'Shear γ = π·D·N/L: geometry of the helix, D the inscribed circle. Limits 2.5 in one heat, 1.5 with nickel or wrought iron: common practice, no source',
  find: (forging) =>
    allWorkedSteps(forging).flatMap(({ bar, step, after }): Finding<Values>[] => {
      if (step.kind !== 'twist') return [];
      const { widthMm, thicknessMm, lengthMm } = after.bar;
      const diameterMm = Math.min(widthMm, thicknessMm);
      const { shear } = shearOf(diameterMm, step.turns, lengthMm);
      const heats = Math.max(1, after.heats);
      const tender =
        steelsOfBar(forging, bar.id).find((steel) => isPureNickel(steel) || steel.composition.slag)?.name ??
        '';
      const limit = tender === '' ? LIMIT : TENDER_LIMIT;
      if (shear / heats <= limit) return [];
      const values = {
        turns: step.turns,
        diameterMm,
        lengthMm,
        shear,
        heats,
        shearPerHeat: shear / heats,
        limit,
        tender,
        heatsNeeded: Math.ceil(shear / limit),
      };
      return [{ severity: 'caution', bar: bar.id, stepId: step.id, values }];
    }),
  words: (values, _severity, format) => ({
    message:
      `${format.number(values.turns)} turns on ${format.length(values.lengthMm)} of a ${format.length(values.diameterMm)} bar shear its skin by ${format.number(values.shear)} ` +
      (values.heats === 1
        ? 'in one heat; '
        : `in ${format.count(values.heats)} heats, ${format.number(values.shearPerHeat)} in each; `) +
      (values.tender === ''
        ? `past ${format.number(values.limit)} in one heat outer seams tear.`
        : `with ${values.tender} in it seams tear past ${format.number(values.limit)} in one heat.`),
    remedy: `Spread the twist over at least ${counted(values.heatsNeeded, 'heat', 'heats', format)}, or turn it less. Round the corners first.`,
  }),
});
