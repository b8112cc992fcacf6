import { isWeldingStep } from '../../metallurgy/index.js';
import { type Finding, check } from '../check.js';
import { allWorkedSteps, firstOfEach } from '../walk.js';

type Values = { lengthMm: number; forgeMm: number; isWeld: 'yes' | 'no' };

/** A bar heated that is longer than the forge; said at the first weld and the first other step of each bar. */
export const longerThanForge = check<Values>({
  code: 'longer-than-forge',
  source:
    'The shop’s limit. Where the design sets none: common practice, no source, a two-burner forge heats a bar of about 500 mm',
  find: (forging) => {
    const forgeMm = forging.limits.forgeLengthMm;
    const findings = allWorkedSteps(forging).flatMap(({ bar, step, before, after }): Finding<Values>[] => {
      const isWeld = isWeldingStep(step);
      // A bar that grows in a step is heated at nearly its final length in the last of several heats.
      const lengthMm =
        after.heats > 1 && step.kind === 'draw'
          ? Math.max(before.lengthMm, after.bar.lengthMm)
          : before.lengthMm;
      if (after.heats === 0 || lengthMm <= forgeMm) return [];
      const values: Values = { lengthMm, forgeMm, isWeld: isWeld ? 'yes' : 'no' };
      return [{ severity: isWeld ? 'caution' : 'note', bar: bar.id, stepId: step.id, values }];
    });
    return firstOfEach(findings, ({ bar, severity }) => `${bar}/${severity}`);
  },
  words: ({ lengthMm, forgeMm, isWeld }, _severity, format) => ({
    message:
      `The bar is ${format.length(lengthMm)} long, the forge heats ${format.length(forgeMm)}: ` +
      (isWeld === 'yes'
        ? 'its seams don’t come to heat together, and what was welded cools and oxidises while the rest is heated.'
        : 'it has to be heated and worked in sections.'),
    remedy:
      isWeld === 'yes'
        ? 'Make the stack shorter and thicker, cut the bar, or weld from one end with overlapping heats and flux the open seams again.'
        : 'Plan more heats, or cut the bar into shorter lengths.',
  }),
});
