import { stepSchema } from '../field.js';
import type { StepKind } from '../step-kind.js';
import { type Restack, restackFields } from './fields.js';
import { restackBar } from './forge.js';
import { traceRestack } from './trace.js';

export type { Restack } from './fields.js';

export const restack: StepKind<Restack> = {
  kind: 'restack',
  fields: restackFields,
  schema: stepSchema('restack', restackFields),
  usualHeats: 0,
  propose: () => ({ kind: 'restack', pieces: 4, turnAlternate: false }),
  forge: restackBar,
  trace: traceRestack,
  words: {
    name: 'Restack',
    purpose: 'Cut the bar across into equal lengths, clean the faces and stack them: the layers multiply.',
    instruction: (step, format) =>
      [
        `Cut into ${format.count(step.pieces)} equal lengths`,
        step.grindPerFaceMm === undefined
          ? 'clean the faces'
          : `grind ${format.length(step.grindPerFaceMm)} off each face`,
        step.turnAlternate ? 'stack, every second one turned over' : 'stack the same way up',
      ].join(', '),
  },
};
