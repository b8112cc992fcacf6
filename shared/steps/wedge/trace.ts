import type { BarState, TraceOp } from '../../bar/index.js';
import type { Wedge } from './fields.js';

/**
 * Lifts the layers back out of the cut.
 *
 * **Source**: the drawing model Δ = drag · exp(−distance/reach); common practice, no source.
 */
export function traceWedge({ dragMm, reachMm }: Wedge, earlier: BarState): readonly TraceOp[] {
  if (dragMm === 0) return [];
  const { widthMm, thicknessMm } = earlier;
  return [{ op: 'wedge', thicknessMm, middleMm: widthMm / 2, dragMm, reachMm }];
}
