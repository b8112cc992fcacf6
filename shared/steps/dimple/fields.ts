import type { Fields, StepOf } from '../field.js';
import { RELIEF_FACES, RELIEF_FINISHES } from '../relief.js';

export const dimpleFields = {
  pitchMm: { type: 'length', label: 'Pitch along the bar', min: 1, max: 500, initial: 10 },
  rowPitchMm: { type: 'length', label: 'Pitch across the bar', min: 1, max: 500, initial: 10 },
  depthMm: { type: 'length', label: 'Depth', min: 0, max: 100 },
  radiusMm: { type: 'length', label: 'Ball radius', min: 0.2, max: 100, initial: 5 },
  layout: {
    type: 'choice',
    label: 'Layout',
    initial: 'staggered',
    options: [
      { value: 'square', label: 'In rows and columns' },
      { value: 'staggered', label: 'Every second row half a pitch along' },
      { value: 'scattered', label: 'Scattered' },
    ],
  },
  seed: {
    type: 'number',
    label: 'Seed of the scatter',
    hint: 'another number, another scatter',
    min: 0,
    max: 2_147_483_647,
    isWhole: true,
    unit: '',
    initial: 1,
  },
  faces: { type: 'choice', label: 'Faces', initial: 'bothStaggered', options: RELIEF_FACES },
  finish: { type: 'choice', label: 'Finish', initial: 'forgeFlat', options: RELIEF_FINISHES },
} as const satisfies Fields;

export type Dimple = StepOf<'dimple', typeof dimpleFields>;
