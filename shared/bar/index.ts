export * from './bar-state.js';
export * from './losses.js';
export * from './section.js';
export * from './trace-op.js';
