import type { Fields, StepOf } from '../field.js';

export const twistFields = {
  turns: {
    type: 'number',
    label: 'Turns over the whole length',
    min: 0.01,
    max: 500,
    isWhole: false,
    unit: '',
    initial: 8,
  },
  hand: {
    type: 'choice',
    label: 'Hand',
    initial: 'right',
    options: [
      { value: 'right', label: 'Right' },
      { value: 'left', label: 'Left' },
    ],
  },
  reversals: {
    type: 'number',
    label: 'Reversals',
    hint: 'how often the direction changes, at equal distances',
    min: 0,
    max: 20,
    isWhole: true,
    unit: '',
    initial: 0,
  },
} as const satisfies Fields;

export type Twist = StepOf<'twist', typeof twistFields>;
