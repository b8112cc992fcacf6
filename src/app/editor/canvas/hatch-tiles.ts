import type { Hatch } from '@shared/steels';
import { HATCH_PATHS, HATCH_TILE_PX, hatchColour } from '../../ui/steel-swatch/hatch-path';

/** Tiles of hatches to fill with, made once for each hatch, ink and pixel ratio: the same lines as on a swatch. */
export class HatchTiles {
  readonly #patterns = new Map<string, CanvasPattern | null>();

  /**
   * A pattern to fill with, or null for no hatch.
   * @param brightness of the tone under it, 0–1
   * @param atPx where a tile begins, CSS px
   */
  pattern(
    context: CanvasRenderingContext2D,
    hatch: Hatch,
    brightness: number,
    pixelRatio: number,
    atPx: { readonly xPx: number; readonly yPx: number },
  ): CanvasPattern | null {
    if (HATCH_PATHS[hatch] === '') return null;
    const ink = hatchColour({ brightness });
    const key = `${hatch} ${ink} ${pixelRatio}`;
    let pattern = this.#patterns.get(key);
    if (pattern === undefined) {
      pattern = context.createPattern(tile(HATCH_PATHS[hatch], ink, pixelRatio), 'repeat');
      this.#patterns.set(key, pattern);
    }
    pattern?.setTransform(new DOMMatrix([1 / pixelRatio, 0, 0, 1 / pixelRatio, atPx.xPx, atPx.yPx]));
    return pattern;
  }

  /** The neutral hatch of what has no layers to show: diagonal lines in one colour. */
  neutral(context: CanvasRenderingContext2D, colour: string, pixelRatio: number): CanvasPattern | null {
    const key = `neutral ${colour} ${pixelRatio}`;
    let pattern = this.#patterns.get(key);
    if (pattern === undefined) {
      pattern = context.createPattern(tile(HATCH_PATHS.diagonal, colour, pixelRatio), 'repeat');
      this.#patterns.set(key, pattern);
    }
    pattern?.setTransform(new DOMMatrix([1 / pixelRatio, 0, 0, 1 / pixelRatio, 0, 0]));
    return pattern;
  }
}

function tile(path: string, ink: string, pixelRatio: number): HTMLCanvasElement {
  const canvas = document.createElement('canvas');
  // A tile of broken pixels would show its border: whole ones, and the lines scaled to them.
  canvas.width = canvas.height = Math.max(1, Math.round(HATCH_TILE_PX * pixelRatio));
  const context = canvas.getContext('2d');
  if (context) {
    context.scale(canvas.width / HATCH_TILE_PX, canvas.height / HATCH_TILE_PX);
    context.strokeStyle = ink;
    context.lineWidth = 1;
    context.lineCap = 'round';
    context.stroke(new Path2D(path));
  }
  return canvas;
}
