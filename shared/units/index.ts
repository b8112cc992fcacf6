export * from './format.js';
export * from './length-format.js';
export * from './length-parse.js';
export {
  formatCount,
  formatNumber,
  joinParts,
  type NumberOptions,
  type QuantityParts,
} from './number-text.js';
export * from './quantity-format.js';
export * from './quantity-parse.js';
export { type Refusal } from './typed-text.js';
export * from './unit-system.js';
