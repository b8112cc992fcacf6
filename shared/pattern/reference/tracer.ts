import { CODE_WORDS, OP, PIECE_WORDS, type Program, SEGMENT_WORDS, START } from '../program/program.js';
import type { Tracer } from '../tracer.js';
import { cornerBack, dimpleBack, grooveBack, twistBack, unevenBack, wedgeBack } from './bent-ops.js';
import { layerAt } from './layers.js';
import { type OpBack, type Points, affineBack, foldBack, restackBack, sliceBack } from './solid-ops.js';

/** Points in a batch: three coordinates of them stay in the first-level cache. */
const CAPACITY = 2048;

const BACK: Readonly<Record<number, OpBack>> = {
  [OP.affine]: affineBack,
  [OP.restack]: restackBack,
  [OP.fold]: foldBack,
  [OP.slice]: sliceBack,
  [OP.twist]: twistBack,
  [OP.corner]: cornerBack,
  [OP.groove]: grooveBack,
  [OP.dimple]: dimpleBack,
  [OP.wedge]: wedgeBack,
  [OP.uneven]: unevenBack,
};

/** A tracer in plain arithmetic, double precision: what the kernel is held against, and what takes over from it. */
export function referenceTracer(program: Program, capacity = CAPACITY): Tracer {
  const x = new Float64Array(capacity);
  const y = new Float64Array(capacity);
  const z = new Float64Array(capacity);
  const points: Points = { x, y, z };
  const layer = new Uint16Array(capacity);
  const entry = program.entry * SEGMENT_WORDS;
  return {
    program,
    engine: 'reference',
    capacity,
    x,
    y,
    z,
    layer,
    run: (count, fromOp = 0) => traceSegment(program, entry, points, layer, count, fromOp),
    begin: (count, toOp, fromOp = 0) => {
      const first = program.segments[entry] as number;
      return traceOps(program, points, first + fromOp, first + toOp, count);
    },
  };
}

function traceOps(program: Program, points: Points, first: number, end: number, count: number): number {
  const { code, params } = program;
  for (let op = first; op < end; op++) {
    const back = BACK[code[op * CODE_WORDS] as number] as OpBack;
    back(points, params, code[op * CODE_WORDS + 1] as number, 0, count);
  }
  return (end - first) * count;
}

function traceSegment(
  program: Program,
  segment: number,
  points: Points,
  layer: Uint16Array,
  count: number,
  skip: number,
): number {
  const { segments, layerTopMm } = program;
  const first = (segments[segment] as number) + skip;
  let done = traceOps(program, points, first, segments[segment + 1] as number, count);
  if (segments[segment + 2] !== START.stack) {
    done += traceAssembly(program, segment, points, layer, count);
    return done;
  }
  const firstLayer = segments[segment + 3] as number;
  const layers = segments[segment + 4] as number;
  for (let i = 0; i < count; i++) layer[i] = layerAt(layerTopMm, firstLayer, layers, points.z[i] as number);
  return done;
}

/** Sorts the points by the bar that their piece was cut from, traces each bar's share, and puts them back in order. */
function traceAssembly(
  program: Program,
  segment: number,
  points: Points,
  layer: Uint16Array,
  count: number,
): number {
  const { segments, pieces, params } = program;
  const piece = piecesOf(program, segment, points, count);
  const firstPiece = segments[segment + 3] as number;
  const bars = new Set<number>();
  for (let p = firstPiece; p < firstPiece + (segments[segment + 4] as number); p++) {
    bars.add(pieces[p * PIECE_WORDS] as number);
  }
  let done = 0;
  for (const bar of bars) {
    const places = new Int32Array(count);
    let share = 0;
    for (let i = 0; i < count; i++) {
      if (pieces[(piece[i] as number) * PIECE_WORDS] === bar) places[share++] = i;
    }
    if (share === 0) continue;
    const shared: Points = {
      x: new Float64Array(share),
      y: new Float64Array(share),
      z: new Float64Array(share),
    };
    for (let i = 0; i < share; i++) {
      const from = places[i] as number;
      shared.x[i] = points.x[from] as number;
      shared.y[i] = points.y[from] as number;
      shared.z[i] = points.z[from] as number;
      affineBack(shared, params, pieces[(piece[from] as number) * PIECE_WORDS + 1] as number, i, i + 1);
    }
    const sharedLayer = new Uint16Array(share);
    done += traceSegment(program, bar * SEGMENT_WORDS, shared, sharedLayer, share, 0);
    for (let i = 0; i < share; i++) {
      const to = places[i] as number;
      points.x[to] = shared.x[i] as number;
      points.y[to] = shared.y[i] as number;
      points.z[to] = shared.z[i] as number;
      layer[to] = sharedLayer[i] as number;
    }
  }
  return done;
}

/** The piece that each point of an assembly lies in, an index into the program's pieces. A border belongs to the next one. */
function piecesOf(
  { segments, pieces, params }: Program,
  segment: number,
  points: Points,
  count: number,
): Uint16Array {
  const first = segments[segment + 3] as number;
  const last = first + (segments[segment + 4] as number) - 1;
  const along = segments[segment + 2] === START.assemblyAlongThickness ? points.z : points.y;
  const piece = new Uint16Array(count);
  for (let i = 0; i < count; i++) {
    const at = along[i] as number;
    let p = first;
    while (p < last && at >= (params[(pieces[p * PIECE_WORDS + 1] as number) + 9] as number)) p++;
    piece[i] = p;
  }
  return piece;
}
