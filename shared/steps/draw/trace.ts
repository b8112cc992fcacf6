import { type BarState, type TraceOp, resizedBack } from '../../bar/index.js';

/** Back to the size before, and before that to where the hammer had moved the layers. */
export function traceDraw(_step: unknown, earlier: BarState, later: BarState): readonly TraceOp[] {
  const { lengthMm, widthMm, thicknessMm } = later;
  const isSameSize =
    lengthMm === earlier.lengthMm && widthMm === earlier.widthMm && thicknessMm === earlier.thicknessMm;
  if (isSameSize) return [];
  return [{ op: 'uneven', lengthMm, widthMm, thicknessMm }, resizedBack(later, earlier)];
}
