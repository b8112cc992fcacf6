/** A stream of numbers in [0, 1) from a seed: the same on every machine. */
export type Random = () => number;

/** mulberry32, a well-known generator of 32-bit state. */
export function randomFrom(seed: number): Random {
  let state = seed | 0;
  return () => {
    state = (state + 0x6d2b79f5) | 0;
    let t = Math.imul(state ^ (state >>> 15), state | 1);
    t ^= t + Math.imul(t ^ (t >>> 7), t | 61);
    return ((t ^ (t >>> 14)) >>> 0) / 0x1_0000_0000;
  };
}

export function between(random: Random, from: number, to: number): number {
  return from + (to - from) * random();
}

/** A whole number from `from` to `to`, both included. */
export function wholeBetween(random: Random, from: number, to: number): number {
  return Math.min(to, Math.floor(between(random, from, to + 1)));
}

export function oneOf<T>(random: Random, values: readonly T[]): T {
  return values[wholeBetween(random, 0, values.length - 1)] as T;
}

export function chance(random: Random, share: number): boolean {
  return random() < share;
}
