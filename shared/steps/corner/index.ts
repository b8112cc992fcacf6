import { stepSchema, type StepOf } from '../field.js';
import { type StepKind, forgedTo } from '../step-kind.js';
import { turnedInSection } from '../twist/index.js';
import { traceCorner } from './trace.js';

export type Corner = StepOf<'corner', Record<never, never>>;

export const corner: StepKind<Corner> = {
  kind: 'corner',
  fields: {},
  schema: stepSchema('corner', {}),
  usualHeats: 3,
  propose: () => ({ kind: 'corner', heats: 3 }),
  forge: (bar) => forgedTo(turnedInSection(bar)),
  trace: traceCorner,
  words: {
    name: 'Forge on the corners',
    purpose:
      'Forge a square bar on its corners until they are the new flats: the layers lie on the diagonal.',
    instruction: () => 'Forge on the corners until they are the new flats',
  },
};
