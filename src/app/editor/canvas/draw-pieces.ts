import type { BarState } from '@shared/bar';
import type { Format } from '@shared/units';
import { type LaidPiece, boxPx } from './bar-scene';
import { sticksOut } from './bar-text';
import { drawBarView } from './draw-bar-view';
import { FIGURE_FONT, haloed } from './draw-dimension';
import type { SteelInk } from './draw-layers';
import type { HatchTiles } from './hatch-tiles';
import { type Paper, measureText } from './paper';
import type { AreaPx, Viewport } from './viewport';

/** Pieces in an end section, and what to draw them with. */
export interface PiecesPicture {
  /** The bar that they make. */
  readonly bar: Pick<BarState, 'widthMm' | 'thicknessMm'>;
  readonly laid: readonly LaidPiece[];
  readonly along: 'thickness' | 'width';
  readonly viewport: Viewport;
  readonly inks: readonly SteelInk[];
  readonly tiles: HatchTiles;
  readonly paper: Paper;
  readonly format: Format;
}

/** The pieces of an assembly from their near end: each with its layers, what sticks out pale with the amount. */
export function drawPieces(
  context: CanvasRenderingContext2D,
  pixelRatio: number,
  picture: PiecesPicture,
): void {
  const { bar, laid, along, paper, viewport } = picture;
  for (const piece of laid) {
    const { widthMm, thicknessMm } = piece.bar;
    const box = boxPx(viewport, piece.acrossMm, piece.upMm, widthMm, thicknessMm);
    drawBarView(context, pixelRatio, piece.bar, 'end', box, picture.inks, picture.tiles, paper);
    if (sticksOut(piece.overhang.acrossMm)) drawOverhang(context, picture, piece);
  }
  for (const piece of laid.slice(1)) {
    const edge =
      along === 'thickness'
        ? boxPx(viewport, 0, piece.upMm, bar.widthMm, 0)
        : boxPx(viewport, piece.acrossMm, 0, 0, bar.thicknessMm);
    seam(context, paper, edge);
  }
  outline(context, paper, boxPx(viewport, 0, 0, bar.widthMm, bar.thicknessMm));
}

function drawOverhang(context: CanvasRenderingContext2D, picture: PiecesPicture, piece: LaidPiece): void {
  const { bar, along, paper, viewport, format } = picture;
  const { widthMm, thicknessMm } = piece.bar;
  const sideMm = piece.overhang.acrossMm / 2;
  const [first, last] =
    along === 'thickness'
      ? [
          boxPx(viewport, piece.acrossMm, piece.upMm, sideMm, thicknessMm),
          boxPx(viewport, bar.widthMm, piece.upMm, sideMm, thicknessMm),
        ]
      : [
          boxPx(viewport, piece.acrossMm, piece.upMm, widthMm, sideMm),
          boxPx(viewport, piece.acrossMm, bar.thicknessMm, widthMm, sideMm),
        ];
  trimmed(context, paper, first);
  trimmed(context, paper, last);
  const figure = `+${format.length(sideMm, { fractionStyle: 'built' })}`;
  if (along === 'thickness') {
    amount(context, paper, figure, last.leftPx + last.widthPx + 6, last.topPx + last.heightPx / 2);
  } else {
    const middlePx = last.leftPx + last.widthPx / 2 - measureText(figure, FIGURE_FONT) / 2;
    amount(context, paper, figure, middlePx, last.topPx - 9);
  }
}

/** The outline of what is drawn. */
export function outline(context: CanvasRenderingContext2D, paper: Paper, box: AreaPx): void {
  context.strokeStyle = paper.colours.ink;
  context.lineWidth = 1.5;
  context.strokeRect(
    Math.round(box.leftPx) - 0.25,
    Math.round(box.topPx) - 0.25,
    Math.round(box.widthPx) + 0.5,
    Math.round(box.heightPx) + 0.5,
  );
}

/** A seam between two pieces: a box without height, or without width. */
export function seam(context: CanvasRenderingContext2D, paper: Paper, box: AreaPx): void {
  for (const [colour, width] of [
    [paper.colours.ground, 3],
    [paper.colours.ink, 1.25],
  ] as const) {
    context.strokeStyle = colour;
    context.lineWidth = width;
    context.beginPath();
    context.moveTo(box.leftPx, box.topPx + box.heightPx);
    context.lineTo(box.leftPx + box.widthPx, box.topPx);
    context.stroke();
  }
}

/** What is trimmed: pale, with a broken outline. */
export function trimmed(context: CanvasRenderingContext2D, paper: Paper, box: AreaPx): void {
  context.fillStyle = paper.colours.ground;
  context.globalAlpha = 0.78;
  context.fillRect(box.leftPx, box.topPx, box.widthPx, box.heightPx);
  context.globalAlpha = 1;
  context.strokeStyle = paper.colours.straw;
  context.lineWidth = 1;
  context.setLineDash([5, 3]);
  context.strokeRect(
    Math.floor(box.leftPx) + 0.5,
    Math.floor(box.topPx) + 0.5,
    Math.round(box.widthPx),
    Math.round(box.heightPx),
  );
  context.setLineDash([]);
}

/** By how much something sticks out. */
export function amount(
  context: CanvasRenderingContext2D,
  paper: Paper,
  figure: string,
  leftPx: number,
  middlePx: number,
): void {
  context.font = FIGURE_FONT;
  context.textAlign = 'left';
  context.textBaseline = 'middle';
  haloed(context, figure, leftPx, middlePx, paper.colours.straw, paper.colours.ground);
}
