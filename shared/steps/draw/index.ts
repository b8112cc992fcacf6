import type { Format } from '../../units/index.js';
import { stepSchema } from '../field.js';
import type { StepKind } from '../step-kind.js';
import { type Draw, drawFields } from './fields.js';
import { type TargetSize, drawTo } from './forge.js';
import { traceDraw } from './trace.js';

export { drawTo, type TargetSize } from './forge.js';
export type { Draw } from './fields.js';
export { traceDraw } from './trace.js';

export const draw: StepKind<Draw> = {
  kind: 'draw',
  fields: drawFields,
  schema: stepSchema('draw', drawFields),
  usualHeats: 3,
  propose: (bar) => ({ kind: 'draw', heats: 3, thicknessMm: Math.max(1, Math.round(bar.thicknessMm / 2)) }),
  forge: (bar, step) => drawTo(bar, step),
  trace: traceDraw,
  words: {
    name: 'Draw out',
    purpose:
      'Make the bar longer or wider and thinner; the volume stays. Give one or two sizes, the rest follows.',
    instruction: (step, format) => {
      const sides = sizeWords(step, format);
      return sides ? `Draw to ${sides}` : 'Heat without changing the size';
    },
  },
};

/** "300 mm long, 40 mm wide", or nothing when no side is given. */
export function sizeWords(target: TargetSize, format: Format): string {
  const sides = [
    target.lengthMm !== undefined && `${format.length(target.lengthMm)} long`,
    target.widthMm !== undefined && `${format.length(target.widthMm)} wide`,
    target.thicknessMm !== undefined && `${format.length(target.thicknessMm)} thick`,
  ];
  return sides.filter(Boolean).join(', ');
}
