import { quarterTurned, stoodOnEnd } from '../../bar/index.js';
import { stepSchema } from '../field.js';
import { type StepKind, forgedTo } from '../step-kind.js';
import { type Turn, turnFields } from './fields.js';
import { traceTurn } from './trace.js';

export type { Turn } from './fields.js';

export const turn: StepKind<Turn> = {
  kind: 'turn',
  fields: turnFields,
  schema: stepSchema('turn', turnFields),
  usualHeats: 0,
  propose: () => ({ kind: 'turn', onto: 'edge' }),
  forge: (bar, step) => forgedTo(step.onto === 'edge' ? quarterTurned(bar) : stoodOnEnd(bar)),
  trace: traceTurn,
  words: {
    name: 'Turn',
    purpose: 'Lay the bar another way round, so that the next step works on its edge or its end.',
    instruction: (step) =>
      step.onto === 'edge'
        ? 'Turn a quarter about its length, the top to the right'
        : 'Stand it on end, the near end to the top',
  },
};
