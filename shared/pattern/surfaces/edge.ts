import type { Blank } from '../../design/index.js';
import type { Tracer } from '../tracer.js';
import { bladeOf, forgedStretch } from './blade.js';

/** What a part of the edge is made of. */
export interface EdgeShare {
  readonly steel: string;
  /** Part of the edge's length, 0–1; the shares add up to 1. */
  readonly share: number;
}

/** Places along the edge that are looked at, each at a few heights within the edge's own thickness. */
const PLACES = 400;
const HEIGHTS = 5;

/**
 * Of which steels the edge of the blank is, the greatest share first; empty when the blank lies outside the bar. Looks
 * at the line where the bevels meet, within a tenth of a millimetre of the middle plane.
 */
export function edgeSteels(tracer: Tracer, blank: Blank | undefined): readonly EdgeShare[] {
  const { program } = tracer;
  const blade = bladeOf(blank, program);
  const counts = new Map<string, number>();
  let total = 0;
  for (let h = 0; h < HEIGHTS; h++) {
    const offMm = ((h + 0.5) / HEIGHTS - 0.5) * 0.2;
    let count = 0;
    for (let p = 0; p < PLACES && count < tracer.capacity; p++) {
      const along = (p + 0.5) / PLACES;
      const up = 1 - blade.outline.edgeAt(along);
      const x = blade.nearMm + along * blade.lengthMm;
      const y = blade.leftMm + (blade.isEdgeLeft ? up : 1 - up) * blade.widthMm;
      const z = blade.middleMm + offMm * forgedStretch(blade, blade.halfAt(along, 0));
      if (!isIn(x, program.lengthMm) || !isIn(y, program.widthMm) || !isIn(z, program.thicknessMm)) continue;
      tracer.x[count] = x;
      tracer.y[count] = y;
      tracer.z[count] = z;
      count += 1;
    }
    tracer.run(count);
    for (let i = 0; i < count; i++) {
      const steel = program.steelIds[program.layerSteel[tracer.layer[i] as number] as number] as string;
      counts.set(steel, (counts.get(steel) ?? 0) + 1);
    }
    total += count;
  }
  return [...counts]
    .map(([steel, count]) => ({ steel, share: count / total }))
    .sort((a, b) => b.share - a.share);
}

function isIn(value: number, size: number): boolean {
  return value >= 0 && value <= size;
}
