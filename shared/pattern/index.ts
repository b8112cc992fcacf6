export { type Moment, compile } from './program/compile.js';
export { type Program, entryOps } from './program/program.js';
export { referenceTracer } from './reference/tracer.js';
export type { Engine, Tracer } from './tracer.js';
