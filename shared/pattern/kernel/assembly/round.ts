import { Lanes } from './lanes';

/** Depth of a round-bottomed cut: max(0, depth − R + √(R² − d²)), 0 outside. */
export class Round {
  @inline
  static depth<T>(distance2: v128, radius2: v128, depthLessRadius: v128): v128 {
    const none = Lanes.all<T>(0);
    const under = v128.sub<T>(radius2, distance2);
    const isUnder = v128.gt<T>(under, none);
    const depth = v128.add<T>(depthLessRadius, v128.sqrt<T>(v128.pmax<T>(none, under)));
    return v128.and(isUnder, v128.pmax<T>(none, depth));
  }
}
