import type { Forging } from '@shared/forging';

/** Sketches are drawn into this box, px. */
export interface SketchBox {
  readonly widthPx: number;
  readonly heightPx: number;
}

/** Sizes that the scale is made for: from one to the next it stays, so that drawings don't jump at every edit. */
const STAGES = [1, 1.25, 1.5, 1.75, 2, 2.5, 3, 3.5, 4, 5, 6, 7, 8, 10] as const;

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
  return Math.min(box.widthPx / stageOf(lengthMm), box.heightPx / stageOf(thicknessMm));
}

/** The next stage from a size on. */
function stageOf(mm: number): number {
  const power = 10 ** Math.floor(Math.log10(mm));
  return power * (STAGES.find((stage) => stage * power >= mm - 1e-9) ?? 10);
}
