import type { BarState, TraceOp } from '../../bar/index.js';
import type { Twist } from './fields.js';

/** Untwists: `turns` over the whole length, whichever way, so that reversals share them out. */
export function traceTwist(step: Twist, earlier: BarState): readonly TraceOp[] {
  const { lengthMm, widthMm, thicknessMm } = earlier;
  const hand = step.hand === 'right' ? 1 : -1;
  return [
    {
      op: 'twist',
      widthMm,
      thicknessMm,
      radPerMm: (hand * 2 * Math.PI * step.turns) / lengthMm,
      reversalMm: lengthMm / (step.reversals + 1),
      isReversed: step.reversals > 0,
    },
  ];
}
