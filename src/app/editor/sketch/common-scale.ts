import type { Forging } from '@shared/forging';

/** Sketches are drawn into this box, px. */
export interface SketchBox {
  readonly widthPx: number;
  readonly heightPx: number;
}

/** Px per mm at which every state of every bar fits into the box. */
export function commonScale(forging: Forging, box: SketchBox): number {
  let lengthMm = 1;
  let thicknessMm = 1;
  for (const { states } of forging.bars) {
    for (const { bar } of states) {
      lengthMm = Math.max(lengthMm, bar.lengthMm);
      thicknessMm = Math.max(thicknessMm, bar.thicknessMm);
    }
  }
  return Math.min(box.widthPx / lengthMm, box.heightPx / thicknessMm);
}
