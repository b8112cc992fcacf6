import { DESIGN_FORMAT, DESIGN_VERSION, type Design, moveLayers } from '@shared/design';
import fc from 'fast-check';
import { landingPlace, placesAfterMove, staysPut } from './landing';
import { stackGeometry } from './stack-geometry';

const SEED = { seed: 20_262 };
const geometry = stackGeometry({
  widthMm: 40,
  layers: [3, 2, 3].map((thicknessMm) => ({ steel: 'x', thicknessMm })),
});

/** A stack whose layers are told apart by their thickness: 1, 2, 3 … mm from the bottom. */
function stackOf(count: number): Design {
  const layers = Array.from({ length: count }, (_, i) => ({ steel: '1084', thicknessMm: i + 1 }));
  return {
    format: DESIGN_FORMAT,
    version: DESIGN_VERSION,
    name: 'Test',
    bars: [
      { id: 'bar', name: 'Bar', start: { kind: 'stack', lengthMm: 100, widthMm: 40, layers }, steps: [] },
    ],
    result: 'bar',
  };
}

const moves = fc.integer({ min: 1, max: 20 }).chain((count) =>
  fc.record({
    count: fc.constant(count),
    places: fc.uniqueArray(fc.integer({ min: 0, max: count - 1 }), { minLength: 1, maxLength: count }),
    to: fc.integer({ min: 0, max: count }),
  }),
);

describe('landing place', () => {
  it('is decided by the middle of each layer', () => {
    expect([-1, 1.4, 1.5, 3.9, 4, 6.4, 6.5, 100].map((upMm) => landingPlace(geometry, upMm))).toEqual([
      0, 0, 1, 1, 2, 2, 3, 3,
    ]);
  });

  it('says where the moved layers are found in the document that the edit makes', () => {
    fc.assert(
      fc.property(moves, ({ count, places, to }) => {
        const moved = moveLayers(stackOf(count), 'bar', new Set(places), to);
        const start = moved.bars[0]?.start;
        const after = start?.kind === 'stack' ? start.layers.map((layer) => layer.thicknessMm - 1) : [];
        const found = [...placesAfterMove(new Set(places), to)].map((place) => after[place]);
        expect(found).toEqual([...places].sort((a, b) => a - b));
      }),
      SEED,
    );
  });

  it('knows when a move changes nothing', () => {
    fc.assert(
      fc.property(moves, ({ count, places, to }) => {
        const design = stackOf(count);
        expect(staysPut(new Set(places), to)).toBe(moveLayers(design, 'bar', new Set(places), to) === design);
      }),
      SEED,
    );
  });
});
