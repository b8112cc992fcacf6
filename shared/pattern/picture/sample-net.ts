/** Most samples that a pixel gets where its neighbours differ. */
export const MOST_SAMPLES = 16;

/** The first samples of a pixel: if they and its middle agree, nothing else is likely to be in it. */
export const FIRST_SAMPLES = 4;

/** A place in a pixel, 0–1 from its left and from its upper edge. */
type Place = readonly [across: number, down: number];

/** Binary digits of the two coordinates of Sobol's first 16 points. */
const ACROSS_BITS = [8, 4, 2, 1] as const;
const DOWN_BITS = [8, 12, 10, 15] as const;
/** Sobol's points, those nearest to the four corners first. */
const ORDER = [0, 7, 8, 15, 1, 2, 3, 4, 5, 6, 9, 10, 11, 12, 13, 14] as const;

/**
 * Sixteen places, one in every sixteenth of the width and of the height, so that straight borders at any slant are weighed
 * finely. The first four lie in the corners and find what the pixel's middle doesn't show.
 *
 * **Source**: Sobol's sequence in two dimensions (from memory: source to be confirmed).
 */
const MANY: readonly Place[] = ORDER.map(
  (i) => [(digits(i, ACROSS_BITS) + 0.5) / 16, (digits(i, DOWN_BITS) + 0.5) / 16] as const,
);

/** Four places, one in every quarter of the width and of the height: the grid turned by the slope 1 : 2. */
const FEW: readonly Place[] = [
  [0.375, 0.125],
  [0.875, 0.375],
  [0.125, 0.625],
  [0.625, 0.875],
];

/** Places of the samples in a pixel that gets so many, 2–16. */
export function placesFor(samples: number): readonly Place[] {
  return samples <= FEW.length ? FEW : MANY;
}

function digits(index: number, bits: readonly number[]): number {
  return bits.reduce((sum, bit, k) => ((index >> k) & 1 ? sum ^ bit : sum), 0);
}
