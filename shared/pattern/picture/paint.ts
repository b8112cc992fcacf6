import type { Steel } from '../../steels/index.js';
import { latticeHash } from '../../steps/index.js';
import type { Program } from '../program/program.js';
import { type Look, type Paint, paintsOf, srgbOfLinear } from './look.js';
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
/** How much deeper slag is eaten than the iron around it, as a part of the heights of steels. By eye. */
const SLAG_DEPTH = 0.3;
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
 * steels, borders lit and shaded by how high the steels stand, slag along the iron, bevels by their slope, scratches by the
 * grit. Grey but for copper, and readable in print.
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
  const { widthPx, heightPx, slope } = samples;
  const paints = paintsOf(steels, look.etch);
  const isGrey = paints.every(({ rgb: [red, green, blue] }) => red === green && red === blue);
  const lit = litPixels(samples, program, paints, look.etch, isGrey);
  const rgba = new Uint8ClampedArray(4 * widthPx * heightPx);
  const scratch = new Float32Array(widthPx);
  const isSloping = slope.length > 0;
  const reliefLight = look.relief * RELIEF_LIGHT;
  for (let row = 0; row < heightPx; row++) {
    const above = Math.max(0, row - 1) * widthPx;
    const below = Math.min(heightPx - 1, row + 1) * widthPx;
    scratchRow(scratch, row, look.grit, pixelMm);
    for (let column = 0; column < widthPx; column++) {
      const pixel = row * widthPx + column;
      const cover = lit.cover[pixel] as number;
      if (cover === 0) continue;
      const before = above + (column === 0 ? 0 : column - 1);
      const after = below + (column === widthPx - 1 ? column : column + 1);
      const rise = heightAt(lit, after, pixel) - heightAt(lit, before, pixel);
      const light =
        (1 + reliefLight * rise) *
        (1 + (scratch[column] as number)) *
        (isSloping ? 1 - SLOPE_LIGHT * Math.min(STEEPEST, slope[pixel] as number) : 1);
      const red = srgbOfLinear((lit.red[pixel] as number) * light);
      rgba[4 * pixel] = red;
      rgba[4 * pixel + 1] = isGrey ? red : srgbOfLinear((lit.green[pixel] as number) * light);
      rgba[4 * pixel + 2] = isGrey ? red : srgbOfLinear((lit.blue[pixel] as number) * light);
      rgba[4 * pixel + 3] = cover === 1 ? 255 : Math.round(255 * cover);
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

function litPixels(
  samples: Samples,
  program: Program,
  paints: readonly Paint[],
  etch: number,
  isGrey: boolean,
): Lit {
  const { layer, slag, slot, fineCount, fineLayer, fineSlag } = samples;
  const pixels = layer.length;
  const hasSlag = slag.length > 0;
  const hasFine = slot.length > 0;
  const red = new Float32Array(pixels);
  const lit: Lit = {
    red,
    green: isGrey ? red : new Float32Array(pixels),
    blue: isGrey ? red : new Float32Array(pixels),
    height: new Float32Array(pixels),
    cover: new Float32Array(pixels),
  };
  const ofLayer = (pick: (paint: Paint) => number): Float32Array =>
    Float32Array.from(program.layerSteel, (steel) => pick(paints[steel] as Paint));
  const reds = ofLayer((colour) => colour.rgb[0]);
  const greens = ofLayer((colour) => colour.rgb[1]);
  const blues = ofLayer((colour) => colour.rgb[2]);
  const heights = ofLayer((colour) => colour.height);
  const darkness = (SLAG_DARKNESS * etch) / 255;
  for (let pixel = 0; pixel < pixels; pixel++) {
    const at = hasFine ? (slot[pixel] as number) : -1;
    const count = at < 0 ? 0 : (fineCount[at] as number);
    const from = count === 0 ? pixel : at * MOST_SAMPLES;
    const layers = count === 0 ? layer : fineLayer;
    const slags = count === 0 ? slag : fineSlag;
    const places = Math.max(1, count);
    let redSum = 0;
    let greenSum = 0;
    let blueSum = 0;
    let heightSum = 0;
    let metal = 0;
    for (let s = from; s < from + places; s++) {
      const own = layers[s] as number;
      if (own === NO_METAL) continue;
      const slagHere = hasSlag ? (slags[s] as number) : 0;
      const light = 1 - darkness * slagHere;
      redSum += (reds[own] as number) * light;
      if (!isGrey) {
        greenSum += (greens[own] as number) * light;
        blueSum += (blues[own] as number) * light;
      }
      heightSum += (heights[own] as number) - (SLAG_DEPTH / 255) * slagHere;
      metal += 1;
    }
    if (metal === 0) continue;
    lit.red[pixel] = redSum / metal;
    if (!isGrey) {
      lit.green[pixel] = greenSum / metal;
      lit.blue[pixel] = blueSum / metal;
    }
    lit.height[pixel] = heightSum / metal;
    lit.cover[pixel] = metal / places;
  }
  return lit;
}

/** Height of a neighbour; beside the metal there is no step. */
function heightAt(lit: Lit, neighbour: number, pixel: number): number {
  return lit.height[lit.cover[neighbour] === 0 ? pixel : neighbour] as number;
}

/** By how much scratches change the light along a row of pixels; finer than a pixel they average out. */
function scratchRow(scratch: Float32Array, row: number, grit: number, pixelMm: number): void {
  const strength = grit * SCRATCH_LIGHT * Math.min(1, Math.sqrt(SCRATCH_MM / pixelMm));
  if (strength < 0.002) return;
  const line = Math.floor(row / Math.max(1, SCRATCH_MM / pixelMm));
  const perPixel = 1 / Math.max(1, SCRATCH_LENGTH_MM / pixelMm);
  // Each line begins somewhere else, so that no seams run across.
  const start = latticeHash(1, line, 0, 3) / 0x1_0000_0000;
  let part = -1;
  let from = 0;
  let rise = 0;
  for (let column = 0; column < scratch.length; column++) {
    const along = column * perPixel + start;
    if (Math.floor(along) !== part) {
      part = Math.floor(along);
      from = latticeHash(2, line, part, 3) / 0x1_0000_0000;
      rise = latticeHash(2, line, part + 1, 3) / 0x1_0000_0000 - from;
    }
    scratch[column] = strength * (from + rise * (along - part) - 0.5);
  }
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
