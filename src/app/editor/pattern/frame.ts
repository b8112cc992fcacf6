import type { Window } from '@shared/pattern';
import { type AreaPx, type PointMm, type PointPx, type Viewport, toMm, toPx } from '../canvas/viewport';

/** A rectangle of the screen in device pixels. */
export interface DeviceRect {
  readonly left: number;
  readonly top: number;
  readonly width: number;
  readonly height: number;
}

/** The part of a surface that is seen, and the pixels that it fills. */
export interface Frame {
  /** The view that it is of, and where in it the part lies. */
  readonly viewport: Viewport;
  readonly rect: DeviceRect;
  /** 0–1 of the surface, from its left and lower edge. */
  readonly window: Window;
  /** Of the picture: those of the rectangle, or fewer. */
  readonly widthPx: number;
  readonly heightPx: number;
  /** The same part in mm, from the surface's lower left corner. */
  readonly from: PointMm;
  readonly to: PointMm;
}

interface Extent {
  readonly widthMm: number;
  readonly heightMm: number;
}

/** Pixels that a picture on the screen has at most; past that it is made coarser. */
const MOST_PIXELS = 2_400_000;

/**
 * What of a surface lies in an area of the screen. Its borders fall on device pixels, so that one sample stands for
 * one pixel. Null where nothing of it is seen.
 */
export function frameOf(extent: Extent, viewport: Viewport, area: AreaPx, pixelRatio: number): Frame | null {
  const leftTop = toPx(viewport, { acrossMm: 0, upMm: extent.heightMm });
  const rightBottom = toPx(viewport, { acrossMm: extent.widthMm, upMm: 0 });
  const across = seen(leftTop.xPx, rightBottom.xPx, area.leftPx, area.leftPx + area.widthPx, pixelRatio);
  const down = seen(leftTop.yPx, rightBottom.yPx, area.topPx, area.topPx + area.heightPx, pixelRatio);
  if (across === null || down === null) return null;
  const coarser = Math.min(1, Math.sqrt(MOST_PIXELS / (across.pixels * down.pixels)));
  const window = { left: across.from, right: across.to, top: 1 - down.from, bottom: 1 - down.to };
  return {
    viewport,
    rect: { left: across.start, top: down.start, width: across.pixels, height: down.pixels },
    window,
    widthPx: Math.max(1, Math.round(across.pixels * coarser)),
    heightPx: Math.max(1, Math.round(down.pixels * coarser)),
    from: { acrossMm: window.left * extent.widthMm, upMm: window.bottom * extent.heightMm },
    to: { acrossMm: window.right * extent.widthMm, upMm: window.top * extent.heightMm },
  };
}

/** The part of a stretch that is in view, as shares of it, and how many device pixels that is. */
function seen(
  startPx: number,
  endPx: number,
  viewStartPx: number,
  viewEndPx: number,
  pixelRatio: number,
): { readonly from: number; readonly to: number; readonly start: number; readonly pixels: number } | null {
  const start = Math.round(startPx * pixelRatio);
  const end = Math.max(start + 1, Math.round(endPx * pixelRatio));
  const from = Math.max(start, Math.floor(viewStartPx * pixelRatio));
  const to = Math.min(end, Math.ceil(viewEndPx * pixelRatio));
  if (to <= from) return null;
  const whole = end - start;
  return { from: (from - start) / whole, to: (to - start) / whole, start: from, pixels: to - from };
}

/** Where in another view the part lies that a frame shows. */
export function rectIn(frame: Frame, viewport: Viewport, pixelRatio: number): DeviceRect {
  // In its own view it lies where it was cut out, to the pixel.
  if (isSameView(frame.viewport, viewport)) return frame.rect;
  const leftTop = toPx(viewport, { acrossMm: frame.from.acrossMm, upMm: frame.to.upMm });
  const rightBottom = toPx(viewport, { acrossMm: frame.to.acrossMm, upMm: frame.from.upMm });
  const left = Math.round(leftTop.xPx * pixelRatio);
  const top = Math.round(leftTop.yPx * pixelRatio);
  return {
    left,
    top,
    width: Math.max(1, Math.round(rightBottom.xPx * pixelRatio) - left),
    height: Math.max(1, Math.round(rightBottom.yPx * pixelRatio) - top),
  };
}

function isSameView(a: Viewport, b: Viewport): boolean {
  return a.pxPerMm === b.pxPerMm && a.originPx.xPx === b.originPx.xPx && a.originPx.yPx === b.originPx.yPx;
}

/** Where on the surface, 0–1 from its left and lower edge; null beside it. */
export function shareAt(
  extent: Extent,
  viewport: Viewport,
  at: PointPx,
): { readonly across: number; readonly up: number } | null {
  const { acrossMm, upMm } = toMm(viewport, at);
  const across = acrossMm / extent.widthMm;
  const up = upMm / extent.heightMm;
  return across >= 0 && across <= 1 && up >= 0 && up <= 1 ? { across, up } : null;
}
