import type { Fields, StepOf } from '../field.js';

export const weldFields = {
  widthMm: { type: 'length', label: 'Press to width', min: 0.1, max: 2_000, isOptional: true },
  thicknessMm: { type: 'length', label: 'Press to thickness', min: 0.1, max: 2_000, isOptional: true },
  method: {
    type: 'choice',
    label: 'Air kept out by',
    hint: 'decides how far the welding range reaches down and whether chromium can weld',
    isOptional: true,
    initial: 'flux',
    options: [
      { value: 'flux', label: 'Flux' },
      { value: 'dry', label: 'Nothing: clean, tight, pressed' },
      { value: 'sealed', label: 'A sealed can or welded seams' },
    ],
  },
} as const satisfies Fields;

export type Weld = StepOf<'weld', typeof weldFields>;
