import { Lanes } from './lanes';

/** The turn of a section about its middle; `shared/pattern/reference/turn-section.ts` says what it is and why. */
export class Section {
  /** k'² of the ring through a point, in half widths from the middle: (1 − y²)(1 − z²). */
  @inline
  static ring<T>(y: v128, z: v128): v128 {
    const one = Lanes.all<T>(1);
    return v128.mul<T>(v128.sub<T>(one, v128.mul<T>(y, y)), v128.sub<T>(one, v128.mul<T>(z, z)));
  }

  /** sn of the turn by `t` quarters, |t| ≤ ½. */
  @inline
  static sine<T>(t: v128, ring: v128): v128 {
    const one = Lanes.all<T>(1);
    const two = Lanes.all<T>(2);
    const kk = v128.sqrt<T>(ring);
    const root = v128.sqrt<T>(kk);
    const lambda = v128.mul<T>(
      Lanes.all<T>(0.5),
      v128.div<T>(v128.sub<T>(one, root), v128.add<T>(one, root)),
    );
    const lambda2 = v128.mul<T>(lambda, lambda);
    const lambda4 = v128.mul<T>(lambda2, lambda2);
    const q = v128.mul<T>(lambda, Lanes.fma<T>(lambda4, Lanes.fma<T>(lambda4, Lanes.all<T>(15), 2), 1));
    const q2 = v128.mul<T>(q, q);
    const q4 = v128.mul<T>(q2, q2);
    const q6 = v128.mul<T>(q2, q4);
    const sin = Lanes.sineOfQuarters<T>(t);
    const s = v128.mul<T>(sin, sin);
    // 1 − q²(3 − 4s) + q⁶(5 − 20s + 16s²)
    const upper = v128.add<T>(
      Lanes.fma<T>(q2, Lanes.fma<T>(s, Lanes.all<T>(4), -3), 1),
      v128.mul<T>(q6, Lanes.fma<T>(s, Lanes.fma<T>(s, Lanes.all<T>(16), -20), 5)),
    );
    // 1 − 2q(1 − 2s) + 2q⁴(1 − 8s + 8s²)
    const lower = v128.add<T>(
      Lanes.fma<T>(v128.mul<T>(two, q), Lanes.fma<T>(s, two, -1), 1),
      v128.mul<T>(v128.mul<T>(two, q4), Lanes.fma<T>(s, Lanes.fma<T>(s, Lanes.all<T>(8), -8), 1)),
    );
    const above = v128.mul<T>(
      v128.mul<T>(v128.mul<T>(Lanes.all<T>(1.4142135623730951), sin), upper),
      v128.sub<T>(one, v128.mul<T>(two, q4)),
    );
    const below = v128.mul<T>(
      v128.mul<T>(lower, v128.sub<T>(v128.sub<T>(one, q2), q6)),
      v128.sqrt<T>(v128.add<T>(one, kk)),
    );
    return v128.div<T>(above, below);
  }

  /** sn of half a quarter. */
  @inline
  static halfQuarterSine<T>(ring: v128): v128 {
    const one = Lanes.all<T>(1);
    return v128.div<T>(one, v128.sqrt<T>(v128.add<T>(one, v128.sqrt<T>(ring))));
  }

  /** The factor that a turn of sine `sine` has for the point's own coordinate: cn·dn. */
  @inline
  static cosine<T>(sine: v128, ring: v128): v128 {
    const one = Lanes.all<T>(1);
    const sine2 = v128.mul<T>(sine, sine);
    const product = v128.mul<T>(
      v128.sub<T>(one, sine2),
      v128.sub<T>(one, v128.mul<T>(v128.sub<T>(one, ring), sine2)),
    );
    return v128.sqrt<T>(v128.pmax<T>(Lanes.all<T>(0), product));
  }

  /** One coordinate after the turn: `own` of it, `other` of the one across, signed by the sense of turning. */
  @inline
  static turned<T>(own: v128, other: v128, sine: v128, cosine: v128): v128 {
    const one = Lanes.all<T>(1);
    const own2 = v128.mul<T>(own, own);
    const above = v128.add<T>(
      v128.mul<T>(own, cosine),
      v128.mul<T>(v128.mul<T>(sine, other), v128.sub<T>(one, own2)),
    );
    const below = v128.sub<T>(one, v128.mul<T>(own2, v128.mul<T>(sine, sine)));
    // Below is rounding alone in the very corners; there the clamp decides.
    const value = v128.div<T>(above, v128.pmax<T>(Lanes.all<T>(1e-30), below));
    return Lanes.clamp<T>(value, Lanes.all<T>(-1), one);
  }
}
