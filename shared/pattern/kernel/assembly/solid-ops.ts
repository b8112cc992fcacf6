import { Lanes } from './lanes';

/**
 * Ops that cut, stack and press: piecewise straight. Each takes all points of a batch one op back, in place.
 * `x`, `y` and `z` point at the coordinates, `bytes` long and padded to whole vectors; `params` at the op's numbers.
 */
export function affineBack<T>(params: usize, x: usize, y: usize, z: usize, bytes: usize): void {
  const fromX = source(params, 0, x, y, z);
  const fromY = source(params, 1, x, y, z);
  const fromZ = source(params, 2, x, y, z);
  const scaleX = Lanes.param<T>(params, 3);
  const scaleY = Lanes.param<T>(params, 4);
  const scaleZ = Lanes.param<T>(params, 5);
  const shiftX = Lanes.param<T>(params, 6);
  const shiftY = Lanes.param<T>(params, 7);
  const shiftZ = Lanes.param<T>(params, 8);
  for (let i: usize = 0; i < bytes; i += 16) {
    const a = v128.load(fromX + i);
    const b = v128.load(fromY + i);
    const c = v128.load(fromZ + i);
    v128.store(x + i, v128.add<T>(v128.mul<T>(a, scaleX), shiftX));
    v128.store(y + i, v128.add<T>(v128.mul<T>(b, scaleY), shiftY));
    v128.store(z + i, v128.add<T>(v128.mul<T>(c, scaleZ), shiftZ));
  }
}

function source(params: usize, index: usize, x: usize, y: usize, z: usize): usize {
  const axis = load<f64>(params + (index << 3));
  return axis === 0 ? x : axis === 1 ? y : z;
}

export function restackBack<T>(params: usize, x: usize, y: usize, z: usize, bytes: usize): void {
  const height = Lanes.param<T>(params, 0);
  const perHeight = Lanes.param<T>(params, 1);
  const last = Lanes.param<T>(params, 2);
  const step = Lanes.param<T>(params, 3);
  const width = Lanes.param<T>(params, 4);
  const none = Lanes.all<T>(0);
  const isTurned = load<f64>(params + 40) === 1;
  for (let i: usize = 0; i < bytes; i += 16) {
    const zi = v128.load(z + i);
    const k = Lanes.clamp<T>(v128.floor<T>(v128.mul<T>(zi, perHeight)), none, last);
    const inPiece = v128.sub<T>(zi, v128.mul<T>(k, height));
    v128.store(x + i, v128.add<T>(v128.load(x + i), v128.mul<T>(k, step)));
    if (isTurned) {
      const isOver = Lanes.isOdd<T>(k);
      const yi = v128.load(y + i);
      v128.store(y + i, v128.bitselect(v128.sub<T>(width, yi), yi, isOver));
      v128.store(z + i, v128.bitselect(v128.sub<T>(height, inPiece), inPiece, isOver));
    } else {
      v128.store(z + i, inPiece);
    }
  }
}

export function foldBack<T>(params: usize, x: usize, z: usize, bytes: usize): void {
  const seam = Lanes.param<T>(params, 0);
  const thickness = Lanes.param<T>(params, 1);
  const length = Lanes.param<T>(params, 2);
  for (let i: usize = 0; i < bytes; i += 16) {
    const xi = v128.load(x + i);
    const zi = v128.load(z + i);
    const isOver = v128.gt<T>(zi, seam);
    v128.store(x + i, v128.bitselect(v128.sub<T>(length, xi), xi, isOver));
    v128.store(z + i, v128.bitselect(v128.sub<T>(thickness, zi), zi, isOver));
  }
}

export function sliceBack<T>(params: usize, x: usize, y: usize, z: usize, bytes: usize): void {
  const tile = Lanes.param<T>(params, 0);
  const perTile = Lanes.param<T>(params, 1);
  const last = Lanes.param<T>(params, 2);
  const step = Lanes.param<T>(params, 3);
  const width = Lanes.param<T>(params, 4);
  const none = Lanes.all<T>(0);
  const isTurned = load<f64>(params + 40) === 1;
  for (let i: usize = 0; i < bytes; i += 16) {
    const xi = v128.load(x + i);
    const k = Lanes.clamp<T>(v128.floor<T>(v128.mul<T>(xi, perTile)), none, last);
    const inTile = v128.sub<T>(xi, v128.mul<T>(k, tile));
    v128.store(x + i, v128.add<T>(v128.mul<T>(k, step), v128.load(z + i)));
    if (isTurned) {
      const isOver = Lanes.isOdd<T>(k);
      const yi = v128.load(y + i);
      v128.store(y + i, v128.bitselect(v128.sub<T>(width, yi), yi, isOver));
      v128.store(z + i, v128.bitselect(v128.sub<T>(tile, inTile), inTile, isOver));
    } else {
      v128.store(z + i, inTile);
    }
  }
}
