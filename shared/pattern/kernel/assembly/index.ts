import { cornerBack, grooveBack, twistBack, unevenBack, wedgeBack } from './bent-ops';
import { layConstants } from './constants';
import { dimpleBack } from './dimple';
import { affineBack, foldBack, restackBack, sliceBack } from './solid-ops';

/*
 * The kernel of the pattern: takes batches of points back through a program, in vectors of four numbers of single
 * precision or two of double. What the ops mean, and the program's layout, is in `shared/pattern/program`; how the host
 * lays everything out in memory, in `shared/pattern/kernel/memory.ts`. The kernel allocates nothing and trusts its host.
 */

/** Words of 32 bits, from the address that {@link prepare} is given. */
let codeAt: usize = 0;
let paramsAt: usize = 0;
let segmentsAt: usize = 0;
let piecesAt: usize = 0;
let groupsAt: usize = 0;
let layerTopsAt: usize = 0;
let layerCellsAt: usize = 0;
let cellsPerMmAt: usize = 0;
let pointsX: usize = 0;
let pointsY: usize = 0;
let pointsZ: usize = 0;
let layersAt: usize = 0;
let scratchAt: usize = 0;
/** Ops carried out, summed over the points, since the run began. */
let done: f64 = 0;

const SEGMENT_BYTES: usize = 32;
const PIECE_BYTES: usize = 8;
const STACK: i32 = 0;
const ALONG_WIDTH: i32 = 1;

/** Where everything lies; `header` holds thirteen addresses in the order of the variables above. */
export function prepare(header: usize): void {
  layConstants();
  codeAt = load<u32>(header);
  paramsAt = load<u32>(header, 4);
  segmentsAt = load<u32>(header, 8);
  piecesAt = load<u32>(header, 12);
  groupsAt = load<u32>(header, 16);
  layerTopsAt = load<u32>(header, 20);
  layerCellsAt = load<u32>(header, 24);
  cellsPerMmAt = load<u32>(header, 28);
  pointsX = load<u32>(header, 32);
  pointsY = load<u32>(header, 36);
  pointsZ = load<u32>(header, 40);
  layersAt = load<u32>(header, 44);
  scratchAt = load<u32>(header, 48);
}

/** Where the host may lay out its memory from. */
export function memoryFrom(): usize {
  return __heap_base;
}

export function runSingle(segment: i32, count: i32, skip: i32): f64 {
  done = 0;
  trace<f32>(segment, pointsX, pointsY, pointsZ, 0, count, skip, scratchAt);
  return done;
}

export function runDouble(segment: i32, count: i32, skip: i32): f64 {
  done = 0;
  trace<f64>(segment, pointsX, pointsY, pointsZ, 0, count, skip, scratchAt);
  return done;
}

export function beginSingle(segment: i32, count: i32, toOp: i32, fromOp: i32): f64 {
  done = 0;
  const first = load<i32>(segmentsAt + (segment as usize) * SEGMENT_BYTES);
  traceOps<f32>(first + fromOp, first + toOp, pointsX, pointsY, pointsZ, count);
  return done;
}

export function beginDouble(segment: i32, count: i32, toOp: i32, fromOp: i32): f64 {
  done = 0;
  const first = load<i32>(segmentsAt + (segment as usize) * SEGMENT_BYTES);
  traceOps<f64>(first + fromOp, first + toOp, pointsX, pointsY, pointsZ, count);
  return done;
}

function traceOps<T>(first: i32, end: i32, x: usize, y: usize, z: usize, count: i32): void {
  const bytes = ((count as usize) * sizeof<T>() + 15) & ~15;
  for (let op = first; op < end; op++) {
    const at = codeAt + ((op as usize) << 3);
    const params = paramsAt + ((load<i32>(at, 4) as usize) << 3);
    switch (load<i32>(at)) {
      case 1:
        affineBack<T>(params, x, y, z, bytes);
        break;
      case 2:
        restackBack<T>(params, x, y, z, bytes);
        break;
      case 3:
        foldBack<T>(params, x, z, bytes);
        break;
      case 4:
        sliceBack<T>(params, x, y, z, bytes);
        break;
      case 5:
        twistBack<T>(params, x, y, z, bytes);
        break;
      case 6:
        cornerBack<T>(params, y, z, bytes);
        break;
      case 7:
        grooveBack<T>(params, x, y, z, bytes);
        break;
      case 8:
        dimpleBack<T>(params, x, y, z, bytes);
        break;
      case 9:
        wedgeBack<T>(params, y, z, bytes);
        break;
      case 10:
        unevenBack<T>(params, x, y, z, bytes);
        break;
      default:
        unreachable();
    }
  }
  done += ((end - first) as f64) * (count as f64);
}

/**
 * Takes points back through a segment to the stacks. `places` holds, for each, its number in the batch; 0 where the
 * points are the batch itself. `scratch` is free from there on.
 */
function trace<T>(
  segment: i32,
  x: usize,
  y: usize,
  z: usize,
  places: usize,
  count: i32,
  skip: i32,
  scratch: usize,
): void {
  const words = segmentsAt + (segment as usize) * SEGMENT_BYTES;
  traceOps<T>(load<i32>(words) + skip, load<i32>(words, 4), x, y, z, count);
  if (load<i32>(words, 8) === STACK) nameLayers<T>(words, x, y, z, places, count);
  else traceAssembly<T>(words, x, y, z, places, count, scratch);
}

/** Finds each point's layer: a cell of the stack's height tells where to begin looking. */
function nameLayers<T>(words: usize, x: usize, y: usize, z: usize, places: usize, count: i32): void {
  const first = load<i32>(words, 12);
  const last = first + load<i32>(words, 16) - 1;
  const cells = layerCellsAt + ((load<i32>(words, 20) as usize) << 1);
  const lastCell = load<i32>(words, 24) - 1;
  const cellsPerMm = load<f64>(cellsPerMmAt + ((load<i32>(words, 28) as usize) << 3));
  for (let i = 0; i < count; i++) {
    const at = (i as usize) * sizeof<T>();
    const height = load<T>(z + at) as f64;
    const cell = max(0, min(lastCell, (height * cellsPerMm) as i32));
    let layer: i32 = load<u16>(cells + ((cell as usize) << 1));
    while (layer < last && height >= load<f64>(layerTopsAt + ((layer as usize) << 3))) layer++;
    while (layer > first && height < load<f64>(layerTopsAt + (((layer - 1) as usize) << 3))) layer--;
    if (places === 0) {
      store<u16>(layersAt + ((i as usize) << 1), layer as u16);
    } else {
      const place = load<u32>(places + ((i as usize) << 2)) as usize;
      store<u16>(layersAt + (place << 1), layer as u16);
      const to = place * sizeof<T>();
      store<T>(pointsX + to, load<T>(x + at));
      store<T>(pointsY + to, load<T>(y + at));
      store<T>(pointsZ + to, load<T>(z + at));
    }
  }
}

/** Sorts the points by the bar that their piece was cut from, each bar's share padded to whole vectors, and goes on with each. */
function traceAssembly<T>(
  words: usize,
  x: usize,
  y: usize,
  z: usize,
  places: usize,
  count: i32,
  scratch: usize,
): void {
  const along = load<i32>(words, 8) === ALONG_WIDTH ? y : z;
  const pieces = piecesAt + (load<i32>(words, 12) as usize) * PIECE_BYTES;
  const lastPiece = load<i32>(words, 16) - 1;
  const groups = groupsAt + ((load<i32>(words, 20) as usize) << 2);
  const groupCount = load<i32>(words, 24);

  const keys = scratch;
  const starts = (keys + (count as usize) + 15) & ~15;
  const cursors = starts + ((groupCount as usize) << 2);
  const counts = cursors + ((groupCount as usize) << 2);
  memory.fill(counts, 0, (groupCount as usize) << 2);
  for (let i = 0; i < count; i++) {
    const height = load<T>(along + (i as usize) * sizeof<T>()) as f64;
    let piece = 0;
    while (piece < lastPiece && height >= load<f64>(pieceParams(pieces, piece), 72)) piece++;
    store<u8>(keys + (i as usize), piece as u8);
    const counter = counts + (groupOf(pieces, piece) << 2);
    store<i32>(counter, load<i32>(counter) + 1);
  }
  const lanes: i32 = (16 / sizeof<T>()) as i32;
  let total = 0;
  for (let g: usize = 0; g < (groupCount as usize); g++) {
    store<i32>(starts + (g << 2), total);
    store<i32>(cursors + (g << 2), total);
    total += (load<i32>(counts + (g << 2)) + lanes - 1) & ~(lanes - 1);
  }
  const bytes = (total as usize) * sizeof<T>();
  const sortedX = (counts + ((groupCount as usize) << 2) + 15) & ~15;
  const sortedY = sortedX + bytes;
  const sortedZ = sortedY + bytes;
  const sortedPlaces = sortedZ + bytes;
  const free = (sortedPlaces + ((total as usize) << 2) + 15) & ~15;

  for (let i: usize = 0; i < (count as usize); i++) {
    const piece: i32 = load<u8>(keys + i);
    const params = pieceParams(pieces, piece);
    const cursor = cursors + (groupOf(pieces, piece) << 2);
    const to = load<i32>(cursor) as usize;
    store<i32>(cursor, (to as i32) + 1);
    const at = i * sizeof<T>();
    const point = to * sizeof<T>();
    store<T>(sortedX + point, axisBack<T>(params, 0, x, y, z, at));
    store<T>(sortedY + point, axisBack<T>(params, 8, x, y, z, at));
    store<T>(sortedZ + point, axisBack<T>(params, 16, x, y, z, at));
    const place: u32 = places === 0 ? (i as u32) : load<u32>(places + (i << 2));
    store<u32>(sortedPlaces + (to << 2), place);
  }
  for (let g: usize = 0; g < (groupCount as usize); g++) {
    const share = load<i32>(counts + (g << 2));
    if (share === 0) continue;
    const from = load<i32>(starts + (g << 2)) as usize;
    const at = from * sizeof<T>();
    const next = load<i32>(groups + (g << 2));
    trace<T>(next, sortedX + at, sortedY + at, sortedZ + at, sortedPlaces + (from << 2), share, 0, free);
  }
}

function pieceParams(pieces: usize, piece: i32): usize {
  return paramsAt + ((load<i32>(pieces + (piece as usize) * PIECE_BYTES, 4) as usize) << 3);
}

/** Which of the assembly's bars a piece was cut from. */
function groupOf(pieces: usize, piece: i32): usize {
  return load<i32>(pieces + (piece as usize) * PIECE_BYTES) as usize;
}

/** One coordinate of a point in its piece; `axis` is eight bytes for each. */
function axisBack<T>(params: usize, axis: usize, x: usize, y: usize, z: usize, at: usize): T {
  const from = load<f64>(params + axis);
  const source = from === 0 ? x : from === 1 ? y : z;
  const scale = load<f64>(params + axis, 24) as T;
  const shift = load<f64>(params + axis, 48) as T;
  return (load<T>(source + at) * scale + shift) as T;
}
