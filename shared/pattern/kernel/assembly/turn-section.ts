import { EVEN, MINUS_ONE, ONE, TINY } from './constants';
import { Lanes } from './lanes';

/** The turn of a section about its middle; `shared/pattern/reference/turn-section.ts` says what it is and why. */
export class Section {
  /** k'² of the ring through a point, from its squared coordinates in half widths from the middle: (1 − y²)(1 − z²). */
  @inline
  static ring<T>(y2: v128, z2: v128): v128 {
    const one = Lanes.constant<T>(ONE);
    return v128.mul<T>(v128.sub<T>(one, y2), v128.sub<T>(one, z2));
  }

  /** g cos 2w + (1 + k') sin²w. */
  @inline
  static scale<T>(kk: v128, s: v128): v128 {
    const one = Lanes.constant<T>(ONE);
    const g = Lanes.term<T>(Lanes.term<T>(Lanes.constant<T>(EVEN), kk, EVEN + 1), kk, EVEN + 2);
    const cosine = v128.sub<T>(one, v128.add<T>(s, s));
    return v128.add<T>(v128.mul<T>(g, cosine), v128.mul<T>(v128.add<T>(one, kk), s));
  }

  /** At least what division needs; less is rounding and happens in the very corners alone. */
  @inline
  static divisor<T>(value: v128): v128 {
    return v128.pmax<T>(Lanes.constant<T>(TINY), value);
  }

  /** Within −1 to 1; in the very corners the limits decide. */
  @inline
  static inside<T>(value: v128): v128 {
    return Lanes.clamp<T>(value, Lanes.constant<T>(MINUS_ONE), Lanes.constant<T>(ONE));
  }
}
