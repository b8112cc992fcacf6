import { type BarState, type TraceOp, quarterTurnBack, standingBack } from '../../bar/index.js';
import type { Turn } from './fields.js';

/** Turns the bar back. */
export function traceTurn(step: Turn, _earlier: BarState, later: BarState): readonly TraceOp[] {
  return [step.onto === 'edge' ? quarterTurnBack(later.thicknessMm) : standingBack(later.thicknessMm)];
}
