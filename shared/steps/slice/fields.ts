import type { Fields, StepOf } from '../field.js';

export const sliceFields = {
  sliceMm: { type: 'length', label: 'Thickness of a slice', min: 0.5, max: 500 },
  count: { type: 'number', label: 'Slices', min: 1, max: 200, isWhole: true, unit: '', initial: 8 },
  turnAlternate: {
    type: 'flag',
    label: 'Turn every second slice half round',
    hint: 'in its plane, so that the picture runs through',
    initial: false,
  },
} as const satisfies Fields;

export type Slice = StepOf<'slice', typeof sliceFields>;
