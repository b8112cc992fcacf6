import type { BarState, TraceOp } from '../../bar/index.js';
import type { Fold } from './fields.js';

/** Unfolds the far half. What was ground lies beyond the seam, so nothing has to be put back. */
export function traceFold(_step: Fold, earlier: BarState, later: BarState): readonly TraceOp[] {
  return [{ op: 'fold', halfThicknessMm: later.thicknessMm / 2, lengthMm: earlier.lengthMm }];
}
