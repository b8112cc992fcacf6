import type { BarState, TraceOp } from '../../bar/index.js';

/** Turns the section back by 45°. */
export function traceCorner(_step: unknown, { widthMm, thicknessMm }: BarState): readonly TraceOp[] {
  return [{ op: 'corner', widthMm, thicknessMm }];
}
