import { sectionAcross } from '../bar/index.js';
import type { Bar } from '../design/index.js';
import type { Forging } from '../forging/index.js';
import { type Steel, nominalPercent } from '../steels/index.js';
import { type CarbonPart, carbonAffinityOf, isCarbonBarrier, levelCarbonPercent } from './carbon-activity.js';
import type { BarContents, PieceShare } from './contents.js';

/** One material in one part of a stack between barriers. */
export interface Constituent {
  /** Index in `Forging.steels`. */
  readonly steel: number;
  /** Its mass is a fraction of the stack's. */
  readonly part: CarbonPart;
  /** Parts with the same number exchange carbon; barriers have none. */
  readonly group: number | null;
}

/** A stack on its way towards level activity. */
export interface LevelledStack {
  readonly constituents: readonly (Constituent & { readonly endPercent: number })[];
  /** Mean distance from the start to level activity, wt%, for each unit of the stack's mass. */
  readonly toGo: number;
}

/** What an assembly does to the carbon of a piece: C becomes `factor`·C + `offset`·affinity. */
export interface CarbonShift {
  readonly factor: number;
  readonly offset: number;
}

export const NO_SHIFT: CarbonShift = { factor: 1, offset: 0 };

/** An assembly on its way towards level activity between its pieces. */
export interface LevelledPieces {
  readonly shifts: readonly CarbonShift[];
  /** As in {@link LevelledStack}. */
  readonly toGo: number;
}

/** The materials of a stack between its barriers, and their carbon once levelled within the stack. */
export function levelledStack(forging: Forging, bar: Bar, levelled: number): LevelledStack {
  const constituents = constituentsOf(forging, bar);
  const groups = new Map<number | null, Constituent[]>();
  for (const constituent of constituents) {
    const group = groups.get(constituent.group);
    if (group) group.push(constituent);
    else groups.set(constituent.group, [constituent]);
  }
  let toGo = 0;
  const levelledOnes = [...groups].flatMap(([group, members]) => {
    const level =
      group === null
        ? members.map(({ part }) => part.carbonPercent)
        : levelCarbonPercent(members.map(({ part }) => part));
    return members.map((constituent, i) => {
      const { carbonPercent, mass } = constituent.part;
      const distance = (level[i] as number) - carbonPercent;
      toGo += mass * Math.abs(distance);
      return { ...constituent, endPercent: carbonPercent + levelled * distance };
    });
  });
  return { constituents: levelledOnes, toGo };
}

function constituentsOf(forging: Forging, bar: Bar): readonly Constituent[] {
  if (bar.start.kind !== 'stack') return [];
  const { layers } = bar.start;
  const steelIndex = new Map(forging.steels.map((steel, index) => [steel.id, index]));
  const steelOf = (id: string): Steel => forging.steels[steelIndex.get(id) as number] as Steel;
  const massOf = (layer: (typeof layers)[number]): number =>
    layer.thicknessMm * steelOf(layer.steel).densityKgM3;
  const total = layers.reduce((sum, layer) => sum + massOf(layer), 0);
  let group = 0;
  const grouped = layers.map((layer) => {
    if (!isCarbonBarrier(steelOf(layer.steel))) return { layer, group };
    group += 1;
    return { layer, group: null };
  });
  // Restacked the same way up, the top of one piece meets the bottom of the next.
  const topMeetsBottom = bar.steps.some(
    (step) => step.kind === 'restack' && !step.isOff && !step.turnAlternate,
  );
  const top = grouped[grouped.length - 1]?.group;
  const bottom = grouped[0]?.group;
  const merged = new Map<string, Constituent>();
  for (const { layer, group: place } of grouped) {
    const own = topMeetsBottom && bottom === 0 && place !== null && place === top ? bottom : place;
    const key = `${own}/${layer.steel}`;
    const steel = steelOf(layer.steel);
    const mass = massOf(layer) / total + (merged.get(key)?.part.mass ?? 0);
    const part = { mass, carbonPercent: nominalPercent(steel, 'C'), affinity: carbonAffinityOf(steel) };
    merged.set(key, { steel: steelIndex.get(layer.steel) as number, group: own, part });
  }
  return [...merged.values()];
}

/** What becomes of the carbon of each piece of an assembly on the way towards level activity between the pieces. */
export function levelledPieces(
  forging: Forging,
  bar: Bar,
  own: BarContents,
  contents: ReadonlyMap<string, BarContents>,
  levelled: number,
): LevelledPieces {
  const along = bar.start.kind === 'assembly' ? bar.start.along : 'thickness';
  const parts = own.pieces.map((piece) => pieceAsPart(forging, piece, contents));
  const shifts = parts.map(() => NO_SHIFT);
  let toGo = 0;
  for (const run of runsWithoutBarrier(forging, own.pieces, parts, along)) {
    const level = levelCarbonPercent(run.map((i) => parts[i] as CarbonPart));
    run.forEach((i, r) => {
      const { mass, carbonPercent } = parts[i] as CarbonPart;
      const distance = (level[r] as number) - carbonPercent;
      toGo += mass * Math.abs(distance);
      shifts[i] = shiftOf(parts[i] as CarbonPart, levelled * distance);
    });
  }
  return { shifts, toGo };
}

/** A piece as one layer: what takes part of its mass, with its mean carbon and affinity. */
function pieceAsPart(
  forging: Forging,
  piece: PieceShare,
  contents: ReadonlyMap<string, BarContents>,
): CarbonPart {
  let mass = 0;
  let carbon = 0;
  let affinity = 0;
  for (const [index, share] of contents.get(piece.from)?.massBySteel ?? []) {
    const steel = forging.steels[index] as Steel;
    if (isCarbonBarrier(steel)) continue;
    mass += share;
    carbon += share * nominalPercent(steel, 'C');
    affinity += share * carbonAffinityOf(steel);
  }
  const scale = mass > 0 ? 1 / mass : 0;
  return { mass: piece.massFraction * mass, carbonPercent: carbon * scale, affinity: affinity * scale };
}

/** Runs of neighbouring pieces with no barrier between them. */
function runsWithoutBarrier(
  forging: Forging,
  pieces: readonly PieceShare[],
  parts: readonly CarbonPart[],
  along: 'thickness' | 'width',
): readonly (readonly number[])[] {
  const faces = pieces.map((piece) => {
    const steels = sectionAcross(piece.bar, along)?.steels;
    const isClosed = (index: number | undefined): boolean =>
      index !== undefined && isCarbonBarrier(forging.steels[index] as Steel);
    return { first: isClosed(steels?.[0]), last: isClosed(steels?.[steels.length - 1]) };
  });
  const runs: number[][] = [];
  pieces.forEach((_, i) => {
    if ((parts[i] as CarbonPart).mass === 0) return;
    const isJoined =
      i > 0 && (parts[i - 1] as CarbonPart).mass > 0 && !faces[i - 1]?.last && !faces[i]?.first;
    const run = runs[runs.length - 1];
    if (isJoined && run) run.push(i);
    else runs.push([i]);
  });
  return runs;
}

/** A piece loses from all its layers in proportion, and gains in proportion to their affinity: none falls below 0. */
function shiftOf(part: CarbonPart, change: number): CarbonShift {
  return change < 0
    ? { factor: 1 + change / part.carbonPercent, offset: 0 }
    : { factor: 1, offset: change / part.affinity };
}
