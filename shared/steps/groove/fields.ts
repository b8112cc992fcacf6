import type { Fields, StepOf } from '../field.js';
import { RELIEF_FACES, RELIEF_FINISHES } from '../relief.js';

export const grooveFields = {
  pitchMm: {
    type: 'length',
    label: 'Pitch',
    hint: 'from groove to groove along the bar',
    min: 1,
    max: 500,
    initial: 12,
  },
  depthMm: { type: 'length', label: 'Depth', min: 0, max: 100 },
  radiusMm: { type: 'length', label: 'Bottom radius', min: 0.2, max: 100, initial: 4 },
  angleDeg: {
    type: 'number',
    label: 'Slant',
    hint: '0 is straight across the bar',
    min: -75,
    max: 75,
    isWhole: false,
    unit: '°',
    initial: 0,
  },
  faces: { type: 'choice', label: 'Faces', initial: 'bothStaggered', options: RELIEF_FACES },
  finish: { type: 'choice', label: 'Finish', initial: 'forgeFlat', options: RELIEF_FINISHES },
} as const satisfies Fields;

export type Groove = StepOf<'groove', typeof grooveFields>;
