/** The error function, to about 15 digits: its series up to 3, the continued fraction of the complement beyond. */
export function erf(x: number): number {
  const size = Math.abs(x);
  if (size > 6) return Math.sign(x);
  return size < 3 ? erfSeries(x) : Math.sign(x) * (1 - erfcFraction(size));
}

/**
 * Inverse of the error function.
 * @param value −1 < value < 1
 * @throws RangeError outside
 */
export function erfInverse(value: number): number {
  if (!(Math.abs(value) < 1)) throw new RangeError(`erfInverse: value ${value}; must lie between −1 and 1`);
  let low = 0;
  let high = 6;
  const target = Math.abs(value);
  // Bisection: 60 halvings of 6 reach the last digit, and it can't run away near 1 as Newton's method does.
  for (let i = 0; i < 60; i++) {
    const middle = (low + high) / 2;
    if (erf(middle) < target) low = middle;
    else high = middle;
  }
  return Math.sign(value) * ((low + high) / 2);
}

/** A solid whose surface is held at a content while its inside starts at another: contents in wt%. */
export interface SkinProfile {
  readonly startPercent: number;
  readonly surfacePercent: number;
}

/**
 * Content at a depth, wt%: (C − C0)/(Cs − C0) = 1 − erf(x/(2√(Dt))).
 * @param depthM m, ≥ 0
 * @param diffusedM2 Σ D·t, m², > 0
 */
export function contentAtDepth(profile: SkinProfile, depthM: number, diffusedM2: number): number {
  const share = 1 - erf(depthM / (2 * Math.sqrt(diffusedM2)));
  return profile.startPercent + (profile.surfacePercent - profile.startPercent) * share;
}

/**
 * D·t in m² after which a depth has reached a content, for the same solid.
 * @param wantedPercent between start and surface
 * @param depthM m, > 0
 */
export function diffusedToReachM2(profile: SkinProfile, wantedPercent: number, depthM: number): number {
  const { startPercent, surfacePercent } = profile;
  const z = erfInverse(1 - (wantedPercent - startPercent) / (surfacePercent - startPercent));
  return (depthM / (2 * z)) ** 2;
}

function erfSeries(x: number): number {
  let term = x;
  let sum = x;
  for (let n = 1; Math.abs(term) > 1e-17 * Math.abs(sum); n++) {
    term *= (-x * x) / n;
    sum += term / (2 * n + 1);
  }
  return (2 / Math.sqrt(Math.PI)) * sum;
}

/** erfc for x ≥ 3 by its continued fraction, from the end backward. */
function erfcFraction(x: number): number {
  let tail = 0;
  for (let n = 60; n >= 1; n--) tail = n / 2 / (x + tail);
  return Math.exp(-x * x) / (Math.sqrt(Math.PI) * (x + tail));
}
