import type { BarState, TraceOp } from '../../bar/index.js';
import type { Allowances } from '../step-kind.js';
import type { Slice } from './fields.js';

/** Stands each slice back up where it was cut from. */
export function traceSlice(
  step: Slice,
  earlier: BarState,
  later: BarState,
  allowances: Allowances,
): readonly TraceOp[] {
  return [
    {
      op: 'slice',
      count: step.count,
      tileMm: earlier.thicknessMm,
      stepMm: later.thicknessMm + allowances.kerfMm,
      widthMm: earlier.widthMm,
      isTurned: step.turnAlternate,
    },
  ];
}
