/**
 * Numbers that the inner loops need, in memory: read from there into every lane they cost one instruction, while the engine
 * builds a literal vector out of pieces each time round. {@link layConstants} writes them.
 */
export const ONE = 0;
export const HALF = 1;
export const QUARTER = 2;
export const MINUS_ONE = 3;
export const EIGHT = 4;
export const SIXTEEN = 5;
/** Least divisor: the product of two is still a normal number. */
export const TINY = 6;
/** More than any squared distance. */
export const HUGE = 7;
/** Added to a number, it leaves the nearest whole one in the lowest bits: 1.5·2²³ and 1.5·2⁵². */
export const ROUNDER = 8;
export const PER_WORD = 9;
export const PER_LN2 = 10;
/** Powers of two below it are no normal numbers. */
export const LEAST_EXPONENT = 11;
/** g of the section's turn: three terms, highest first. */
export const EVEN = 12;
/** Two terms of the hammer's waves. */
export const BELLY = 15;
/**
 * sin(90°·t) = t·Σ SINE[n]·t²ⁿ, highest first: eight of Taylor's in double precision, in single the last four places with
 * four fitted to an error of 5·10⁻⁹.
 */
export const SINE = 17;
/** 2ᶠ = Σ POWER[n]·fⁿ likewise; the first six in double precision alone. */
export const POWER = 25;
const COUNT = 39;

const singles = memory.data(COUNT * 4, 16);
const doubles = memory.data(COUNT * 8, 16);

/** Where constant `index` lies in the precision `T`. */
export function constantAt<T>(index: i32): usize {
  if (sizeof<T>() === 8) return doubles + ((index as usize) << 3);
  return singles + ((index as usize) << 2);
}

function put(index: i32, value: f64): void {
  both(index, value, value);
}

function both(index: i32, single: f64, double: f64): void {
  store<f32>(constantAt<f32>(index), single as f32);
  store<f64>(constantAt<f64>(index), double);
}

export function layConstants(): void {
  put(ONE, 1);
  put(HALF, 0.5);
  put(QUARTER, 0.25);
  put(EIGHT, 8);
  put(SIXTEEN, 16);
  put(BELLY, 0.225);
  put(BELLY + 1, 0.775);
  both(TINY, 1e-15, 1e-60);
  put(MINUS_ONE, -1);
  both(ROUNDER, 12582912, 6755399441055744);
  put(EVEN, 0.025);
  put(EVEN + 1, 0.908);
  put(EVEN + 2, 0.067);
  put(HUGE, 1e30);
  put(PER_WORD, 1.0 / 65535.0);
  put(PER_LN2, 1.4426950408889634);
  both(LEAST_EXPONENT, -124, -1020);
  put(SINE, -6.688035109811467e-10);
  put(SINE + 1, 5.692172921967926e-8);
  put(SINE + 2, -3.598843235212085e-6);
  put(SINE + 3, 1.6044118478735982e-4);
  both(SINE + 4, -0.004602176993919446, -0.004681754135318687);
  both(SINE + 5, 0.07968022806619444, 0.07969262624616704);
  both(SINE + 6, -0.6459634786416236, -0.6459640975062462);
  both(SINE + 7, 1.5707963219668066, 1.5707963267948966);
  put(POWER, 1.3691488853904124e-12);
  put(POWER + 1, 2.5678435993488196e-11);
  put(POWER + 2, 4.445538271870812e-10);
  put(POWER + 3, 7.054911620801121e-9);
  put(POWER + 4, 1.0178086009239696e-7);
  put(POWER + 5, 1.3215486790144305e-6);
  put(POWER + 6, 1.525273380405984e-5);
  put(POWER + 7, 1.5403530393381606e-4);
  put(POWER + 8, 0.0013333558146428441);
  put(POWER + 9, 0.009618129107628477);
  put(POWER + 10, 0.05550410866482158);
  put(POWER + 11, 0.2402265069591007);
  put(POWER + 12, 0.6931471805599453);
  put(POWER + 13, 1);
}
