export {
  BLADE_BEVELS,
  BLADE_GRINDS,
  BLADE_OUTLINES,
  type BladeBevels,
  type BladeGrind,
  type BladeOutlineName,
  type Blank,
  type DrawnOutline,
  type OutlinePoint,
} from './blank.js';
export * from './edits/index.js';
export * from './history.js';
export * from './limits.js';
export * from './parse.js';
export * from './schema.js';
export * from './starters/index.js';
export * from './steel-schema.js';
export * from './steel-table.js';
