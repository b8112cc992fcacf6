import { PIECE_WORDS, type Program, SEGMENT_WORDS, START } from '../program/program.js';

/** Words of 32 bits in the kernel's record of a segment. */
const KERNEL_SEGMENT_WORDS = 8;
/** Cells of height for each layer of a stack, by which its layers are found. */
const CELLS_PER_LAYER = 4;
const PAGE_BYTES = 65_536;
/** The kernel works on vectors of this size. */
const VECTOR_BYTES = 16;

/** A program's tables as the kernel reads them. */
export interface KernelTables {
  readonly code: Int32Array;
  readonly params: Float64Array;
  readonly segments: Int32Array;
  readonly pieces: Int32Array;
  readonly groups: Int32Array;
  readonly layerTopMm: Float64Array;
  readonly layerCells: Uint16Array;
  readonly cellsPerMm: Float64Array;
  /** Assemblies within assemblies, at most. */
  readonly depth: number;
}

/** Where things lie in the kernel's memory, in bytes. */
export interface KernelMemory {
  /** The thirteen addresses that `prepare` of the kernel takes, in its order. */
  readonly addresses: Uint32Array;
  readonly headerAt: number;
  readonly pages: number;
}

/** Tables for the kernel: cells for finding layers, and pieces sorted into groups by the bar they were cut from. */
export function kernelTables(program: Program): KernelTables {
  const count = program.segments.length / SEGMENT_WORDS;
  const segments = new Int32Array(count * KERNEL_SEGMENT_WORDS);
  const pieces = Int32Array.from(program.pieces);
  const groups: number[] = [];
  const layerCells: number[] = [];
  const cellsPerMm: number[] = [];
  const depths: number[] = [];
  for (let s = 0; s < count; s++) {
    const words = program.segments.subarray(s * SEGMENT_WORDS, (s + 1) * SEGMENT_WORDS);
    const [, , kind, first, parts] = words as unknown as [number, number, number, number, number];
    const at = s * KERNEL_SEGMENT_WORDS;
    segments.set(words, at);
    if (kind === START.stack) {
      const cells = cellsOf(program.layerTopMm, first, parts);
      segments.set([layerCells.length, cells.first.length, cellsPerMm.length], at + SEGMENT_WORDS);
      layerCells.push(...cells.first);
      cellsPerMm.push(cells.perMm);
      depths.push(0);
      continue;
    }
    const own: number[] = [];
    let deepest = 0;
    for (let p = first; p < first + parts; p++) {
      const bar = program.pieces[p * PIECE_WORDS] as number;
      if (!own.includes(bar)) own.push(bar);
      pieces[p * PIECE_WORDS] = own.indexOf(bar);
      deepest = Math.max(deepest, depths[bar] as number);
    }
    depths.push(deepest + 1);
    segments.set([groups.length, own.length, 0], at + SEGMENT_WORDS);
    groups.push(...own);
  }
  return {
    code: program.code,
    params: program.params,
    segments,
    pieces,
    groups: Int32Array.from(groups),
    layerTopMm: program.layerTopMm,
    layerCells: Uint16Array.from(layerCells),
    cellsPerMm: Float64Array.from(cellsPerMm),
    depth: depths[program.entry] as number,
  };
}

/**
 * Lays out memory for a program and batches of `capacity` points of `numberBytes` each coordinate.
 * @param from first free byte
 */
export function layOut(
  tables: KernelTables,
  from: number,
  capacity: number,
  numberBytes: number,
): KernelMemory {
  let next = from;
  const take = (bytes: number): number => {
    const at = Math.ceil(next / VECTOR_BYTES) * VECTOR_BYTES;
    next = at + bytes;
    return at;
  };
  const headerAt = take(13 * 4);
  const coordinateBytes = capacity * numberBytes + VECTOR_BYTES;
  const fixed = [
    take(tables.code.byteLength),
    take(tables.params.byteLength),
    take(tables.segments.byteLength),
    take(tables.pieces.byteLength),
    take(tables.groups.byteLength),
    take(tables.layerTopMm.byteLength),
    take(tables.layerCells.byteLength),
    take(tables.cellsPerMm.byteLength),
    take(coordinateBytes),
    take(coordinateBytes),
    take(coordinateBytes),
    take(capacity * 2),
  ];
  // One level of an assembly: a key for each point, three words for each bar, and the sorted points with their places,
  // where each bar's share is padded to whole vectors.
  const bars = tables.groups.length;
  const sorted = capacity + bars * (VECTOR_BYTES / numberBytes);
  const level = capacity + bars * 12 + sorted * (3 * numberBytes + 4) + 8 * VECTOR_BYTES;
  const scratchAt = take(tables.depth * level);
  return {
    addresses: Uint32Array.from([...fixed, scratchAt]),
    headerAt,
    pages: Math.ceil((next + VECTOR_BYTES) / PAGE_BYTES),
  };
}

/** For each cell of a stack's height the layer that its bottom lies in. */
function cellsOf(
  tops: Float64Array,
  first: number,
  count: number,
): { readonly first: readonly number[]; readonly perMm: number } {
  const cells = count * CELLS_PER_LAYER;
  const heightMm = tops[first + count - 1] as number;
  let layer = first;
  const found = Array.from({ length: cells }, (_, cell) => {
    const bottomMm = (cell / cells) * heightMm;
    while (layer < first + count - 1 && bottomMm >= (tops[layer] as number)) layer += 1;
    return layer;
  });
  return { first: found, perMm: cells / heightMm };
}
