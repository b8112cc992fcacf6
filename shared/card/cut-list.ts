import { massKg } from '../bar/index.js';
import type { Forging } from '../forging/index.js';
import type { Format } from '../units/index.js';

/** One line of the cut list: equal pieces of one steel and size. */
export interface CutLine {
  readonly steel: string;
  readonly steelName: string;
  readonly thicknessMm: number;
  readonly widthMm: number;
  readonly lengthMm: number;
  readonly pieces: number;
  /** Length of bar that the line uses up, a saw cut for each piece. */
  readonly barLengthMm: number;
  readonly massKg: number;
}

/** What to cut before the first heat. */
export interface CutList {
  readonly title: string;
  readonly kerfMm: number;
  readonly lines: readonly CutLine[];
  readonly totalMassKg: number;
}

/** The plain cut list of a design: the stock of every bar that ends in the result, thickest section first per steel. */
export function cutList(forging: Forging): CutList {
  const { kerfMm } = forging.allowances;
  const lines = forging.stock.map((item): CutLine => {
    const steel = forging.steels.find((candidate) => candidate.id === item.steel);
    const volume = item.pieces * item.lengthMm * item.widthMm * item.thicknessMm;
    return {
      ...item,
      steelName: steel?.name ?? item.steel,
      barLengthMm: item.pieces * (item.lengthMm + kerfMm),
      massKg: massKg(volume, steel?.densityKgM3 ?? 0),
    };
  });
  lines.sort(
    (a, b) =>
      compareText(a.steelName, b.steelName) || b.thicknessMm - a.thicknessMm || b.lengthMm - a.lengthMm,
  );
  return {
    title: forging.design.name,
    kerfMm,
    lines,
    totalMassKg: lines.reduce((sum, line) => sum + line.massKg, 0),
  };
}

/** By code points: the same order on every machine, whatever its language. */
function compareText(a: string, b: string): number {
  return a < b ? -1 : a > b ? 1 : 0;
}

/** A line in words: "7 pieces of 1084, 3.2 × 40 mm, 95 mm long". */
export function cutLineText(line: CutLine, format: Format): string {
  const pieces = `${format.count(line.pieces)} ${line.pieces === 1 ? 'piece' : 'pieces'}`;
  return `${pieces} of ${line.steelName}, ${format.size([line.thicknessMm, line.widthMm])}, ${format.length(line.lengthMm)} long`;
}
