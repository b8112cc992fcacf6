import { type BarState, NO_LOSSES, addLosses, massKg, sectionOf } from '../bar/index.js';
import type { Bar, Stack } from '../design/index.js';
import { type Steel, mixDensityByVolume } from '../steels/index.js';
import type { Allowances, Refusal } from '../steps/index.js';
import { assemble, pieceOfBar, placed } from './assembly.js';
import type { CutPlan } from './cut-plan.js';
import type { ForgedBar, ForgedState } from './forging.js';

/** What the bars of a design start from: the bars before, the steels, the allowances. */
export interface Ground {
  readonly forged: ReadonlyMap<string, ForgedBar>;
  readonly cutPlan: CutPlan;
  readonly steels: readonly Steel[];
  readonly allowances: Allowances;
}

/** A bar's start, or why its pieces make none. */
export interface Start {
  readonly state: ForgedState | null;
  readonly refusal: Refusal | null;
  readonly overhangs: ForgedBar['overhangs'];
  readonly pieces: readonly BarState[];
}

/** The start of a bar; the one computed before, when bar and pieces are the very same. */
export function startOf(
  bar: Bar,
  ground: Ground,
  before: { bar: Bar; forged: ForgedBar } | undefined,
): Start {
  const kept = before?.bar.start === bar.start ? before.forged : undefined;
  const keptState = kept?.states[0];
  if (bar.start.kind === 'stack') {
    const state = keptState ?? startState(stackBar(bar.start, ground.steels), NO_LOSSES);
    return { state, refusal: null, overhangs: [], pieces: [] };
  }
  const laid = laidPieces(bar, ground);
  if (laid.refusal) return { state: null, refusal: laid.refusal, overhangs: [], pieces: [] };
  if (keptState && isSame(kept.pieces, laid.pieces)) {
    return { state: keptState, refusal: null, overhangs: kept.overhangs, pieces: kept.pieces };
  }
  const assembled = assemble(laid.pieces, bar.start.along);
  if ('refusal' in assembled)
    return { state: null, refusal: assembled.refusal, overhangs: [], pieces: laid.pieces };
  const lossesKg = addLosses(assembled.lossesKg, { ...NO_LOSSES, kerf: laid.kerfKg });
  return {
    state: startState(assembled.bar, lossesKg),
    refusal: null,
    overhangs: assembled.overhangs,
    pieces: laid.pieces,
  };
}

/** Mass of one saw cut through a finished bar, kg. */
export function kerfMassKg(bar: BarState, allowances: Allowances): number {
  return massKg(allowances.kerfMm * bar.widthMm * bar.thicknessMm, bar.densityKgM3);
}

/** The last state of a bar that nothing stopped. */
export function endOf(forged: ForgedBar | undefined): BarState | null {
  if (forged === undefined || forged.refusal !== null) return null;
  return forged.states[forged.states.length - 1]?.bar ?? null;
}

function startState(bar: BarState, lossesKg: ForgedState['lossesKg']): ForgedState {
  return { step: null, bar, lossesKg, heats: 0, minutesAtHeat: 0, eatenLayers: { scale: 0, grinding: 0 } };
}

function stackBar(stack: Stack, steels: readonly Steel[]): BarState {
  const steelIndex = new Map(steels.map((steel, index) => [steel.id, index]));
  const indexes = Uint16Array.from(stack.layers, (layer) => steelIndex.get(layer.steel) as number);
  const section = sectionOf(
    indexes,
    Float64Array.from(stack.layers, (layer) => layer.thicknessMm),
  );
  const parts = stack.layers.map((layer, i) => ({
    densityKgM3: (steels[indexes[i] as number] as Steel).densityKgM3,
    share: layer.thicknessMm / section.totalMm,
  }));
  return {
    lengthMm: stack.lengthMm,
    widthMm: stack.widthMm,
    thicknessMm: section.totalMm,
    densityKgM3: mixDensityByVolume(parts),
    layers: stack.layers.length,
    lie: 'thickness',
    section,
    openSeams: stack.layers.length - 1,
  };
}

interface LaidPieces {
  readonly pieces: readonly BarState[];
  /** Cuts that set these pieces free: one for each piece but the first of its bar. */
  readonly kerfKg: number;
  readonly refusal: Refusal | null;
}

function laidPieces(bar: Bar, ground: Ground): LaidPieces {
  const pieces: BarState[] = [];
  let kerfKg = 0;
  if (bar.start.kind !== 'assembly') return { pieces, kerfKg, refusal: null };
  const places = ground.cutPlan.places.get(bar.id) ?? [];
  for (const [i, piece] of bar.start.pieces.entries()) {
    const end = endOf(ground.forged.get(piece.bar));
    if (end === null) {
      return {
        pieces,
        kerfKg,
        refusal: { code: 'piece-refused', field: 'pieces', asked: i + 1, available: i, unit: 'pieces' },
      };
    }
    const length = pieceOfBar(end, ground.cutPlan.pieces.get(piece.bar) ?? 1, ground.allowances.kerfMm);
    if ('refusal' in length) return { pieces, kerfKg, refusal: length.refusal };
    pieces.push(placed(length, piece));
    if ((places[i] ?? 0) > 0) kerfKg += kerfMassKg(end, ground.allowances);
  }
  return { pieces, kerfKg, refusal: null };
}

/** Whether two rows of pieces are the same in all that an assembly is made from. */
function isSame(a: readonly BarState[], b: readonly BarState[]): boolean {
  return (
    a.length === b.length &&
    a.every((piece, i) => {
      const other = b[i] as BarState;
      return (Object.keys(piece) as (keyof BarState)[]).every((key) =>
        key === 'section' ? isSameSection(piece, other) : piece[key] === other[key],
      );
    })
  );
}

function isSameSection(a: BarState, b: BarState): boolean {
  if (a.section === b.section) return true;
  if (a.section === null || b.section === null) return false;
  return (
    a.section.steels.length === b.section.steels.length &&
    a.section.steels.every((steel, i) => steel === b.section?.steels[i]) &&
    a.section.scale === b.section.scale &&
    a.section.firstMm === b.section.firstMm &&
    a.section.lastMm === b.section.lastMm &&
    a.section.baseMm.every((base, i) => base === b.section?.baseMm[i])
  );
}
