import { latticeHash } from '../../steps/index.js';
import { type Steel, nominalPercent } from '../../steels/index.js';

/**
 * Size of a string of slag in puddled iron, mm: rolled out along the bar, thin across it. Common practice, no source; for
 * pictures only.
 */
const LENGTH_MM = 14;
const WIDTH_MM = 0.7;
const HEIGHT_MM = 0.35;
/** Part of the noise's range below which there is no slag. */
const CLEAN = 0.52;

/** Whether a material shows strings of slag when it is etched. */
export function hasSlag(steel: Steel): boolean {
  return nominalPercent(steel, 'slag') > 0;
}

/** How much slag there is at a place in a stack, 0 none to 255. The same place always shows the same. */
export function slagAt(x: number, y: number, z: number, layer: number): number {
  const broad = noise(x / LENGTH_MM, y / WIDTH_MM, z / HEIGHT_MM, layer);
  const fine = noise(x / (LENGTH_MM / 3), (y * 2.7) / WIDTH_MM, (z * 2.7) / HEIGHT_MM, layer + 1_000);
  const value = 0.65 * broad + 0.35 * fine;
  return value <= CLEAN ? 0 : Math.min(255, Math.round(((value - CLEAN) / (1 - CLEAN)) * 380));
}

/** Smooth noise, 0–1, one value for each whole place. */
function noise(x: number, y: number, z: number, seed: number): number {
  const xi = Math.floor(x);
  const yi = Math.floor(y);
  const zi = Math.floor(z);
  const u = smooth(x - xi);
  const v = smooth(y - yi);
  const w = smooth(z - zi);
  const row = (j: number, k: number): number => {
    const near = valueAt(xi, j, k, seed);
    return near + u * (valueAt(xi + 1, j, k, seed) - near);
  };
  const plane = (k: number): number => {
    const left = row(yi, k);
    return left + v * (row(yi + 1, k) - left);
  };
  const below = plane(zi);
  return below + w * (plane(zi + 1) - below);
}

function valueAt(i: number, j: number, k: number, seed: number): number {
  return latticeHash(seed, i, j, k) / 0x1_0000_0000;
}

function smooth(t: number): number {
  return t * t * (3 - 2 * t);
}
