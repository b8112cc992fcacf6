import { HALF, ONE, QUARTER, ROUNDER } from './constants';
import { Lanes } from './lanes';
import { Round } from './round';
import { Section } from './turn-section';

/** Ops that bend: each takes all points of a batch one op back, in place, as those of `solid-ops`. */

export function twistBack<T>(params: usize, x: usize, y: usize, z: usize, bytes: usize): void {
  const none = Lanes.all<T>(0);
  const one = Lanes.constant<T>(ONE);
  const halfWidth = Lanes.param<T>(params, 0);
  const halfThickness = Lanes.param<T>(params, 1);
  const perHalfWidth = v128.div<T>(one, halfWidth);
  const perHalfThickness = v128.div<T>(one, halfThickness);
  const quartersPerMm = Lanes.param<T>(params, 2);
  const reversal = Lanes.param<T>(params, 3);
  const cycle = v128.add<T>(reversal, reversal);
  const perCycle = v128.div<T>(one, cycle);
  const isReversed = load<f64>(params + 32) !== 0;
  const rounder = Lanes.constant<T>(ROUNDER);
  for (let i: usize = 0; i < bytes; i += 16) {
    let turning = v128.load(x + i);
    if (isReversed) {
      const inCycle = v128.mul<T>(cycle, v128.floor<T>(v128.mul<T>(turning, perCycle)));
      const fromTurn = v128.abs<T>(v128.sub<T>(v128.sub<T>(turning, inCycle), reversal));
      turning = v128.sub<T>(reversal, fromTurn);
    }
    const turns = v128.mul<T>(quartersPerMm, turning);
    const rounded = v128.add<T>(turns, rounder);
    const part = v128.sub<T>(turns, v128.sub<T>(rounded, rounder));
    const yIn = Section.inside<T>(v128.sub<T>(v128.mul<T>(v128.load(y + i), perHalfWidth), one));
    const zIn = Section.inside<T>(v128.sub<T>(v128.mul<T>(v128.load(z + i), perHalfThickness), one));
    const y2 = v128.mul<T>(yIn, yIn);
    const z2 = v128.mul<T>(zIn, zIn);
    const besideY = v128.sub<T>(one, y2);
    const besideZ = v128.sub<T>(one, z2);
    const ring = v128.mul<T>(besideY, besideZ);
    const sin = Lanes.sineOfQuarters<T>(part);
    const s = v128.mul<T>(sin, sin);
    const d = Section.scale<T>(v128.sqrt<T>(ring), s);
    // (d − s)(d − (1 − k'²) s)
    const less = v128.sub<T>(d, s);
    const product = v128.mul<T>(less, v128.add<T>(less, v128.mul<T>(ring, s)));
    const own = v128.sqrt<T>(v128.pmax<T>(none, product));
    const other = v128.mul<T>(v128.sqrt<T>(d), sin);
    const yAside = v128.mul<T>(v128.mul<T>(other, zIn), besideY);
    const zAside = v128.mul<T>(v128.mul<T>(other, yIn), besideZ);
    // One division for both coordinates.
    const yBelow = Section.divisor<T>(v128.sub<T>(d, v128.mul<T>(y2, s)));
    const zBelow = Section.divisor<T>(v128.sub<T>(d, v128.mul<T>(z2, s)));
    const perBoth = v128.div<T>(one, v128.mul<T>(yBelow, zBelow));
    const yAbove = v128.sub<T>(v128.mul<T>(yIn, own), yAside);
    const zAbove = v128.add<T>(v128.mul<T>(zIn, own), zAside);
    const yTurned = Section.inside<T>(v128.mul<T>(v128.mul<T>(yAbove, zBelow), perBoth));
    const zTurned = Section.inside<T>(v128.mul<T>(v128.mul<T>(zAbove, yBelow), perBoth));
    // Whole quarters, by the two lowest bits of their number: (y, z), (−z, y), (−y, −z), (z, −y).
    const odd = Lanes.bitToSign<T>(rounded, 0);
    const second = Lanes.bitToSign<T>(rounded, 1);
    const swap = v128.and(v128.xor(yTurned, zTurned), Lanes.signToMask<T>(odd));
    const yBack = v128.xor(v128.xor(yTurned, swap), v128.xor(odd, second));
    const zBack = v128.xor(v128.xor(zTurned, swap), second);
    v128.store(y + i, v128.mul<T>(v128.add<T>(yBack, one), halfWidth));
    v128.store(z + i, v128.mul<T>(v128.add<T>(zBack, one), halfThickness));
  }
}

export function cornerBack<T>(params: usize, y: usize, z: usize, bytes: usize): void {
  const one = Lanes.constant<T>(ONE);
  const halfWidth = Lanes.param<T>(params, 0);
  const halfThickness = Lanes.param<T>(params, 1);
  const perHalfWidth = v128.div<T>(one, halfWidth);
  const perHalfThickness = v128.div<T>(one, halfThickness);
  for (let i: usize = 0; i < bytes; i += 16) {
    const yi = v128.sub<T>(v128.mul<T>(v128.load(y + i), perHalfWidth), one);
    const zi = v128.sub<T>(v128.mul<T>(v128.load(z + i), perHalfThickness), one);
    const yIn = Section.inside<T>(yi);
    const zIn = Section.inside<T>(zi);
    const y2 = v128.mul<T>(yIn, yIn);
    const z2 = v128.mul<T>(zIn, zIn);
    const kk = v128.sqrt<T>(Section.ring<T>(y2, z2));
    const more = v128.add<T>(one, kk);
    const root = v128.sqrt<T>(more);
    const yAside = v128.mul<T>(zIn, v128.sub<T>(one, y2));
    const zAside = v128.mul<T>(yIn, v128.sub<T>(one, z2));
    const yBelow = Section.divisor<T>(v128.sub<T>(more, y2));
    const zBelow = Section.divisor<T>(v128.sub<T>(more, z2));
    const perBoth = v128.div<T>(root, v128.mul<T>(yBelow, zBelow));
    const yAbove = v128.sub<T>(v128.mul<T>(yIn, kk), yAside);
    const zAbove = v128.add<T>(v128.mul<T>(zIn, kk), zAside);
    const yBack = Section.inside<T>(v128.mul<T>(v128.mul<T>(yAbove, zBelow), perBoth));
    const zBack = Section.inside<T>(v128.mul<T>(v128.mul<T>(zAbove, yBelow), perBoth));
    v128.store(y + i, v128.mul<T>(v128.add<T>(yBack, one), halfWidth));
    v128.store(z + i, v128.mul<T>(v128.add<T>(zBack, one), halfThickness));
  }
}

export function grooveBack<T>(params: usize, x: usize, y: usize, z: usize, bytes: usize): void {
  const perThickness = Lanes.param<T>(params, 0);
  const topMm = Lanes.param<T>(params, 1);
  const topSign = Lanes.param<T>(params, 2);
  const bottomMm = Lanes.param<T>(params, 3);
  const bottomSign = Lanes.param<T>(params, 4);
  const isBottomWorked = load<f64>(params + 32) !== 0;
  const shift = Lanes.param<T>(params, 5);
  const radius2 = Lanes.param<T>(params, 6);
  const depthLessRadius = Lanes.param<T>(params, 7);
  const perPitch = Lanes.param<T>(params, 8);
  const pitchAcross = Lanes.param<T>(params, 9);
  const slope = Lanes.param<T>(params, 10);
  const middle = Lanes.param<T>(params, 11);
  const half = Lanes.constant<T>(HALF);
  for (let i: usize = 0; i < bytes; i += 16) {
    const zi = v128.load(z + i);
    const slant = v128.mul<T>(v128.sub<T>(v128.load(y + i), middle), slope);
    const turns = v128.mul<T>(v128.add<T>(v128.load(x + i), slant), perPitch);
    const inPitch = v128.sub<T>(v128.sub<T>(turns, v128.floor<T>(turns)), half);
    const offset = v128.mul<T>(inPitch, pitchAcross);
    const topDepth = Round.depth<T>(v128.mul<T>(offset, offset), radius2, depthLessRadius);
    const top = v128.add<T>(topMm, v128.mul<T>(topSign, topDepth));
    let bottom = bottomMm;
    if (isBottomWorked) {
      const below = v128.add<T>(turns, shift);
      const inPitchBelow = v128.sub<T>(v128.sub<T>(below, v128.floor<T>(below)), half);
      const offsetBelow = v128.mul<T>(inPitchBelow, pitchAcross);
      const depth = Round.depth<T>(v128.mul<T>(offsetBelow, offsetBelow), radius2, depthLessRadius);
      bottom = v128.add<T>(bottomMm, v128.mul<T>(bottomSign, depth));
    }
    const share = v128.mul<T>(zi, perThickness);
    v128.store(z + i, v128.add<T>(bottom, v128.mul<T>(share, v128.sub<T>(top, bottom))));
  }
}

export function wedgeBack<T>(params: usize, y: usize, z: usize, bytes: usize): void {
  const thickness = Lanes.param<T>(params, 0);
  const middle = Lanes.param<T>(params, 1);
  const drag = Lanes.param<T>(params, 2);
  const perReach = Lanes.param<T>(params, 3);
  for (let i: usize = 0; i < bytes; i += 16) {
    const distance = v128.abs<T>(v128.sub<T>(v128.load(y + i), middle));
    const dragged = v128.mul<T>(drag, Lanes.exponential<T>(v128.neg<T>(v128.mul<T>(distance, perReach))));
    const height = v128.add<T>(v128.load(z + i), dragged);
    const isPast = v128.gt<T>(height, thickness);
    v128.store(z + i, v128.sub<T>(height, v128.and(isPast, thickness)));
  }
}

/** Three waves: see `shared/pattern/program/waves.ts`. */
export function unevenBack<T>(params: usize, x: usize, y: usize, z: usize, bytes: usize): void {
  const one = Lanes.constant<T>(ONE);
  const perLength = Lanes.param<T>(params, 0);
  const perWidth = Lanes.param<T>(params, 1);
  const perThickness = Lanes.param<T>(params, 2);
  const driftX = Lanes.param<T>(params, 3);
  const driftY = Lanes.param<T>(params, 4);
  const liftZ = Lanes.param<T>(params, 5);
  for (let i: usize = 0; i < bytes; i += 16) {
    const xi = v128.load(x + i);
    const yi = v128.load(y + i);
    const zi = v128.load(z + i);
    let lift = Lanes.all<T>(0);
    let drift = Lanes.all<T>(0);
    for (let wave: usize = 0; wave < 3; wave++) {
      const words = params + 48 + (wave << 5);
      const alongX = v128.mul<T>(xi, Lanes.param<T>(words, 0));
      const alongY = v128.mul<T>(yi, Lanes.param<T>(words, 1));
      const turns = v128.add<T>(v128.add<T>(alongX, alongY), Lanes.param<T>(words, 2));
      lift = v128.add<T>(lift, v128.mul<T>(Lanes.param<T>(words, 3), Lanes.wave<T>(turns)));
      if (wave === 0) drift = Lanes.wave<T>(v128.add<T>(turns, Lanes.constant<T>(QUARTER)));
    }
    const u = v128.mul<T>(xi, perLength);
    const v = v128.mul<T>(yi, perWidth);
    const w = v128.mul<T>(zi, perThickness);
    const alongX = v128.mul<T>(v128.mul<T>(drift, driftX), v128.mul<T>(u, v128.sub<T>(one, u)));
    const alongY = v128.mul<T>(v128.mul<T>(drift, driftY), v128.mul<T>(v, v128.sub<T>(one, v)));
    const alongZ = v128.mul<T>(v128.mul<T>(lift, liftZ), v128.mul<T>(w, v128.sub<T>(one, w)));
    v128.store(x + i, v128.add<T>(xi, alongX));
    v128.store(y + i, v128.add<T>(yi, alongY));
    v128.store(z + i, v128.add<T>(zi, alongZ));
  }
}
