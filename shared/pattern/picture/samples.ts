import { MOST_SAMPLES } from './sample-net.js';

/** In place of a layer: there is no metal here. */
export const NO_METAL = 0xffff;

/**
 * What a picture's samples found: everything that painting needs. Grows while the picture is refined; its arrays can be
 * given to another thread.
 */
export interface Samples {
  readonly widthPx: number;
  readonly heightPx: number;
  /** Layer in the middle of each pixel, row by row from the top left; {@link NO_METAL} where there is none. */
  readonly layer: Uint16Array;
  /** Slag there, 0–255. */
  readonly slag: Uint8Array;
  /** Slope of the surface there towards the upper edge, mm per mm. */
  readonly slope: Float32Array;
  /** Whether the middle was sampled itself, or shows what was found beside it. */
  readonly isSampled: Uint8Array;
  /** Where the finer samples of a pixel are, −1 where it has none. */
  readonly slot: Int32Array;
  /** Number of finer samples in each slot; they follow each other, {@link MOST_SAMPLES} places for each slot. */
  fineCount: Uint8Array;
  fineLayer: Uint16Array;
  fineSlag: Uint8Array;
  slots: number;
}

/** Samples of a picture of which nothing is known yet. */
export function emptySamples(widthPx: number, heightPx: number): Samples {
  const pixels = widthPx * heightPx;
  return {
    widthPx,
    heightPx,
    layer: new Uint16Array(pixels).fill(NO_METAL),
    slag: new Uint8Array(pixels),
    slope: new Float32Array(pixels),
    isSampled: new Uint8Array(pixels),
    slot: new Int32Array(pixels).fill(-1),
    fineCount: new Uint8Array(0),
    fineLayer: new Uint16Array(0),
    fineSlag: new Uint8Array(0),
    slots: 0,
  };
}

/** Makes room for the finer samples of a pixel. */
export function addSlot(samples: Samples, pixel: number): void {
  if (samples.slots === samples.fineCount.length) {
    const room = Math.max(1024, 2 * samples.slots);
    samples.fineCount = grown(samples.fineCount, new Uint8Array(room));
    samples.fineLayer = grown(samples.fineLayer, new Uint16Array(room * MOST_SAMPLES));
    samples.fineSlag = grown(samples.fineSlag, new Uint8Array(room * MOST_SAMPLES));
  }
  samples.slot[pixel] = samples.slots;
  samples.slots += 1;
}

function grown<T extends Uint8Array | Uint16Array>(from: T, to: T): T {
  to.set(from);
  return to;
}
