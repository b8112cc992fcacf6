import { isForeignToWelding } from '../../metallurgy/index.js';
import { type Steel, nominalPercent } from '../../steels/index.js';
import { type Finding, check } from '../check.js';
import { firstBarWith } from '../walk.js';

type Values = { steel: string; steelName: string; zincPercent: number; leadPercent: number };

/** Brass, bronze and other metals that have no place in a forge weld. */
export const metalUnweldable = check<Values>({
  code: 'metal-unweldable',
  source:
    'From memory: source to be confirmed: zinc, lead and cadmium evaporate at welding heat, poison and leave no weld; ' +
    'workplace limits and the safety data sheet come first',
  find: (forging) =>
    forging.steels.filter(isForeignToWelding).flatMap((steel: Steel): Finding<Values>[] => {
      const bar = firstBarWith(forging, steel.id);
      const zincPercent = nominalPercent(steel, 'Zn');
      const leadPercent = nominalPercent(steel, 'Pb');
      const values = { steel: steel.id, steelName: steel.name, zincPercent, leadPercent };
      return bar === undefined ? [] : [{ severity: 'stop', bar, stepId: null, values }];
    }),
  words: ({ steelName, zincPercent, leadPercent }, _severity, format) => {
    const contents = [
      zincPercent > 0 && `${format.number(zincPercent)} % zinc`,
      leadPercent > 0 && `${format.number(leadPercent)} % lead`,
    ].filter((part) => part !== false);
    return {
      message:
        contents.length > 0
          ? `${steelName} (${contents.join(', ')}) is in a stack: at welding heat the metal evaporates, the fume is poisonous, and nothing welds.`
          : `${steelName} is in a stack: it melts far below welding heat and doesn’t weld to steel.`,
      remedy: 'Take it out of the stack. It belongs to the fittings, joined cold; keep it out of the forge.',
    };
  },
});
