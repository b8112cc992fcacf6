import type { Format } from '@shared/units';
import { drawDimension, FIGURE_FONT, haloed } from './draw-dimension';
import { type SteelInk, drawLayers } from './draw-layers';
import { type StackPicture, drawHeadline } from './draw-stack';
import { boxOf, outlined, runsOf } from './draw-stack-box';
import { staysPut } from './landing';
import { type Paper, measureText } from './paper';
import type { Paint } from './sheet';
import { GRIP_OFFSET_PX, type StackHit, gripAt, seamMm, thicknessOf } from './stack-geometry';
import { stackRect } from './stack-scene';
import { type StackTool, gripOf } from './stack-tool';
import { type PointPx, toPx } from './viewport';
import { stockTicks } from './thickness-snap';
import { NOTHING_SELECTED } from './selection';

/** What lies over the stack while it is worked on. */
export interface StackWork {
  readonly picture: StackPicture;
  readonly tool: StackTool;
  readonly hover: StackHit;
  /** Where something dragged from the catalogue would land; null when nothing is. */
  readonly dropAt: number | null;
  readonly stockMm: readonly number[];
  readonly headline: string;
  /** Finer targets on touch: the grip is drawn larger. */
  readonly isCoarse: boolean;
}

/** What is chosen, what the pointer is on, and what the gesture under way will do. */
export function paintWork(work: StackWork): Paint {
  return (context, pixelRatio) => {
    const { picture, tool } = work;
    const isMoving = tool.kind === 'moving';
    if (tool.kind === 'idle' && work.dropAt === null) drawHover(context, picture, work.hover);
    const isAtRest = tool.kind === 'idle' || tool.kind === 'pressed' || tool.kind === 'waiting';
    if (isAtRest || tool.kind === 'spent') drawGrip(context, picture, work.isCoarse);
    if (tool.kind === 'resizing') drawResizing(context, work, tool);
    if (isMoving) drawMoving(context, pixelRatio, picture, tool);
    if (work.dropAt !== null) drawLanding(context, picture, work.dropAt);
    if (tool.kind === 'marquee') drawMarquee(context, picture.paper, tool.from, tool.to);
    const isLive = tool.kind === 'resizing' || isMoving || work.dropAt !== null;
    drawHeadline(context, picture.paper, work.headline, isLive, measureText);
  };
}

/** What happens now, or what is pointed at, in words. */
export function headlineOf(
  tool: StackTool,
  dropAt: number | null,
  count: number,
  format: Format,
  atRest: string,
): string {
  if (dropAt !== null) return `Lay it ${placeWords(dropAt, count)}`;
  if (tool.kind === 'moving') {
    const what = tool.places.size === 1 ? 'the layer' : `${format.count(tool.places.size)} layers`;
    if (tool.to === null || staysPut(tool.places, tool.to)) return `Leave ${what} here`;
    return `Put ${what} ${placeWords(tool.to, tool.geometry.count)}`;
  }
  if (tool.kind === 'resizing') {
    const figure = format.length(tool.thickness.thicknessMm);
    return tool.thickness.stockMm === null
      ? `Layer ${tool.place + 1}: ${figure}`
      : `Layer ${tool.place + 1}: ${figure}, a stock thickness`;
  }
  return atRest;
}

/** "at the bottom", "on top", "between layers 4 and 5". */
function placeWords(to: number, count: number): string {
  if (to === 0) return 'at the bottom';
  return to >= count ? 'on top' : `between layers ${to} and ${to + 1}`;
}

function drawHover(context: CanvasRenderingContext2D, picture: StackPicture, hover: StackHit): void {
  const { paper, geometry, viewport } = picture;
  if (hover.kind === 'empty' || hover.place >= geometry.count) return;
  if (hover.kind === 'layer') {
    if (!picture.chosen.has(hover.place)) {
      outlined(context, paper, boxOf(picture, hover.place, hover.place), paper.colours.steel, 1.25);
    }
    return;
  }
  const rect = stackRect(geometry, viewport);
  const y = rect.bottomPx - seamMm(geometry, hover.place + 1) * viewport.pxPerMm;
  line(context, [rect.leftPx - 4, y], [rect.rightPx + 4, y], paper.colours.ground, 5);
  line(context, [rect.leftPx - 4, y], [rect.rightPx + 4, y], paper.colours.ember, 2);
}

/** The grip: the edge goes on to a double arrow. */
function drawGrip(context: CanvasRenderingContext2D, picture: StackPicture, isCoarse: boolean): void {
  const place = gripOf({ ...NOTHING_SELECTED, places: picture.chosen });
  if (place === null || place >= picture.geometry.count) return;
  drawGripAt(context, picture.paper, gripAt(picture.geometry, picture.viewport, place), isCoarse);
}

function drawGripAt(
  context: CanvasRenderingContext2D,
  paper: Paper,
  { xPx, yPx }: PointPx,
  isCoarse: boolean,
): void {
  const half = isCoarse ? 12 : 9;
  line(context, [xPx - GRIP_OFFSET_PX, yPx], [xPx + 6, yPx], paper.colours.ember, 2);
  context.fillStyle = paper.colours.ember;
  for (const side of [-1, 1]) {
    context.beginPath();
    context.moveTo(xPx, yPx + side * half);
    context.lineTo(xPx - half / 2, yPx + side * 3);
    context.lineTo(xPx + half / 2, yPx + side * 3);
    context.fill();
  }
}

function drawResizing(
  context: CanvasRenderingContext2D,
  work: StackWork,
  tool: Extract<StackTool, { kind: 'resizing' }>,
): void {
  const { picture } = work;
  const { paper, viewport, geometry, format } = picture;
  const rect = stackRect(geometry, viewport);
  const basePx = rect.bottomPx - seamMm(geometry, tool.place) * viewport.pxPerMm;
  const { thicknessMm, stockMm } = tool.thickness;
  const edgePx = basePx - thicknessMm * viewport.pxPerMm;
  line(context, [rect.leftPx, edgePx], [rect.rightPx + 4, edgePx], paper.colours.ember, 2);
  drawGripAt(context, paper, { xPx: rect.rightPx + GRIP_OFFSET_PX, yPx: edgePx }, work.isCoarse);
  const scalePx = rect.rightPx + GRIP_OFFSET_PX + 16;
  const ticks = stockTicks(work.stockMm, thicknessMm, viewport.pxPerMm, 160, 16);
  const figures = ticks.filter((tick) => tick.hasFigure).map((tick) => written(format, tick.stockMm));
  const widestPx = Math.max(0, ...figures.map((figure) => measureText(figure, FIGURE_FONT)));
  if (ticks.length > 0) {
    const heights = ticks.map((tick) => basePx - tick.stockMm * viewport.pxPerMm);
    context.fillStyle = paper.colours.ground;
    context.fillRect(
      scalePx - 4,
      Math.min(...heights) - 12,
      widestPx + 26,
      Math.max(...heights) - Math.min(...heights) + 24,
    );
    context.font = FIGURE_FONT;
    context.textAlign = 'left';
    context.textBaseline = 'middle';
    for (const [i, tick] of ticks.entries()) {
      const y = heights[i] as number;
      const isHere = tick.stockMm === stockMm;
      const ink = isHere ? paper.colours.ember : paper.colours.quiet;
      line(context, [scalePx, y], [scalePx + (isHere ? 14 : 9), y], ink, isHere ? 2 : 1);
      if (tick.hasFigure)
        haloed(context, written(format, tick.stockMm), scalePx + 18, y, ink, paper.colours.ground);
    }
  }
  drawDimension(
    context,
    paper,
    {
      direction: 'vertical',
      fromPx: edgePx,
      toPx: basePx,
      atPx: Math.max(30, rect.leftPx - picture.frame.dimensionsPx[0]),
      objectPx: Math.max(30, rect.leftPx),
      figure: written(format, thicknessMm),
      seenPx: [6, picture.frame.heightPx - 6],
      isLive: true,
    },
    measureText,
  );
}

function drawMoving(
  context: CanvasRenderingContext2D,
  pixelRatio: number,
  picture: StackPicture,
  tool: Extract<StackTool, { kind: 'moving' }>,
): void {
  const { paper, geometry } = picture;
  // Where they were taken from: pale, with a broken outline.
  for (const [first, last] of runsOf(tool.places, geometry.count)) {
    const box = boxOf(picture, first, last);
    context.fillStyle = paper.colours.ground;
    context.globalAlpha = 0.72;
    context.fillRect(box.x, box.y, box.width, box.height);
    context.globalAlpha = 1;
    context.setLineDash([5, 4]);
    context.strokeStyle = paper.colours.quiet;
    context.lineWidth = 1;
    context.strokeRect(box.x + 0.5, box.y + 0.5, box.width - 1, Math.max(0, box.height - 1));
    context.setLineDash([]);
  }
  if (tool.to !== null) drawLanding(context, picture, tool.to);
  drawCarried(context, pixelRatio, picture, tool);
}

/** The layers in the hand: to scale, as far as that can be seen and doesn't hide where they go. */
function drawCarried(
  context: CanvasRenderingContext2D,
  pixelRatio: number,
  picture: StackPicture,
  tool: Extract<StackTool, { kind: 'moving' }>,
): void {
  const { geometry, viewport, paper } = picture;
  const places = [...tool.places].filter((place) => place < geometry.count).sort((a, b) => a - b);
  const totalMm = places.reduce((sum, place) => sum + thicknessOf(geometry, place), 0);
  const pxPerMm = Math.min(viewport.pxPerMm, 110 / totalMm);
  const heightPx = Math.max(6, totalMm * pxPerMm);
  const rect = stackRect(geometry, viewport);
  const widthPx = Math.min(200, (rect.rightPx - rect.leftPx) * 0.6);
  const leftPx = tool.at.xPx + 16;
  const bottomPx = tool.at.yPx + heightPx / 2;
  const inks: readonly SteelInk[] = picture.inks;
  context.globalAlpha = 0.92;
  context.fillStyle = paper.colours.raised;
  context.fillRect(leftPx - 3, bottomPx - heightPx - 3, widthPx + 6, heightPx + 6);
  drawLayers(
    context,
    pixelRatio,
    {
      layers: {
        count: places.length,
        thicknessMm: (i) => thicknessOf(geometry, places[i] as number),
        tone: (i) => picture.inkOf[places[i] as number] as number,
      },
      inks,
      maxMm: totalMm,
      direction: 'up',
      startPx: bottomPx,
      pxPerMm: heightPx / totalMm,
      seenPx: [bottomPx - heightPx, bottomPx],
      acrossPx: [leftPx, leftPx + widthPx],
    },
    picture.tiles,
  );
  context.globalAlpha = 1;
  context.strokeStyle = paper.colours.ember;
  context.lineWidth = 2;
  context.strokeRect(leftPx - 1, bottomPx - heightPx - 1, widthPx + 2, heightPx + 2);
}

/** The seam where something will be laid: a line through the stack with an arrow on either side. */
function drawLanding(context: CanvasRenderingContext2D, picture: StackPicture, to: number): void {
  const { geometry, viewport, paper, frame } = picture;
  const rect = stackRect(geometry, viewport);
  const y = toPx(viewport, { acrossMm: 0, upMm: seamMm(geometry, to) }).yPx;
  const left = Math.max(14, rect.leftPx);
  const right = Math.min(frame.widthPx - 14, rect.rightPx);
  line(context, [left - 2, y], [right + 2, y], paper.colours.ground, 6);
  line(context, [left - 2, y], [right + 2, y], paper.colours.ember, 3);
  context.fillStyle = paper.colours.ember;
  for (const [tip, foot] of [
    [left - 1, left - 12],
    [right + 1, right + 12],
  ] as const) {
    context.beginPath();
    context.moveTo(tip, y);
    context.lineTo(foot, y - 6);
    context.lineTo(foot, y + 6);
    context.fill();
  }
}

function drawMarquee(context: CanvasRenderingContext2D, paper: Paper, a: PointPx, b: PointPx): void {
  const x = Math.min(a.xPx, b.xPx);
  const y = Math.min(a.yPx, b.yPx);
  const width = Math.abs(a.xPx - b.xPx);
  const height = Math.abs(a.yPx - b.yPx);
  context.fillStyle = paper.colours.steel;
  context.globalAlpha = 0.14;
  context.fillRect(x, y, width, height);
  context.globalAlpha = 1;
  context.strokeStyle = paper.colours.steel;
  context.lineWidth = 1;
  context.setLineDash([4, 3]);
  context.strokeRect(x + 0.5, y + 0.5, width, height);
  context.setLineDash([]);
}

function written(format: Format, mm: number): string {
  return format.length(mm, { fractionStyle: 'built' });
}

function line(
  context: CanvasRenderingContext2D,
  [x1, y1]: readonly [number, number],
  [x2, y2]: readonly [number, number],
  colour: string,
  widthPx: number,
): void {
  context.strokeStyle = colour;
  context.lineWidth = widthPx;
  context.beginPath();
  context.moveTo(x1, y1);
  context.lineTo(x2, y2);
  context.stroke();
}
