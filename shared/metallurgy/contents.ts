import { type BarState, volumeMm3 } from '../bar/index.js';
import type { ForgedBar, Forging } from '../forging/index.js';
import type { Steel } from '../steels/index.js';

/** A piece of an earlier bar in an assembly. */
export interface PieceShare {
  /** Id of the bar it was cut from. */
  readonly from: string;
  /** Its part of the assembly's mass, 0–1, after trimming. */
  readonly massFraction: number;
  /** The piece as it was laid in. */
  readonly bar: BarState;
}

/** What a bar is made of when it is put together. Scale and grinding don't change it: they take a little of everything. */
export interface BarContents {
  readonly id: string;
  /** Mass fraction of each material by its index in `Forging.steels`; adds up to 1. */
  readonly massBySteel: ReadonlyMap<number, number>;
  /** Empty for a stack. */
  readonly pieces: readonly PieceShare[];
}

const CONTENTS = new WeakMap<Forging, ReadonlyMap<string, BarContents>>();

/** Contents of every bar that has a start, by id in the order of the document. Worked out once for a forging. */
export function contentsOf(forging: Forging): ReadonlyMap<string, BarContents> {
  const known = CONTENTS.get(forging);
  if (known) return known;
  const contents = new Map<string, BarContents>();
  const steelIndex = new Map(forging.steels.map((steel, index) => [steel.id, index]));
  forging.design.bars.forEach((bar, b) => {
    const forged = forging.bars[b] as ForgedBar;
    if (forged.states.length === 0) return;
    const massBySteel = new Map<number, number>();
    const add = (steel: number, mass: number): void => {
      massBySteel.set(steel, (massBySteel.get(steel) ?? 0) + mass);
    };
    let pieces: readonly PieceShare[] = [];
    if (bar.start.kind === 'stack') {
      for (const layer of bar.start.layers) {
        const steel = steelIndex.get(layer.steel) as number;
        add(steel, layer.thicknessMm * (forging.steels[steel] as Steel).densityKgM3);
      }
    } else {
      pieces = pieceShares(
        forged,
        bar.start.pieces.map((piece) => piece.bar),
        bar.start.along,
      );
      for (const piece of pieces) {
        for (const [steel, mass] of contents.get(piece.from)?.massBySteel ?? [])
          add(steel, mass * piece.massFraction);
      }
    }
    const total = [...massBySteel.values()].reduce((sum, mass) => sum + mass, 0);
    for (const [steel, mass] of massBySteel) massBySteel.set(steel, mass / total);
    contents.set(bar.id, { id: bar.id, massBySteel, pieces });
  });
  CONTENTS.set(forging, contents);
  return contents;
}

/** The materials of a bar, in the order in which the document lays them; empty while the bar has no start. */
export function steelsOfBar(forging: Forging, barId: string): readonly Steel[] {
  const indexes = [...(contentsOf(forging).get(barId)?.massBySteel.keys() ?? [])].sort((a, b) => a - b);
  return indexes.map((index) => forging.steels[index] as Steel);
}

/** Which part of the result's mass comes from each bar, 0–1; bars that don't end in it are missing. */
export function sharesOfResult(forging: Forging): ReadonlyMap<string, number> {
  const contents = contentsOf(forging);
  const shares = new Map<string, number>([[forging.design.result, 1]]);
  for (const bar of [...forging.bars].reverse()) {
    const share = shares.get(bar.id);
    if (share === undefined) continue;
    for (const piece of contents.get(bar.id)?.pieces ?? []) {
      shares.set(piece.from, (shares.get(piece.from) ?? 0) + share * piece.massFraction);
    }
  }
  return shares;
}

function pieceShares(
  bar: ForgedBar,
  from: readonly string[],
  along: 'thickness' | 'width',
): readonly PieceShare[] {
  const masses = bar.pieces.map((piece, i) => {
    const overhang = bar.overhangs[i] ?? { lengthMm: 0, acrossMm: 0 };
    const across = along === 'thickness' ? 'widthMm' : 'thicknessMm';
    const trimmed = {
      ...piece,
      lengthMm: piece.lengthMm - overhang.lengthMm,
      [across]: piece[across] - overhang.acrossMm,
    };
    return volumeMm3(trimmed) * piece.densityKgM3;
  });
  const total = masses.reduce((sum, mass) => sum + mass, 0);
  return bar.pieces.map((piece, i) => ({
    from: from[i] as string,
    massFraction: (masses[i] as number) / total,
    bar: piece,
  }));
}
