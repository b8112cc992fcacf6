import {
  type AffineOp,
  IDENTITY_OP,
  type TraceOp,
  endForEndBack,
  isIdentity,
  mergedAffine,
  quarterTurnBack,
} from '../../bar/index.js';
import type { Assembly, Bar, Stack } from '../../design/index.js';
import { type ForgedBar, type Forging, cutPlanOf } from '../../forging/index.js';
import { traceStep } from '../../steps/index.js';
import { affineParams, encode } from './encode.js';
import { OP, PIECE_WORDS, type Program, SEGMENT_WORDS, START } from './program.js';
import { hammerWaves } from './waves.js';

/** A bar at one moment: after so many of its states, 0 being its start. */
export interface Moment {
  readonly bar: string;
  readonly state: number;
}

/**
 * Makes a forging ready for tracing: every step's way back, last first, neighbouring affine ops merged into one and
 * constants worked out.
 * @param at the bar and state to look at; the result as it is in the end when left out
 * @returns null when that state doesn't exist because a step before it is refused
 */
export function compile(forging: Forging, at?: Moment): Program | null {
  const { design } = forging;
  const barId = at?.bar ?? design.result;
  const forged = forging.bars.find((candidate) => candidate.id === barId);
  const last = forged ? forged.states.length - 1 : -1;
  const state = at?.state ?? last;
  const shown = forged?.states[state]?.bar;
  if (!forged || !shown || (at === undefined && forging.result === null)) return null;
  const writer = new ProgramWriter(forging);
  const entry = writer.segmentOf(forged, state);
  return {
    ...writer.finished(),
    entry,
    lengthMm: shown.lengthMm,
    widthMm: shown.widthMm,
    thicknessMm: shown.thicknessMm,
  };
}

interface WrittenSegment {
  readonly index: number;
  readonly folds: number;
}

/** Holds what has been written so far; lives for one call of {@link compile}. */
class ProgramWriter {
  private readonly code: number[] = [];
  private readonly params: number[] = [];
  private readonly segments: number[] = [];
  private readonly pieces: number[] = [];
  private readonly layerTopMm: number[] = [];
  private readonly layerSteel: number[] = [];
  private readonly layerBar: number[] = [];
  private readonly layerPlace: number[] = [];
  private readonly written = new Map<string, WrittenSegment>();
  private readonly steelIndex: ReadonlyMap<string, number>;
  private readonly barIndex: ReadonlyMap<string, number>;
  private readonly places: ReadonlyMap<string, readonly number[]>;
  private folds = 0;

  constructor(private readonly forging: Forging) {
    this.steelIndex = new Map(forging.steels.map((steel, i) => [steel.id, i]));
    this.barIndex = new Map(forging.design.bars.map((bar, i) => [bar.id, i]));
    this.places = cutPlanOf(forging.design).places;
  }

  /** Writes the way from a state of a bar to its start, and before that the ways of the bars it is made of. */
  segmentOf(forged: ForgedBar, state: number): number {
    const segment = this.write(forged, state);
    this.folds = Math.max(this.folds, segment.folds);
    return segment.index;
  }

  finished(): Omit<Program, 'entry' | 'lengthMm' | 'widthMm' | 'thicknessMm'> {
    return {
      code: Int32Array.from(this.code),
      params: Float64Array.from(this.params),
      segments: Int32Array.from(this.segments),
      pieces: Int32Array.from(this.pieces),
      layerTopMm: Float64Array.from(this.layerTopMm),
      layerSteel: Uint16Array.from(this.layerSteel),
      layerBar: Uint16Array.from(this.layerBar),
      layerPlace: Uint16Array.from(this.layerPlace),
      steelIds: this.forging.steels.map((steel) => steel.id),
      barIds: this.forging.design.bars.map((bar) => bar.id),
      folds: this.folds,
    };
  }

  private write(forged: ForgedBar, state: number): WrittenSegment {
    const bar = this.forging.design.bars[this.barIndex.get(forged.id) as number] as Bar;
    const start =
      bar.start.kind === 'stack'
        ? { words: this.writeStack(bar.start, forged.id), folds: 0 }
        : this.writeAssembly(bar.start, forged);
    const firstOp = this.code.length / 2;
    const folds = this.writeOps(forged, state);
    const index = this.segments.length / SEGMENT_WORDS;
    this.segments.push(firstOp, this.code.length / 2, ...start.words);
    return { index, folds: folds + start.folds };
  }

  private writeOps(forged: ForgedBar, state: number): number {
    const { design, allowances } = this.forging;
    const strength = design.unevenness ?? 0;
    const seed = design.seed ?? 0;
    const barIndex = this.barIndex.get(forged.id) as number;
    let folds = 0;
    let pending: AffineOp = IDENTITY_OP;
    const flush = (): void => {
      if (!isIdentity(pending)) this.writeOp(OP.affine, affineParams(pending));
      pending = IDENTITY_OP;
    };
    const add = (op: TraceOp, step: number): void => {
      if (op.op === 'affine') {
        pending = mergedAffine(pending, op);
        return;
      }
      const waves = op.op === 'uneven' && strength > 0 ? hammerWaves(seed, barIndex, step) : [];
      const encoded = encode(op, { strength, waves });
      if (encoded === null) return;
      flush();
      this.writeOp(encoded.code, encoded.params);
      if (op.op === 'fold') folds += 1;
      if (op.op === 'restack') folds += Math.log2(op.pieces);
    };
    for (let s = state; s > 0; s--) {
      const later = forged.states[s];
      const earlier = forged.states[s - 1];
      if (!later?.step || !earlier) continue;
      for (const op of traceStep(later.step, earlier.bar, later.bar, allowances)) add(op, s);
    }
    flush();
    return folds;
  }

  private writeOp(code: number, params: readonly number[]): void {
    this.code.push(code, this.params.length);
    this.params.push(...params);
  }

  private writeStack(stack: Stack, barId: string): readonly [number, number, number] {
    const first = this.layerTopMm.length;
    let heightMm = 0;
    stack.layers.forEach((layer, place) => {
      heightMm += layer.thicknessMm;
      this.layerTopMm.push(heightMm);
      this.layerSteel.push(this.steelIndex.get(layer.steel) as number);
      this.layerBar.push(this.barIndex.get(barId) as number);
      this.layerPlace.push(place);
    });
    return [START.stack, first, stack.layers.length];
  }

  private writeAssembly(
    assembly: Assembly,
    forged: ForgedBar,
  ): { readonly words: readonly [number, number, number]; readonly folds: number } {
    const isAcross = assembly.along === 'thickness';
    const places = this.places.get(forged.id) ?? [];
    let borderMm = 0;
    let folds = 0;
    const words: number[] = [];
    assembly.pieces.forEach((piece, i) => {
      const source = this.forging.bars.find((candidate) => candidate.id === piece.bar) as ForgedBar;
      const segment = this.written.get(piece.bar) ?? this.write(source, source.states.length - 1);
      this.written.set(piece.bar, segment);
      folds = Math.max(folds, segment.folds);
      const back = this.pieceBack(assembly, forged, source, i, places[i] ?? 0, borderMm);
      borderMm = back.borderMm;
      words.push(segment.index, this.params.length);
      this.params.push(...affineParams(back.op), borderMm);
    });
    const first = this.pieces.length / PIECE_WORDS;
    this.pieces.push(...words);
    const kind = isAcross ? START.assemblyAlongThickness : START.assemblyAlongWidth;
    return { words: [kind, first, assembly.pieces.length], folds };
  }

  /**
   * From the assembly to the end of the bar that piece `i` was cut from: down into the piece, back out of what was
   * trimmed, its turns undone, along to where it was sawn off.
   */
  private pieceBack(
    assembly: Assembly,
    forged: ForgedBar,
    source: ForgedBar,
    i: number,
    place: number,
    fromMm: number,
  ): { readonly op: AffineOp; readonly borderMm: number } {
    const placed = forged.pieces[i];
    const overhang = forged.overhangs[i];
    const piece = assembly.pieces[i];
    const bar = source.states[source.states.length - 1]?.bar;
    if (!placed || !overhang || !piece || !bar) {
      throw new RangeError(`compile: bar "${forged.id}" has a start but not its piece ${i + 1}`);
    }
    const isAcross = assembly.along === 'thickness';
    const side = overhang.acrossMm / 2;
    const shift: AffineOp = {
      ...IDENTITY_OP,
      shiftMm: isAcross ? [0, side, -fromMm] : [0, -fromMm, side],
    };
    let op = piece.endForEnd ? mergedAffine(shift, endForEndBack(placed.lengthMm, placed.widthMm)) : shift;
    let thicknessMm = placed.thicknessMm;
    let widthMm = placed.widthMm;
    for (let turn = 0; turn < (piece.quarterTurns ?? 0); turn++) {
      op = mergedAffine(op, quarterTurnBack(thicknessMm));
      [thicknessMm, widthMm] = [widthMm, thicknessMm];
    }
    const alongMm = place * (placed.lengthMm + this.forging.allowances.kerfMm);
    op = mergedAffine(op, { ...IDENTITY_OP, shiftMm: [alongMm, 0, 0] });
    return { op, borderMm: fromMm + (isAcross ? placed.thicknessMm : placed.widthMm) };
  }
}
