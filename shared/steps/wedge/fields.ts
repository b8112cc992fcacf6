import type { Fields, StepOf } from '../field.js';

export const wedgeFields = {
  dragMm: {
    type: 'length',
    label: 'Drag at the cut',
    hint: 'how far the layers are pulled down',
    min: 0,
    max: 500,
  },
  reachMm: {
    type: 'length',
    label: 'Reach',
    hint: 'distance from the cut at which the drag has fallen to 37 %',
    min: 0.1,
    max: 500,
  },
} as const satisfies Fields;

export type Wedge = StepOf<'wedge', typeof wedgeFields>;
