import { type BarState, NO_LOSSES, type ReliefColumn, resized, volumeMm3 } from '../bar/index.js';
import { type ForgeResult, forgedTo, refuse } from './step-kind.js';

/** Which faces are worked, and whether the back is worked half a pitch along. */
export const RELIEF_FACES = [
  { value: 'top', label: 'The top' },
  { value: 'bothStaggered', label: 'Both, half a pitch apart' },
  { value: 'bothOpposed', label: 'Both, opposite each other' },
] as const;
export type ReliefFaces = (typeof RELIEF_FACES)[number]['value'];

/** How the bar is made flat again. */
export const RELIEF_FINISHES = [
  { value: 'forgeFlat', label: 'Cut them, then forge flat' },
  { value: 'grindFlat', label: 'Press them in, then grind flat' },
] as const;
export type ReliefFinish = (typeof RELIEF_FINISHES)[number]['value'];

/** The part of grooves and dimples that is the same for both. */
export interface ReliefStep {
  readonly depthMm: number;
  readonly faces: ReliefFaces;
  readonly finish: ReliefFinish;
}

/** Volume under the rectangle of the bar's face, mm³; `shift` moves the pattern along the length by half a pitch. */
export type FaceVolume = (bar: BarState, isShifted: boolean) => number;

/**
 * A bar with relief worked into one or two faces and made flat again.
 * Cut and forged flat: the cut volume is lost, L and W kept, T = V/(L·W). Pressed and ground flat: the depth comes off
 * each worked face. The layers move along their normal, column by column, so lie and number stay.
 */
export function forgeRelief(bar: BarState, step: ReliefStep, faceVolumeMm3: FaceVolume): ForgeResult {
  const worked = step.faces === 'top' ? 1 : 2;
  const deepest = worked * step.depthMm;
  if (deepest >= bar.thicknessMm) return refuse('cut-too-deep', 'depthMm', deepest, bar.thicknessMm);
  if (step.depthMm === 0) return forgedTo(bar);
  const removedMm3 =
    step.finish === 'grindFlat'
      ? deepest * bar.lengthMm * bar.widthMm
      : faceVolumeMm3(bar, false) + (worked === 2 ? faceVolumeMm3(bar, step.faces === 'bothStaggered') : 0);
  const thicknessMm = (volumeMm3(bar) - removedMm3) / (bar.lengthMm * bar.widthMm);
  const cause = step.finish === 'grindFlat' ? 'grinding' : 'cutting';
  return {
    bar: resized(bar, bar.lengthMm, bar.widthMm, thicknessMm),
    lossesMm3: { ...NO_LOSSES, [cause]: removedMm3 },
    eatenLayers: { scale: 0, grinding: 0 },
  };
}

/**
 * How far back each column of metal reaches. Cut and forged flat: up to the bottom of the cut. Pressed in and ground
 * flat: the bar's own face shows at the middle of each print, `depthMm` deeper metal beside it.
 */
export function reliefColumn(
  step: ReliefStep & { readonly radiusMm: number; readonly pitchMm: number },
  earlier: BarState,
  later: BarState,
): ReliefColumn {
  const isPressed = step.finish === 'grindFlat';
  const isBottomWorked = step.faces !== 'top';
  return {
    thicknessMm: later.thicknessMm,
    topMm: earlier.thicknessMm - (isPressed ? step.depthMm : 0),
    topSign: isPressed ? 1 : -1,
    bottomMm: isPressed && isBottomWorked ? step.depthMm : 0,
    bottomSign: isBottomWorked ? (isPressed ? -1 : 1) : 0,
    isBottomShifted: step.faces === 'bothStaggered',
    depthMm: step.depthMm,
    radiusMm: step.radiusMm,
    pitchMm: step.pitchMm,
    middleMm: earlier.widthMm / 2,
  };
}

/** Half the width at the surface of a round-bottomed cut of radius `radiusMm`, `depthMm` deep; upright walls below the radius. */
export function rimRadiusMm(radiusMm: number, depthMm: number): number {
  return depthMm >= radiusMm ? radiusMm : Math.sqrt(2 * radiusMm * depthMm - depthMm * depthMm);
}

/** Depth in mm of a round-bottomed cut at `offsetMm` from its middle; 0 outside its rim. */
export function roundDepthMm(radiusMm: number, depthMm: number, offsetMm: number): number {
  const under = radiusMm * radiusMm - offsetMm * offsetMm;
  return under <= 0 ? 0 : Math.max(0, depthMm - radiusMm + Math.sqrt(under));
}
