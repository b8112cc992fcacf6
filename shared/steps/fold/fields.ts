import type { Fields, StepOf } from '../field.js';

export const foldFields = {
  grindPerFaceMm: {
    type: 'length',
    label: 'Grind each face that meets',
    hint: 'left empty: the shop’s seam allowance',
    min: 0,
    max: 50,
    isOptional: true,
  },
} as const satisfies Fields;

export type Fold = StepOf<'fold', typeof foldFields>;
