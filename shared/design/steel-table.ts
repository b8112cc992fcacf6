import { type Steel, findSteel } from '../steels/index.js';
import type { Design } from './schema.js';

/** The steel an id stands for in a design: its own snapshot first, then the catalogue. */
export function steelOf(design: Pick<Design, 'steels'>, steelId: string): Steel | undefined {
  return design.steels?.find((steel) => steel.id === steelId) ?? findSteel(steelId);
}

/** Ids of the steels a design lays, in the order of first appearance (bars, then layers from the bottom). */
export function steelIdsOf(design: Pick<Design, 'bars'>): readonly string[] {
  const ids = new Set<string>();
  for (const bar of design.bars) {
    if (bar.start.kind === 'stack') for (const layer of bar.start.layers) ids.add(layer.steel);
  }
  return [...ids];
}
