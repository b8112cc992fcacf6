/** What an op of a program does. Each is followed, in `params`, by the numbers that `encode.ts` lays out. */
export const OP = {
  affine: 1,
  restack: 2,
  fold: 3,
  slice: 4,
  twist: 5,
  corner: 6,
  groove: 7,
  dimple: 8,
  wedge: 9,
  uneven: 10,
} as const;
export type OpCode = (typeof OP)[keyof typeof OP];

/** Words in `code` for one op: the op, and the index of its first parameter. */
export const CODE_WORDS = 2;
/** Words in `segments` for one bar: its first op, the op after its last, the kind of its start, where that is, how many. */
export const SEGMENT_WORDS = 5;
/** Words in `pieces` for one piece: the segment of its bar, and the index of its nine affine parameters. */
export const PIECE_WORDS = 2;

/** The kinds of start in `segments`. */
export const START = { stack: 0, assemblyAlongWidth: 1, assemblyAlongThickness: 2 } as const;

/**
 * A design made ready for tracing: flat arrays, so that an engine reads it without looking anything up by name, and a
 * worker or a kernel takes it as it is.
 *
 * A segment is the way back through one bar, from the state that is asked for to its start. A start is either a stack,
 * whose layers lie in `layerTopMm` from `first` on, or an assembly, whose pieces lie in `pieces` from `first` on. The
 * upper border of piece p, along the thickness or the width, is `params[pieces[p].params + 9]`.
 */
export interface Program {
  readonly code: Int32Array;
  readonly params: Float64Array;
  readonly segments: Int32Array;
  readonly pieces: Int32Array;
  /** Segment of the bar that is asked for. */
  readonly entry: number;
  /** Height of the top of each layer in its stack, mm; the stacks follow each other. */
  readonly layerTopMm: Float64Array;
  /** Index of each layer's steel in {@link Program.steelIds}. */
  readonly layerSteel: Uint16Array;
  /** Index of each layer's bar in {@link Program.barIds}. */
  readonly layerBar: Uint16Array;
  /** Place of each layer in its stack, the bottom one 0. */
  readonly layerPlace: Uint16Array;
  /** Every steel of the document, in the order of first appearance (bars, then layers). */
  readonly steelIds: readonly string[];
  /** Every bar of the document. */
  readonly barIds: readonly string[];
  /** Size of the bar that is asked for, mm. */
  readonly lengthMm: number;
  readonly widthMm: number;
  readonly thicknessMm: number;
  /** Halvings that a point can go through on its way: one for each fold, log₂ n for a restack of n. */
  readonly folds: number;
}

/** Ops of a program's entry segment. */
export function entryOps(program: Program): number {
  const at = program.entry * SEGMENT_WORDS;
  return (program.segments[at + 1] as number) - (program.segments[at] as number);
}
