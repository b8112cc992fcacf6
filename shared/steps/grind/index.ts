import { NO_LOSSES, NO_REMOVAL, cutBar, fromEveryFace, isCutShort } from '../../bar/index.js';
import { stepSchema } from '../field.js';
import { type StepKind, refuseCut } from '../step-kind.js';
import { type Grind, grindFields } from './fields.js';
import { traceGrind } from './trace.js';

export type { Grind } from './fields.js';

export const grind: StepKind<Grind> = {
  kind: 'grind',
  fields: grindFields,
  schema: stepSchema('grind', grindFields),
  usualHeats: 0,
  propose: () => ({ kind: 'grind', perFaceMm: 0.5, faces: 'flats' }),
  forge: (bar, step) => {
    const flats = { ...NO_REMOVAL, bottom: step.perFaceMm, top: step.perFaceMm };
    const cut = cutBar(bar, step.faces === 'flats' ? flats : fromEveryFace(step.perFaceMm));
    if (isCutShort(cut)) return refuseCut(cut, 'perFaceMm');
    return {
      bar: cut.bar,
      lossesMm3: { ...NO_LOSSES, grinding: cut.removedMm3 },
      eatenLayers: { scale: 0, grinding: cut.eatenLayers },
    };
  },
  trace: traceGrind,
  words: {
    name: 'Grind clean',
    purpose: 'Grind scale and decarburised skin off the faces.',
    instruction: (step, format) =>
      `Grind ${format.length(step.perFaceMm)} off ${step.faces === 'flats' ? 'top and bottom' : 'all six faces'}`,
  },
};
