import { type Random, randomFrom } from './random.js';

/** The middles of the twelve edges of a cube: directions of the gradients. */
const GRADIENTS = new Float64Array([
  1, 1, 0, -1, 1, 0, 1, -1, 0, -1, -1, 0, 1, 0, 1, -1, 0, 1, 1, 0, -1, -1, 0, -1, 0, 1, 1, 0, -1, 1, 0, 1, -1,
  0, -1, -1,
]);

/**
 * Simplex noise in three dimensions, −1 to 1: a yardstick for how much arithmetic one sample costs, since every machine has
 * its own pace. Measured against, not used.
 *
 * **Source**: K. Perlin's simplex noise (2001) in the form of S. Gustavson's explanation (from memory: source to be confirmed).
 */
export function simplexNoise(seed: number): (x: number, y: number, z: number) => number {
  const shuffled = shuffledBytes(randomFrom(seed));
  const corner = (dx: number, dy: number, dz: number, hash: number): number => {
    const left = 0.6 - dx * dx - dy * dy - dz * dz;
    if (left < 0) return 0;
    const gradient = (hash % 12) * 3;
    const slope =
      (GRADIENTS[gradient] as number) * dx +
      (GRADIENTS[gradient + 1] as number) * dy +
      (GRADIENTS[gradient + 2] as number) * dz;
    return left * left * left * left * slope;
  };
  const hashOf = (i: number, j: number, k: number): number =>
    shuffled[(i & 255) + (shuffled[(j & 255) + (shuffled[k & 255] as number)] as number)] as number;
  return (x, y, z) => {
    const skew = (x + y + z) / 3;
    const i = Math.floor(x + skew);
    const j = Math.floor(y + skew);
    const k = Math.floor(z + skew);
    const unskew = (i + j + k) / 6;
    const x0 = x - i + unskew;
    const y0 = y - j + unskew;
    const z0 = z - k + unskew;
    // Which of the six tetrahedra of the cube the point lies in: the two corners on the way across.
    const i1 = x0 >= y0 && x0 >= z0 ? 1 : 0;
    const j1 = y0 > x0 && y0 >= z0 ? 1 : 0;
    const k1 = i1 + j1 === 0 ? 1 : 0;
    const i2 = x0 >= y0 || x0 >= z0 ? 1 : 0;
    const j2 = y0 > x0 || y0 >= z0 ? 1 : 0;
    const k2 = i2 + j2 === 2 ? 0 : 1;
    return (
      32 *
      (corner(x0, y0, z0, hashOf(i, j, k)) +
        corner(x0 - i1 + 1 / 6, y0 - j1 + 1 / 6, z0 - k1 + 1 / 6, hashOf(i + i1, j + j1, k + k1)) +
        corner(x0 - i2 + 1 / 3, y0 - j2 + 1 / 3, z0 - k2 + 1 / 3, hashOf(i + i2, j + j2, k + k2)) +
        corner(x0 - 0.5, y0 - 0.5, z0 - 0.5, hashOf(i + 1, j + 1, k + 1)))
    );
  };
}

function shuffledBytes(random: Random): Uint8Array {
  const bytes = Array.from({ length: 256 }, (_, i) => i);
  for (let i = 255; i > 0; i--) {
    const j = Math.floor(random() * (i + 1));
    [bytes[i], bytes[j]] = [bytes[j] as number, bytes[i] as number];
  }
  return Uint8Array.from({ length: 512 }, (_, i) => bytes[i & 255] as number);
}
