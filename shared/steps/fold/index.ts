import { stepSchema } from '../field.js';
import type { StepKind } from '../step-kind.js';
import { type Fold, foldFields } from './fields.js';
import { foldBar } from './forge.js';
import { traceFold } from './trace.js';

export type { Fold } from './fields.js';

export const fold: StepKind<Fold> = {
  kind: 'fold',
  fields: foldFields,
  schema: stepSchema('fold', foldFields),
  usualHeats: 1,
  propose: () => ({ kind: 'fold', heats: 1 }),
  forge: foldBar,
  trace: traceFold,
  words: {
    name: 'Fold',
    purpose:
      'Cut half through at mid-length and hinge the far half over onto the near one; the top faces meet.',
    instruction: (step, format) =>
      step.grindPerFaceMm === undefined
        ? 'Clean the top face, hot cut at mid-length and fold it onto itself'
        : `Grind ${format.length(step.grindPerFaceMm)} off the top face, hot cut at mid-length and fold it onto itself`,
  },
};
