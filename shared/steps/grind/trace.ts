import { NO_REMOVAL, type TraceOp, fromEveryFace, removalBack } from '../../bar/index.js';
import type { Grind } from './fields.js';

/** Puts back what was ground off. */
export function traceGrind({ perFaceMm, faces }: Grind): readonly TraceOp[] {
  return [removalBack(faces === 'flats' ? { ...NO_REMOVAL, bottom: perFaceMm } : fromEveryFace(perFaceMm))];
}
