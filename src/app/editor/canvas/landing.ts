import { type StackGeometry, seamMm, thicknessOf } from './stack-geometry';

/**
 * Where layers that are carried over a stack would come to lie: the place of the layer that they go before, or the
 * number of layers for the top. The middle of each layer decides, as the stack was when they were taken up.
 * @param upMm height of the pointer over the bottom, mm
 */
export function landingPlace(geometry: StackGeometry, upMm: number): number {
  let low = 0;
  let high = geometry.count;
  while (low < high) {
    const mid = (low + high) >> 1;
    if (seamMm(geometry, mid) + thicknessOf(geometry, mid) / 2 <= upMm) low = mid + 1;
    else high = mid;
  }
  return low;
}

/** Whether moving `places` to before `to` would leave everything as it is. */
export function staysPut(places: ReadonlySet<number>, to: number): boolean {
  if (places.size === 0) return true;
  const first = Math.min(...places);
  const last = Math.max(...places);
  return last - first + 1 === places.size && to >= first && to <= last + 1;
}

/** The places that moved layers have after they were put before `to`: they lie together. */
export function placesAfterMove(places: ReadonlySet<number>, to: number): ReadonlySet<number> {
  const below = [...places].filter((place) => place < to).length;
  const first = to - below;
  return new Set(Array.from({ length: places.size }, (_, i) => first + i));
}
