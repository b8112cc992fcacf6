import { NO_REMOVAL, type TraceOp, removalBack } from '../../bar/index.js';
import type { Trim } from './fields.js';

/** Puts the near end back on. */
export function traceTrim({ perEndMm }: Trim): readonly TraceOp[] {
  return [removalBack({ ...NO_REMOVAL, near: perEndMm })];
}
