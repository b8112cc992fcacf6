import type { Stack } from '@shared/design';
import { type PointPx, type Viewport, toMm, toPx } from './viewport';

/** A stack as heights: what drawing and picking are computed from. Places count from 0 at the bottom. */
export interface StackGeometry {
  readonly widthMm: number;
  readonly heightMm: number;
  readonly count: number;
  /** Height of each seam, mm, from the bottom: `count + 1` values, layer `i` lies between `seamsMm[i]` and `[i + 1]`. */
  readonly seamsMm: Float64Array;
}

export function stackGeometry(stack: Pick<Stack, 'widthMm' | 'layers'>): StackGeometry {
  const seamsMm = new Float64Array(stack.layers.length + 1);
  for (const [place, layer] of stack.layers.entries()) {
    seamsMm[place + 1] = (seamsMm[place] as number) + layer.thicknessMm;
  }
  return {
    widthMm: stack.widthMm,
    heightMm: seamsMm[stack.layers.length] as number,
    count: stack.layers.length,
    seamsMm,
  };
}

/** Height of the seam under layer `place`, mm; `place` = number of layers: the top of the stack. */
export function seamMm(geometry: StackGeometry, place: number): number {
  return geometry.seamsMm[Math.min(geometry.count, Math.max(0, place))] as number;
}

export function thicknessOf(geometry: StackGeometry, place: number): number {
  return seamMm(geometry, place + 1) - seamMm(geometry, place);
}

/** The layer at a height (mm), or null above and below the stack. A seam belongs to the layer on it. */
export function layerAt(geometry: StackGeometry, upMm: number): number | null {
  if (upMm < 0 || upMm > geometry.heightMm) return null;
  return Math.min(geometry.count - 1, lastAtOrBelow(geometry.seamsMm, upMm));
}

/**
 * Where each layer can be picked: heights in px from the bottom of the stack, `count + 1` limits.
 *
 * A layer thinner than `minPx` borrows height from a thicker neighbour (at most a third of it) until it can be hit; so a
 * foil of a few hundredths in a tall stack is picked as easily as a bar, and nothing thick gets lost. Where thin lies on
 * thin, each keeps what it has: only a larger scale tells them apart.
 */
export function pickLimitsPx(geometry: StackGeometry, pxPerMm: number, minPx: number): Float64Array {
  const { count, seamsMm } = geometry;
  const limits = new Float64Array(count + 1);
  const heightPx = (place: number): number => thicknessOf(geometry, place) * pxPerMm;
  const wants = (place: number): number => Math.max(0, (minPx - heightPx(place)) / 2);
  limits[0] = -wants(0);
  for (let place = 1; place < count; place++) {
    const below = heightPx(place - 1);
    const above = heightPx(place);
    let shift = 0;
    if (below < minPx && above >= minPx) shift = Math.min(wants(place - 1), above / 3);
    else if (above < minPx && below >= minPx) shift = -Math.min(wants(place), below / 3);
    limits[place] = (seamsMm[place] as number) * pxPerMm + shift;
  }
  limits[count] = geometry.heightMm * pxPerMm + wants(count - 1);
  return limits;
}

/** What a pointer is on. */
export type StackHit =
  /** The grip beside the one chosen layer, with which its upper edge is drawn. */
  | { readonly kind: 'grip'; readonly place: number }
  /** The upper edge of a layer. */
  | { readonly kind: 'edge'; readonly place: number }
  | { readonly kind: 'layer'; readonly place: number }
  | { readonly kind: 'empty' };

/** How exact a pointer is. */
export interface Reach {
  /** Layers thinner than this borrow height to be picked, px. */
  readonly minPickPx: number;
  /** So far from an edge it can still be taken, px; less where the layers beside it are low. */
  readonly edgePx: number;
  /** Half the side of the grip, px. */
  readonly gripPx: number;
}

/** A pointer with a tip, and a finger. */
export const REACH: Readonly<Record<'fine' | 'coarse', Reach>> = {
  fine: { minPickPx: 10, edgePx: 5, gripPx: 14 },
  coarse: { minPickPx: 28, edgePx: 14, gripPx: 24 },
};

/** Distance from the right side of the stack to the middle of the grip, px. */
export const GRIP_OFFSET_PX = 14;

/** Where the grip of a layer is drawn: beside its upper edge. */
export function gripAt(geometry: StackGeometry, viewport: Viewport, place: number): PointPx {
  const corner = toPx(viewport, { acrossMm: geometry.widthMm, upMm: seamMm(geometry, place + 1) });
  return { xPx: corner.xPx + GRIP_OFFSET_PX, yPx: corner.yPx };
}

/**
 * What lies under a point of the sheet: arithmetic on the seams, no matter how many layers there are.
 * @param grip place of the layer that shows a grip, if one does
 */
export function hitStack(
  geometry: StackGeometry,
  viewport: Viewport,
  at: PointPx,
  reach: Reach,
  grip: number | null,
): StackHit {
  if (grip !== null && grip < geometry.count) {
    const middle = gripAt(geometry, viewport, grip);
    const isNear =
      Math.abs(at.xPx - middle.xPx) <= reach.gripPx && Math.abs(at.yPx - middle.yPx) <= reach.gripPx;
    if (isNear && at.xPx >= middle.xPx - GRIP_OFFSET_PX) return { kind: 'grip', place: grip };
  }
  const { acrossMm, upMm } = toMm(viewport, at);
  if (acrossMm < 0 || acrossMm > geometry.widthMm) return { kind: 'empty' };
  const limits = pickLimitsPx(geometry, viewport.pxPerMm, reach.minPickPx);
  const upPx = upMm * viewport.pxPerMm;
  const edge = edgeNear(geometry, viewport.pxPerMm, upPx, reach);
  if (edge !== null) return { kind: 'edge', place: edge };
  if (upPx < (limits[0] as number) || upPx > (limits[geometry.count] as number)) return { kind: 'empty' };
  return { kind: 'layer', place: Math.min(geometry.count - 1, lastAtOrBelow(limits, upPx)) };
}

/** Layers that a range of heights (mm, either way round) touches. */
export function layersBetween(geometry: StackGeometry, aMm: number, bMm: number): ReadonlySet<number> {
  const lowMm = Math.max(0, Math.min(aMm, bMm));
  const highMm = Math.min(geometry.heightMm, Math.max(aMm, bMm));
  const places = new Set<number>();
  if (highMm < lowMm) return places;
  const first = layerAt(geometry, lowMm) ?? 0;
  for (let place = first; place < geometry.count && seamMm(geometry, place) <= highMm; place++)
    places.add(place);
  return places;
}

/** The layer whose upper edge is near. Beside a layer too thin to be hit there is only the picking of it, and its grip. */
function edgeNear(geometry: StackGeometry, pxPerMm: number, upPx: number, reach: Reach): number | null {
  const isThin = (place: number): boolean => thicknessOf(geometry, place) * pxPerMm < reach.minPickPx;
  const under = lastAtOrBelow(geometry.seamsMm, upPx / pxPerMm);
  for (const seam of [under, under + 1]) {
    if (seam < 1 || seam > geometry.count || isThin(seam - 1)) continue;
    const isTop = seam === geometry.count;
    if (!isTop && isThin(seam)) continue;
    const offPx = upPx - seamMm(geometry, seam) * pxPerMm;
    const beside = offPx < 0 || isTop ? seam - 1 : seam;
    // Above the stack there is nothing to be picked instead.
    const roomPx = isTop && offPx >= 0 ? reach.edgePx : (thicknessOf(geometry, beside) * pxPerMm) / 4;
    if (Math.abs(offPx) <= Math.min(reach.edgePx, roomPx)) return seam - 1;
  }
  return null;
}

/** Index of the last value ≤ `value` in ascending values; −1 below them all. */
function lastAtOrBelow(values: Float64Array, value: number): number {
  let low = 0;
  let high = values.length;
  while (low < high) {
    const mid = (low + high) >> 1;
    if ((values[mid] as number) <= value) low = mid + 1;
    else high = mid;
  }
  return low - 1;
}
