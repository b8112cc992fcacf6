import { stepSchema } from '../field.js';
import { forgeRelief } from '../relief.js';
import type { StepKind } from '../step-kind.js';
import { type Groove, grooveFields } from './fields.js';
import { grooveVolumeMm3 } from './volume.js';
import { traceGroove } from './trace.js';

export type { Groove } from './fields.js';

export const groove: StepKind<Groove> = {
  kind: 'groove',
  fields: grooveFields,
  schema: stepSchema('groove', grooveFields),
  usualHeats: 2,
  // A third of the thickness from each side: common practice, no source.
  propose: (bar) => ({
    kind: 'groove',
    heats: 2,
    pitchMm: 12,
    depthMm: Math.max(0.1, Math.round(bar.thicknessMm * 2.5) / 10),
    radiusMm: 4,
    angleDeg: 0,
    faces: 'bothStaggered',
    finish: 'forgeFlat',
  }),
  forge: (bar, step) => forgeRelief(bar, step, (state, isShifted) => grooveVolumeMm3(state, step, isShifted)),
  trace: traceGroove,
  words: {
    name: 'Groove (ladder)',
    purpose: 'Cut or press grooves across the bar and make it flat again: the layers show as rungs.',
    instruction: (step, format) =>
      `${step.finish === 'forgeFlat' ? 'Cut' : 'Press'} grooves ${format.length(step.depthMm)} deep every ${format.length(step.pitchMm)}, ` +
      `${facesWords[step.faces]}, then ${step.finish === 'forgeFlat' ? 'forge' : 'grind'} flat`,
  },
};

const facesWords = {
  top: 'on top',
  bothStaggered: 'on both faces half a pitch apart',
  bothOpposed: 'on both faces opposite each other',
} as const;
