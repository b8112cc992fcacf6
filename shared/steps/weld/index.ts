import { drawTo, sizeWords } from '../draw/index.js';
import { stepSchema } from '../field.js';
import { type StepKind, isRefused } from '../step-kind.js';
import { type Weld, weldFields } from './fields.js';
import { traceWeld } from './trace.js';

export type { Weld } from './fields.js';

export const weld: StepKind<Weld> = {
  kind: 'weld',
  fields: weldFields,
  schema: stepSchema('weld', weldFields),
  usualHeats: 2,
  propose: () => ({ kind: 'weld', heats: 2 }),
  forge: (bar, step) => {
    const pressed = drawTo(bar, { widthMm: step.widthMm, thicknessMm: step.thicknessMm });
    return isRefused(pressed) ? pressed : { ...pressed, bar: { ...pressed.bar, openSeams: 0 } };
  },
  trace: traceWeld,
  words: {
    name: 'Forge weld',
    purpose: 'Set the seams of what was put together; with a size, press it to that size as well.',
    instruction: (step, format) => {
      const size = sizeWords(step, format);
      return size ? `Weld, press to ${size}` : 'Weld every seam';
    },
  },
};
