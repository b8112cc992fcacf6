import type { BarState } from '@shared/bar';
import {
  type AssemblyGeometry,
  type AssemblyHit,
  type PieceBox,
  handleAt,
  spanMm,
} from './assembly-geometry';
import { AMOUNT_PX, type AssemblyFrame, type PieceEntry, type PieceList } from './assembly-scene';
import type { AssemblyTool } from './assembly-tool';
import { boxPx } from './bar-scene';
import { sticksOut } from './bar-text';
import { drawBarView } from './draw-bar-view';
import { drawDimension } from './draw-dimension';
import { type PiecesPicture, drawPieces } from './draw-pieces';
import { drawHeadline } from './draw-stack';
import { FIGURES, type Paper, measureText } from './paper';
import type { Paint } from './sheet';
import { LABEL_FONT } from './stack-scene';
import { type AreaPx, type PointPx, toPx } from './viewport';

const BALLOON_FONT = `500 12px ${FIGURES}`;
const BALLOON_PX = 10;

/** Everything that the drawing of an assembly at rest is made from. */
export interface AssemblyPicture extends PiecesPicture {
  readonly bar: BarState;
  readonly geometry: AssemblyGeometry;
  readonly frame: AssemblyFrame;
  readonly list: PieceList;
  readonly chosen: number | null;
}

/** The end section of an assembly with its dimensions, and the list of its pieces. */
export function paintAssembly(picture: AssemblyPicture): Paint {
  return (context, pixelRatio) => {
    drawPieces(context, pixelRatio, picture);
    drawDimensions(context, picture);
    for (const entry of picture.list.entries) drawEntry(context, picture, entry);
    for (const [place, box] of picture.geometry.boxes.entries()) drawBalloon(context, picture, place, box);
  };
}

function drawDimensions(context: CanvasRenderingContext2D, picture: AssemblyPicture): void {
  const { bar, viewport, paper, format, frame, geometry } = picture;
  const whole = boxPx(viewport, 0, 0, bar.widthMm, bar.thicknessMm);
  const low = Math.min(0, ...geometry.boxes.map((box) => box.upMm));
  const left = Math.min(0, ...geometry.boxes.map((box) => box.acrossMm));
  const corner = toPx(viewport, { acrossMm: left, upMm: low });
  drawDimension(
    context,
    paper,
    {
      direction: 'horizontal',
      fromPx: whole.leftPx,
      toPx: whole.leftPx + whole.widthPx,
      atPx: corner.yPx + 26,
      objectPx: whole.topPx + whole.heightPx,
      figure: format.length(bar.widthMm, { fractionStyle: 'built' }),
      seenPx: [4, frame.widthPx - 4],
    },
    measureText,
  );
  drawDimension(
    context,
    paper,
    {
      direction: 'vertical',
      hasRoomBeside: true,
      fromPx: whole.topPx,
      toPx: whole.topPx + whole.heightPx,
      atPx: corner.xPx - 20,
      objectPx: whole.leftPx,
      figure: format.length(bar.thicknessMm, { fractionStyle: 'built' }),
      seenPx: [4, frame.heightPx - 4],
    },
    measureText,
  );
}

function drawEntry(context: CanvasRenderingContext2D, picture: AssemblyPicture, entry: PieceEntry): void {
  const { paper, list, chosen, geometry, viewport } = picture;
  const isChosen = entry.place === chosen;
  const { leftPx, widthPx, entryPx } = list;
  if (isChosen) {
    context.fillStyle = paper.colours['steel-ground'];
    context.beginPath();
    context.roundRect(leftPx - 6, entry.middlePx - entryPx / 2 + 1, widthPx, entryPx - 2, 3);
    context.fill();
  }
  const box = geometry.boxes[entry.place];
  if (geometry.along === 'thickness' && box) {
    const from = toPx(viewport, { acrossMm: box.acrossMm + box.widthMm, upMm: box.upMm + box.heightMm / 2 });
    context.strokeStyle = isChosen ? paper.colours.steel : paper.colours.edge;
    context.lineWidth = 1;
    context.beginPath();
    // The figure of what sticks out stands first.
    const overhangMm = picture.laid[entry.place]?.overhang.acrossMm ?? 0;
    const startPx = from.xPx + (sticksOut(overhangMm) ? AMOUNT_PX : 3);
    context.moveTo(startPx, from.yPx);
    context.lineTo(startPx + 3, from.yPx);
    context.lineTo(leftPx - 14, entry.middlePx);
    context.lineTo(leftPx - 8, entry.middlePx);
    context.stroke();
  }
  const hasWords = entryPx >= 30;
  balloon(context, paper, { xPx: leftPx + BALLOON_PX, yPx: entry.middlePx }, entry.place, isChosen);
  context.font = LABEL_FONT;
  context.textAlign = 'left';
  context.textBaseline = 'middle';
  context.fillStyle = paper.colours.ink;
  const textPx = leftPx + 2 * BALLOON_PX + 8;
  context.fillText(entry.name, textPx, entry.middlePx + (hasWords ? -8 : 0.5));
  if (!hasWords) return;
  context.fillStyle = paper.colours.quiet;
  context.fillText(entry.words, textPx, entry.middlePx + 10);
}

/** The number of a piece on it, where it is large enough. */
function drawBalloon(
  context: CanvasRenderingContext2D,
  picture: AssemblyPicture,
  place: number,
  box: PieceBox,
): void {
  const { viewport, paper, chosen } = picture;
  if (Math.min(box.widthMm, box.heightMm) * viewport.pxPerMm < 2 * BALLOON_PX + 4) return;
  const middle = toPx(viewport, {
    acrossMm: box.acrossMm + box.widthMm / 2,
    upMm: box.upMm + box.heightMm / 2,
  });
  balloon(context, paper, middle, place, place === chosen);
}

function balloon(
  context: CanvasRenderingContext2D,
  paper: Paper,
  at: PointPx,
  place: number,
  isChosen: boolean,
): void {
  context.beginPath();
  context.arc(at.xPx, at.yPx, BALLOON_PX, 0, 2 * Math.PI);
  context.fillStyle = isChosen ? paper.colours.steel : paper.colours.raised;
  context.fill();
  context.strokeStyle = isChosen ? paper.colours.steel : paper.colours.ink;
  context.lineWidth = 1;
  context.stroke();
  context.font = BALLOON_FONT;
  context.textAlign = 'center';
  context.textBaseline = 'middle';
  context.fillStyle = isChosen ? paper.colours['on-steel'] : paper.colours.ink;
  context.fillText(String(place + 1), at.xPx, at.yPx + 0.5);
}

/** What lies over the assembly while it is worked on. */
export interface AssemblyWork {
  readonly picture: AssemblyPicture;
  readonly tool: AssemblyTool;
  readonly hover: AssemblyHit;
  /** Where a bar dragged from the list would land; null when none is. */
  readonly dropAt: number | null;
  readonly headline: string;
}

/** What is chosen, what the pointer is on, and what the gesture under way will do. */
export function paintAssemblyWork(work: AssemblyWork): Paint {
  return (context, pixelRatio) => {
    const { picture, tool, hover } = work;
    const { paper, chosen } = picture;
    if (tool.kind === 'moving') drawMoving(context, pixelRatio, picture, tool);
    else if (chosen !== null) {
      frameBox(context, picture, chosen, paper.colours.steel, 2.5);
      drawHandle(context, picture, chosen, tool);
    }
    if (tool.kind === 'idle' && hover.kind === 'piece' && hover.place !== chosen) {
      frameBox(context, picture, hover.place, paper.colours.steel, 1.25);
    }
    if (work.dropAt !== null) drawLanding(context, picture, work.dropAt);
    const isLive = tool.kind === 'moving' || tool.kind === 'turning' || work.dropAt !== null;
    drawHeadline(context, paper, work.headline, isLive, measureText);
  };
}

function drawMoving(
  context: CanvasRenderingContext2D,
  pixelRatio: number,
  picture: AssemblyPicture,
  tool: Extract<AssemblyTool, { kind: 'moving' }>,
): void {
  const { paper, viewport, laid } = picture;
  const piece = laid[tool.place];
  const box = placeBox(picture, tool.place);
  if (piece === undefined || box === null) return;
  context.fillStyle = paper.colours.ground;
  context.globalAlpha = 0.72;
  context.fillRect(box.leftPx, box.topPx, box.widthPx, box.heightPx);
  context.globalAlpha = 1;
  context.setLineDash([5, 4]);
  context.strokeStyle = paper.colours.quiet;
  context.lineWidth = 1;
  context.strokeRect(box.leftPx + 0.5, box.topPx + 0.5, box.widthPx - 1, box.heightPx - 1);
  context.setLineDash([]);
  if (tool.to !== null) drawLanding(context, picture, tool.to);
  const shrink = Math.min(1, 120 / box.widthPx, 90 / box.heightPx);
  const carried: AreaPx = {
    leftPx: tool.at.xPx + 14,
    topPx: tool.at.yPx - (box.heightPx * shrink) / 2,
    widthPx: Math.max(6, piece.bar.widthMm * viewport.pxPerMm * shrink),
    heightPx: Math.max(6, piece.bar.thicknessMm * viewport.pxPerMm * shrink),
  };
  context.globalAlpha = 0.92;
  drawBarView(context, pixelRatio, piece.bar, 'end', carried, picture.inks, picture.tiles, paper);
  context.globalAlpha = 1;
  context.strokeStyle = paper.colours.ember;
  context.lineWidth = 2;
  context.strokeRect(carried.leftPx - 1, carried.topPx - 1, carried.widthPx + 2, carried.heightPx + 2);
}

/** The seam where a piece will be laid: a line right through, with an arrow on either side. */
function drawLanding(context: CanvasRenderingContext2D, picture: AssemblyPicture, to: number): void {
  const { geometry, viewport, bar, paper } = picture;
  const count = geometry.boxes.length;
  const atMm = to < count ? spanMm(geometry, to)[0] : spanMm(geometry, count - 1)[1];
  const isUp = geometry.along === 'thickness';
  const a = toPx(viewport, isUp ? { acrossMm: 0, upMm: atMm } : { acrossMm: atMm, upMm: bar.thicknessMm });
  const b = toPx(viewport, isUp ? { acrossMm: bar.widthMm, upMm: atMm } : { acrossMm: atMm, upMm: 0 });
  for (const [colour, width] of [
    [paper.colours.ground, 6],
    [paper.colours.ember, 3],
  ] as const) {
    context.strokeStyle = colour;
    context.lineWidth = width;
    context.beginPath();
    context.moveTo(a.xPx, a.yPx);
    context.lineTo(b.xPx, b.yPx);
    context.stroke();
  }
  context.fillStyle = paper.colours.ember;
  for (const [end, side] of [
    [a, -1],
    [b, 1],
  ] as const) {
    context.beginPath();
    context.moveTo(end.xPx, end.yPx);
    context.lineTo(end.xPx + (isUp ? side * 12 : -6), end.yPx + (isUp ? -6 : side * 12));
    context.lineTo(end.xPx + (isUp ? side * 12 : 6), end.yPx + (isUp ? 6 : side * 12));
    context.fill();
  }
}

/** The handle: an arrow that goes a quarter round. */
function drawHandle(
  context: CanvasRenderingContext2D,
  picture: AssemblyPicture,
  place: number,
  tool: AssemblyTool,
): void {
  const { paper, geometry, viewport } = picture;
  if (place >= geometry.boxes.length) return;
  const { xPx, yPx } = handleAt(geometry, viewport, place);
  context.beginPath();
  context.arc(xPx, yPx, 12, 0, 2 * Math.PI);
  context.fillStyle = tool.kind === 'turning' ? paper.colours.ember : paper.colours.raised;
  context.fill();
  context.strokeStyle = paper.colours.ember;
  context.lineWidth = 1.5;
  context.stroke();
  const ink = tool.kind === 'turning' ? paper.colours['on-ember'] : paper.colours.ember;
  context.strokeStyle = ink;
  context.lineWidth = 2;
  context.beginPath();
  context.arc(xPx, yPx, 6, -Math.PI, Math.PI * 0.35);
  context.stroke();
  // Clockwise, as a quarter turn takes the top to the right.
  const end = Math.PI * 0.35;
  context.fillStyle = ink;
  context.beginPath();
  context.moveTo(xPx + 6 * Math.cos(end) - 5, yPx + 6 * Math.sin(end) + 1);
  context.lineTo(xPx + 6 * Math.cos(end) + 4, yPx + 6 * Math.sin(end) - 2);
  context.lineTo(xPx + 6 * Math.cos(end) + 1, yPx + 6 * Math.sin(end) + 5);
  context.fill();
}

function frameBox(
  context: CanvasRenderingContext2D,
  picture: AssemblyPicture,
  place: number,
  colour: string,
  widthPx: number,
): void {
  const box = placeBox(picture, place);
  if (box === null) return;
  for (const [stroke, width] of [
    [picture.paper.colours.ground, widthPx + 2.5],
    [colour, widthPx],
  ] as const) {
    context.strokeStyle = stroke;
    context.lineWidth = width;
    context.strokeRect(
      box.leftPx + 1,
      box.topPx + 1,
      Math.max(1, box.widthPx - 2),
      Math.max(1, box.heightPx - 2),
    );
  }
}

function placeBox({ geometry, viewport }: AssemblyPicture, place: number): AreaPx | null {
  const box = geometry.boxes[place];
  return box ? boxPx(viewport, box.acrossMm, box.upMm, box.widthMm, box.heightMm) : null;
}
