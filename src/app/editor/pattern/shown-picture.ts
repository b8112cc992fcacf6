import type { PicturePart } from '../../core/compute/messages';
import type { Viewport } from '../canvas/viewport';
import { type Frame, rectIn } from './frame';

/** A picture, and the part of the surface that it shows. */
export interface ShownPicture {
  readonly canvas: HTMLCanvasElement;
  readonly frame: Frame;
}

/** A part of a picture on a canvas of its own, to be drawn wherever the view puts it. */
export function pictureOn(part: PicturePart, frame: Frame): ShownPicture {
  const canvas = document.createElement('canvas');
  canvas.width = part.widthPx;
  canvas.height = part.heightPx;
  canvas.getContext('2d')?.putImageData(new ImageData(part.pixels, part.widthPx, part.heightPx), 0, 0);
  return { canvas, frame };
}

/** Gives back the memory of a picture: some browsers count canvases that nobody holds. */
export function letGo(picture: ShownPicture | null): void {
  if (picture === null) return;
  picture.canvas.width = 0;
  picture.canvas.height = 0;
}

/** Draws a picture where it lies in a view, on a canvas in device pixels. */
export function drawPicture(
  context: CanvasRenderingContext2D,
  { canvas, frame }: ShownPicture,
  viewport: Viewport,
  pixelRatio: number,
): void {
  if (canvas.width === 0) return;
  const { left, top, width, height } = rectIn(frame, viewport, pixelRatio);
  context.imageSmoothingEnabled = width !== canvas.width || height !== canvas.height;
  context.drawImage(canvas, left, top, width, height);
}
