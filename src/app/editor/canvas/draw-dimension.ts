import { ARROW_HALF_PX, ARROW_PX, type DimensionLine, dimensionLine } from './dimension-line';
import { FIGURES, type Measure, type Paper } from './paper';

export const FIGURE_FONT = `400 12px ${FIGURES}`;
/** Between what is measured and its extension line, and how far that goes on past the dimension line, px. */
const EXTENSION_GAP_PX = 3;
const EXTENSION_PAST_PX = 5;

/** A dimension to be drawn beside something. */
export interface Dimension {
  readonly direction: 'horizontal' | 'vertical';
  /** Ends of what is measured along the direction, px, ascending. */
  readonly fromPx: number;
  readonly toPx: number;
  /** Where the line runs: its y, or its x. */
  readonly atPx: number;
  /** Where what is measured ends: the extension lines come from there. */
  readonly objectPx: number;
  readonly figure: string;
  /** The part of the sheet the line may take, along the direction. */
  readonly seenPx: readonly [number, number];
  /** A figure for which a vertical line is too short is written level beside it; there must be nothing there. */
  readonly hasRoomBeside?: boolean;
  /** Ember while it changes. */
  readonly isLive?: boolean;
}

/** Draws a dimension as a drawing office does: extension lines, slender filled arrows, the figure set into the line. */
export function drawDimension(
  context: CanvasRenderingContext2D,
  paper: Paper,
  dimension: Dimension,
  measure: Measure,
): void {
  const { fromPx, toPx, figure, seenPx, atPx, objectPx } = dimension;
  const layout = dimensionLine(fromPx, toPx, measure(figure, FIGURE_FONT), seenPx);
  if (layout === null) return;
  const isVertical = dimension.direction === 'vertical';
  const colour = dimension.isLive ? paper.colours.ember : paper.colours.quiet;
  context.save();
  context.strokeStyle = colour;
  context.fillStyle = colour;
  context.lineWidth = 1;
  context.beginPath();
  const side = Math.sign(atPx - objectPx) || 1;
  for (const along of layout.extensions) {
    const a = [along, objectPx + side * EXTENSION_GAP_PX] as const;
    const b = [along, atPx + side * EXTENSION_PAST_PX] as const;
    strokeLine(context, a, b, isVertical);
  }
  for (const [from, to] of layout.lines) strokeLine(context, [from, atPx], [to, atPx], isVertical);
  context.stroke();
  for (const arrow of layout.arrows) drawArrow(context, arrow.atPx, atPx, arrow.points, isVertical);
  context.restore();
  drawFigure(context, paper, layout, dimension);
}

/** A filled arrowhead with its tip at a point. */
function drawArrow(
  context: CanvasRenderingContext2D,
  along: number,
  across: number,
  points: 'back' | 'forth',
  isVertical: boolean,
): void {
  const foot = points === 'back' ? along + ARROW_PX : along - ARROW_PX;
  const corners = [
    [along, across],
    [foot, across - ARROW_HALF_PX],
    [foot, across + ARROW_HALF_PX],
  ] as const;
  context.beginPath();
  for (const [a, b] of corners) context.lineTo(isVertical ? b : a, isVertical ? a : b);
  context.fill();
}

function drawFigure(
  context: CanvasRenderingContext2D,
  paper: Paper,
  layout: DimensionLine,
  { direction, atPx, fromPx, toPx, figure, seenPx, isLive, hasRoomBeside }: Dimension,
): void {
  const ink = isLive ? paper.colours.ember : paper.colours.ink;
  context.save();
  context.font = FIGURE_FONT;
  context.textBaseline = 'middle';
  context.textAlign = 'center';
  if (direction === 'horizontal') {
    haloed(context, figure, layout.figurePx, atPx, ink, paper.colours.ground);
  } else if (layout.isBeside && hasRoomBeside) {
    // Upright and level with what it measures, where there is no height to write along the line.
    context.textAlign = 'right';
    const middlePx = (Math.max(fromPx, seenPx[0]) + Math.min(toPx, seenPx[1])) / 2;
    haloed(context, figure, atPx - ARROW_HALF_PX - 5, middlePx, ink, paper.colours.ground);
  } else {
    // Read from the right-hand side of the sheet, as drawings are.
    context.translate(atPx, layout.figurePx);
    context.rotate(-Math.PI / 2);
    haloed(context, figure, 0, 0, ink, paper.colours.ground);
  }
  context.restore();
}

/** Text that stays legible on whatever it crosses. */
export function haloed(
  context: CanvasRenderingContext2D,
  text: string,
  xPx: number,
  yPx: number,
  ink: string,
  ground: string,
): void {
  context.lineJoin = 'round';
  context.lineWidth = 4;
  context.strokeStyle = ground;
  context.strokeText(text, xPx, yPx);
  context.fillStyle = ink;
  context.fillText(text, xPx, yPx);
}

function strokeLine(
  context: CanvasRenderingContext2D,
  [a1, b1]: readonly [number, number],
  [a2, b2]: readonly [number, number],
  isVertical: boolean,
): void {
  // Half pixels keep one-pixel lines sharp.
  const sharp = (value: number): number => Math.floor(value) + 0.5;
  context.moveTo(sharp(isVertical ? b1 : a1), sharp(isVertical ? a1 : b1));
  context.lineTo(sharp(isVertical ? b2 : a2), sharp(isVertical ? a2 : b2));
}
