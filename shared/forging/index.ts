export { type Overhang, assemble, pieceOfBar, placed } from './assembly.js';
export { type CutPlan, cutPlanOf } from './cut-plan.js';
export { evaluate, forgeStep } from './evaluate.js';
export * from './forging.js';
export { type State, figuresOf } from './state.js';
export { unaccountedKg } from './totals.js';
