import type { StepKindName } from '../../steps/index.js';
import { type Finding, check } from '../check.js';
import { counted } from '../say.js';
import { lastStepId, resultBar, workedSteps } from '../walk.js';

type Values = { seams: number; work: StepKindName | 'end' };

/** Work under which a loose stack shifts, opens or falls apart. */
const LOOSE_FAILS: ReadonlySet<StepKindName> = new Set<StepKindName>([
  'draw',
  'restack',
  'fold',
  'twist',
  'groove',
  'dimple',
  'wedge',
  'corner',
  'slice',
]);

/** Seams put together that no weld sets before the bar is worked, or at all. */
export const seamsOpen = check<Values>({
  code: 'seams-open',
  source:
    'Common practice, no source: every seam is set at welding heat, lightly, before the bar is drawn, twisted or cut',
  find: (forging) => {
    const result = resultBar(forging);
    return forging.bars.flatMap((bar): Finding<Values>[] => {
      const findings: Finding<Values>[] = [];
      let isTold = false;
      for (const { step, before, after } of workedSteps(bar)) {
        if (!isTold && before.openSeams > 0 && LOOSE_FAILS.has(step.kind)) {
          isTold = true;
          findings.push({
            severity: 'caution',
            bar: bar.id,
            stepId: step.id,
            values: { seams: before.openSeams, work: step.kind },
          });
        }
        if (after.bar.openSeams === 0) isTold = false;
      }
      const open = forging.result?.bar.openSeams ?? 0;
      if (bar === result && open > 0 && !isTold && lastStepId(bar) !== null) {
        const values: Values = { seams: open, work: 'end' };
        findings.push({ severity: 'note', bar: bar.id, stepId: lastStepId(bar), values });
      }
      return findings;
    });
  },
  words: ({ seams, work }, _severity, format) => {
    const open = counted(seams, 'seam is', 'seams are', format);
    return work === 'end'
      ? {
          message: `${open} put together at the end and never welded: the bar is still a loose stack.`,
          remedy: 'Add a weld.',
        }
      : {
          message: `${open} put together but not welded before this step: loose layers slide, gape and oxidise when they are ${WORK_WORDS[work]}.`,
          remedy: 'Put a weld before this step.',
        };
  },
});

const WORK_WORDS: Readonly<Record<StepKindName, string>> = {
  weld: 'pressed',
  draw: 'drawn out',
  restack: 'cut and restacked',
  fold: 'folded',
  turn: 'turned',
  twist: 'twisted',
  groove: 'grooved',
  dimple: 'dimpled',
  wedge: 'split',
  corner: 'forged on the corners',
  slice: 'sliced',
  grind: 'ground',
  trim: 'trimmed',
};
