import type { Fields, StepOf } from '../field.js';

export const trimFields = {
  perEndMm: { type: 'length', label: 'Off each end', min: 0, max: 2_000, initial: 5 },
} as const satisfies Fields;

export type Trim = StepOf<'trim', typeof trimFields>;
