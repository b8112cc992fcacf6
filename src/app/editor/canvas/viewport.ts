/** A point of the sheet in CSS pixels, from its upper left corner, downward. */
export interface PointPx {
  readonly xPx: number;
  readonly yPx: number;
}

/** A point of what is drawn, in mm: to the right and upward. Which axes of the bar these are, the view says. */
export interface PointMm {
  readonly acrossMm: number;
  readonly upMm: number;
}

/** A rectangle of the sheet, CSS pixels. */
export interface AreaPx {
  readonly leftPx: number;
  readonly topPx: number;
  readonly widthPx: number;
  readonly heightPx: number;
}

/** A rectangle of what is drawn, from its lower left corner (0, 0), mm. */
export interface ExtentMm {
  readonly acrossMm: number;
  readonly upMm: number;
}

/** Where and how large something is drawn. {@link toPx} and {@link toMm} are the only ones that read it. */
export interface Viewport {
  /** > 0, the same in both directions: everything is drawn to scale. */
  readonly pxPerMm: number;
  /** Where (0 mm, 0 mm) lies on the sheet. */
  readonly originPx: PointPx;
}

/** The finest scale: 0.01 mm, the thinnest layer a document may hold, is then 20 px. */
export const MAX_PX_PER_MM = 2000;
/** The coarsest, as a part of the scale at which everything just fits. */
export const MIN_OF_FIT = 0.5;
/** So much of the drawing stays on the sheet however far it is pushed, px. */
const KEPT_IN_SIGHT_PX = 48;

export function toPx(viewport: Viewport, point: PointMm): PointPx {
  return {
    xPx: viewport.originPx.xPx + point.acrossMm * viewport.pxPerMm,
    yPx: viewport.originPx.yPx - point.upMm * viewport.pxPerMm,
  };
}

export function toMm(viewport: Viewport, point: PointPx): PointMm {
  return {
    acrossMm: (point.xPx - viewport.originPx.xPx) / viewport.pxPerMm,
    upMm: (viewport.originPx.yPx - point.yPx) / viewport.pxPerMm,
  };
}

/** The drawing as large as the area allows, in its middle. */
export function fitted(extent: ExtentMm, area: AreaPx): Viewport {
  const pxPerMm = Math.max(
    1e-6,
    Math.min(MAX_PX_PER_MM, area.widthPx / extent.acrossMm, area.heightPx / extent.upMm),
  );
  return {
    pxPerMm,
    originPx: {
      xPx: area.leftPx + (area.widthPx - extent.acrossMm * pxPerMm) / 2,
      yPx: area.topPx + (area.heightPx + extent.upMm * pxPerMm) / 2,
    },
  };
}

/** How much larger it would have to become before a drawing that fits is drawn anew. */
const WORTH_REFITTING = 1.3;

/**
 * The view after what is drawn changed its size: the same scale as long as everything still fits and would not become
 * much larger, so that an edit doesn't make the drawing jump; else it is fitted anew.
 */
export function refitted(before: Viewport | null, extent: ExtentMm, area: AreaPx): Viewport {
  const fit = fitted(extent, area);
  if (before === null) return fit;
  const isTooLarge = before.pxPerMm > fit.pxPerMm * (1 + 1e-9);
  if (isTooLarge || before.pxPerMm * WORTH_REFITTING < fit.pxPerMm) return fit;
  const widthPx = extent.acrossMm * before.pxPerMm;
  const heightPx = extent.upMm * before.pxPerMm;
  const { yPx } = before.originPx;
  return {
    pxPerMm: before.pxPerMm,
    originPx: {
      xPx: area.leftPx + (area.widthPx - widthPx) / 2,
      yPx: clamped(yPx, area.topPx + heightPx, area.topPx + area.heightPx),
    },
  };
}

/** Enlarged by `factor` so that what is under the point stays under it. The scale keeps within its limits. */
export function zoomedAbout(
  viewport: Viewport,
  at: PointPx,
  factor: number,
  extent: ExtentMm,
  area: AreaPx,
): Viewport {
  const fit = fitted(extent, area).pxPerMm;
  const pxPerMm = Math.min(MAX_PX_PER_MM, Math.max(fit * MIN_OF_FIT, viewport.pxPerMm * factor));
  const under = toMm(viewport, at);
  const next: Viewport = {
    pxPerMm,
    originPx: { xPx: at.xPx - under.acrossMm * pxPerMm, yPx: at.yPx + under.upMm * pxPerMm },
  };
  return inSight(next, extent, area);
}

/** Pushed by so many pixels; part of the drawing always stays in the area. */
export function panned(
  viewport: Viewport,
  byXPx: number,
  byYPx: number,
  extent: ExtentMm,
  area: AreaPx,
): Viewport {
  const { xPx, yPx } = viewport.originPx;
  return inSight({ ...viewport, originPx: { xPx: xPx + byXPx, yPx: yPx + byYPx } }, extent, area);
}

/**
 * The view after two fingers moved: what lay under them lies under them again, as far as one scale for both directions
 * allows.
 */
export function pinched(
  viewport: Viewport,
  from: readonly [PointPx, PointPx],
  to: readonly [PointPx, PointPx],
  extent: ExtentMm,
  area: AreaPx,
): Viewport {
  const before = middle(from);
  const after = middle(to);
  const moved = panned(viewport, after.xPx - before.xPx, after.yPx - before.yPx, extent, area);
  return zoomedAbout(moved, after, distance(to) / Math.max(1, distance(from)), extent, area);
}

/** The view moved as little as possible so that a range of heights (mm) can be seen. The scale stays. */
export function showing(viewport: Viewport, fromMm: number, toMmUp: number, area: AreaPx): Viewport {
  const bottomPx = toPx(viewport, { acrossMm: 0, upMm: fromMm }).yPx;
  const topPx = toPx(viewport, { acrossMm: 0, upMm: toMmUp }).yPx;
  const below = Math.max(0, bottomPx - (area.topPx + area.heightPx));
  const above = Math.max(0, area.topPx - topPx);
  // What is taller than the area shows its top.
  const byYPx = above > 0 ? above : -Math.min(below, Math.max(0, topPx - area.topPx));
  if (byYPx === 0) return viewport;
  return { ...viewport, originPx: { ...viewport.originPx, yPx: viewport.originPx.yPx + byYPx } };
}

export function isSameArea(a: AreaPx, b: AreaPx): boolean {
  return a.leftPx === b.leftPx && a.topPx === b.topPx && a.widthPx === b.widthPx && a.heightPx === b.heightPx;
}

function inSight(viewport: Viewport, extent: ExtentMm, area: AreaPx): Viewport {
  const widthPx = extent.acrossMm * viewport.pxPerMm;
  const heightPx = extent.upMm * viewport.pxPerMm;
  const keptX = Math.min(KEPT_IN_SIGHT_PX, widthPx, area.widthPx);
  const keptY = Math.min(KEPT_IN_SIGHT_PX, heightPx, area.heightPx);
  const { xPx, yPx } = viewport.originPx;
  return {
    ...viewport,
    originPx: {
      xPx: clamped(xPx, area.leftPx + keptX - widthPx, area.leftPx + area.widthPx - keptX),
      yPx: clamped(yPx, area.topPx + keptY, area.topPx + area.heightPx - keptY + heightPx),
    },
  };
}

function clamped(value: number, min: number, max: number): number {
  return Math.min(max, Math.max(min, value));
}

function middle([a, b]: readonly [PointPx, PointPx]): PointPx {
  return { xPx: (a.xPx + b.xPx) / 2, yPx: (a.yPx + b.yPx) / 2 };
}

function distance([a, b]: readonly [PointPx, PointPx]): number {
  return Math.hypot(a.xPx - b.xPx, a.yPx - b.yPx);
}
