import type { Dimple } from './fields.js';

/** How far a scattered dimple may stray from its place in the lattice, as a part of each pitch. */
const STRAY = 0.35;

/**
 * Middle of the dimple in column `i` and row `j` of the lattice, mm: x from the near end, y from mid-width.
 * Columns lie at (i + ½)·pitch, shifted patterns half a pitch along, odd rows of a staggered layout too.
 */
export function dimpleMiddle(
  step: Dimple,
  isShifted: boolean,
  i: number,
  j: number,
): { x: number; y: number } {
  const isOddRow = Math.abs(j % 2) === 1;
  const along = i + 0.5 + (isShifted ? 0.5 : 0) + (step.layout === 'staggered' && isOddRow ? 0.5 : 0);
  if (step.layout !== 'scattered') return { x: along * step.pitchMm, y: j * step.rowPitchMm };
  const hash = latticeHash(step.seed, i, j, isShifted ? 1 : 0);
  const dx = ((hash & 0xffff) / 0xffff - 0.5) * 2 * STRAY;
  const dy = ((hash >>> 16) / 0xffff - 0.5) * 2 * STRAY;
  return { x: (along + dx) * step.pitchMm, y: (j + dy) * step.rowPitchMm };
}

/** A well-mixed unsigned 32-bit number for a place in the lattice; integer arithmetic alone, the same on every engine. */
export function latticeHash(seed: number, i: number, j: number, face: number): number {
  let h = Math.imul(seed ^ 0x9e3779b9, 0x85ebca6b);
  h = Math.imul(h ^ (i | 0), 0xc2b2ae35);
  h ^= h >>> 15;
  h = Math.imul(h ^ (j | 0), 0x27d4eb2f);
  h ^= h >>> 13;
  h = Math.imul(h ^ face, 0x165667b1);
  h ^= h >>> 16;
  return h >>> 0;
}
