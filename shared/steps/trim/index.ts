import { NO_LOSSES, NO_REMOVAL, cutBar, isCutShort } from '../../bar/index.js';
import { type Fields, type StepOf, stepSchema } from '../field.js';
import { type StepKind, refuseCut } from '../step-kind.js';

const trimFields = {
  perEndMm: { type: 'length', label: 'Off each end', min: 0, max: 2_000, initial: 5 },
} as const satisfies Fields;

export type Trim = StepOf<'trim', typeof trimFields>;

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
  words: {
    name: 'Trim the ends',
    purpose: 'Crop ragged or unwelded ends.',
    instruction: (step, format) => `Crop ${format.length(step.perEndMm)} off each end`,
  },
};
