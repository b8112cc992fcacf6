import { latticeHash } from '../../steps/index.js';
import { WAVES, waveAt } from '../program/waves.js';
import type { OpBack } from './solid-ops.js';
import { turnPoint, turnPointByHalf } from './turn-section.js';

/** Ops that bend: each takes points `from` to `to` (excluded) one op back, in place. */

export const twistBack: OpBack = ({ x, y, z }, params, at, from, to) => {
  const halfWidth = params[at] as number;
  const halfThickness = params[at + 1] as number;
  const quartersPerMm = params[at + 2] as number;
  const reversal = params[at + 3] as number;
  const isReversed = params[at + 4] !== 0;
  for (let i = from; i < to; i++) {
    let turning = x[i] as number;
    if (isReversed) {
      const inCycle = turning - 2 * reversal * Math.floor(turning / (2 * reversal));
      turning = reversal - Math.abs(inCycle - reversal);
    }
    const turned = quartersPerMm * turning;
    const quarters = Math.round(turned);
    y[i] = clamped((y[i] as number) / halfWidth - 1);
    z[i] = clamped((z[i] as number) / halfThickness - 1);
    turnPoint(y, z, i, turned - quarters, quarters);
    y[i] = ((y[i] as number) + 1) * halfWidth;
    z[i] = ((z[i] as number) + 1) * halfThickness;
  }
};

export const cornerBack: OpBack = ({ y, z }, params, at, from, to) => {
  const halfWidth = params[at] as number;
  const halfThickness = params[at + 1] as number;
  for (let i = from; i < to; i++) {
    y[i] = clamped((y[i] as number) / halfWidth - 1);
    z[i] = clamped((z[i] as number) / halfThickness - 1);
    turnPointByHalf(y, z, i);
    y[i] = ((y[i] as number) + 1) * halfWidth;
    z[i] = ((z[i] as number) + 1) * halfThickness;
  }
};

export const grooveBack: OpBack = ({ x, y, z }, params, at, from, to) => {
  const radius2 = params[at + 6] as number;
  const depthLessRadius = params[at + 7] as number;
  const perPitch = params[at + 8] as number;
  const pitchAcross = params[at + 9] as number;
  const slope = params[at + 10] as number;
  const middle = params[at + 11] as number;
  const depthAt = (turns: number): number => {
    const offset = (turns - Math.floor(turns) - 0.5) * pitchAcross;
    const under = radius2 - offset * offset;
    return under <= 0 ? 0 : Math.max(0, depthLessRadius + Math.sqrt(under));
  };
  const isBottomWorked = params[at + 4] !== 0;
  const shift = params[at + 5] as number;
  for (let i = from; i < to; i++) {
    const turns = ((x[i] as number) + ((y[i] as number) - middle) * slope) * perPitch;
    const bottomDepth = isBottomWorked ? depthAt(turns + shift) : 0;
    z[i] = heightInColumn(z[i] as number, params, at, depthAt(turns), bottomDepth);
  }
};

export const dimpleBack: OpBack = ({ x, y, z }, params, at, from, to) => {
  const isBottomWorked = params[at + 4] !== 0;
  const shift = params[at + 5] as number;
  for (let i = from; i < to; i++) {
    const xi = x[i] as number;
    const yi = y[i] as number;
    const bottomDepth = isBottomWorked ? dimpleDepth(xi, yi, params, at, shift) : 0;
    z[i] = heightInColumn(z[i] as number, params, at, dimpleDepth(xi, yi, params, at, 0), bottomDepth);
  }
};

/** Depth of the pit over a place: that of the nearest, since all have one profile. */
function dimpleDepth(x: number, y: number, params: Float64Array, at: number, shift: number): number {
  const perPitch = params[at + 8] as number;
  const pitch = params[at + 9] as number;
  const perRow = params[at + 10] as number;
  const rowPitch = params[at + 11] as number;
  const stagger = params[at + 13] as number;
  const stray = params[at + 14] as number;
  const seed = params[at + 15] as number;
  const columnReach = params[at + 16] as number;
  const rowReach = params[at + 17] as number;
  const row = (y - (params[at + 12] as number)) * perRow;
  const column = x * perPitch - 0.5 - shift;
  const middleRow = Math.round(row);
  let nearest = Infinity;
  for (let j = middleRow - rowReach; j <= middleRow + rowReach; j++) {
    const isOddRow = Math.abs(j % 2) === 1;
    const inRow = column - (isOddRow ? stagger : 0);
    const middleColumn = Math.round(inRow);
    for (let i = middleColumn - columnReach; i <= middleColumn + columnReach; i++) {
      let alongX = inRow - i;
      let alongY = row - j;
      if (stray > 0) {
        const hash = latticeHash(seed, i, j, shift > 0 ? 1 : 0);
        alongX -= ((hash & 0xffff) / 0xffff - 0.5) * stray;
        alongY -= ((hash >>> 16) / 0xffff - 0.5) * stray;
      }
      const dx = alongX * pitch;
      const dy = alongY * rowPitch;
      nearest = Math.min(nearest, dx * dx + dy * dy);
    }
  }
  const under = (params[at + 6] as number) - nearest;
  return under <= 0 ? 0 : Math.max(0, (params[at + 7] as number) + Math.sqrt(under));
}

/** Where a height in the flattened column lay before: straight from the bottom to the top of what was left of it. */
function heightInColumn(
  z: number,
  params: Float64Array,
  at: number,
  topDepth: number,
  bottomDepth: number,
): number {
  const top = (params[at + 1] as number) + (params[at + 2] as number) * topDepth;
  const bottom = (params[at + 3] as number) + (params[at + 4] as number) * bottomDepth;
  return bottom + z * (params[at] as number) * (top - bottom);
}

export const wedgeBack: OpBack = ({ y, z }, params, at, from, to) => {
  const thickness = params[at] as number;
  const middle = params[at + 1] as number;
  const drag = params[at + 2] as number;
  const perReach = params[at + 3] as number;
  for (let i = from; i < to; i++) {
    const height = (z[i] as number) + drag * Math.exp(-Math.abs((y[i] as number) - middle) * perReach);
    z[i] = height > thickness ? height - thickness : height;
  }
};

export const unevenBack: OpBack = ({ x, y, z }, params, at, from, to) => {
  const waveWords = 4;
  for (let i = from; i < to; i++) {
    const xi = x[i] as number;
    const yi = y[i] as number;
    const zi = z[i] as number;
    let lift = 0;
    let drift = 0;
    for (let wave = 0; wave < WAVES; wave++) {
      const w = at + 6 + wave * waveWords;
      const turns = xi * (params[w] as number) + yi * (params[w + 1] as number) + (params[w + 2] as number);
      lift += (params[w + 3] as number) * waveAt(turns);
      if (wave === 0) drift = waveAt(turns + 0.25);
    }
    // Nothing moves across the faces: the displacement along each axis is none at both ends of it.
    const u = xi * (params[at] as number);
    const v = yi * (params[at + 1] as number);
    const w = zi * (params[at + 2] as number);
    x[i] = xi + drift * (params[at + 3] as number) * u * (1 - u);
    y[i] = yi + drift * (params[at + 4] as number) * v * (1 - v);
    z[i] = zi + lift * (params[at + 5] as number) * w * (1 - w);
  }
};

function clamped(value: number): number {
  return Math.max(-1, Math.min(1, value));
}
