import type { Blank } from '../../design/index.js';
import type { Steel } from '../../steels/index.js';
import type { Program } from '../program/program.js';
import { CODE_WORDS, SEGMENT_WORDS, entryOps } from '../program/program.js';
import { type Surface, WHOLE, type Window } from '../surfaces/surface.js';
import { hasSlag } from './fibre.js';

/** What a picture is to show. */
export interface PictureRequest {
  readonly program: Program;
  /** The steels that the program counts in: those of the forging. */
  readonly steels: readonly Steel[];
  readonly surface: Surface;
  /** Of the design; for the blade alone. */
  readonly blank?: Blank;
  /** The part of the surface that fills the picture. Absent: all of it. */
  readonly window?: Window;
  readonly widthPx: number;
  readonly heightPx: number;
  /** Samples in a pixel where its neighbours differ, 1–16; 1 refines nothing. */
  readonly samples: number;
  /** Gives every pixel all its samples: for measuring what refining by need leaves out. */
  readonly isUniform?: boolean;
}

/** Whether two pictures sample the same places of bars of the same size. */
export function hasSamePlaces(a: PictureRequest, b: PictureRequest): boolean {
  return placesKey(a) === placesKey(b);
}

function placesKey({ program, surface, blank, window, widthPx, heightPx }: PictureRequest): string {
  const { lengthMm, widthMm, thicknessMm } = program;
  const size = [lengthMm, widthMm, thicknessMm, widthPx, heightPx];
  return JSON.stringify([size, surface, surface.kind === 'blade' ? blank : null, window ?? WHOLE]);
}

/** Whether points of both end in the same layers, whatever steel those are of, and show slag in the same places. */
export function hasSameTrace(a: PictureRequest, b: PictureRequest): boolean {
  const p = a.program;
  const q = b.program;
  return (
    p.entry === q.entry &&
    isEqual(p.code, q.code) &&
    isEqual(p.params, q.params) &&
    isEqual(p.segments, q.segments) &&
    isEqual(p.pieces, q.pieces) &&
    isEqual(p.layerTopMm, q.layerTopMm) &&
    p.layerSteel.every((steel, layer) => isSlag(a, steel) === isSlag(b, q.layerSteel[layer]))
  );
}

function isSlag({ steels }: PictureRequest, steel: number | undefined): boolean {
  const found = steel === undefined ? undefined : steels[steel];
  return found !== undefined && hasSlag(found);
}

/** How many ops of the entry segment two programs carry out alike before they differ. */
export function sharedOps(a: Program, b: Program): number {
  const most = Math.min(entryOps(a), entryOps(b));
  const first = a.segments[a.entry * SEGMENT_WORDS] as number;
  const other = b.segments[b.entry * SEGMENT_WORDS] as number;
  let ops = 0;
  while (
    ops < most &&
    a.code[(first + ops) * CODE_WORDS] === b.code[(other + ops) * CODE_WORDS] &&
    isEqual(paramsOf(a, first + ops), paramsOf(b, other + ops))
  ) {
    ops += 1;
  }
  return ops;
}

/**
 * The parameters of an op, and what lies between them and the next op's: borders of pieces, which differ only where more
 * does.
 */
function paramsOf({ code, params }: Program, op: number): Float64Array {
  const next = (op + 1) * CODE_WORDS + 1;
  return params.subarray(code[op * CODE_WORDS + 1], next < code.length ? code[next] : params.length);
}

function isEqual(a: ArrayLike<number>, b: ArrayLike<number>): boolean {
  if (a.length !== b.length) return false;
  for (let i = 0; i < a.length; i++) if (a[i] !== b[i]) return false;
  return true;
}
