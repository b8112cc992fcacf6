import { erf } from './semi-infinite.js';

/** Below this the series takes many terms and the short-time form is exact to 10⁻¹². */
const SHORT_TIME_FO = 0.01;
/** From here on the first term alone is right to 10⁻⁴ of the residual. */
export const LONG_TIME_FO = 0.05;

/**
 * Share of the starting difference that is left between the means of alternating equal layers: 1 at the start, 0 when
 * level. (8/π²) Σ exp(−(2n+1)²π²Fo)/(2n+1)²; below Fo 0.01 the same as 1 − 4√(Fo/π).
 *
 * **Source**: derived here: Fourier series of a periodic step with equal layers. Unequal layers: half the period stands
 * for the thickness, which is the first harmonic and good once Fo > 0.05.
 * @param fo Σ D·Δt/d², ≥ 0, without unit; d the thickness of a layer
 */
export function layerMeanResidual(fo: number): number {
  if (fo < SHORT_TIME_FO) return 1 - 4 * Math.sqrt(fo / Math.PI);
  let sum = 0;
  for (let n = 1; ; n += 2) {
    const term = Math.exp(-n * n * Math.PI * Math.PI * fo) / (n * n);
    sum += term;
    if (term < 1e-17) return (8 / Math.PI ** 2) * sum;
  }
}

/**
 * Share of the starting difference that is left in the middle of a layer:
 * (4/π) Σ (−1)ⁿ exp(−(2n+1)²π²Fo)/(2n+1); below Fo 0.01 the same as 2·erf(1/(4√Fo)) − 1.
 * **Source** and parameter as {@link layerMeanResidual}.
 */
export function midLayerResidual(fo: number): number {
  if (fo < SHORT_TIME_FO) return fo === 0 ? 1 : 2 * erf(1 / (4 * Math.sqrt(fo))) - 1;
  let sum = 0;
  for (let n = 1, sign = 1; ; n += 2, sign = -sign) {
    const term = Math.exp(-n * n * Math.PI * Math.PI * fo) / n;
    sum += sign * term;
    if (term < 1e-17) return (4 / Math.PI) * sum;
  }
}

/** The long-time form of {@link layerMeanResidual}: 0.81057 exp(−9.8696 Fo). **Valid for** Fo > 0.05. */
export function longTimeMeanResidual(fo: number): number {
  return (8 / Math.PI ** 2) * Math.exp(-Math.PI * Math.PI * fo);
}

/** The long-time form of {@link midLayerResidual}: 1.2732 exp(−9.8696 Fo). **Valid for** Fo > 0.05. */
export function longTimeMidResidual(fo: number): number {
  return (4 / Math.PI) * Math.exp(-Math.PI * Math.PI * fo);
}

/**
 * Seconds until the means of alternating layers have closed to `residual` of their starting difference:
 * d² ln(0.81057/residual)/(9.8696 D).
 * **Valid for** residual < 0.5 (Fo > 0.05).
 * @param layerMm thickness of a layer, or half the period of unequal ones, mm
 */
export function secondsToMeanResidual(residual: number, layerMm: number, diffusivityM2PerS: number): number {
  const fo = Math.log(8 / Math.PI ** 2 / residual) / Math.PI ** 2;
  return (fo * (layerMm * 1e-3) ** 2) / diffusivityM2PerS;
}
