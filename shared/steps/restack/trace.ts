import { type BarState, NO_REMOVAL, type TraceOp, removalBack } from '../../bar/index.js';
import type { Allowances } from '../step-kind.js';
import type { Restack } from './fields.js';

/** Down into the piece, along to where it was cut from, and into what was ground off its faces. */
export function traceRestack(
  step: Restack,
  earlier: BarState,
  later: BarState,
  allowances: Allowances,
): readonly TraceOp[] {
  const groundMm = step.grindPerFaceMm ?? allowances.seamGrindMm;
  return [
    {
      op: 'restack',
      pieces: step.pieces,
      pieceThicknessMm: later.thicknessMm / step.pieces,
      stepMm: later.lengthMm + allowances.kerfMm,
      widthMm: earlier.widthMm,
      isTurned: step.turnAlternate,
    },
    removalBack({ ...NO_REMOVAL, bottom: groundMm }),
  ];
}
