import type { LaidPiece } from './bar-scene';
import { type PointMm, type PointPx, type Viewport, toMm, toPx } from './viewport';

/** The pieces of an assembly as boxes in its end section, from the bottom or from the left. */
export interface AssemblyGeometry {
  readonly along: 'thickness' | 'width';
  readonly boxes: readonly PieceBox[];
}

/** mm, from the lower left corner of the bar that the pieces make. */
export interface PieceBox extends PointMm {
  readonly widthMm: number;
  readonly heightMm: number;
}

export function assemblyGeometry(laid: readonly LaidPiece[], along: 'thickness' | 'width'): AssemblyGeometry {
  const boxes = laid.map(({ acrossMm, upMm, bar }) => ({
    acrossMm,
    upMm,
    widthMm: bar.widthMm,
    heightMm: bar.thicknessMm,
  }));
  return { along, boxes };
}

/** Where a piece begins and ends along the direction in which the pieces are put together, mm. */
export function spanMm(geometry: AssemblyGeometry, place: number): readonly [number, number] {
  const box = geometry.boxes[place];
  if (box === undefined) return [0, 0];
  return geometry.along === 'thickness'
    ? [box.upMm, box.upMm + box.heightMm]
    : [box.acrossMm, box.acrossMm + box.widthMm];
}

/** The place of the piece that one carried to a point would go before: the middle of each piece decides. */
export function pieceLanding(geometry: AssemblyGeometry, at: PointMm): number {
  const reached = geometry.along === 'thickness' ? at.upMm : at.acrossMm;
  let to = 0;
  while (to < geometry.boxes.length) {
    const [from, end] = spanMm(geometry, to);
    if (reached < (from + end) / 2) break;
    to += 1;
  }
  return to;
}

/** What a pointer is on. */
export type AssemblyHit =
  /** The handle with which the chosen piece is turned. */
  | { readonly kind: 'handle'; readonly place: number }
  | { readonly kind: 'piece'; readonly place: number }
  | { readonly kind: 'empty' };

/** Distance of the turning handle from the upper right corner of its piece, px. */
const HANDLE_OFF_PX = 16;
/** Half the side of what a pointer, and a finger, must hit of it, px. */
const HANDLE_HALF_PX = { fine: 13, coarse: 24 } as const;
/** A piece thinner than this can still be picked, px. */
const MIN_PICK_PX = { fine: 10, coarse: 28 } as const;

/** Where the handle of a piece is drawn. */
export function handleAt(geometry: AssemblyGeometry, viewport: Viewport, place: number): PointPx {
  const box = geometry.boxes[place] ?? { acrossMm: 0, upMm: 0, widthMm: 0, heightMm: 0 };
  const corner = toPx(viewport, { acrossMm: box.acrossMm + box.widthMm, upMm: box.upMm + box.heightMm });
  return { xPx: corner.xPx + HANDLE_OFF_PX, yPx: corner.yPx - HANDLE_OFF_PX };
}

/** What lies under a point of the sheet. @param chosen place of the piece that shows a handle, if one does */
export function hitAssembly(
  geometry: AssemblyGeometry,
  viewport: Viewport,
  at: PointPx,
  exactness: 'fine' | 'coarse',
  chosen: number | null,
): AssemblyHit {
  if (chosen !== null && chosen < geometry.boxes.length) {
    const handle = handleAt(geometry, viewport, chosen);
    const half = HANDLE_HALF_PX[exactness];
    if (Math.abs(at.xPx - handle.xPx) <= half && Math.abs(at.yPx - handle.yPx) <= half) {
      return { kind: 'handle', place: chosen };
    }
  }
  const point = toMm(viewport, at);
  let nearest: AssemblyHit = { kind: 'empty' };
  let leastPx = Infinity;
  for (const [place, box] of geometry.boxes.entries()) {
    const roomMm = (sizeMm: number): number =>
      Math.max(0, (MIN_PICK_PX[exactness] / viewport.pxPerMm - sizeMm) / 2);
    const acrossRoom = roomMm(box.widthMm);
    const upRoom = roomMm(box.heightMm);
    const isWithin =
      point.acrossMm >= box.acrossMm - acrossRoom &&
      point.acrossMm <= box.acrossMm + box.widthMm + acrossRoom &&
      point.upMm >= box.upMm - upRoom &&
      point.upMm <= box.upMm + box.heightMm + upRoom;
    if (!isWithin) continue;
    const offMm = Math.hypot(
      point.acrossMm - box.acrossMm - box.widthMm / 2,
      point.upMm - box.upMm - box.heightMm / 2,
    );
    // Where a thin piece reaches into a thick one, its middle is the nearer.
    const offPx = offMm * viewport.pxPerMm;
    if (offPx < leastPx) {
      leastPx = offPx;
      nearest = { kind: 'piece', place };
    }
  }
  return nearest;
}

/** Quarter turns, clockwise as the end section is drawn, that lead from one direction seen from a middle to another. */
export function quartersBetween(middle: PointPx, from: PointPx, to: PointPx): 0 | 1 | 2 | 3 {
  const angle = (point: PointPx): number => Math.atan2(point.yPx - middle.yPx, point.xPx - middle.xPx);
  const quarters = Math.round((angle(to) - angle(from)) / (Math.PI / 2));
  return quarterTurns(quarters);
}

/** Any number of quarter turns as 0 to 3. */
export function quarterTurns(quarters: number): 0 | 1 | 2 | 3 {
  return (((quarters % 4) + 4) % 4) as 0 | 1 | 2 | 3;
}
