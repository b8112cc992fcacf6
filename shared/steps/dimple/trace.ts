import type { BarState, TraceOp } from '../../bar/index.js';
import { reliefColumn } from '../relief.js';
import type { Dimple } from './fields.js';

/** Follows each column of metal back to its height before the bar was made flat again. */
export function traceDimple(step: Dimple, earlier: BarState, later: BarState): readonly TraceOp[] {
  if (step.depthMm === 0) return [];
  const { rowPitchMm, layout, seed } = step;
  return [{ op: 'dimple', ...reliefColumn(step, earlier, later), rowPitchMm, layout, seed }];
}
