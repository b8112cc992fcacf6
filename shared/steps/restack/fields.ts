import type { Fields, StepOf } from '../field.js';

export const restackFields = {
  pieces: { type: 'number', label: 'Pieces', min: 2, max: 12, isWhole: true, unit: '', initial: 4 },
  turnAlternate: {
    type: 'flag',
    label: 'Turn every second piece over',
    hint: 'about its length, so that like faces meet',
    initial: false,
  },
  grindPerFaceMm: {
    type: 'length',
    label: 'Grind each face',
    hint: 'left empty: the shop’s seam allowance',
    min: 0,
    max: 50,
    isOptional: true,
  },
} as const satisfies Fields;

export type Restack = StepOf<'restack', typeof restackFields>;
