import type { Design } from '../../design/index.js';
import {
  type StepPlan,
  LOSSLESS,
  alternating,
  barFrom,
  designOf,
  stackOf,
} from '../../forging/testing/designs.js';

/** Fifteen layers, folded so many times, drawn back to 40 × 12 mm after each fold. Nothing is lost, so that any number of folds can be done. */
export function foldedDesign(folds: number): Design {
  const plans: StepPlan[] = [];
  for (let i = 0; i < folds; i++) {
    plans.push({ kind: 'fold' }, { kind: 'draw', widthMm: 40, thicknessMm: 12 });
  }
  const start = stackOf(alternating(15, ['1084', '15n20'], [0.8, 0.8]), 300, 40);
  return designOf([barFrom('billet', start, plans)], { allowances: LOSSLESS });
}
