import type { Layer } from '../design/index.js';

/** Layers that repeat: the group from the bottom, and how often it is laid. */
export interface RecipeLine {
  readonly times: number;
  readonly layers: readonly Layer[];
}

/** The longest group that is looked for. */
const LONGEST_GROUP = 12;

/**
 * A stack in the few lines one would call across the shop: "6 × (1084, 15N20), then 1084".
 * At each place the group that covers most layers by repeating is taken; what doesn't repeat stands by itself.
 */
export function stackRecipe(layers: readonly Layer[]): readonly RecipeLine[] {
  const lines: RecipeLine[] = [];
  let at = 0;
  while (at < layers.length) {
    const { size, times } = bestGroup(layers, at);
    lines.push({ times, layers: layers.slice(at, at + size) });
    at += size * times;
  }
  return lines;
}

function bestGroup(layers: readonly Layer[], from: number): { size: number; times: number } {
  let best = { size: 1, times: 1 };
  for (let size = 1; size <= Math.min(LONGEST_GROUP, (layers.length - from) / 2); size++) {
    let times = 1;
    while (isRepeated(layers, from, size, times)) times += 1;
    if (times > 1 && size * times > best.size * best.times) best = { size, times };
  }
  return best;
}

function isRepeated(layers: readonly Layer[], from: number, size: number, times: number): boolean {
  for (let i = 0; i < size; i++) {
    const first = layers[from + i];
    const again = layers[from + times * size + i];
    if (!first || !again || first.steel !== again.steel || first.thicknessMm !== again.thicknessMm)
      return false;
  }
  return true;
}
