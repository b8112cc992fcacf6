import type { StepKindName } from '../../steps/index.js';
import { type Finding, check } from '../check.js';
import { allWorkedSteps, firstOfEach } from '../walk.js';

type Values = { heightMm: number; openingMm: number; isOwnLimit: 'yes' | 'no' };

/** Steps for which the bar has to go between the dies. */
const PRESSED: ReadonlySet<StepKindName> = new Set<StepKindName>([
  'weld',
  'draw',
  'groove',
  'dimple',
  'wedge',
  'corner',
]);

/** A bar that doesn't go into the press; said at the first step of each bar that needs it to. */
export const tallerThanPress = check<Values>({
  code: 'taller-than-press',
  source:
    'The shop’s limit. Where the design sets none: common practice, no source, a small press opens 100–150 mm between the dies',
  find: (forging) => {
    const openingMm = forging.limits.pressOpeningMm;
    const isOwnLimit = forging.design.limits?.pressOpeningMm === undefined ? 'no' : 'yes';
    const findings = allWorkedSteps(forging).flatMap(({ bar, step, before }): Finding<Values>[] => {
      if (!PRESSED.has(step.kind) || before.thicknessMm <= openingMm) return [];
      const values: Values = { heightMm: before.thicknessMm, openingMm, isOwnLimit };
      return [{ severity: isOwnLimit === 'yes' ? 'stop' : 'caution', bar: bar.id, stepId: step.id, values }];
    });
    return firstOfEach(findings, ({ bar }) => bar);
  },
  words: ({ heightMm, openingMm, isOwnLimit }, _severity, format) => ({
    message: `The bar is ${format.length(heightMm)} high, the press opens ${format.length(openingMm)}${isOwnLimit === 'yes' ? '' : ' (the usual small press: no limit is set)'}: it doesn’t go between the dies.`,
    remedy: 'Lay fewer or thinner layers, weld in two halves, or set the opening of your press or hammer.',
  }),
});
