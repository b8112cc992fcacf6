export * from './allowances.js';
export type {
  ChoiceField,
  Field,
  FieldData,
  Fields,
  FlagField,
  LengthField,
  NumberField,
  StepBase,
  StepOf,
} from './field.js';
export { dimpleMiddle, latticeHash } from './dimple/index.js';
export { rimRadiusMm, roundDepthMm } from './relief.js';
export type { ReliefFaces, ReliefFinish } from './relief.js';
export * from './step-kind.js';
export * from './table.js';
export { traceStep } from './trace.js';
export type { Corner } from './corner/index.js';
export type { Dimple } from './dimple/index.js';
export type { Draw } from './draw/index.js';
export type { Fold } from './fold/index.js';
export type { Grind } from './grind/index.js';
export type { Groove } from './groove/index.js';
export type { Restack } from './restack/index.js';
export type { Slice } from './slice/index.js';
export type { Trim } from './trim/index.js';
export type { Turn } from './turn/index.js';
export type { Twist } from './twist/index.js';
export type { Wedge } from './wedge/index.js';
export type { Weld } from './weld/index.js';
