import { MIN_EXTENT_MM, type BarState, resized, volumeMm3 } from '../../bar/index.js';
import { type ForgeResult, forgedTo, refuse } from '../step-kind.js';

/** The sizes a bar is pressed or drawn to; the sides left out follow from constant volume. */
export interface TargetSize {
  readonly lengthMm?: number;
  readonly widthMm?: number;
  readonly thicknessMm?: number;
}

/**
 * Draws a bar to a size at constant volume. With two sides given the third follows; with one, the width is held
 * (the thickness, if the width is the one given); with none, nothing changes.
 * @returns the drawn bar, or a refusal that names the side left over when three are given or the side computed would
 *   be thinner than {@link MIN_EXTENT_MM}
 */
export function drawTo(bar: BarState, target: TargetSize): ForgeResult {
  const { lengthMm, widthMm, thicknessMm } = target;
  const volume = volumeMm3(bar);
  if (lengthMm !== undefined && widthMm !== undefined && thicknessMm !== undefined) {
    return refuse('size-impossible', 'thicknessMm', thicknessMm, volume / (lengthMm * widthMm));
  }
  if (lengthMm === undefined && widthMm === undefined && thicknessMm === undefined) return forgedTo(bar);
  const holdsThickness = lengthMm === undefined && thicknessMm === undefined;
  const width = widthMm ?? (lengthMm !== undefined && thicknessMm !== undefined ? undefined : bar.widthMm);
  const thickness = holdsThickness ? bar.thicknessMm : thicknessMm;
  const length = lengthMm ?? volume / ((width as number) * (thickness as number));
  const finalWidth = width ?? volume / (length * (thickness as number));
  const finalThickness = thickness ?? volume / (length * finalWidth);
  const thinnest = Math.min(length, finalWidth, finalThickness);
  if (thinnest < MIN_EXTENT_MM) {
    const field = lengthMm !== undefined ? 'lengthMm' : widthMm !== undefined ? 'widthMm' : 'thicknessMm';
    return refuse('size-impossible', field, target[field] as number, volume / MIN_EXTENT_MM ** 2);
  }
  return forgedTo(resized(bar, length, finalWidth, finalThickness));
}
