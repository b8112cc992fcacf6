import type { BarState } from '../../bar/index.js';
import { rimRadiusMm, roundDepthMm } from '../relief.js';
import type { Dimple } from './fields.js';
import { dimpleMiddle } from './lattice.js';

/** Samples along each side of a dimple's box where no closed form applies. */
const SAMPLES = 32;
/** Above this many dimples one repeat of the lattice stands for all of them. */
const MANY = 4_000;

/**
 * Volume of the dimples in one face, mm³. A whole, free dimple is a spherical cap, πd²(3R - d)/3, with an upright wall
 * below the radius; cut by the bar's border or by a neighbour it is summed over 32 × 32 points (within 1 % of its own
 * volume). With more than 4 000 dimples the mean of one lattice repeat is used.
 */
export function dimpleVolumeMm3(bar: BarState, step: Dimple, isShifted: boolean): number {
  const columns = Math.ceil(bar.lengthMm / step.pitchMm) + 1;
  const rows = Math.ceil(bar.widthMm / 2 / step.rowPitchMm) + 1;
  if (columns * (2 * rows + 1) > MANY) {
    const repeat = repeatVolume(step);
    return (repeat / (step.pitchMm * step.rowPitchMm)) * bar.lengthMm * bar.widthMm;
  }
  let volume = 0;
  for (let i = -2; i <= columns; i++) {
    for (let j = -rows; j <= rows; j++) volume += oneVolume(bar, step, isShifted, i, j);
  }
  return volume;
}

/** Volume of a whole, free dimple, mm³. */
export function freeDimpleVolumeMm3(radiusMm: number, depthMm: number): number {
  if (depthMm <= radiusMm) return (Math.PI * depthMm * depthMm * (3 * radiusMm - depthMm)) / 3;
  return (2 * Math.PI * radiusMm ** 3) / 3 + Math.PI * radiusMm * radiusMm * (depthMm - radiusMm);
}

function oneVolume(bar: BarState, step: Dimple, isShifted: boolean, i: number, j: number): number {
  const rim = rimRadiusMm(step.radiusMm, step.depthMm);
  const middle = dimpleMiddle(step, isShifted, i, j);
  const y = middle.y + bar.widthMm / 2;
  if (middle.x + rim <= 0 || middle.x - rim >= bar.lengthMm || y + rim <= 0 || y - rim >= bar.widthMm)
    return 0;
  const isWhole = middle.x >= rim && middle.x + rim <= bar.lengthMm && y >= rim && y + rim <= bar.widthMm;
  const neighbours = neighboursOf(step, isShifted, i, j, rim);
  if (isWhole && neighbours.length === 0) return freeDimpleVolumeMm3(step.radiusMm, step.depthMm);
  return sampledVolume(step, rim, (dx, dy) => {
    const px = middle.x + dx;
    const py = y + dy;
    if (px < 0 || px > bar.lengthMm || py < 0 || py > bar.widthMm) return false;
    return isNearest(dx, dy, middle, neighbours);
  });
}

function repeatVolume(step: Dimple): number {
  const rim = rimRadiusMm(step.radiusMm, step.depthMm);
  const middle = dimpleMiddle(step, false, 0, 0);
  const neighbours = neighboursOf(step, false, 0, 0, rim);
  if (neighbours.length === 0) return freeDimpleVolumeMm3(step.radiusMm, step.depthMm);
  return sampledVolume(step, rim, (dx, dy) => isNearest(dx, dy, middle, neighbours));
}

function sampledVolume(step: Dimple, rim: number, counts: (dx: number, dy: number) => boolean): number {
  const stepMm = (2 * rim) / SAMPLES;
  let sum = 0;
  for (let a = 0; a < SAMPLES; a++) {
    for (let b = 0; b < SAMPLES; b++) {
      const dx = (a + 0.5) * stepMm - rim;
      const dy = (b + 0.5) * stepMm - rim;
      const offset = Math.hypot(dx, dy);
      if (offset < rim && counts(dx, dy)) sum += roundDepthMm(step.radiusMm, step.depthMm, offset);
    }
  }
  return sum * stepMm * stepMm;
}

interface Middle {
  readonly x: number;
  readonly y: number;
}

/** Where two dimples overlap the nearer one counts: both have the same profile. */
function isNearest(dx: number, dy: number, middle: Middle, neighbours: readonly Middle[]): boolean {
  const own = dx * dx + dy * dy;
  return neighbours.every((other) => (middle.x + dx - other.x) ** 2 + (middle.y + dy - other.y) ** 2 >= own);
}

function neighboursOf(
  step: Dimple,
  isShifted: boolean,
  i: number,
  j: number,
  rim: number,
): readonly Middle[] {
  const middle = dimpleMiddle(step, isShifted, i, j);
  const reachI = Math.min(12, Math.ceil((2 * rim) / step.pitchMm) + 1);
  const reachJ = Math.min(12, Math.ceil((2 * rim) / step.rowPitchMm) + 1);
  const found: Middle[] = [];
  for (let di = -reachI; di <= reachI; di++) {
    for (let dj = -reachJ; dj <= reachJ; dj++) {
      if (di === 0 && dj === 0) continue;
      const other = dimpleMiddle(step, isShifted, i + di, j + dj);
      if (Math.hypot(other.x - middle.x, other.y - middle.y) < 2 * rim) found.push(other);
    }
  }
  return found;
}
