import { type Bar, STARTERS } from '@shared/design';
import fc from 'fast-check';
import { NODE_HEIGHT_PX, NODE_WIDTH_PX, type BarsMap, barsMap } from './bars-map-layout';

const SEED = { seed: 20_274 };

function stack(id: string): Bar {
  return {
    id,
    name: id,
    start: { kind: 'stack', lengthMm: 100, widthMm: 30, layers: [{ steel: '1084', thicknessMm: 3 }] },
    steps: [],
  };
}

function assembly(id: string, pieces: readonly string[]): Bar {
  return {
    id,
    name: id,
    start: { kind: 'assembly', along: 'width', pieces: pieces.map((bar) => ({ bar })) },
    steps: [],
  };
}

/** A design of any shape: each bar is a stack or laid from bars before it. */
const designs = fc.array(fc.array(fc.nat(), { maxLength: 5 }), { minLength: 1, maxLength: 12 }).map((uses) =>
  uses.map((picks, i) =>
    i === 0 || picks.length < 2
      ? stack(`b${i}`)
      : assembly(
          `b${i}`,
          picks.map((pick) => `b${pick % i}`),
        ),
  ),
);

function nodeOf(map: BarsMap, id: string): { leftPx: number; topPx: number } {
  return map.nodes.find((node) => node.barId === id) as { leftPx: number; topPx: number };
}

describe('map of bars', () => {
  it('puts each bar to the right of all that goes into it', () => {
    const bars = [
      stack('square'),
      assembly('lower', ['square', 'square']),
      assembly('mosaic', ['lower', 'square']),
    ];
    const map = barsMap(bars, 1200);
    expect(map.kind).toBe('columns');
    expect(map.nodes.map((node) => node.leftPx)).toEqual([12, 272, 532]);
    expect(map.links.map(({ from, to, pieces }) => `${pieces} ${from} ${to}`)).toEqual([
      '2 square lower',
      '1 lower mosaic',
      '1 square mosaic',
    ]);
  });

  it('counts the pieces of the five-bar starter', () => {
    const design = STARTERS.find((starter) => starter.id === 'five-bars')?.design;
    const map = barsMap(design?.bars ?? [], 1200);
    expect(map.links.map(({ from, pieces }) => `${pieces} ${from}`)).toEqual(['2 right', '2 left', '1 edge']);
  });

  it('lays bars under each other where columns find no room', () => {
    const bars = [stack('a'), stack('b'), assembly('c', ['a', 'b'])];
    const map = barsMap(bars, 366);
    expect(map.kind).toBe('list');
    expect(map.widthPx).toBeLessThanOrEqual(366);
    expect(nodeOf(map, 'c').topPx).toBeGreaterThan(nodeOf(map, 'b').topPx);
  });

  it('never lays two bars on each other, and leads every line from its bar to its bar', () => {
    fc.assert(
      fc.property(designs, fc.constantFrom(340, 700, 1400), (bars, widthPx) => {
        const map = barsMap(bars, widthPx);
        expect(map.nodes.length).toBe(bars.length);
        for (const [i, a] of map.nodes.entries()) {
          expect(a.leftPx + NODE_WIDTH_PX).toBeLessThanOrEqual(Math.max(map.widthPx, widthPx));
          expect(a.topPx + NODE_HEIGHT_PX).toBeLessThanOrEqual(map.heightPx);
          for (const b of map.nodes.slice(i + 1)) {
            const isApart =
              Math.abs(a.leftPx - b.leftPx) >= NODE_WIDTH_PX || Math.abs(a.topPx - b.topPx) >= NODE_HEIGHT_PX;
            expect(isApart).toBeTrue();
          }
        }
        for (const link of map.links) {
          const from = nodeOf(map, link.from);
          const to = nodeOf(map, link.to);
          const [, startY] = link.points[0] as readonly [number, number];
          const [endX, endY] = link.points[link.points.length - 1] as readonly [number, number];
          expect(startY).toBeGreaterThan(from.topPx);
          expect(startY).toBeLessThan(from.topPx + NODE_HEIGHT_PX);
          expect(endX).toBe(to.leftPx);
          expect(endY).toBeGreaterThan(to.topPx);
          expect(endY).toBeLessThan(to.topPx + NODE_HEIGHT_PX);
        }
        const pieces = bars.reduce(
          (sum, bar) => sum + (bar.start.kind === 'assembly' ? bar.start.pieces.length : 0),
          0,
        );
        expect(map.links.reduce((sum, link) => sum + link.pieces, 0)).toBe(pieces);
      }),
      SEED,
    );
  });

  it('gives every line in a list its own way as long as there is room', () => {
    fc.assert(
      fc.property(designs, (bars) => {
        const map = barsMap(bars, 600);
        fc.pre(map.kind === 'list' && map.links.length < 12);
        const ways = map.links.map((link) => {
          const [x, y1] = link.points[1] as readonly [number, number];
          const [, y2] = link.points[2] as readonly [number, number];
          return { x, y1, y2 };
        });
        for (const [i, a] of ways.entries()) {
          for (const b of ways.slice(i + 1)) {
            if (a.x === b.x) expect(a.y2 <= b.y1 || b.y2 <= a.y1).toBeTrue();
          }
        }
      }),
      SEED,
    );
  });
});
