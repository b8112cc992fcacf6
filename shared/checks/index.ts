export {
  type Check,
  type Finding,
  WARNING_SEVERITIES,
  type WarningSeverity,
  type WarningValues,
  type WarningWords,
} from './check.js';
export * from './checks.js';
export * from './evaluation.js';
export * from './evaluation-schema.js';
export * from './refusal-words.js';
