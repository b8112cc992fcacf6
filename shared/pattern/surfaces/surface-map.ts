import type { Blank } from '../../design/index.js';
import type { Program } from '../program/program.js';
import { bladeMap, bladeOf } from './blade.js';
import { flatMap } from './flat.js';
import type { Surface, SurfaceMap } from './surface.js';

/**
 * Lays a surface out flat.
 * @param bar the program of the bar, or its size
 * @param blank of the design; for the blade alone
 */
export function surfaceMap(
  surface: Surface,
  bar: Pick<Program, 'lengthMm' | 'widthMm' | 'thicknessMm'>,
  blank?: Blank,
): SurfaceMap {
  return surface.kind === 'blade' ? bladeMap(bladeOf(blank, bar), surface.side, bar) : flatMap(surface, bar);
}

/** Points of a surface at the middles of a grid of pixels, row by row from the top left. */
export interface PixelPoints {
  readonly x: Float64Array;
  readonly y: Float64Array;
  readonly z: Float64Array;
  /** 1 where there is metal, else 0. */
  readonly isMetal: Uint8Array;
}

/**
 * Where the pixels of a surface's picture lie in the bar, mm.
 * @param widthPx pixels across, at least 1
 * @param heightPx pixels up, at least 1
 */
export function surfacePoints(map: SurfaceMap, widthPx: number, heightPx: number): PixelPoints {
  const count = widthPx * heightPx;
  const across = new Float64Array(count);
  const up = new Float64Array(count);
  for (let row = 0; row < heightPx; row++) {
    for (let column = 0; column < widthPx; column++) {
      across[row * widthPx + column] = (column + 0.5) / widthPx;
      up[row * widthPx + column] = 1 - (row + 0.5) / heightPx;
    }
  }
  const points = {
    x: new Float64Array(count),
    y: new Float64Array(count),
    z: new Float64Array(count),
    isMetal: new Uint8Array(count).fill(1),
  };
  map.place(across, up, count, { ...points, slope: new Float32Array(count) });
  return points;
}
