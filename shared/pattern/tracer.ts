import type { Program } from './program/program.js';

/** The engines that a program can run on; they mean the same. */
export type Engine = 'kernel-f32' | 'kernel-f64' | 'reference';

/**
 * Takes batches of points back to the stacks they come from. Write coordinates into `x`, `y` and `z`, run, read `layer`;
 * afterwards the coordinates are those in the stack, mm: `x` along, `y` across, `z` from its bottom.
 */
export interface Tracer {
  readonly program: Program;
  readonly engine: Engine;
  /** Most points in a batch. */
  readonly capacity: number;
  readonly x: Float32Array | Float64Array;
  readonly y: Float32Array | Float64Array;
  readonly z: Float32Array | Float64Array;
  /** After a run, the layer of each point: an index into the program's layers. */
  readonly layer: Uint16Array;
  /**
   * Traces the first `count` points.
   * @param fromOp where in the entry segment to begin: what {@link Tracer.begin} had done before
   * @returns ops carried out, summed over the points
   */
  run(count: number, fromOp?: number): number;
  /**
   * Carries out ops of the entry segment alone, from `fromOp` to `toOp` (excluded), and leaves the coordinates there.
   * @returns ops carried out, summed over the points
   */
  begin(count: number, toOp: number, fromOp?: number): number;
}
