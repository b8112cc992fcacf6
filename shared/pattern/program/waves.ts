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

function share(seed: number, bar: number, step: number, which: number): number {
  return latticeHash(seed, bar * 64 + step, which, 2) / 0x1_0000_0000;
}
