import { type Check, type Finding, check, severityAbove } from '../check.js';
import { allWorkedSteps } from '../walk.js';

type Values = { widthMm: number; thicknessMm: number; ratio: number };

/** Longer side to shorter past which a section is no longer near-square, or no section for this work at all. */
const LIMITS = { caution: 1.1, stop: 2 } as const;

const SOURCE =
  'Common practice, no source: sides within a tenth of each other count as square; past two to one a bar buckles';

/** Twisting a bar that isn't square. */
export const twistNotSquare: Check = notSquare(
  'twist',
  'twist-not-square',
  'a flat bar twists unevenly, folds over its edges and tears the outer seams',
);
/** Forging a bar that isn't square on its corners. */
export const cornerNotSquare: Check = notSquare(
  'corner',
  'corner-not-square',
  'on its corners a flat bar leans over and folds instead of becoming square again',
);

function notSquare(kind: 'twist' | 'corner', code: string, reason: string): Check {
  return check<Values>({
    code,
    source: SOURCE,
    find: (forging) =>
      allWorkedSteps(forging).flatMap(({ bar, step, before }): Finding<Values>[] => {
        if (step.kind !== kind) return [];
        const { widthMm, thicknessMm } = before;
        const ratio = Math.max(widthMm, thicknessMm) / Math.min(widthMm, thicknessMm);
        const severity = severityAbove(ratio, LIMITS);
        return severity
          ? [{ severity, bar: bar.id, stepId: step.id, values: { widthMm, thicknessMm, ratio } }]
          : [];
      }),
    words: ({ widthMm, thicknessMm, ratio }, _severity, format) => ({
      message: `The section is ${format.size([widthMm, thicknessMm])}, ${format.number(ratio)} to 1: ${reason}.`,
      remedy: `Draw the bar square first, to about ${format.length(Math.sqrt(widthMm * thicknessMm))} a side${kind === 'twist' ? ', and round its corners' : ''}.`,
    }),
  });
}
