/** Ops that cut, stack and press: piecewise straight. Each takes points `from` to `to` (excluded) one op back, in place. */

/** Points of a batch, mm. */
export interface Points {
  readonly x: Float64Array;
  readonly y: Float64Array;
  readonly z: Float64Array;
}

/** Takes the points `from` to `to` (excluded) one op back; its parameters start at `at`. */
export type OpBack = (points: Points, params: Float64Array, at: number, from: number, to: number) => void;

export const affineBack: OpBack = (points, params, at, from, to) => {
  const axes = [points.x, points.y, points.z] as const;
  const a = axes[params[at] as 0 | 1 | 2];
  const b = axes[params[at + 1] as 0 | 1 | 2];
  const c = axes[params[at + 2] as 0 | 1 | 2];
  const scaleX = params[at + 3] as number;
  const scaleY = params[at + 4] as number;
  const scaleZ = params[at + 5] as number;
  const shiftX = params[at + 6] as number;
  const shiftY = params[at + 7] as number;
  const shiftZ = params[at + 8] as number;
  const { x, y, z } = points;
  for (let i = from; i < to; i++) {
    const ai = a[i] as number;
    const bi = b[i] as number;
    const ci = c[i] as number;
    x[i] = ai * scaleX + shiftX;
    y[i] = bi * scaleY + shiftY;
    z[i] = ci * scaleZ + shiftZ;
  }
};

export const restackBack: OpBack = ({ x, y, z }, params, at, from, to) => {
  const height = params[at] as number;
  const perHeight = params[at + 1] as number;
  const last = params[at + 2] as number;
  const step = params[at + 3] as number;
  const width = params[at + 4] as number;
  const isTurned = params[at + 5] === 1;
  for (let i = from; i < to; i++) {
    const zi = z[i] as number;
    const k = Math.max(0, Math.min(last, Math.floor(zi * perHeight)));
    const inPiece = zi - k * height;
    x[i] = (x[i] as number) + k * step;
    if (isTurned && k % 2 === 1) {
      y[i] = width - (y[i] as number);
      z[i] = height - inPiece;
    } else z[i] = inPiece;
  }
};

export const foldBack: OpBack = ({ x, z }, params, at, from, to) => {
  const seam = params[at] as number;
  const thickness = params[at + 1] as number;
  const length = params[at + 2] as number;
  for (let i = from; i < to; i++) {
    if ((z[i] as number) > seam) {
      x[i] = length - (x[i] as number);
      z[i] = thickness - (z[i] as number);
    }
  }
};

export const sliceBack: OpBack = ({ x, y, z }, params, at, from, to) => {
  const tile = params[at] as number;
  const perTile = params[at + 1] as number;
  const last = params[at + 2] as number;
  const step = params[at + 3] as number;
  const width = params[at + 4] as number;
  const isTurned = params[at + 5] === 1;
  for (let i = from; i < to; i++) {
    const xi = x[i] as number;
    const k = Math.max(0, Math.min(last, Math.floor(xi * perTile)));
    const inTile = xi - k * tile;
    x[i] = k * step + (z[i] as number);
    if (isTurned && k % 2 === 1) {
      y[i] = width - (y[i] as number);
      z[i] = tile - inTile;
    } else z[i] = inTile;
  }
};
