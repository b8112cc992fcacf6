import { Lanes } from './lanes';
import { Round } from './round';
import { Section } from './turn-section';

/** Ops that bend: each takes all points of a batch one op back, in place, as those of `solid-ops`. */

export function twistBack<T>(params: usize, x: usize, y: usize, z: usize, bytes: usize): void {
  const one = Lanes.all<T>(1);
  const halfWidth = Lanes.param<T>(params, 0);
  const halfThickness = Lanes.param<T>(params, 1);
  const perHalfWidth = v128.div<T>(one, halfWidth);
  const perHalfThickness = v128.div<T>(one, halfThickness);
  const quartersPerMm = Lanes.param<T>(params, 2);
  const reversal = Lanes.param<T>(params, 3);
  const cycle = v128.add<T>(reversal, reversal);
  const perCycle = v128.div<T>(one, cycle);
  for (let i: usize = 0; i < bytes; i += 16) {
    const xi = v128.load(x + i);
    const inCycle = v128.sub<T>(xi, v128.mul<T>(cycle, v128.floor<T>(v128.mul<T>(xi, perCycle))));
    const turning = v128.sub<T>(reversal, v128.abs<T>(v128.sub<T>(inCycle, reversal)));
    const turns = v128.mul<T>(quartersPerMm, turning);
    const whole = v128.nearest<T>(turns);
    const yi = v128.sub<T>(v128.mul<T>(v128.load(y + i), perHalfWidth), one);
    const zi = v128.sub<T>(v128.mul<T>(v128.load(z + i), perHalfThickness), one);
    const yIn = Lanes.clamp<T>(yi, v128.neg<T>(one), one);
    const zIn = Lanes.clamp<T>(zi, v128.neg<T>(one), one);
    const ring = Section.ring<T>(yIn, zIn);
    const sine = Section.sine<T>(v128.sub<T>(turns, whole), ring);
    const cosine = Section.cosine<T>(sine, ring);
    const yTurned = Section.turned<T>(yIn, zIn, v128.neg<T>(sine), cosine);
    const zTurned = Section.turned<T>(zIn, yIn, sine, cosine);
    // Whole quarters: (y, z), (−z, y), (−y, −z), (z, −y).
    const isOdd = Lanes.isOdd<T>(whole);
    const half = v128.floor<T>(v128.mul<T>(whole, Lanes.all<T>(0.5)));
    const isSecondHalf = Lanes.isOdd<T>(half);
    const yQuarter = v128.bitselect(v128.neg<T>(zTurned), yTurned, isOdd);
    const zQuarter = v128.bitselect(yTurned, zTurned, isOdd);
    const yBack = v128.bitselect(v128.neg<T>(yQuarter), yQuarter, isSecondHalf);
    const zBack = v128.bitselect(v128.neg<T>(zQuarter), zQuarter, isSecondHalf);
    v128.store(y + i, v128.mul<T>(v128.add<T>(yBack, one), halfWidth));
    v128.store(z + i, v128.mul<T>(v128.add<T>(zBack, one), halfThickness));
  }
}

export function cornerBack<T>(params: usize, y: usize, z: usize, bytes: usize): void {
  const one = Lanes.all<T>(1);
  const halfWidth = Lanes.param<T>(params, 0);
  const halfThickness = Lanes.param<T>(params, 1);
  const perHalfWidth = v128.div<T>(one, halfWidth);
  const perHalfThickness = v128.div<T>(one, halfThickness);
  for (let i: usize = 0; i < bytes; i += 16) {
    const yi = v128.sub<T>(v128.mul<T>(v128.load(y + i), perHalfWidth), one);
    const zi = v128.sub<T>(v128.mul<T>(v128.load(z + i), perHalfThickness), one);
    const yIn = Lanes.clamp<T>(yi, v128.neg<T>(one), one);
    const zIn = Lanes.clamp<T>(zi, v128.neg<T>(one), one);
    const ring = Section.ring<T>(yIn, zIn);
    const sine = Section.halfQuarterSine<T>(ring);
    const cosine = Section.cosine<T>(sine, ring);
    const yBack = Section.turned<T>(yIn, zIn, v128.neg<T>(sine), cosine);
    const zBack = Section.turned<T>(zIn, yIn, sine, cosine);
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
  const half = Lanes.all<T>(0.5);
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
  const one = Lanes.all<T>(1);
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
      const quarters = v128.add<T>(v128.add<T>(alongX, alongY), Lanes.param<T>(words, 2));
      const whole = v128.nearest<T>(quarters);
      const t = v128.sub<T>(quarters, whole);
      const sine = Lanes.sineOfQuarters<T>(t);
      const cosine = Lanes.cosineOfQuarters<T>(t);
      const value = Lanes.quadrant<T>(whole, sine, cosine);
      lift = v128.add<T>(lift, v128.mul<T>(Lanes.param<T>(words, 3), value));
      if (wave === 0) drift = Lanes.quadrant<T>(v128.add<T>(whole, one), sine, cosine);
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
