import type { Format } from '@shared/units';
import { drawDimension, haloed } from './draw-dimension';
import { boxOf, outlined, runsOf } from './draw-stack-box';
import { type SteelInk, drawLayers } from './draw-layers';
import type { HatchTiles } from './hatch-tiles';
import { type Measure, type Paper, measureText } from './paper';
import type { Paint } from './sheet';
import { type StackGeometry, seamMm, thicknessOf } from './stack-geometry';
import {
  LABEL_FIGURE_FONT,
  LABEL_FONT,
  LABEL_PX,
  type LabelColumn,
  PLACE_FONT,
  type StackFrame,
  type StackLabel,
  stackRect,
} from './stack-scene';
import type { Viewport } from './viewport';

/** Everything that the drawing of a stack at rest is made from. */
export interface StackPicture {
  readonly geometry: StackGeometry;
  readonly viewport: Viewport;
  readonly frame: StackFrame;
  readonly column: LabelColumn;
  readonly chosen: ReadonlySet<number>;
  /** What is chosen is in the hand: it has no outline where it lay. */
  readonly isCarrying: boolean;
  readonly format: Format;
  readonly paper: Paper;
  /** Index into `inks` for each layer. */
  readonly inkOf: Uint16Array;
  readonly inks: readonly SteelInk[];
  readonly tiles: HatchTiles;
}

/** The layers, to scale. */
export function paintStack(picture: StackPicture): Paint {
  return (context, pixelRatio) => {
    const { geometry, viewport, frame, paper } = picture;
    const rect = stackRect(geometry, viewport);
    drawLayers(context, pixelRatio, pileOf(picture, rect), picture.tiles);
    context.strokeStyle = paper.colours.ink;
    context.lineWidth = 1.5;
    context.strokeRect(
      Math.round(rect.leftPx) - 0.25,
      Math.round(rect.topPx) - 0.25,
      Math.round(rect.rightPx - rect.leftPx) + 0.5,
      Math.round(rect.bottomPx - rect.topPx) + 0.5,
    );
    // Under the margins and the names: enlarged, it would run over them.
    if (!picture.isCarrying) {
      for (const [first, last] of runsOf(picture.chosen, geometry.count)) {
        outlined(context, paper, boxOf(picture, first, last), paper.colours.steel, 2.5);
      }
    }
    drawDimensions(context, picture, frame);
  };
}

function pileOf(picture: StackPicture, rect: ReturnType<typeof stackRect>): Parameters<typeof drawLayers>[2] {
  const { geometry, frame, viewport } = picture;
  let maxMm = 0;
  for (let i = 0; i < geometry.count; i++) maxMm = Math.max(maxMm, thicknessOf(geometry, i));
  return {
    layers: {
      count: geometry.count,
      thicknessMm: (i) => thicknessOf(geometry, i),
      tone: (i) => picture.inkOf[i] as number,
    },
    inks: picture.inks,
    maxMm,
    direction: 'up',
    startPx: rect.bottomPx,
    pxPerMm: viewport.pxPerMm,
    seenPx: [0, frame.heightPx],
    acrossPx: [Math.max(-20, rect.leftPx), Math.min(frame.widthPx + 20, rect.rightPx)],
  };
}

function drawDimensions(context: CanvasRenderingContext2D, picture: StackPicture, frame: StackFrame): void {
  const { geometry, viewport, paper, format, chosen } = picture;
  const rect = stackRect(geometry, viewport);
  const [nearPx, farPx] = frame.dimensionsPx;
  const written = (mm: number): string => format.length(mm, { fractionStyle: 'built' });
  const seenPx = [6, frame.heightPx - 6] as const;
  const leftOf = (px: number): number => Math.max(14 + farPx - px, rect.leftPx - px);
  const lowestPx = frame.heightPx - 24;
  const endPx = Math.max(80, frame.widthPx - 160);
  drawMargins(context, paper, rect, leftOf(nearPx) + 8, lowestPx - 12, frame);
  drawDimension(
    context,
    paper,
    {
      direction: 'vertical',
      fromPx: rect.topPx,
      toPx: rect.bottomPx,
      atPx: leftOf(farPx),
      objectPx: Math.max(rect.leftPx, leftOf(farPx)),
      figure: written(geometry.heightMm),
      seenPx,
    },
    measureText,
  );
  const run = oneRun(chosen, geometry.count);
  if (run !== null && chosen.size < geometry.count) {
    const [first, last] = run;
    drawDimension(
      context,
      paper,
      {
        direction: 'vertical',
        fromPx: rect.bottomPx - seamMm(geometry, last + 1) * viewport.pxPerMm,
        toPx: rect.bottomPx - seamMm(geometry, first) * viewport.pxPerMm,
        atPx: leftOf(nearPx),
        objectPx: Math.max(rect.leftPx, leftOf(nearPx)),
        figure: written(seamMm(geometry, last + 1) - seamMm(geometry, first)),
        seenPx,
      },
      measureText,
    );
  }
  drawDimension(
    context,
    paper,
    {
      direction: 'horizontal',
      fromPx: rect.leftPx,
      toPx: rect.rightPx,
      atPx: Math.min(rect.bottomPx + 26, lowestPx),
      objectPx: Math.min(rect.bottomPx, lowestPx),
      figure: written(geometry.widthMm),
      seenPx: [6, endPx],
    },
    measureText,
  );
}

/** Where the stack, enlarged, would run under its dimensions, it ends at a margin. */
function drawMargins(
  context: CanvasRenderingContext2D,
  paper: Paper,
  rect: ReturnType<typeof stackRect>,
  leftPx: number,
  lowestPx: number,
  frame: StackFrame,
): void {
  context.fillStyle = paper.colours.ground;
  if (rect.leftPx < leftPx - 8) context.fillRect(0, 0, leftPx, frame.heightPx);
  if (rect.bottomPx > lowestPx) context.fillRect(0, lowestPx, frame.widthPx, frame.heightPx);
}

/** The names beside the stack, each with its leader. */
export function paintLabels(picture: StackPicture): Paint {
  return (context) => {
    const { column, paper, chosen } = picture;
    const rect = stackRect(picture.geometry, picture.viewport);
    const isOverStack = rect.rightPx > column.leftPx - 12;
    context.textBaseline = 'middle';
    for (const label of column.labels) {
      const isChosen = label.place !== null && chosen.has(label.place);
      if (isChosen || isOverStack) drawPlate(context, paper, column, label, isChosen);
      if (!isOverStack) drawLeader(context, paper, column, label, rect.rightPx, isChosen);
      drawWriting(context, paper, column, label);
    }
  };
}

function drawPlate(
  context: CanvasRenderingContext2D,
  paper: Paper,
  column: LabelColumn,
  label: StackLabel,
  isChosen: boolean,
): void {
  context.fillStyle = isChosen ? paper.colours['steel-ground'] : paper.colours.raised;
  context.globalAlpha = isChosen ? 1 : 0.9;
  context.beginPath();
  context.roundRect(
    column.leftPx - 6,
    label.middlePx - label.heightPx / 2 + 0.5,
    column.widthPx + 12,
    label.heightPx - 1,
    3,
  );
  context.fill();
  context.globalAlpha = 1;
}

/** From the middle of a layer to its name; a brace where a group is named. */
function drawLeader(
  context: CanvasRenderingContext2D,
  paper: Paper,
  column: LabelColumn,
  label: StackLabel,
  fromPx: number,
  isChosen: boolean,
): void {
  const [highPx, lowPx] = label.spanPx;
  const startPx = fromPx + 3;
  const endPx = column.leftPx - 9;
  const middle = (highPx + lowPx) / 2;
  context.strokeStyle = isChosen ? paper.colours.steel : paper.colours.edge;
  context.lineWidth = 1;
  context.beginPath();
  if (label.place === null) {
    const bracePx = startPx + 5;
    context.moveTo(startPx, Math.floor(highPx) + 1.5);
    context.lineTo(bracePx, Math.floor(highPx) + 1.5);
    context.lineTo(bracePx, Math.floor(lowPx) - 0.5);
    context.lineTo(startPx, Math.floor(lowPx) - 0.5);
    context.moveTo(bracePx, middle);
    context.lineTo(endPx - 8, label.middlePx);
    context.lineTo(endPx, label.middlePx);
  } else {
    // The knees keep clear of the grip and of each other.
    context.moveTo(startPx, middle);
    context.lineTo(startPx + 4, middle);
    context.lineTo(endPx - 6, label.middlePx);
    context.lineTo(endPx, label.middlePx);
  }
  context.stroke();
}

function drawWriting(
  context: CanvasRenderingContext2D,
  paper: Paper,
  column: LabelColumn,
  label: StackLabel,
): void {
  const firstPx = label.middlePx + 0.5 - ((label.lines.length - 1) * LABEL_PX) / 2;
  context.textAlign = 'right';
  context.font = PLACE_FONT;
  context.fillStyle = paper.colours.quiet;
  context.fillText(label.number, column.leftPx + column.nameAtPx - 8, label.middlePx + 0.5);
  context.fillStyle = paper.colours.ink;
  for (const [i, line] of label.lines.entries()) {
    const y = firstPx + i * LABEL_PX;
    context.textAlign = 'left';
    context.font = LABEL_FONT;
    context.fillText(line.name, column.leftPx + column.nameAtPx, y);
    context.textAlign = 'right';
    context.font = LABEL_FIGURE_FONT;
    context.fillText(line.figure, column.leftPx + column.widthPx, y);
  }
}

/** A line of words at the head of the sheet. */
export function drawHeadline(
  context: CanvasRenderingContext2D,
  paper: Paper,
  words: string,
  isLive: boolean,
  measure: Measure,
): void {
  context.font = LABEL_FONT;
  context.textAlign = 'left';
  context.textBaseline = 'middle';
  const widthPx = measure(words, LABEL_FONT);
  context.fillStyle = paper.colours.ground;
  context.fillRect(4, 2, widthPx + 12, 24);
  haloed(context, words, 10, 15, isLive ? paper.colours.ember : paper.colours.quiet, paper.colours.ground);
}

/** First and last of places that lie together, or null when they don't. */
export function oneRun(places: ReadonlySet<number>, count: number): readonly [number, number] | null {
  if (places.size === 0) return null;
  const first = Math.min(...places);
  const last = Math.max(...places);
  return last < count && last - first + 1 === places.size ? [first, last] : null;
}
