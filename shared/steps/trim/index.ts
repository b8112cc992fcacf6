import { NO_LOSSES, NO_REMOVAL, cutBar, isCutShort } from '../../bar/index.js';
import { stepSchema } from '../field.js';
import { type StepKind, refuseCut } from '../step-kind.js';
import { type Trim, trimFields } from './fields.js';
import { traceTrim } from './trace.js';

export type { Trim } from './fields.js';

export const trim: StepKind<Trim> = {
  kind: 'trim',
  fields: trimFields,
  schema: stepSchema('trim', trimFields),
  usualHeats: 0,
  propose: () => ({ kind: 'trim', perEndMm: 5 }),
  forge: (bar, step) => {
    const cut = cutBar(bar, { ...NO_REMOVAL, near: step.perEndMm, far: step.perEndMm });
    if (isCutShort(cut)) return refuseCut(cut, 'perEndMm');
    return {
      bar: cut.bar,
      lossesMm3: { ...NO_LOSSES, trim: cut.removedMm3 },
      eatenLayers: { scale: 0, grinding: 0 },
    };
  },
  trace: traceTrim,
  words: {
    name: 'Trim the ends',
    purpose: 'Crop ragged or unwelded ends.',
    instruction: (step, format) => `Crop ${format.length(step.perEndMm)} off each end`,
  },
};
