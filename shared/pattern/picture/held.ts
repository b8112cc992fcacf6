import { MOST_SAMPLES } from './sample-net.js';

/** Finer samples whose coordinates are kept, at most: 24 MB in single precision. */
const MOST_HELD = 2_000_000;

type Numbers = Float32Array | Float64Array;

/** Coordinates part of the way back, kept for the next picture: three numbers for each sample. */
export class HeldCoordinates {
  private readonly middles: Numbers;
  private readonly hasMiddle: Uint8Array;
  private fine: Numbers;
  private hasFine: Uint8Array;

  /** @param isDouble whether the tracer works in double precision */
  constructor(
    pixels: number,
    private readonly isDouble: boolean,
  ) {
    this.middles = this.numbers(3 * pixels);
    this.hasMiddle = new Uint8Array(pixels);
    this.fine = this.numbers(0);
    this.hasFine = new Uint8Array(0);
  }

  /**
   * Where a sample's coordinates are, or −1 when they are not kept.
   * @param sample −1 for the middle of the pixel, else the number of the finer sample
   * @param slot of the pixel's finer samples
   */
  find(pixel: number, sample: number, slot: number): number {
    if (sample < 0) return this.hasMiddle[pixel] === 1 ? pixel : -1;
    const at = slot * MOST_SAMPLES + sample;
    return slot >= 0 && this.hasFine[at] === 1 ? at : -1;
  }

  /** Copies kept coordinates to place `i` of the arrays. */
  load(isMiddle: boolean, at: number, x: Numbers, y: Numbers, z: Numbers, i: number): void {
    const from = isMiddle ? this.middles : this.fine;
    x[i] = from[3 * at] as number;
    y[i] = from[3 * at + 1] as number;
    z[i] = from[3 * at + 2] as number;
  }

  /** Keeps coordinates. */
  keep(pixel: number, sample: number, slot: number, x: number, y: number, z: number): void {
    if (sample < 0) {
      this.middles[3 * pixel] = x;
      this.middles[3 * pixel + 1] = y;
      this.middles[3 * pixel + 2] = z;
      this.hasMiddle[pixel] = 1;
      return;
    }
    const at = slot * MOST_SAMPLES + sample;
    if (at >= MOST_HELD) return;
    this.makeRoom(at + 1);
    this.fine[3 * at] = x;
    this.fine[3 * at + 1] = y;
    this.fine[3 * at + 2] = z;
    this.hasFine[at] = 1;
  }

  private makeRoom(samples: number): void {
    if (samples <= this.hasFine.length) return;
    const room = Math.min(MOST_HELD, Math.max(16_384, 2 * samples));
    const { fine, hasFine } = this;
    this.fine = this.numbers(3 * room);
    this.fine.set(fine);
    this.hasFine = new Uint8Array(room);
    this.hasFine.set(hasFine);
  }

  private numbers(length: number): Numbers {
    return this.isDouble ? new Float64Array(length) : new Float32Array(length);
  }
}
