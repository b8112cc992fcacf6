export * from './edits/index.js';
export * from './history.js';
export * from './limits.js';
export * from './parse.js';
export * from './schema.js';
export * from './starters/index.js';
export * from './steel-schema.js';
export * from './steel-table.js';
