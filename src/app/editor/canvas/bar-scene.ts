import type { BarState } from '@shared/bar';
import type { Overhang } from '@shared/forging';
import { type AreaPx, type PointPx, type Viewport, toPx } from './viewport';

/** A piece of an assembly in the bar's own coordinates, mm: as it was laid in, before what sticks out was trimmed. */
export interface LaidPiece {
  readonly bar: BarState;
  /** Lower left corner of its end section. */
  readonly acrossMm: number;
  readonly upMm: number;
  readonly overhang: Overhang;
}

/** How pieces lie, as far as their sizes tell: what adds up to the bar's. */
export function alongOf(
  bar: Pick<BarState, 'widthMm' | 'thicknessMm'>,
  pieces: readonly BarState[],
): 'thickness' | 'width' {
  const off = (side: 'thicknessMm' | 'widthMm'): number =>
    Math.abs(pieces.reduce((sum, piece) => sum + piece[side], 0) - bar[side]);
  return off('thicknessMm') <= off('widthMm') ? 'thickness' : 'width';
}

/**
 * Where the pieces of an assembly lie in its end section: one on the other or side by side, centred across, so that
 * what sticks out does so equally on both sides.
 */
export function laidPieces(
  bar: Pick<BarState, 'widthMm' | 'thicknessMm'>,
  pieces: readonly BarState[],
  overhangs: readonly Overhang[],
  along: 'thickness' | 'width',
): readonly LaidPiece[] {
  let reachedMm = 0;
  return pieces.map((piece, i) => {
    const overhang = overhangs[i] ?? { lengthMm: 0, acrossMm: 0 };
    const laid =
      along === 'thickness'
        ? { acrossMm: (bar.widthMm - piece.widthMm) / 2, upMm: reachedMm }
        : { acrossMm: reachedMm, upMm: (bar.thicknessMm - piece.thicknessMm) / 2 };
    reachedMm += along === 'thickness' ? piece.thicknessMm : piece.widthMm;
    return { bar: piece, overhang, ...laid };
  });
}

/** How much a section may be drawn larger than the side view: whole figures. */
const RATIOS = [50, 40, 30, 25, 20, 15, 12, 10, 8, 6, 5, 4, 3, 2, 1] as const;

/** Where the two views of a bar are drawn, and how large. */
export interface BarScene {
  readonly side: Viewport;
  readonly end: Viewport;
  /** The end section is drawn so many times as large as the side view. */
  readonly ratio: number;
  /** Where the captions of the views begin. */
  readonly captions: { readonly side: PointPx; readonly end: PointPx };
}

/** Sizes of a bar with all that sticks out, mm. */
interface Full {
  readonly lengthMm: number;
  readonly widthMm: number;
  readonly thicknessMm: number;
}

/** Room above a view for its caption and an arrow that points down, at the left for its thickness, below for its size, px. */
const CAPTION_PX = 38;
const LEFT_PX = 82;
const DIMENSION_PX = 44;
/** For a line of words at the foot when something sticks out, px. */
const FOOT_PX = 22;

/**
 * Lays out the side view and the end section, both to scale, the section larger by a whole figure where there is room:
 * below the side view or beside it, whichever shows both larger.
 */
export function barScene(
  bar: Pick<BarState, 'lengthMm' | 'widthMm' | 'thicknessMm'>,
  laid: readonly LaidPiece[],
  widthPx: number,
  heightPx: number,
): BarScene {
  const most = (amounts: readonly number[]): number => Math.max(0, ...amounts);
  const full: Full = {
    lengthMm: bar.lengthMm + most(laid.map((piece) => piece.overhang.lengthMm)),
    widthMm: Math.max(bar.widthMm, ...laid.map((piece) => piece.bar.widthMm)),
    thicknessMm: Math.max(bar.thicknessMm, ...laid.map((piece) => piece.bar.thicknessMm)),
  };
  // Figures of what sticks out stand at the right and, over pieces side by side, above.
  const rightPx = laid.length === 0 ? 24 : widthPx < 560 ? 64 : 90;
  const abovePx = full.thicknessMm > bar.thicknessMm ? 18 : 0;
  const footPx = laid.some((piece) => piece.overhang.acrossMm + piece.overhang.lengthMm > 0) ? FOOT_PX : 0;
  const sheet = { widthPx, heightPx: heightPx - footPx, rightPx, abovePx };
  const candidates = [
    ...[0.15, 0.25, 0.35, 0.45, 0.55].map((share) => below(bar, full, sheet, share)),
    ...[1, 2, 3].map((ratio) => beside(bar, full, sheet, ratio)),
  ];
  return candidates.reduce((best, candidate) => (worth(candidate) > worth(best) * 1.001 ? candidate : best));
}

interface SheetRoom {
  readonly widthPx: number;
  readonly heightPx: number;
  readonly rightPx: number;
  readonly abovePx: number;
}

/** A section smaller than the side view is for want of anything better. */
function worth(scene: BarScene): number {
  return scene.side.pxPerMm * scene.end.pxPerMm * (scene.ratio < 1 ? 0.1 : 1);
}

/** The section below the side view, which gets a share of the height. */
function below(
  bar: Pick<Full, 'widthMm' | 'thicknessMm'>,
  full: Full,
  sheet: SheetRoom,
  share: number,
): BarScene {
  const drawnPx = Math.max(40, sheet.widthPx - LEFT_PX - sheet.rightPx);
  const roomPx = Math.max(60, sheet.heightPx - 2 * (CAPTION_PX + DIMENSION_PX) - sheet.abovePx);
  const sideScale = Math.min(drawnPx / full.lengthMm, (roomPx * share) / full.thicknessMm);
  const sideHeightPx = full.thicknessMm * sideScale;
  const endCaptionPx = CAPTION_PX + sideHeightPx + DIMENSION_PX;
  const endTopPx = endCaptionPx + CAPTION_PX + sheet.abovePx;
  const mostScale = Math.min(drawnPx / full.widthMm, (roomPx - sideHeightPx) / full.thicknessMm);
  const ratio = wholeRatio(mostScale / sideScale);
  const leftPx = LEFT_PX + ((full.widthMm - bar.widthMm) / 2) * sideScale * ratio;
  return {
    side: anchored(sideScale, LEFT_PX, CAPTION_PX, full.thicknessMm, bar.thicknessMm),
    end: anchored(sideScale * ratio, leftPx, endTopPx, full.thicknessMm, bar.thicknessMm),
    ratio,
    captions: { side: { xPx: 10, yPx: 0 }, end: { xPx: 10, yPx: endCaptionPx } },
  };
}

/** The section to the right of the side view; in one scale they stand on one line. */
function beside(
  bar: Pick<Full, 'widthMm' | 'thicknessMm'>,
  full: Full,
  sheet: SheetRoom,
  ratio: number,
): BarScene {
  const drawnPx = Math.max(40, sheet.widthPx - 2 * LEFT_PX - 2 * sheet.rightPx);
  const roomPx = Math.max(40, sheet.heightPx - CAPTION_PX - DIMENSION_PX - sheet.abovePx);
  const sideScale = Math.min(
    drawnPx / (full.lengthMm + full.widthMm * ratio),
    roomPx / (full.thicknessMm * ratio),
  );
  const endScale = sideScale * ratio;
  const endCaptionPx = LEFT_PX + full.lengthMm * sideScale + sheet.rightPx + 10;
  const endLeftPx = endCaptionPx - 10 + LEFT_PX + ((full.widthMm - bar.widthMm) / 2) * endScale;
  const topPx = CAPTION_PX + sheet.abovePx;
  return {
    side: anchored(sideScale, LEFT_PX, topPx, full.thicknessMm, bar.thicknessMm),
    end: anchored(endScale, endLeftPx, topPx, full.thicknessMm, bar.thicknessMm),
    ratio,
    captions: { side: { xPx: 10, yPx: 0 }, end: { xPx: endCaptionPx, yPx: 0 } },
  };
}

function wholeRatio(most: number): number {
  return RATIOS.find((candidate) => candidate <= most) ?? most;
}

/** A view whose upper left corner is given; what is thicker than the bar sticks out equally above and below. */
function anchored(
  pxPerMm: number,
  leftPx: number,
  topPx: number,
  fullThicknessMm: number,
  thicknessMm: number,
): Viewport {
  return {
    pxPerMm,
    originPx: { xPx: leftPx, yPx: topPx + ((fullThicknessMm + thicknessMm) / 2) * pxPerMm },
  };
}

/** A rectangle of a view on the sheet. */
export function boxPx(
  viewport: Viewport,
  acrossMm: number,
  upMm: number,
  widthMm: number,
  heightMm: number,
): AreaPx {
  const low = toPx(viewport, { acrossMm, upMm });
  return {
    leftPx: low.xPx,
    topPx: low.yPx - heightMm * viewport.pxPerMm,
    widthPx: widthMm * viewport.pxPerMm,
    heightPx: heightMm * viewport.pxPerMm,
  };
}
