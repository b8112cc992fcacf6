import { WHOLE } from '../surfaces/surface.js';
import type { Tracer } from '../tracer.js';
import type { PictureRequest } from './request.js';
import { FIRST_SAMPLES, MOST_SAMPLES } from './sample-net.js';
import { type Counters, Sampler, type Task } from './sampler.js';
import { NO_METAL, type Samples, addSlots } from './samples.js';

/** How far a picture has come. Each stage leaves a whole picture: blocks of 4 × 4 pixels, then pixels, then softened borders. */
export const STAGES = ['blocks', 'pixels', 'borders', 'finer', 'done'] as const;
export type Stage = (typeof STAGES)[number];

/** Side of the blocks that the first stage samples once, px. */
const BLOCK = 4;

/**
 * A picture in the making. Call {@link Picture.advance} until it is done, in portions small enough for whatever else has to
 * run; paint the samples whenever a stage is over. To stop it, stop calling.
 *
 * The same request on the same engine gives the same samples, on every host.
 */
export class Picture {
  private readonly sampler: Sampler;
  private readonly task: Task;
  private stageNow: Stage = 'blocks';
  private next = 0;

  /**
   * @param tracer for the request's program; no other picture may use it before this one is done
   * @param before the picture last shown, to take over what is still right of it
   * @param isHeld keeps coordinates for the next picture; costs 12 bytes a sample
   */
  constructor(
    readonly request: PictureRequest,
    tracer: Tracer,
    before: Picture | null = null,
    isHeld = false,
  ) {
    this.sampler = new Sampler(request, tracer, before?.sampler ?? null, isHeld);
    const { capacity } = this.sampler;
    this.task = { pixel: new Int32Array(capacity), sample: new Int8Array(capacity), count: 0 };
  }

  /** What has been found so far; complete from the end of the first stage on. */
  get samples(): Samples {
    return this.sampler.samples;
  }

  get stage(): Stage {
    return this.stageNow;
  }

  get counters(): Counters {
    return this.sampler.counters;
  }

  /** Size of a pixel, mm. */
  get pixelMm(): number {
    const { left, right } = this.request.window ?? WHOLE;
    return (this.sampler.map.widthMm * (right - left)) / this.request.widthPx;
  }

  /**
   * Goes on for about `portion` samples, or to the end of the stage if that comes first.
   * @returns the stage that the picture is in now
   */
  advance(portion = 16_384): Stage {
    const stage = this.stageNow;
    if (stage === 'done') return stage;
    let taken = 0;
    while (taken < portion && this.stageNow === stage) {
      this.collect();
      taken += this.task.count;
      this.sampler.take(this.task);
      if (this.next >= this.samples.layer.length) this.enterNextStage();
    }
    return this.stageNow;
  }

  /** Goes on until nothing is left to do. */
  finish(): this {
    while (this.advance() !== 'done');
    return this;
  }

  private enterNextStage(): void {
    this.next = 0;
    if (this.stageNow === 'blocks') this.spreadBlocks();
    const stages = stagesFor(this.request.samples);
    this.stageNow = stages[stages.indexOf(this.stageNow) + 1] as Stage;
    // Which pixels lie on borders is settled before any of them changes.
    if (this.stageNow === 'borders') this.addBorderSlots();
    if (this.stageNow === 'done') this.sampler.release();
  }

  /** Fills the task with the next samples of this stage. */
  private collect(): void {
    const { task, samples } = this;
    const most = this.request.samples;
    const pixels = samples.layer.length;
    if (this.stageNow === 'blocks') {
      this.collectBlocks();
      return;
    }
    while (this.next < pixels && task.count + MOST_SAMPLES <= task.pixel.length) {
      const pixel = this.next++;
      if (this.stageNow === 'pixels') {
        if (samples.isSampled[pixel] === 0) this.add(pixel, -1);
      } else if (samples.slot[pixel] === -1) continue;
      else if (this.stageNow === 'borders') this.addFine(pixel, 0, Math.min(FIRST_SAMPLES, most));
      else if (this.isMixed(pixel)) this.addFine(pixel, FIRST_SAMPLES, most);
    }
  }

  /** The middles of the blocks, row by row of them. */
  private collectBlocks(): void {
    const { task } = this;
    const { widthPx, heightPx, layer } = this.samples;
    const inRow = Math.ceil(widthPx / BLOCK);
    const blocks = inRow * Math.ceil(heightPx / BLOCK);
    while (this.next < blocks && task.count < task.pixel.length) {
      const block = this.next++;
      const column = blockMiddle((block % inRow) * BLOCK, widthPx);
      const row = blockMiddle(Math.floor(block / inRow) * BLOCK, heightPx);
      this.add(row * widthPx + column, -1);
    }
    if (this.next === blocks) this.next = layer.length;
  }

  private addFine(pixel: number, from: number, to: number): void {
    for (let sample = from; sample < to; sample++) this.add(pixel, sample);
  }

  private add(pixel: number, sample: number): void {
    const { task } = this;
    task.pixel[task.count] = pixel;
    task.sample[task.count] = sample;
    task.count += 1;
  }

  /** Shows each block in the tone of its middle until its own pixels are known. */
  private spreadBlocks(): void {
    const { widthPx, heightPx, layer, slag, slope } = this.samples;
    const hasSlag = slag.length > 0;
    const isSloping = slope.length > 0;
    const from = Int32Array.from({ length: widthPx }, (_, column) => blockMiddle(column, widthPx));
    for (let row = 0; row < heightPx; row++) {
      const middleRow = blockMiddle(row, heightPx) * widthPx;
      for (let column = 0; column < widthPx; column++) {
        const middle = middleRow + (from[column] as number);
        const pixel = row * widthPx + column;
        layer[pixel] = layer[middle] as number;
        if (hasSlag) slag[pixel] = slag[middle] as number;
        if (isSloping) slope[pixel] = slope[middle] as number;
      }
    }
  }

  private addBorderSlots(): void {
    const { widthPx, heightPx, layer } = this.samples;
    const isBorder = new Uint8Array(layer.length);
    if (this.request.isUniform) isBorder.fill(1);
    else {
      for (let row = 0; row < heightPx; row++) {
        for (let pixel = row * widthPx; pixel < (row + 1) * widthPx; pixel++) {
          const own = layer[pixel];
          if (pixel + 1 < (row + 1) * widthPx && layer[pixel + 1] !== own) {
            isBorder[pixel] = isBorder[pixel + 1] = 1;
          }
          if (row + 1 < heightPx && layer[pixel + widthPx] !== own) {
            isBorder[pixel] = isBorder[pixel + widthPx] = 1;
          }
        }
      }
    }
    addSlots(this.samples, isBorder);
  }

  /** Whether the first finer samples of a border pixel and its middle show more than one steel. */
  private isMixed(pixel: number): boolean {
    if (this.request.isUniform) return true;
    const { slot, layer, fineLayer } = this.samples;
    const at = (slot[pixel] as number) * MOST_SAMPLES;
    const own = this.steelOf(layer[pixel] as number);
    for (let sample = 0; sample < FIRST_SAMPLES; sample++) {
      if (this.steelOf(fineLayer[at + sample] as number) !== own) return true;
    }
    return false;
  }

  private steelOf(layer: number): number {
    return layer === NO_METAL ? -1 : (this.request.program.layerSteel[layer] as number);
  }
}

function stagesFor(samples: number): readonly Stage[] {
  if (samples <= 1) return ['blocks', 'pixels', 'done'];
  return samples <= FIRST_SAMPLES ? ['blocks', 'pixels', 'borders', 'done'] : STAGES;
}

/** The row or column whose sample stands for the block that `at` lies in. */
function blockMiddle(at: number, size: number): number {
  return Math.min(size - 1, at - (at % BLOCK) + BLOCK / 2);
}
