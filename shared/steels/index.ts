export { CATALOGUE, findSteel } from './catalogue/index.js';
export * from './density.js';
export * from './etch.js';
export * from './steel.js';
