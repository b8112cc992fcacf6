import type { BarState, TraceOp } from '../../bar/index.js';
import { reliefColumn } from '../relief.js';
import type { Groove } from './fields.js';

/** Follows each column of metal back to its height before the bar was made flat again. */
export function traceGroove(step: Groove, earlier: BarState, later: BarState): readonly TraceOp[] {
  if (step.depthMm === 0) return [];
  return [{ op: 'groove', ...reliefColumn(step, earlier, later), slantRad: (step.angleDeg * Math.PI) / 180 }];
}
