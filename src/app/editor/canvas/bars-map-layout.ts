import type { Bar } from '@shared/design';

/** A bar on the map. */
export interface MapNode {
  readonly barId: string;
  readonly leftPx: number;
  readonly topPx: number;
}

/** Pieces of one bar that go into another. */
export interface MapLink {
  readonly from: string;
  readonly to: string;
  readonly pieces: number;
  /** The way on the sheet, px: corners of a line that runs level and plumb. */
  readonly points: readonly (readonly [x: number, y: number])[];
  /** Where the number of pieces stands. */
  readonly figureAt: readonly [x: number, y: number];
}

/** The bars of a design and how they run into each other, laid out. */
export interface BarsMap {
  readonly kind: 'columns' | 'list';
  readonly nodes: readonly MapNode[];
  readonly links: readonly MapLink[];
  readonly widthPx: number;
  readonly heightPx: number;
}

/** Size of a bar on the map, px. */
export const NODE_WIDTH_PX = 176;
export const NODE_HEIGHT_PX = 108;
const COLUMN_GAP_PX = 84;
const ROW_GAP_PX = 16;
const MARGIN_PX = 12;
/** In a list: from one line to the next beside it, px. */
const LANE_PX = 14;
/** From the first of them to the bars, px: the arrow stands there. */
const ENTRY_PX = 22;

/**
 * A map of bars: from the left to the right in columns, each bar right of all that goes into it; under each other with
 * lines beside them where the columns find no room.
 */
export function barsMap(bars: readonly Bar[], widthPx: number): BarsMap {
  const columns = columnsOf(bars);
  const widest = columns.length * NODE_WIDTH_PX + (columns.length - 1) * COLUMN_GAP_PX + 2 * MARGIN_PX;
  return widest <= widthPx ? inColumns(bars, columns) : inList(bars, widthPx);
}

/** How many pieces of each bar go into a bar, in the order of first use. */
export function piecesInto(bar: Bar): ReadonlyMap<string, number> {
  const pieces = new Map<string, number>();
  if (bar.start.kind === 'assembly') {
    for (const piece of bar.start.pieces) pieces.set(piece.bar, (pieces.get(piece.bar) ?? 0) + 1);
  }
  return pieces;
}

/** The bars by how many bars lie before them at most; within a column those that go into the same bar stand together. */
function columnsOf(bars: readonly Bar[]): readonly (readonly Bar[])[] {
  const depths = new Map<string, number>();
  const columns: Bar[][] = [];
  for (const bar of bars) {
    const before = [...piecesInto(bar).keys()].map((id) => depths.get(id) ?? 0);
    const depth = before.length === 0 ? 0 : Math.max(...before) + 1;
    depths.set(bar.id, depth);
    (columns[depth] ??= []).push(bar);
  }
  // From the last column back: a bar stands where the first bar that uses it stands.
  const place = new Map<string, number>();
  for (const column of [...columns].reverse()) {
    const wanted = (bar: Bar): number => {
      const users = bars.filter((user) => piecesInto(user).has(bar.id));
      return users.reduce((least, user) => Math.min(least, place.get(user.id) ?? 0), Infinity);
    };
    const before = new Map(column.map((bar, i) => [bar.id, i]));
    column.sort((a, b) => orderOf(wanted(a), wanted(b)) || (before.get(a.id) ?? 0) - (before.get(b.id) ?? 0));
    for (const [i, bar] of column.entries()) place.set(bar.id, i);
  }
  return columns;
}

function orderOf(a: number, b: number): number {
  return a === b ? 0 : a - b;
}

function inColumns(bars: readonly Bar[], columns: readonly (readonly Bar[])[]): BarsMap {
  const tallest = Math.max(...columns.map((column) => column.length));
  const rowPx = NODE_HEIGHT_PX + ROW_GAP_PX;
  const heightPx = tallest * rowPx - ROW_GAP_PX + 2 * MARGIN_PX;
  const nodes = columns.flatMap((column, c) =>
    column.map((bar, row): MapNode => {
      const columnPx = column.length * rowPx - ROW_GAP_PX;
      return {
        barId: bar.id,
        leftPx: MARGIN_PX + c * (NODE_WIDTH_PX + COLUMN_GAP_PX),
        topPx: (heightPx - columnPx) / 2 + row * rowPx,
      };
    }),
  );
  const nodeOf = new Map(nodes.map((node) => [node.barId, node]));
  const links = bars.flatMap((bar) => {
    const into = [...piecesInto(bar)];
    const end = nodeOf.get(bar.id) as MapNode;
    // From the top down as they come in, so that no two cross in front of the bar.
    const sorted = into.sort(([a], [b]) => (nodeOf.get(a)?.topPx ?? 0) - (nodeOf.get(b)?.topPx ?? 0));
    return sorted.map(([from, pieces], i): MapLink => {
      const start = nodeOf.get(from) as MapNode;
      const x1 = start.leftPx + NODE_WIDTH_PX;
      const y1 = start.topPx + NODE_HEIGHT_PX / 2;
      const x2 = end.leftPx;
      const y2 = end.topPx + (NODE_HEIGHT_PX * (i + 1)) / (sorted.length + 1);
      const bendPx = x2 - COLUMN_GAP_PX / 2;
      return {
        from,
        to: bar.id,
        pieces,
        points: [
          [x1, y1],
          [bendPx, y1],
          [bendPx, y2],
          [x2, y2],
        ],
        // Where it comes in: what goes out of a bar may run in one line with others.
        figureAt: [x2 - 26, y2],
      };
    });
  });
  const widthPx = columns.length * (NODE_WIDTH_PX + COLUMN_GAP_PX) - COLUMN_GAP_PX + 2 * MARGIN_PX;
  return { kind: 'columns', nodes, links, widthPx, heightPx };
}

/** Every bar in its own row; each line runs down beside them in a lane that no other line uses there. */
function inList(bars: readonly Bar[], widthPx: number): BarsMap {
  const rowPx = NODE_HEIGHT_PX + ROW_GAP_PX;
  const row = new Map(bars.map((bar, i) => [bar.id, i]));
  const spans = bars
    .flatMap((bar, to) =>
      [...piecesInto(bar)].map(([from, pieces]) => ({ from, pieces, to, bar, first: row.get(from) ?? 0 })),
    )
    .sort((a, b) => a.to - a.first - (b.to - b.first) || a.first - b.first);
  const lanes: { first: number; to: number }[][] = [];
  const placed = spans.map((span) => {
    const isFree = (lane: { first: number; to: number }[]): boolean =>
      lane.every((other) => other.to <= span.first || other.first >= span.to);
    let lane = lanes.findIndex(isFree);
    if (lane < 0) lane = lanes.push([]) - 1;
    lanes[lane]?.push(span);
    return { ...span, lane };
  });
  const shownLanes = Math.min(
    lanes.length,
    Math.max(1, Math.floor((widthPx - NODE_WIDTH_PX - 2 * MARGIN_PX - ENTRY_PX) / LANE_PX)),
  );
  const railPx = MARGIN_PX + ENTRY_PX + shownLanes * LANE_PX;
  const topOf = (place: number): number => MARGIN_PX + place * rowPx;
  const nodes = bars.map((bar, i): MapNode => ({ barId: bar.id, leftPx: railPx, topPx: topOf(i) }));
  const links = placed.map(({ from, pieces, to, bar, first, lane }): MapLink => {
    const x = railPx - 12 - Math.min(lane, shownLanes - 1) * LANE_PX;
    const y1 = topOf(first) + NODE_HEIGHT_PX * 0.66;
    const y2 = topOf(to) + NODE_HEIGHT_PX * 0.33;
    return {
      from,
      to: bar.id,
      pieces,
      points: [
        [railPx, y1],
        [x, y1],
        [x, y2],
        [railPx, y2],
      ],
      figureAt: [x, (y1 + y2) / 2],
    };
  });
  return {
    kind: 'list',
    nodes,
    links,
    widthPx: Math.min(widthPx, railPx + NODE_WIDTH_PX + MARGIN_PX),
    heightPx: bars.length * rowPx - ROW_GAP_PX + 2 * MARGIN_PX,
  };
}
