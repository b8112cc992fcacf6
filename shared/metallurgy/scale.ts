import type { Source } from '../steels/index.js';

export const SCALE_SOURCE: Source = {
  text:
    'x² = kp·t with kp = 6.1 exp(−169 452/RT) cm²/s, attributed to the review by Chen & Yuen (2003) of Paidassi’s data ' +
    'on iron in air; metal lost = 0.565 x (FeO, ratio of volumes 1.77)',
  status: 'from memory: source to be confirmed',
};

/** Metal that goes into one thickness of oxide: FeO has 1.77 times the volume of the iron in it. */
const METAL_PER_OXIDE = 0.565;

/** What clean iron becomes in air at a heat. */
export interface Oxidation {
  /** Parabolic rate, cm²/s. */
  readonly rateCm2PerS: number;
  readonly oxideMm: number;
  /** Off each face. */
  readonly metalLostMm: number;
}

/**
 * Scale that clean iron grows in still air, and the metal in it.
 *
 * **Source**: {@link SCALE_SOURCE}; whether their law carries a factor 2 is not settled.
 * **Valid for** pure iron in air, 700–1250 °C. Habits of the trade, no source: a rich gas forge 0.2–0.6 of it, under
 * borax 0.1–0.3, steel 0.5–0.9. Brushed off in every heat the heats add; left on, the times do.
 * @param temperatureC °C
 * @param seconds ≥ 0
 */
export function ironOxidation(temperatureC: number, seconds: number): Oxidation {
  const rateCm2PerS = 6.1 * Math.exp(-169_452 / (8.314 * (temperatureC + 273.15)));
  const oxideMm = 10 * Math.sqrt(rateCm2PerS * seconds);
  return { rateCm2PerS, oxideMm, metalLostMm: METAL_PER_OXIDE * oxideMm };
}

/**
 * Fraction of a block's volume lost when the same amount is taken off every face:
 * 1 − (a − 2δ)(b − 2δ)(l − 2δ)/(abl). **Source**: derived here, geometry.
 * @param sidesMm the three sides, mm, > 0
 * @param perFaceMm 0 ≤ δ ≤ half the shortest side
 */
export function fractionLostFromFaces(sidesMm: readonly [number, number, number], perFaceMm: number): number {
  return 1 - sidesMm.reduce((left, side) => left * ((side - 2 * perFaceMm) / side), 1);
}
