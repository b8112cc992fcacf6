/**
 * Index of the layer at height `z`, within a stack whose tops lie in `tops` from `first` on. A border belongs to the
 * layer above it; heights outside belong to the outermost layers.
 */
export function layerAt(tops: Float64Array, first: number, count: number, z: number): number {
  let low = first;
  let high = first + count - 1;
  while (low < high) {
    const middle = (low + high) >> 1;
    if (z >= (tops[middle] as number)) low = middle + 1;
    else high = middle;
  }
  return low;
}
