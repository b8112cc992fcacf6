import { HALF, HUGE, PER_WORD } from './constants';
import { Lanes } from './lanes';
import { Round } from './round';

/** The lattice of dimples, as the step lays it out. */
class Lattice {
  /** A well-mixed 32-bit number for column `i` and row `j`; the same arithmetic as `latticeHash` of the step. */
  @inline
  static hash(start: i32, i: v128, j: v128, face: i32): v128 {
    let h = i32x4.mul(v128.xor(i32x4.splat(start), i), i32x4.splat(0xc2b2ae35));
    h = v128.xor(h, i32x4.shr_u(h, 15));
    h = i32x4.mul(v128.xor(h, j), i32x4.splat(0x27d4eb2f));
    h = v128.xor(h, i32x4.shr_u(h, 13));
    h = i32x4.mul(v128.xor(h, i32x4.splat(face)), i32x4.splat(0x165667b1));
    return v128.xor(h, i32x4.shr_u(h, 16));
  }

  /** How far off its place, in pitches: ±½·stray for a number from 0 to 65 535. */
  @inline
  static stray<T>(bits: v128, stray: v128): v128 {
    const share = v128.mul<T>(Lanes.fromInteger<T>(bits), Lanes.constant<T>(PER_WORD));
    return v128.mul<T>(v128.sub<T>(share, Lanes.constant<T>(HALF)), stray);
  }
}

/** Squared distance to the nearest dimple. `params` are the op's; `shift` is half a pitch on the other face. */
function nearest2<T>(params: usize, x: v128, y: v128, shift: f64): v128 {
  const pitch = Lanes.param<T>(params, 9);
  const rowPitch = Lanes.param<T>(params, 11);
  const stagger = Lanes.param<T>(params, 13);
  const stray = Lanes.param<T>(params, 14);
  const isScattered = load<f64>(params + 112) > 0;
  const seed = load<f64>(params + 120) as i32;
  const start: i32 = (seed ^ 0x9e3779b9) * 0x85ebca6b;
  const columnReach = load<f64>(params + 128) as i32;
  const rowReach = load<f64>(params + 136) as i32;
  const face: i32 = shift > 0 ? 1 : 0;
  const row = v128.mul<T>(v128.sub<T>(y, Lanes.param<T>(params, 12)), Lanes.param<T>(params, 10));
  const column = v128.sub<T>(v128.mul<T>(x, Lanes.param<T>(params, 8)), Lanes.all<T>(0.5 + shift));
  const middleRow = v128.nearest<T>(row);
  let nearest = Lanes.constant<T>(HUGE);
  for (let dj = -rowReach; dj <= rowReach; dj++) {
    const j = v128.add<T>(middleRow, Lanes.all<T>(dj as f64));
    const inRow = v128.sub<T>(column, v128.and(Lanes.isOdd<T>(j), stagger));
    const middleColumn = v128.nearest<T>(inRow);
    for (let di = -columnReach; di <= columnReach; di++) {
      const i = v128.add<T>(middleColumn, Lanes.all<T>(di as f64));
      let alongX = v128.sub<T>(inRow, i);
      let alongY = v128.sub<T>(row, j);
      if (isScattered) {
        const h = Lattice.hash(start, Lanes.toInteger<T>(i), Lanes.toInteger<T>(j), face);
        alongX = v128.sub<T>(alongX, Lattice.stray<T>(v128.and(h, i32x4.splat(0xffff)), stray));
        alongY = v128.sub<T>(alongY, Lattice.stray<T>(i32x4.shr_u(h, 16), stray));
      }
      const dx = v128.mul<T>(alongX, pitch);
      const dy = v128.mul<T>(alongY, rowPitch);
      nearest = v128.pmin<T>(nearest, v128.add<T>(v128.mul<T>(dx, dx), v128.mul<T>(dy, dy)));
    }
  }
  return nearest;
}

export function dimpleBack<T>(params: usize, x: usize, y: usize, z: usize, bytes: usize): void {
  const perThickness = Lanes.param<T>(params, 0);
  const topMm = Lanes.param<T>(params, 1);
  const topSign = Lanes.param<T>(params, 2);
  const bottomMm = Lanes.param<T>(params, 3);
  const bottomSign = Lanes.param<T>(params, 4);
  const isBottomWorked = load<f64>(params + 32) !== 0;
  const shift = load<f64>(params + 40);
  const radius2 = Lanes.param<T>(params, 6);
  const depthLessRadius = Lanes.param<T>(params, 7);
  for (let i: usize = 0; i < bytes; i += 16) {
    const xi = v128.load(x + i);
    const yi = v128.load(y + i);
    const topDepth = Round.depth<T>(nearest2<T>(params, xi, yi, 0), radius2, depthLessRadius);
    const top = v128.add<T>(topMm, v128.mul<T>(topSign, topDepth));
    let bottom = bottomMm;
    if (isBottomWorked) {
      const depth = Round.depth<T>(nearest2<T>(params, xi, yi, shift), radius2, depthLessRadius);
      bottom = v128.add<T>(bottomMm, v128.mul<T>(bottomSign, depth));
    }
    const share = v128.mul<T>(v128.load(z + i), perThickness);
    v128.store(z + i, v128.add<T>(bottom, v128.mul<T>(share, v128.sub<T>(top, bottom))));
  }
}
