import { latticeHash } from '../../steps/index.js';

/** Waves of unevenness in each draw. */
export const WAVES = 3;

/**
 * Wavelengths in mm: the reach of a die, a hammer face, a planishing blow. Common practice, no source; pictures only.
 */
const WAVELENGTH_MM = [36, 19, 11] as const;

/** One wave over the flat of a bar: its turns per mm along x and y and where it starts, in turns. */
export interface Wave {
  readonly turnsPerMmX: number;
  readonly turnsPerMmY: number;
  readonly startTurns: number;
}

/**
 * The waves that a hammer leaves in one draw.
 * @param seed of the design
 * @param bar index of the bar in the document
 * @param step index of the step in the bar
 */
export function hammerWaves(seed: number, bar: number, step: number): readonly Wave[] {
  return WAVELENGTH_MM.map((wavelengthMm, wave) => {
    const spread = share(seed, bar, step, 3 * wave);
    const direction = share(seed, bar, step, 3 * wave + 1) * Math.PI;
    const turnsPerMm = 1 / (wavelengthMm * (0.75 + 0.5 * spread));
    return {
      turnsPerMmX: turnsPerMm * Math.cos(direction),
      turnsPerMmY: turnsPerMm * Math.sin(direction),
      startTurns: share(seed, bar, step, 3 * wave + 2),
    };
  });
}

/**
 * The form of a wave: with t the turns from the nearest whole one and f = 8t(1 − 2|t|), f·(0.775 + 0.225|f|). It is within
 * a thousandth of sin 2πt and as smooth to the eye, for a third of the work.
 *
 * **Source**: a parabola through the sine's zeros and tops, its belly corrected (from memory: source to be confirmed).
 */
export function waveAt(turns: number): number {
  const t = turns - Math.round(turns);
  const f = 8 * t * (1 - 2 * Math.abs(t));
  return f * (0.775 + 0.225 * Math.abs(f));
}

function share(seed: number, bar: number, step: number, which: number): number {
  return latticeHash(seed, bar * 64 + step, which, 2) / 0x1_0000_0000;
}
