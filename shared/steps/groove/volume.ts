import type { BarState } from '../../bar/index.js';
import { rimRadiusMm } from '../relief.js';
import type { Groove } from './fields.js';

/** Rows over which slanted grooves are averaged across the width. */
const ROWS = 64;

/**
 * Volume of the grooves in one face, mm³. Groove middles lie at (k + ½)·pitch along the line
 * p = x + (y - W/2)·tan(angle); shifted ones at k·pitch. Where grooves overlap, the deeper one counts.
 * The circular segment is integrated in closed form along x; slanted grooves are averaged over 64 rows in y.
 */
export function grooveVolumeMm3(bar: BarState, step: Groove, isShifted: boolean): number {
  const slant = (step.angleDeg * Math.PI) / 180;
  const rowVolume = (y: number): number => {
    const from = (y - bar.widthMm / 2) * Math.tan(slant) + (isShifted ? step.pitchMm / 2 : 0);
    return depthIntegral(from + bar.lengthMm, step, slant) - depthIntegral(from, step, slant);
  };
  if (step.angleDeg === 0) return rowVolume(bar.widthMm / 2) * bar.widthMm;
  let sum = 0;
  for (let row = 0; row < ROWS; row++) sum += rowVolume(((row + 0.5) / ROWS) * bar.widthMm);
  return (sum / ROWS) * bar.widthMm;
}

/** ∫ depth dp from 0 to `p`, mm². */
function depthIntegral(p: number, step: Groove, slant: number): number {
  const { pitchMm, radiusMm, depthMm } = step;
  const cos = Math.cos(slant);
  const half = Math.min(rimRadiusMm(radiusMm, depthMm), (pitchMm / 2) * cos);
  const toMiddle = segmentIntegral(half, radiusMm, depthMm);
  const cell = Math.floor(p / pitchMm);
  const offset = (p - cell * pitchMm - pitchMm / 2) * cos;
  const partial = segmentIntegral(Math.max(-half, Math.min(half, offset)), radiusMm, depthMm) + toMiddle;
  return (cell * 2 * toMiddle + partial) / cos;
}

/** ∫ (depth - R + √(R² - u²)) du from 0 to `u`. */
function segmentIntegral(u: number, radiusMm: number, depthMm: number): number {
  const root = Math.sqrt(Math.max(0, radiusMm * radiusMm - u * u));
  const arc = radiusMm * radiusMm * Math.asin(Math.max(-1, Math.min(1, u / radiusMm)));
  return (depthMm - radiusMm) * u + (u * root + arc) / 2;
}
