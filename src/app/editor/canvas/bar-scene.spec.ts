import { type BarState, sectionOf } from '@shared/bar';
import { STARTERS } from '@shared/design';
import { evaluate } from '@shared/forging';
import fc from 'fast-check';
import { alongOf, barScene, boxPx, laidPieces } from './bar-scene';
import { shownLayers } from './draw-bar-view';

const SEED = { seed: 20_273 };
const bar: BarState = {
  lengthMm: 300,
  widthMm: 40,
  thicknessMm: 7,
  densityKgM3: 7850,
  layers: 3,
  lie: 'thickness',
  section: sectionOf(Uint16Array.from([0, 1, 0]), Float64Array.from([3, 1, 3])),
  openSeams: 0,
};
const NONE = { lengthMm: 0, acrossMm: 0 };

describe('pieces in an end section', () => {
  it('lie on each other, centred across', () => {
    const pieces = [bar, { ...bar, widthMm: 46, thicknessMm: 5 }];
    const laid = laidPieces(
      { widthMm: 40, thicknessMm: 12 },
      pieces,
      [NONE, { lengthMm: 0, acrossMm: 6 }],
      'thickness',
    );
    expect(laid.map(({ acrossMm, upMm }) => [acrossMm, upMm])).toEqual([
      [0, 0],
      [-3, 7],
    ]);
  });

  it('lie side by side, centred in height', () => {
    const pieces = [bar, { ...bar, thicknessMm: 9 }];
    const laid = laidPieces({ widthMm: 80, thicknessMm: 7 }, pieces, [NONE, NONE], 'width');
    expect(laid.map(({ acrossMm, upMm }) => [acrossMm, upMm])).toEqual([
      [0, 0],
      [40, -1],
    ]);
  });

  it('tell by their sizes how they lie, for every assembly of the starters', () => {
    let assemblies = 0;
    for (const { design } of STARTERS) {
      for (const forged of evaluate(design).bars) {
        const start = design.bars.find((candidate) => candidate.id === forged.id)?.start;
        const [state] = forged.states;
        if (start?.kind !== 'assembly' || !state) continue;
        assemblies += 1;
        expect(alongOf(state.bar, forged.pieces)).withContext(forged.id).toBe(start.along);
      }
    }
    expect(assemblies).toBeGreaterThanOrEqual(5);
  });
});

describe('layout of a bar', () => {
  it('draws a long flat bar with its section enlarged below', () => {
    const scene = barScene(bar, [], 1000, 420);
    expect(scene.ratio).toBeGreaterThan(3);
    expect(scene.captions.end.yPx).toBeGreaterThan(scene.captions.side.yPx);
    expect(scene.end.pxPerMm).toBeCloseTo(scene.side.pxPerMm * scene.ratio, 9);
  });

  it('keeps both views on the sheet and apart from each other, whatever the sizes', () => {
    fc.assert(
      fc.property(
        fc.double({ min: 5, max: 1000, noNaN: true }),
        fc.double({ min: 1, max: 200, noNaN: true }),
        fc.double({ min: 1, max: 200, noNaN: true }),
        fc.constantFrom([1000, 560], [390, 420], [820, 400]),
        (lengthMm, widthMm, thicknessMm, [widthPx, heightPx]) => {
          const size = { lengthMm, widthMm, thicknessMm };
          const scene = barScene(size, [], widthPx, heightPx);
          const side = boxPx(scene.side, 0, 0, lengthMm, thicknessMm);
          const end = boxPx(scene.end, 0, 0, widthMm, thicknessMm);
          for (const box of [side, end]) {
            expect(box.leftPx).toBeGreaterThanOrEqual(0);
            expect(box.topPx).toBeGreaterThanOrEqual(0);
            expect(box.leftPx + box.widthPx).toBeLessThanOrEqual((widthPx as number) + 1e-6);
            expect(box.topPx + box.heightPx).toBeLessThanOrEqual((heightPx as number) + 1e-6);
          }
          const isBelow = end.topPx >= side.topPx + side.heightPx;
          const isBeside = end.leftPx >= side.leftPx + side.widthPx;
          expect(isBelow || isBeside).toBeTrue();
        },
      ),
      SEED,
    );
  });
});

describe('what a view shows', () => {
  it('is the pile from where it can be seen, and the first layer from where it can not', () => {
    expect(shownLayers(bar, 'side')).toEqual({ kind: 'pile', direction: 'up' });
    expect(shownLayers(bar, 'end')).toEqual({ kind: 'pile', direction: 'up' });
    expect(shownLayers({ ...bar, lie: 'width' }, 'side')).toEqual({ kind: 'one', index: 0 });
    expect(shownLayers({ ...bar, lie: 'width' }, 'end')).toEqual({ kind: 'pile', direction: 'right' });
    expect(shownLayers({ ...bar, lie: 'length' }, 'side')).toEqual({ kind: 'pile', direction: 'right' });
    expect(shownLayers({ ...bar, lie: 'length' }, 'end')).toEqual({ kind: 'one', index: 0 });
    expect(shownLayers({ ...bar, lie: 'mixed', section: null }, 'end')).toEqual({ kind: 'mixed' });
    expect(shownLayers({ ...bar, section: null }, 'end')).toEqual({ kind: 'mixed' });
  });
});
