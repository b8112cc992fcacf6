import type { Paper } from './paper';
import { type StackGeometry, seamMm } from './stack-geometry';
import { type StackFrame, stackRect } from './stack-scene';
import type { Viewport } from './viewport';

/** What the place of layers on the sheet is computed from. */
interface BoxGround {
  readonly geometry: StackGeometry;
  readonly viewport: Viewport;
  readonly frame: StackFrame;
}

/** Layers that lie together, on the sheet, px. */
export interface Box {
  readonly x: number;
  readonly y: number;
  readonly width: number;
  readonly height: number;
}

export function boxOf(picture: BoxGround, first: number, last: number): Box {
  const { geometry, viewport, frame } = picture;
  const rect = stackRect(geometry, viewport);
  const top = rect.bottomPx - seamMm(geometry, last + 1) * viewport.pxPerMm;
  const bottom = rect.bottomPx - seamMm(geometry, first) * viewport.pxPerMm;
  const left = Math.max(-20, rect.leftPx);
  return {
    x: left,
    y: top,
    width: Math.min(frame.widthPx + 20, rect.rightPx) - left,
    height: bottom - top,
  };
}

/** An outline that shows on any tone, and about the thinnest foil too. */
export function outlined(
  context: CanvasRenderingContext2D,
  paper: Paper,
  box: Box,
  colour: string,
  widthPx: number,
): void {
  const grow = box.height < 6 ? 3 : 0;
  const x = Math.round(box.x) + (grow > 0 ? -2 : 1);
  const y = box.y - grow + (grow > 0 ? 0 : 1);
  const width = Math.round(box.width) + (grow > 0 ? 4 : -2);
  const height = box.height + 2 * grow - (grow > 0 ? 0 : 2);
  context.lineJoin = 'miter';
  context.strokeStyle = paper.colours.ground;
  context.lineWidth = widthPx + 2.5;
  context.strokeRect(x, y, width, height);
  context.strokeStyle = colour;
  context.lineWidth = widthPx;
  context.strokeRect(x, y, width, height);
}

/** Places that lie together, as first and last. */
export function runsOf(places: ReadonlySet<number>, count: number): readonly (readonly [number, number])[] {
  const runs: [number, number][] = [];
  for (const place of [...places].filter((p) => p < count).sort((a, b) => a - b)) {
    const last = runs[runs.length - 1];
    if (last && last[1] === place - 1) last[1] = place;
    else runs.push([place, place]);
  }
  return runs;
}
