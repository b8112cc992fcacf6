import fc from 'fast-check';
import { spreadLabels } from './label-spread';

const SEED = { seed: 20_264 };
const sets = fc
  .array(
    fc.record({
      wanted: fc.double({ min: 0, max: 500, noNaN: true }),
      height: fc.integer({ min: 10, max: 60 }),
    }),
    { maxLength: 20 },
  )
  .map((labels) => labels.sort((a, b) => a.wanted - b.wanted));

describe('spreading labels', () => {
  it('leaves labels alone that do not touch', () => {
    expect(spreadLabels([50, 100, 200], [20, 20, 20], 0, 300)).toEqual([50, 100, 200]);
  });

  it('parts two that want the same place by half a label each', () => {
    expect(spreadLabels([100, 100], [20, 20], 0, 300)).toEqual([90, 110]);
    expect(spreadLabels([100, 100, 100], [20, 20, 20], 0, 300)).toEqual([80, 100, 120]);
  });

  it('keeps within the ends', () => {
    expect(spreadLabels([0, 0], [20, 20], 0, 300)).toEqual([10, 30]);
    expect(spreadLabels([300, 300], [20, 20], 0, 300)).toEqual([270, 290]);
  });

  it('sets labels closer when there is no room for all', () => {
    expect(spreadLabels([0, 0, 0, 0], [20, 20, 20, 20], 0, 40)).toEqual([5, 15, 25, 35]);
    expect(spreadLabels([], [], 0, 40)).toEqual([]);
  });

  it('keeps their order, none touching another, all inside, for any labels that find room', () => {
    fc.assert(
      fc.property(sets, (labels) => {
        const heights = labels.map((label) => label.height);
        fc.pre(heights.reduce((sum, height) => sum + height, 0) <= 500);
        const middles = spreadLabels(
          labels.map((label) => label.wanted),
          heights,
          0,
          500,
        );
        let endPx = 0;
        for (const [i, middle] of middles.entries()) {
          const half = (heights[i] as number) / 2;
          expect(middle - half).toBeGreaterThanOrEqual(endPx - 1e-6);
          endPx = middle + half;
        }
        expect(endPx).toBeLessThanOrEqual(500 + 1e-6);
      }),
      SEED,
    );
  });

  it('shifts them as little as can be: no single label can be nearer to its place', () => {
    fc.assert(
      fc.property(sets, (labels) => {
        const heights = labels.map((label) => label.height);
        fc.pre(heights.reduce((sum, height) => sum + height, 0) <= 500);
        const wanted = labels.map((label) => label.wanted);
        const middles = spreadLabels(wanted, heights, 0, 500);
        for (const [i, middle] of middles.entries()) {
          const off = (wanted[i] as number) - middle;
          if (Math.abs(off) < 1e-6) continue;
          // Off its place, it is held by a neighbour or by an end.
          const neighbour = off > 0 ? i + 1 : i - 1;
          const gapPx =
            neighbour in middles
              ? Math.abs((middles[neighbour] as number) - middle) -
                ((heights[neighbour] as number) + (heights[i] as number)) / 2
              : off > 0
                ? 500 - middle - (heights[i] as number) / 2
                : middle - (heights[i] as number) / 2;
          expect(gapPx).toBeLessThan(1e-6);
        }
      }),
      SEED,
    );
  });
});
