import type { BarState } from '@shared/bar';
import type { Assembly } from '@shared/design';
import type { Format } from '@shared/units';
import { turnText } from './assembly-text';
import type { LaidPiece } from './bar-scene';
import { sticksOut } from './bar-text';
import { spreadLabels } from './label-spread';
import { type Measure, shortened } from './paper';
import { LABEL_FONT, LABEL_PX } from './stack-scene';
import { type AreaPx, type PointPx, type Viewport, fitted, toPx } from './viewport';

/** The sheet of an assembly: the section at the left, the list of its pieces at the right. */
export interface AssemblyFrame {
  readonly widthPx: number;
  readonly heightPx: number;
  readonly area: AreaPx;
  readonly listPx: number;
}

const LIST_GAP_PX = 44;
/** Room for the figure of what sticks out, px. */
export const AMOUNT_PX = 66;
/** Two lines for each piece: its bar, and how it lies. */
const ENTRY_PX = 2 * LABEL_PX - 2;

export function assemblyFrame(widthPx: number, heightPx: number): AssemblyFrame {
  const isNarrow = widthPx < 560;
  const left = isNarrow ? 60 : 82;
  const listPx = isNarrow ? Math.round(widthPx * 0.36) : 250;
  const area = {
    leftPx: left,
    topPx: 56,
    widthPx: Math.max(40, widthPx - left - listPx - LIST_GAP_PX - 16),
    heightPx: Math.max(40, heightPx - 56 - 100),
  };
  return { widthPx, heightPx, area, listPx };
}

/** The whole section with all that sticks out, as large as its area allows. */
export function assemblyViewport(
  made: Pick<BarState, 'widthMm' | 'thicknessMm'>,
  laid: readonly LaidPiece[],
  frame: AssemblyFrame,
): Viewport {
  const widthMm = Math.max(made.widthMm, ...laid.map((piece) => piece.bar.widthMm));
  const heightMm = Math.max(made.thicknessMm, ...laid.map((piece) => piece.bar.thicknessMm));
  const whole = fitted({ acrossMm: widthMm, upMm: heightMm }, frame.area);
  const corner = toPx(whole, {
    acrossMm: (widthMm - made.widthMm) / 2,
    upMm: (heightMm - made.thicknessMm) / 2,
  });
  return { pxPerMm: whole.pxPerMm, originPx: corner };
}

/** A piece in the list. */
export interface PieceEntry {
  readonly place: number;
  readonly middlePx: number;
  readonly name: string;
  readonly words: string;
}

export interface PieceList {
  readonly leftPx: number;
  readonly widthPx: number;
  readonly entryPx: number;
  readonly entries: readonly PieceEntry[];
}

/**
 * The list of pieces beside the section: each level with its piece where they lie on each other, from the top down in
 * their order where they lie side by side.
 */
export function pieceList(
  assembly: Assembly,
  laid: readonly LaidPiece[],
  names: ReadonlyMap<string, string>,
  format: Format,
  viewport: Viewport,
  frame: AssemblyFrame,
  measure: Measure,
): PieceList {
  const isUp = assembly.along === 'thickness';
  const drafts = laid.map((piece, place) => {
    const middle = toPx(viewport, { acrossMm: 0, upMm: piece.upMm + piece.bar.thicknessMm / 2 });
    return { place, wantedPx: isUp ? middle.yPx : frame.area.topPx + place * ENTRY_PX };
  });
  const falling = drafts.sort((a, b) => a.wantedPx - b.wantedPx || a.place - b.place);
  const fromPx = frame.area.topPx - 22;
  const toEndPx = frame.heightPx - 64;
  const entryPx = Math.min(ENTRY_PX, Math.max(8, (toEndPx - fromPx) / Math.max(1, laid.length)));
  const middles = spreadLabels(
    falling.map((draft) => draft.wantedPx),
    falling.map(() => entryPx),
    fromPx,
    toEndPx,
  );
  const nameRoomPx = frame.listPx - 44;
  const rightPx = Math.max(
    ...laid.map((piece) => toPx(viewport, { acrossMm: piece.acrossMm + piece.bar.widthMm, upMm: 0 }).xPx),
    0,
  );
  const hasAmounts = isUp && laid.some((piece) => sticksOut(piece.overhang.acrossMm));
  const leftPx = Math.min(
    rightPx + LIST_GAP_PX + (hasAmounts ? AMOUNT_PX : 0),
    frame.widthPx - frame.listPx - 8,
  );
  const entries = falling.map(({ place }, i) => {
    const piece = assembly.pieces[place];
    const bar = laid[place]?.bar;
    const size = bar ? format.size([bar.widthMm, bar.thicknessMm], { fractionStyle: 'built' }) : '';
    const turn = piece ? turnText(piece) : '';
    return {
      place,
      middlePx: middles[i] as number,
      name: shortened(names.get(piece?.bar ?? '') ?? piece?.bar ?? '', LABEL_FONT, nameRoomPx, measure),
      words: shortened(turn === '' ? size : `${size}, ${turn}`, LABEL_FONT, nameRoomPx, measure),
    };
  });
  return { leftPx, widthPx: frame.listPx, entryPx, entries };
}

/** The piece whose entry is at a point of the sheet, or null. */
export function entryAt(list: PieceList, at: PointPx): number | null {
  if (at.xPx < list.leftPx - 6 || at.xPx > list.leftPx + list.widthPx) return null;
  return list.entries.find((entry) => Math.abs(entry.middlePx - at.yPx) <= list.entryPx / 2)?.place ?? null;
}
