import { moveLayers, type Stack } from '@shared/design';
import * as fc from 'fast-check';
import { STRAIGHT } from '../testing/designs';
import { placesAfterMove } from './layer-work';

describe('placesAfterMove', () => {
  it('says where the moved layers lie, for any move', () => {
    const layers = Array.from({ length: 9 }, (_, i) => ({ steel: '1084', thicknessMm: i + 1 }));
    const [bar] = STRAIGHT.bars;
    const design = {
      ...STRAIGHT,
      bars: [{ ...bar, start: { kind: 'stack', lengthMm: 10, widthMm: 10, layers } }] as typeof STRAIGHT.bars,
    };
    fc.assert(
      fc.property(fc.uniqueArray(fc.nat(8), { minLength: 1 }), fc.nat(9), (chosen, to) => {
        const places = new Set(chosen);
        const moved = moveLayers(design, 'billet', places, to).bars[0]?.start as Stack;
        const at = [...placesAfterMove(places, to)].map((place) => moved.layers[place]?.thicknessMm);
        const expected = [...chosen].sort((a, b) => a - b).map((place) => place + 1);
        expect(at).toEqual(expected);
      }),
      { seed: 2 },
    );
  });
});
