import type { Design } from '../design/index.js';

/** How the bars of a design are cut into the pieces that later bars use. */
export interface CutPlan {
  /** Number of equal pieces each bar is cut into; a bar that no piece uses is not in it. */
  readonly pieces: ReadonlyMap<string, number>;
  /** For each assembled bar, the place of each of its pieces in the bar it comes from, from the near end, from 0. */
  readonly places: ReadonlyMap<string, readonly number[]>;
  /** Ids of the bars that end in the result, the result among them. */
  readonly endsInResult: ReadonlySet<string>;
}

/** The cut plan of a design: pieces are cut from the near end on in the order in which the document names them. */
export function cutPlanOf(design: Design): CutPlan {
  const pieces = new Map<string, number>();
  const places = new Map<string, readonly number[]>();
  for (const bar of design.bars) {
    if (bar.start.kind !== 'assembly') continue;
    places.set(
      bar.id,
      bar.start.pieces.map((piece) => {
        const place = pieces.get(piece.bar) ?? 0;
        pieces.set(piece.bar, place + 1);
        return place;
      }),
    );
  }
  const endsInResult = new Set([design.result]);
  for (const bar of [...design.bars].reverse()) {
    if (!endsInResult.has(bar.id) || bar.start.kind !== 'assembly') continue;
    for (const piece of bar.start.pieces) endsInResult.add(piece.bar);
  }
  return { pieces, places, endsInResult };
}
