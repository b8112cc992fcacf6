import { stepSchema } from '../field.js';
import { type StepKind, forgedTo, refuse } from '../step-kind.js';
import { type Wedge, wedgeFields } from './fields.js';
import { traceWedge } from './trace.js';

export type { Wedge } from './fields.js';

export const wedge: StepKind<Wedge> = {
  kind: 'wedge',
  fields: wedgeFields,
  schema: stepSchema('wedge', wedgeFields),
  usualHeats: 2,
  // Drag 0.3–0.6 of the wedge's travel, reach 0.2–0.4 of the half-width: common practice, no source.
  propose: (bar) => ({
    kind: 'wedge',
    heats: 2,
    dragMm: Math.round(bar.thicknessMm * 4) / 10,
    reachMm: Math.max(0.5, Math.round(bar.widthMm * 1.5) / 10),
  }),
  // The layers move along their own normal, column by column, so they keep their lie and their number.
  forge: (bar, step) =>
    step.dragMm >= bar.thicknessMm
      ? refuse('cut-too-deep', 'dragMm', step.dragMm, bar.thicknessMm)
      : forgedTo({ ...bar, openSeams: bar.openSeams + 1 }),
  trace: traceWedge,
  words: {
    name: 'Split with the wedge',
    purpose:
      'Split the bar lengthwise with a blunt wedge and weld it shut again: the layers are dragged into a feather.',
    instruction: (step, format) =>
      `Split down the middle of the width with a blunt wedge (drag ${format.length(step.dragMm)}, reach ${format.length(step.reachMm)}), weld shut`,
  },
};
