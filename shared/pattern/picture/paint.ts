import type { Steel } from '../../steels/index.js';
import { latticeHash } from '../../steps/index.js';
import type { Program } from '../program/program.js';
import { type Look, paintsOf, srgbOfLinear } from './look.js';
import { MOST_SAMPLES } from './sample-net.js';
import { NO_METAL, type Samples } from './samples.js';

/** A finished picture: red, green, blue and opacity, 0–255 each, row by row from the top left. */
export interface Pixels {
  readonly widthPx: number;
  readonly heightPx: number;
  readonly rgba: Uint8ClampedArray;
}

/** How much darker slag is than the iron around it, at most. Common practice, no source. */
const SLAG_DARKNESS = 0.62;
/** Share by which a border of the greatest difference in height is lit or shaded. By eye. */
const RELIEF_LIGHT = 0.5;
/** Share by which light changes for each mm per mm of slope. By eye. */
const SLOPE_LIGHT = 1.6;
/** Slopes past this are the point of a blade, where the whole bevel runs out in a millimetre: no darker than that. */
const STEEPEST = 0.15;
/** Width and length of a scratch at full grit, mm, and the share by which it changes the light. By eye. */
const SCRATCH_MM = 0.12;
const SCRATCH_LENGTH_MM = 9;
const SCRATCH_LIGHT = 0.14;

/**
 * Paints what a picture's samples found, as a smith sees it in raking light from the upper left: the etched tones of the
 * steels, borders lit and shaded by how high the steels stand, slag along the iron, bevels by their slope, scratches by the grit.
 * Grey but for copper, and readable in print.
 * @param program the picture's; another of the same layers recolours it
 * @param steels those of the forging, in its order
 * @param pixelMm size of a pixel, for the scratches
 */
export function paint(
  samples: Samples,
  program: Program,
  steels: readonly Steel[],
  look: Look,
  pixelMm: number,
): Pixels {
  const { widthPx, heightPx } = samples;
  const lit = litPixels(samples, program, steels, look);
  const rgba = new Uint8ClampedArray(4 * widthPx * heightPx);
  const scratch = scratchLines(look.grit, pixelMm);
  for (let row = 0; row < heightPx; row++) {
    const above = Math.max(0, row - 1) * widthPx;
    const below = Math.min(heightPx - 1, row + 1) * widthPx;
    for (let column = 0; column < widthPx; column++) {
      const pixel = row * widthPx + column;
      const cover = lit.cover[pixel] as number;
      if (cover === 0) continue;
      const before = Math.max(0, column - 1);
      const after = Math.min(widthPx - 1, column + 1);
      const rise = heightOf(lit, below + after, pixel) - heightOf(lit, above + before, pixel);
      const light =
        (1 + look.relief * RELIEF_LIGHT * rise) *
        (1 - SLOPE_LIGHT * Math.min(STEEPEST, samples.slope[pixel] as number)) *
        (1 + scratch(column, row));
      rgba[4 * pixel] = srgbOfLinear((lit.red[pixel] as number) * light);
      rgba[4 * pixel + 1] = srgbOfLinear((lit.green[pixel] as number) * light);
      rgba[4 * pixel + 2] = srgbOfLinear((lit.blue[pixel] as number) * light);
      rgba[4 * pixel + 3] = Math.round(255 * cover);
    }
  }
  return { widthPx, heightPx, rgba };
}

/** Light that comes back from each pixel, before any relief. */
interface Lit {
  readonly red: Float32Array;
  readonly green: Float32Array;
  readonly blue: Float32Array;
  readonly height: Float32Array;
  /** Part of the pixel that is metal, 0–1. */
  readonly cover: Float32Array;
}

function litPixels(samples: Samples, program: Program, steels: readonly Steel[], look: Look): Lit {
  const pixels = samples.layer.length;
  const lit: Lit = {
    red: new Float32Array(pixels),
    green: new Float32Array(pixels),
    blue: new Float32Array(pixels),
    height: new Float32Array(pixels),
    cover: new Float32Array(pixels),
  };
  const paints = paintsOf(steels, look.etch);
  const paintOf = Array.from(program.layerSteel, (steel) => paints[steel] as (typeof paints)[number]);
  for (let pixel = 0; pixel < pixels; pixel++) {
    const slot = samples.slot[pixel] as number;
    const count = slot < 0 ? 0 : (samples.fineCount[slot] as number);
    let red = 0;
    let green = 0;
    let blue = 0;
    let height = 0;
    let metal = 0;
    const from = slot * MOST_SAMPLES;
    for (let s = 0; s < Math.max(1, count); s++) {
      const layer = (count === 0 ? samples.layer[pixel] : samples.fineLayer[from + s]) as number;
      if (layer === NO_METAL) continue;
      const slag = (count === 0 ? samples.slag[pixel] : samples.fineSlag[from + s]) as number;
      const colour = paintOf[layer] as (typeof paints)[number];
      const light = slag === 0 ? 1 : 1 - (SLAG_DARKNESS * look.etch * slag) / 255;
      red += colour.rgb[0] * light;
      green += colour.rgb[1] * light;
      blue += colour.rgb[2] * light;
      height += colour.height - (slag * 0.3) / 255;
      metal += 1;
    }
    if (metal === 0) continue;
    lit.red[pixel] = red / metal;
    lit.green[pixel] = green / metal;
    lit.blue[pixel] = blue / metal;
    lit.height[pixel] = height / metal;
    lit.cover[pixel] = metal / Math.max(1, count);
  }
  return lit;
}

/** Height of a neighbour; beside the metal there is no step. */
function heightOf(lit: Lit, neighbour: number, pixel: number): number {
  return lit.height[lit.cover[neighbour] === 0 ? pixel : neighbour] as number;
}

/** By how much scratches change the light of a pixel; finer than a pixel they average out. */
function scratchLines(grit: number, pixelMm: number): (column: number, row: number) => number {
  const strength = grit * SCRATCH_LIGHT * Math.min(1, Math.sqrt(SCRATCH_MM / pixelMm));
  if (strength < 0.002) return () => 0;
  const rowsPerLine = Math.max(1, SCRATCH_MM / pixelMm);
  const columnsPerLine = Math.max(1, SCRATCH_LENGTH_MM / pixelMm);
  return (column, row) => {
    const line = Math.floor(row / rowsPerLine);
    // Each line begins somewhere else, so that no seams run across.
    const start = latticeHash(1, line, 0, 3) / 0x1_0000_0000;
    const along = column / columnsPerLine + start;
    const part = Math.floor(along);
    const from = latticeHash(2, line, part, 3) / 0x1_0000_0000;
    const to = latticeHash(2, line, part + 1, 3) / 0x1_0000_0000;
    return strength * (from + (to - from) * (along - part) - 0.5);
  };
}

/**
 * For measuring: one colour for each steel. Red is the index of the steel in the middle of the pixel, in the order of
 * first appearance in the document; green and blue are 0. Opaque where there is metal, empty elsewhere.
 */
export function paintSteelIndex(samples: Samples, program: Program): Pixels {
  const { widthPx, heightPx } = samples;
  const rgba = new Uint8ClampedArray(4 * widthPx * heightPx);
  for (let pixel = 0; pixel < samples.layer.length; pixel++) {
    const layer = samples.layer[pixel] as number;
    if (layer === NO_METAL) continue;
    rgba[4 * pixel] = program.layerSteel[layer] as number;
    rgba[4 * pixel + 3] = 255;
  }
  return { widthPx, heightPx, rgba };
}
