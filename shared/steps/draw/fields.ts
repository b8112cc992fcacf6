import type { Fields, StepOf } from '../field.js';

export const drawFields = {
  lengthMm: { type: 'length', label: 'To length', min: 0.1, max: 20_000, isOptional: true },
  widthMm: { type: 'length', label: 'To width', min: 0.1, max: 2_000, isOptional: true },
  thicknessMm: { type: 'length', label: 'To thickness', min: 0.1, max: 2_000, isOptional: true },
} as const satisfies Fields;

export type Draw = StepOf<'draw', typeof drawFields>;
