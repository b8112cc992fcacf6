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
  /** Slag there, 0–255; empty when no steel has any. */
  readonly slag: Uint8Array;
  /** Slope of the surface there towards the upper edge, mm per mm; empty when it is flat. */
  readonly slope: Float32Array;
  /** Whether the middle was sampled itself, or shows what was found beside it. */
  readonly isSampled: Uint8Array;
  /** Where the finer samples of a pixel are, −1 where it has none; empty until there are any. */
  slot: Int32Array;
  /** Number of finer samples in each slot; they follow each other, {@link MOST_SAMPLES} places for each slot. */
  fineCount: Uint8Array;
  fineLayer: Uint16Array;
  /** Empty as `slag` is. */
  fineSlag: Uint8Array;
  slots: number;
}

/** Samples of a picture of which nothing is known yet. */
export function emptySamples(
  widthPx: number,
  heightPx: number,
  { isFlat, hasSlag }: { readonly isFlat: boolean; readonly hasSlag: boolean },
): Samples {
  const pixels = widthPx * heightPx;
  return {
    widthPx,
    heightPx,
    layer: new Uint16Array(pixels).fill(NO_METAL),
    slag: new Uint8Array(hasSlag ? pixels : 0),
    slope: new Float32Array(isFlat ? 0 : pixels),
    isSampled: new Uint8Array(pixels),
    slot: new Int32Array(0),
    fineCount: new Uint8Array(0),
    fineLayer: new Uint16Array(0),
    fineSlag: new Uint8Array(0),
    slots: 0,
  };
}

/** Gives slots to all the pixels that `isWanted` names, one after another. */
export function addSlots(samples: Samples, isWanted: Uint8Array): void {
  const slot = new Int32Array(isWanted.length).fill(-1);
  let slots = 0;
  for (let pixel = 0; pixel < isWanted.length; pixel++) {
    if (isWanted[pixel] === 1) slot[pixel] = slots++;
  }
  samples.slot = slot;
  samples.slots = slots;
  samples.fineCount = new Uint8Array(slots);
  samples.fineLayer = new Uint16Array(slots * MOST_SAMPLES);
  samples.fineSlag = new Uint8Array(samples.slag.length === 0 ? 0 : slots * MOST_SAMPLES);
}

/** Where the finer samples of a pixel are, −1 where it has none. */
export function slotOf({ slot }: Samples, pixel: number): number {
  return slot.length === 0 ? -1 : (slot[pixel] as number);
}
