/**
 * Arithmetic on one vector of numbers: four of single precision or two of double, as `T` says. No table is looked up
 * anywhere; sine, cosine and exponential are polynomials (Taylor series about 0, on an interval so short that their
 * last term left out is below the rounding of `T`).
 */
export class Lanes {
  /** The same number in every lane. */
  @inline
  static all<T>(value: f64): v128 {
    return v128.splat<T>(value as T);
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
    const half = v128.mul<T>(value, Lanes.all<T>(0.5));
    return v128.ne<T>(half, v128.floor<T>(half));
  }

  /** a·b + c. */
  @inline
  static fma<T>(a: v128, b: v128, c: f64): v128 {
    return v128.add<T>(v128.mul<T>(a, b), Lanes.all<T>(c));
  }

  /** sin(90°·t) for −½ ≤ t ≤ ½. */
  @inline
  static sineOfQuarters<T>(t: v128): v128 {
    const s = v128.mul<T>(t, t);
    let sum: v128;
    if (sizeof<T>() === 8) {
      sum = Lanes.fma<T>(s, Lanes.all<T>(-6.688035109811467e-10), 5.692172921967926e-8);
      sum = Lanes.fma<T>(sum, s, -3.598843235212085e-6);
      sum = Lanes.fma<T>(sum, s, 1.6044118478735982e-4);
    } else {
      sum = Lanes.all<T>(1.6044118478735982e-4);
    }
    sum = Lanes.fma<T>(sum, s, -0.004681754135318687);
    sum = Lanes.fma<T>(sum, s, 0.07969262624616704);
    sum = Lanes.fma<T>(sum, s, -0.6459640975062462);
    sum = Lanes.fma<T>(sum, s, 1.5707963267948966);
    return v128.mul<T>(sum, t);
  }

  /** cos(90°·t) for −½ ≤ t ≤ ½. */
  @inline
  static cosineOfQuarters<T>(t: v128): v128 {
    const s = v128.mul<T>(t, t);
    let sum: v128;
    if (sizeof<T>() === 8) {
      sum = Lanes.fma<T>(s, Lanes.all<T>(6.565963114979472e-11), -6.386603083791847e-9);
      sum = Lanes.fma<T>(sum, s, 4.710874778818172e-7);
      sum = Lanes.fma<T>(sum, s, -2.5202042373060605e-5);
      sum = Lanes.fma<T>(sum, s, 9.192602748394266e-4);
    } else {
      sum = Lanes.fma<T>(s, Lanes.all<T>(-2.5202042373060605e-5), 9.192602748394266e-4);
    }
    sum = Lanes.fma<T>(sum, s, -0.02086348076335296);
    sum = Lanes.fma<T>(sum, s, 0.253669507901048);
    sum = Lanes.fma<T>(sum, s, -1.2337005501361697);
    return Lanes.fma<T>(sum, s, 1);
  }

  /** sin(90°·(whole + t)) from the two values at t, |t| ≤ ½. */
  @inline
  static quadrant<T>(whole: v128, sine: v128, cosine: v128): v128 {
    const value = v128.bitselect(cosine, sine, Lanes.isOdd<T>(whole));
    const isNegative = Lanes.isOdd<T>(v128.floor<T>(v128.mul<T>(whole, Lanes.all<T>(0.5))));
    return v128.bitselect(v128.neg<T>(value), value, isNegative);
  }

  /** eˣ for x ≤ 0. */
  @inline
  static exponential<T>(x: v128): v128 {
    const least: f64 = sizeof<T>() === 8 ? -1020 : -124;
    const binary = v128.pmax<T>(Lanes.all<T>(least), v128.mul<T>(x, Lanes.all<T>(1.4426950408889634)));
    const whole = v128.nearest<T>(binary);
    const f = v128.sub<T>(binary, whole);
    let sum: v128;
    if (sizeof<T>() === 8) {
      sum = Lanes.fma<T>(f, Lanes.all<T>(1.3691488853904124e-12), 2.5678435993488196e-11);
      sum = Lanes.fma<T>(sum, f, 4.445538271870812e-10);
      sum = Lanes.fma<T>(sum, f, 7.054911620801121e-9);
      sum = Lanes.fma<T>(sum, f, 1.0178086009239696e-7);
      sum = Lanes.fma<T>(sum, f, 1.3215486790144305e-6);
      sum = Lanes.fma<T>(sum, f, 1.525273380405984e-5);
    } else {
      sum = Lanes.all<T>(1.525273380405984e-5);
    }
    sum = Lanes.fma<T>(sum, f, 1.5403530393381606e-4);
    sum = Lanes.fma<T>(sum, f, 0.0013333558146428441);
    sum = Lanes.fma<T>(sum, f, 0.009618129107628477);
    sum = Lanes.fma<T>(sum, f, 0.05550410866482158);
    sum = Lanes.fma<T>(sum, f, 0.2402265069591007);
    sum = Lanes.fma<T>(sum, f, 0.6931471805599453);
    sum = Lanes.fma<T>(sum, f, 1);
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
