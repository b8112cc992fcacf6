import {
  BELLY,
  EIGHT,
  HALF,
  LEAST_EXPONENT,
  PER_LN2,
  POWER,
  ROUNDER,
  SINE,
  SIXTEEN,
  constantAt,
} from './constants';

/**
 * Arithmetic on one vector of numbers: four of single precision or two of double, as `T` says. No table is looked up
 * by what a sample holds; sine, cosine and exponential are polynomials on an interval so short that their error is below the
 * rounding of `T`.
 */
export class Lanes {
  /** The same number in every lane. */
  @inline
  static all<T>(value: f64): v128 {
    return v128.splat<T>(value as T);
  }

  /** One of the numbers of `constants` in every lane. */
  @inline
  static constant<T>(index: i32): v128 {
    return v128.load_splat<T>(constantAt<T>(index));
  }

  /** Parameter `index` of an op in every lane. */
  @inline
  static param<T>(params: usize, index: i32): v128 {
    return v128.splat<T>(load<f64>(params + ((index as usize) << 3)) as T);
  }

  @inline
  static clamp<T>(value: v128, low: v128, high: v128): v128 {
    return v128.pmin<T>(high, v128.pmax<T>(low, value));
  }

  /** All bits set in the lanes where the whole number `value` is odd. */
  @inline
  static isOdd<T>(value: v128): v128 {
    const half = v128.mul<T>(value, Lanes.constant<T>(HALF));
    return v128.ne<T>(half, v128.floor<T>(half));
  }

  /** The next term of a polynomial: sum·x + constant `index`. */
  @inline
  static term<T>(sum: v128, x: v128, index: i32): v128 {
    return v128.add<T>(v128.mul<T>(sum, x), Lanes.constant<T>(index));
  }

  /** Bit 0 or 1 of whole numbers, added to the constant ROUNDER, as the sign bit of each lane; the other bits are 0. */
  @inline
  static bitToSign<T>(rounded: v128, bit: i32): v128 {
    if (sizeof<T>() === 8) return i64x2.shl(i64x2.shr_u(rounded, bit), 63);
    return i32x4.shl(i32x4.shr_u(rounded, bit), 31);
  }

  /** All bits of the lanes whose sign bit is set. */
  @inline
  static signToMask<T>(sign: v128): v128 {
    if (sizeof<T>() === 8) return i64x2.sub(i64x2.splat(0), i64x2.shr_u(sign, 63));
    return i32x4.shr_s(sign, 31);
  }

  /** sin(90°·t) for −½ ≤ t ≤ ½. */
  @inline
  static sineOfQuarters<T>(t: v128): v128 {
    const s = v128.mul<T>(t, t);
    let sum: v128;
    if (sizeof<T>() === 8) {
      sum = Lanes.term<T>(Lanes.constant<T>(SINE), s, SINE + 1);
      sum = Lanes.term<T>(sum, s, SINE + 2);
      sum = Lanes.term<T>(sum, s, SINE + 3);
      sum = Lanes.term<T>(sum, s, SINE + 4);
    } else {
      sum = Lanes.constant<T>(SINE + 4);
    }
    sum = Lanes.term<T>(sum, s, SINE + 5);
    sum = Lanes.term<T>(sum, s, SINE + 6);
    sum = Lanes.term<T>(sum, s, SINE + 7);
    return v128.mul<T>(sum, t);
  }

  /** The form of the hammer's waves; see `shared/pattern/program/waves.ts`. */
  @inline
  static wave<T>(turns: v128): v128 {
    const rounder = Lanes.constant<T>(ROUNDER);
    const t = v128.sub<T>(turns, v128.sub<T>(v128.add<T>(turns, rounder), rounder));
    const left = v128.sub<T>(
      Lanes.constant<T>(EIGHT),
      v128.mul<T>(Lanes.constant<T>(SIXTEEN), v128.abs<T>(t)),
    );
    const f = v128.mul<T>(t, left);
    const belly = v128.mul<T>(Lanes.constant<T>(BELLY), v128.abs<T>(f));
    return v128.mul<T>(f, v128.add<T>(belly, Lanes.constant<T>(BELLY + 1)));
  }

  /** eˣ for x ≤ 0. */
  @inline
  static exponential<T>(x: v128): v128 {
    const binary = v128.pmax<T>(
      Lanes.constant<T>(LEAST_EXPONENT),
      v128.mul<T>(x, Lanes.constant<T>(PER_LN2)),
    );
    const whole = v128.nearest<T>(binary);
    const f = v128.sub<T>(binary, whole);
    let sum: v128;
    if (sizeof<T>() === 8) {
      sum = Lanes.term<T>(Lanes.constant<T>(POWER), f, POWER + 1);
      sum = Lanes.term<T>(sum, f, POWER + 2);
      sum = Lanes.term<T>(sum, f, POWER + 3);
      sum = Lanes.term<T>(sum, f, POWER + 4);
      sum = Lanes.term<T>(sum, f, POWER + 5);
      sum = Lanes.term<T>(sum, f, POWER + 6);
    } else {
      sum = Lanes.constant<T>(POWER + 6);
    }
    sum = Lanes.term<T>(sum, f, POWER + 7);
    sum = Lanes.term<T>(sum, f, POWER + 8);
    sum = Lanes.term<T>(sum, f, POWER + 9);
    sum = Lanes.term<T>(sum, f, POWER + 10);
    sum = Lanes.term<T>(sum, f, POWER + 11);
    sum = Lanes.term<T>(sum, f, POWER + 12);
    sum = Lanes.term<T>(sum, f, POWER + 13);
    return v128.mul<T>(sum, Lanes.powerOfTwo<T>(whole));
  }

  /** 2ⁿ for a whole n within the exponents of `T`, written straight into the bits. */
  @inline
  static powerOfTwo<T>(n: v128): v128 {
    if (sizeof<T>() === 8) {
      const whole = i64x2.extend_low_i32x4_s(i32x4.trunc_sat_f64x2_s_zero(n));
      return i64x2.shl(i64x2.add(whole, i64x2.splat(1023)), 52);
    }
    return i32x4.shl(i32x4.add(i32x4.trunc_sat_f32x4_s(n), i32x4.splat(127)), 23);
  }

  /** Whole numbers as 32-bit integers; two of them, then zeros, in double precision. */
  @inline
  static toInteger<T>(value: v128): v128 {
    if (sizeof<T>() === 8) return i32x4.trunc_sat_f64x2_s_zero(value);
    return i32x4.trunc_sat_f32x4_s(value);
  }

  /** Integers from 0 to 65 535 back as numbers. */
  @inline
  static fromInteger<T>(value: v128): v128 {
    if (sizeof<T>() === 8) return f64x2.convert_low_i32x4_s(value);
    return f32x4.convert_i32x4_s(value);
  }
}
