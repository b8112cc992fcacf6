import type { Fields, StepOf } from '../field.js';

export const grindFields = {
  perFaceMm: { type: 'length', label: 'Off each face', min: 0, max: 200, initial: 0.5 },
  faces: {
    type: 'choice',
    label: 'Faces',
    initial: 'flats',
    options: [
      { value: 'flats', label: 'The flats: top and bottom' },
      { value: 'all', label: 'All six faces' },
    ],
  },
} as const satisfies Fields;

export type Grind = StepOf<'grind', typeof grindFields>;
