import { stepSchema } from '../field.js';
import type { StepKind } from '../step-kind.js';
import { type Slice, sliceFields } from './fields.js';
import { sliceBar } from './forge.js';
import { traceSlice } from './trace.js';

export type { Slice } from './fields.js';

export const slice: StepKind<Slice> = {
  kind: 'slice',
  fields: sliceFields,
  schema: stepSchema('slice', sliceFields),
  usualHeats: 0,
  propose: (bar) => {
    const sliceMm = Math.min(6, Math.max(0.5, bar.lengthMm / 10));
    return {
      kind: 'slice',
      sliceMm,
      count: Math.max(1, Math.min(8, Math.floor(bar.lengthMm / (sliceMm + 2)))),
      turnAlternate: false,
    };
  },
  forge: sliceBar,
  trace: traceSlice,
  words: {
    name: 'Slice across',
    purpose: 'Cut slices off the end and lay them in a row, end grain up.',
    instruction: (step, format) =>
      `Cut ${format.count(step.count)} slices of ${format.length(step.sliceMm)} and lay them in a row, end grain up` +
      (step.turnAlternate ? ', every second one turned half round' : ''),
  },
};
