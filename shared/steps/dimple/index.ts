import { stepSchema } from '../field.js';
import { forgeRelief } from '../relief.js';
import type { StepKind } from '../step-kind.js';
import { type Dimple, dimpleFields } from './fields.js';
import { dimpleVolumeMm3 } from './volume.js';
import { traceDimple } from './trace.js';

export type { Dimple } from './fields.js';
export { dimpleMiddle, latticeHash } from './lattice.js';

export const dimple: StepKind<Dimple> = {
  kind: 'dimple',
  fields: dimpleFields,
  schema: stepSchema('dimple', dimpleFields),
  usualHeats: 2,
  // A quarter of the thickness: common practice, no source.
  propose: (bar) => ({
    kind: 'dimple',
    heats: 2,
    pitchMm: 10,
    rowPitchMm: 10,
    depthMm: Math.max(0.1, Math.round(bar.thicknessMm * 2.5) / 10),
    radiusMm: 5,
    layout: 'staggered',
    seed: 1,
    faces: 'bothStaggered',
    finish: 'forgeFlat',
  }),
  forge: (bar, step) => forgeRelief(bar, step, (state, isShifted) => dimpleVolumeMm3(state, step, isShifted)),
  trace: traceDimple,
  words: {
    name: 'Dimple (raindrop)',
    purpose: 'Drill or press round pits and make the bar flat again: the layers show as rings.',
    instruction: (step, format) =>
      `${step.finish === 'forgeFlat' ? 'Drill' : 'Press'} round pits ${format.length(step.depthMm)} deep, ` +
      `${format.length(step.pitchMm)} × ${format.length(step.rowPitchMm)} apart, ` +
      `${step.faces === 'top' ? 'on top' : 'on both faces'}, then ${step.finish === 'forgeFlat' ? 'forge' : 'grind'} flat`,
  },
};
