import { entryOps } from '../program/program.js';
import { surfaceMap } from '../surfaces/surface-map.js';
import { type SurfaceMap, WHOLE } from '../surfaces/surface.js';
import type { Engine, Tracer } from '../tracer.js';
import { hasSlag, slagAt } from './fibre.js';
import { HeldCoordinates } from './held.js';
import { type PictureRequest, hasSamePlaces, hasSameTrace, sharedOps } from './request.js';
import { MOST_SAMPLES, placesFor } from './sample-net.js';
import { NO_METAL, type Samples, emptySamples, slotOf } from './samples.js';

/** Samples to take: of each a pixel, and −1 for its middle or the number of a finer one. */
export interface Task {
  readonly pixel: Int32Array;
  readonly sample: Int8Array;
  count: number;
}

/** Work done for a picture. */
export interface Counters {
  /** Points traced, wholly or from part of the way. */
  readonly samples: number;
  /** Ops carried out on them. */
  readonly stepEvaluations: number;
  /** Points taken over from the picture before, wholly or part of the way. */
  readonly reused: number;
}

/** Takes the samples of one picture and notes what they found. */
export class Sampler {
  readonly samples: Samples;
  readonly map: SurfaceMap;
  readonly engine: Engine;
  private readonly held: HeldCoordinates | null;
  /** Of each layer, whether its steel has slag. */
  private readonly isSlag: Uint8Array;
  private readonly hasSlag: boolean;
  private readonly across: Float64Array;
  private readonly up: Float64Array;
  private readonly metal: Uint8Array;
  private readonly slopes: Float32Array;
  /** Where in the pixel a sample lies: the middle, then the finer ones; two numbers each. */
  private readonly offsets: Float64Array;
  private readonly isSameTrace: boolean;
  /** Ops of the entry segment after which coordinates are held. */
  private readonly heldAt: number;
  private before: Sampler | null;
  private sampleCount = 0;
  private evaluations = 0;
  private reusedCount = 0;

  constructor(
    private readonly request: PictureRequest,
    private readonly tracer: Tracer,
    before: Sampler | null,
    isHeld: boolean,
  ) {
    const { program, steels, surface, blank, widthPx, heightPx } = request;
    this.map = surfaceMap(surface, program, blank);
    this.engine = tracer.engine;
    this.held = isHeld ? new HeldCoordinates(widthPx * heightPx, tracer.x instanceof Float64Array) : null;
    this.isSlag = Uint8Array.from(program.layerSteel, (steel) => {
      const found = steels[steel];
      return found && hasSlag(found) ? 1 : 0;
    });
    this.hasSlag = this.isSlag.includes(1);
    this.samples = emptySamples(widthPx, heightPx, { isFlat: this.map.isFlat, hasSlag: this.hasSlag });
    const { capacity } = tracer;
    this.across = new Float64Array(capacity);
    this.up = new Float64Array(capacity);
    this.metal = new Uint8Array(capacity);
    this.slopes = new Float32Array(capacity);
    this.offsets = Float64Array.from([0.5, 0.5, ...placesFor(request.samples).flat()]);
    const isComparable =
      before !== null && hasSamePlaces(before.request, request) && before.engine === this.engine;
    this.isSameTrace = isComparable && hasSameTrace(before.request, request);
    const shared = isComparable ? sharedOps(before.request.program, program) : 0;
    const isPartSame = isComparable && before.held !== null && before.heldAt > 0 && before.heldAt <= shared;
    this.before = this.isSameTrace || isPartSame ? before : null;
    // The next change is likely to be where the last one was: hold just before it; half way when nothing is known.
    const ops = entryOps(program);
    this.heldAt = this.isSameTrace && before ? before.heldAt : shared > 0 ? shared : Math.ceil(ops / 2);
  }

  get counters(): Counters {
    return { samples: this.sampleCount, stepEvaluations: this.evaluations, reused: this.reusedCount };
  }

  /** Points that can be taken at once. */
  get capacity(): number {
    return this.tracer.capacity;
  }

  /** Takes the samples of a task; empties it. */
  take(task: Task): void {
    const { before } = this;
    if (before && this.isSameTrace) this.takeOver(before, task);
    if (before?.held) this.traceFromHeld(before.held, before, task);
    this.traceWhole(task);
    task.count = 0;
  }

  /** Forgets the picture before, once nothing more is taken over from it. */
  release(): void {
    this.before = null;
  }

  /** Leaves in the task what the picture before doesn't know. */
  private takeOver(before: Sampler, task: Task): void {
    const from = before.samples;
    let left = 0;
    for (let i = 0; i < task.count; i++) {
      const pixel = task.pixel[i] as number;
      const sample = task.sample[i] as number;
      const slot = slotOf(from, pixel);
      const at = slot * MOST_SAMPLES + sample;
      if (sample < 0 && from.isSampled[pixel] === 1) {
        this.store(
          pixel,
          sample,
          from.layer[pixel] as number,
          this.hasSlag ? (from.slag[pixel] as number) : 0,
        );
        if (!this.map.isFlat) this.samples.slope[pixel] = from.slope[pixel] as number;
        this.reusedCount += 1;
      } else if (sample >= 0 && slot >= 0 && sample < (from.fineCount[slot] as number)) {
        this.store(
          pixel,
          sample,
          from.fineLayer[at] as number,
          this.hasSlag ? (from.fineSlag[at] as number) : 0,
        );
        this.reusedCount += 1;
      } else {
        task.pixel[left] = pixel;
        task.sample[left] = sample;
        left += 1;
        continue;
      }
      this.passOn(before, pixel, sample, slot);
    }
    task.count = left;
  }

  /** Keeps the coordinates that the picture before has kept of a sample. */
  private passOn(before: Sampler, pixel: number, sample: number, slot: number): void {
    const at = before.held?.find(pixel, sample, slot) ?? -1;
    if (!before.held || !this.held || at < 0) return;
    const one = [new Float64Array(1), new Float64Array(1), new Float64Array(1)] as const;
    before.held.load(sample < 0, at, ...one, 0);
    const [x, y, z] = one;
    this.held.keep(
      pixel,
      sample,
      slotOf(this.samples, pixel),
      x[0] as number,
      y[0] as number,
      z[0] as number,
    );
  }

  /** Traces the samples of the task whose coordinates part of the way are known, and leaves the others in it. */
  private traceFromHeld(held: HeldCoordinates, before: Sampler, task: Task): void {
    const { tracer } = this;
    const from = before.samples;
    const known = {
      pixel: task.pixel.slice(0, task.count),
      sample: task.sample.slice(0, task.count),
      count: 0,
    };
    let left = 0;
    for (let i = 0; i < task.count; i++) {
      const pixel = task.pixel[i] as number;
      const sample = task.sample[i] as number;
      const at = held.find(pixel, sample, slotOf(from, pixel));
      if (at < 0) {
        task.pixel[left] = pixel;
        task.sample[left] = sample;
        left += 1;
        continue;
      }
      held.load(sample < 0, at, tracer.x, tracer.y, tracer.z, known.count);
      known.pixel[known.count] = pixel;
      known.sample[known.count] = sample;
      if (sample < 0 && !this.map.isFlat) this.slopes[known.count] = from.slope[pixel] as number;
      known.count += 1;
    }
    task.count = left;
    if (known.count === 0) return;
    this.reusedCount += known.count;
    this.evaluations += tracer.begin(known.count, this.heldAt, before.heldAt);
    this.traceOn(known);
  }

  private traceWhole(task: Task): void {
    const { tracer, offsets } = this;
    if (task.count === 0) return;
    const { widthPx, heightPx } = this.samples;
    const { left, bottom, right, top } = this.request.window ?? WHOLE;
    const stepAcross = (right - left) / widthPx;
    const stepDown = (top - bottom) / heightPx;
    for (let i = 0; i < task.count; i++) {
      const pixel = task.pixel[i] as number;
      const place = 2 * ((task.sample[i] as number) + 1);
      const row = Math.floor(pixel / widthPx);
      const column = pixel - row * widthPx;
      this.across[i] = left + (column + (offsets[place] as number)) * stepAcross;
      this.up[i] = top - (row + (offsets[place + 1] as number)) * stepDown;
    }
    const points = { x: tracer.x, y: tracer.y, z: tracer.z, isMetal: this.metal, slope: this.slopes };
    this.map.place(this.across, this.up, task.count, points);
    if (!this.map.isFlat) this.leaveOutEmpty(task);
    if (task.count === 0) return;
    this.evaluations += tracer.begin(task.count, this.heldAt);
    this.traceOn(task);
  }

  /** Notes the samples that lie beside the metal, and moves the others together. */
  private leaveOutEmpty(task: Task): void {
    const { tracer } = this;
    let count = 0;
    for (let i = 0; i < task.count; i++) {
      const pixel = task.pixel[i] as number;
      const sample = task.sample[i] as number;
      if (this.metal[i] === 0) {
        this.store(pixel, sample, NO_METAL, 0);
        continue;
      }
      if (count < i) {
        task.pixel[count] = pixel;
        task.sample[count] = sample;
        tracer.x[count] = tracer.x[i] as number;
        tracer.y[count] = tracer.y[i] as number;
        tracer.z[count] = tracer.z[i] as number;
        this.slopes[count] = this.slopes[i] as number;
      }
      count += 1;
    }
    task.count = count;
  }

  /** From where coordinates are held to the stacks; notes what was found. */
  private traceOn({ pixel, sample, count }: Task): void {
    const { tracer, samples } = this;
    if (this.held) this.hold(this.held, pixel, sample, count);
    this.evaluations += tracer.run(count, this.heldAt);
    this.sampleCount += count;
    for (let i = 0; i < count; i++) {
      const layer = tracer.layer[i] as number;
      const slag =
        this.isSlag[layer] === 1
          ? slagAt(tracer.x[i] as number, tracer.y[i] as number, tracer.z[i] as number, layer)
          : 0;
      this.store(pixel[i] as number, sample[i] as number, layer, slag);
    }
    if (this.map.isFlat) return;
    for (let i = 0; i < count; i++) {
      if ((sample[i] as number) < 0) samples.slope[pixel[i] as number] = this.slopes[i] as number;
    }
  }

  private hold(held: HeldCoordinates, pixel: Int32Array, sample: Int8Array, count: number): void {
    const { x, y, z } = this.tracer;
    for (let i = 0; i < count; i++) {
      const p = pixel[i] as number;
      const slot = slotOf(this.samples, p);
      held.keep(p, sample[i] as number, slot, x[i] as number, y[i] as number, z[i] as number);
    }
  }

  private store(pixel: number, sample: number, layer: number, slag: number): void {
    const { samples } = this;
    if (sample < 0) {
      samples.layer[pixel] = layer;
      if (this.hasSlag) samples.slag[pixel] = slag;
      samples.isSampled[pixel] = 1;
      return;
    }
    const slot = samples.slot[pixel] as number;
    samples.fineLayer[slot * MOST_SAMPLES + sample] = layer;
    if (this.hasSlag) samples.fineSlag[slot * MOST_SAMPLES + sample] = slag;
    if (sample >= (samples.fineCount[slot] as number)) samples.fineCount[slot] = sample + 1;
  }
}
