import type { Fields, StepOf } from '../field.js';

export const turnFields = {
  onto: {
    type: 'choice',
    label: 'Turn onto',
    initial: 'edge',
    options: [
      { value: 'edge', label: 'Its edge: the top goes to the right' },
      { value: 'end', label: 'Its end: the near end goes to the top' },
    ],
  },
} as const satisfies Fields;

export type Turn = StepOf<'turn', typeof turnFields>;
