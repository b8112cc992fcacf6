/** Length of an arrowhead, and half its width: slender and filled, as on a technical drawing (ISO 129-1 leaves 1 : 3). */
export const ARROW_PX = 9;
export const ARROW_HALF_PX = 1.6;
/** Between a figure and what is beside it, px. */
const GAP_PX = 5;
/** How far the line goes on past an arrow that points inward, px. */
const TAIL_PX = 8;

/** An arrowhead on a dimension line: its tip, and which way it points. */
export interface Arrow {
  readonly atPx: number;
  readonly points: 'back' | 'forth';
}

/** A dimension line laid out along one direction. */
export interface DimensionLine {
  /** Pieces of the line, from and to, ascending. */
  readonly lines: readonly (readonly [number, number])[];
  readonly arrows: readonly Arrow[];
  /** The middle of the figure. */
  readonly figurePx: number;
  /** Whether the figure stands beside the line, for want of room in it. */
  readonly isBeside: boolean;
  /** Ends whose extension line is drawn; an end off the sheet has none. */
  readonly extensions: readonly number[];
}

/**
 * A dimension line from `fromPx` to `toPx` (ascending) with its figure set into it: arrows inside; where they don't fit,
 * arrows outside pointing in; where the figure doesn't fit either, the figure beside it. What lies off the sheet is left
 * away, arrow and all, and the figure goes to the middle of what can be seen. Null when nothing of it can be.
 * @param figureLengthPx length of the figure along the line
 * @param seenPx the part of the sheet the line may take
 */
export function dimensionLine(
  fromPx: number,
  toPx: number,
  figureLengthPx: number,
  seenPx: readonly [number, number],
): DimensionLine | null {
  const [seenFrom, seenTo] = seenPx;
  if (toPx < seenFrom || fromPx > seenTo || !(toPx > fromPx)) return null;
  const hasFrom = fromPx >= seenFrom;
  const hasTo = toPx <= seenTo;
  const start = Math.max(fromPx, seenFrom);
  const end = Math.min(toPx, seenTo);
  const extensions = [...(hasFrom ? [fromPx] : []), ...(hasTo ? [toPx] : [])];
  const lengthPx = end - start;
  const arrowsPx = (hasFrom ? ARROW_PX : 0) + (hasTo ? ARROW_PX : 0);
  const figureRoomPx = figureLengthPx + 2 * GAP_PX;
  if (lengthPx >= arrowsPx + figureRoomPx) {
    const figurePx = (start + end) / 2;
    return {
      lines: [
        [start, figurePx - figureRoomPx / 2],
        [figurePx + figureRoomPx / 2, end],
      ],
      arrows: [
        ...(hasFrom ? [{ atPx: fromPx, points: 'back' } as const] : []),
        ...(hasTo ? [{ atPx: toPx, points: 'forth' } as const] : []),
      ],
      figurePx,
      isBeside: false,
      extensions,
    };
  }
  const arrows: readonly Arrow[] = [
    ...(hasFrom ? [{ atPx: fromPx, points: 'forth' } as const] : []),
    ...(hasTo ? [{ atPx: toPx, points: 'back' } as const] : []),
  ];
  const before = fromPx - ARROW_PX - TAIL_PX;
  const after = toPx + ARROW_PX + TAIL_PX;
  const tails: (readonly [number, number])[] = [
    ...(hasFrom ? [[before, fromPx] as const] : []),
    ...(hasTo ? [[toPx, after] as const] : []),
  ];
  if (lengthPx >= figureRoomPx - GAP_PX) {
    return { lines: tails, arrows, figurePx: (start + end) / 2, isBeside: false, extensions };
  }
  const forthPx = after + GAP_PX + figureLengthPx / 2;
  const backPx = before - GAP_PX - figureLengthPx / 2;
  const isForthSeen = forthPx + figureLengthPx / 2 <= seenTo;
  const isBackSeen = backPx - figureLengthPx / 2 >= seenFrom;
  const figurePx = isForthSeen || !isBackSeen ? Math.min(forthPx, seenTo - figureLengthPx / 2) : backPx;
  return { lines: [...tails, [start, end]], arrows, figurePx, isBeside: true, extensions };
}
