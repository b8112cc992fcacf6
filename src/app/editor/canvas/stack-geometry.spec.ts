import fc from 'fast-check';
import {
  REACH,
  gripAt,
  hitStack,
  layerAt,
  layersBetween,
  pickLimitsPx,
  seamMm,
  stackGeometry,
  thicknessOf,
} from './stack-geometry';
import { type Viewport, toPx } from './viewport';

const SEED = { seed: 20_261 };
const ofThicknesses = (thicknesses: readonly number[], widthMm = 40) =>
  stackGeometry({ widthMm, layers: thicknesses.map((thicknessMm) => ({ steel: 'x', thicknessMm })) });
const stacks = fc
  .array(fc.double({ min: 0.01, max: 40, noNaN: true }), { minLength: 1, maxLength: 60 })
  .map((thicknesses) => ofThicknesses(thicknesses));
const scales = fc.double({ min: 0.5, max: 100, noNaN: true });

/** A foil of 0.05 mm at 29.95 mm in a stack of 60 mm. */
const withFoil = ofThicknesses([29.95, 0.05, 20, 10], 50);
/** 8 px a millimetre: the foil is 0.4 px. */
const view: Viewport = { pxPerMm: 8, originPx: { xPx: 100, yPx: 600 } };

describe('stack geometry', () => {
  it('adds the layers up from the bottom', () => {
    const geometry = ofThicknesses([3, 2, 3]);
    expect([...geometry.seamsMm]).toEqual([0, 3, 5, 8]);
    expect(geometry.heightMm).toBe(8);
    expect(thicknessOf(geometry, 1)).toBe(2);
    expect(layerAt(geometry, 0)).toBe(0);
    expect(layerAt(geometry, 2.9)).toBe(0);
    expect(layerAt(geometry, 3)).toBe(1);
    expect(layerAt(geometry, 8)).toBe(2);
    expect(layerAt(geometry, -0.1)).toBeNull();
    expect(layerAt(geometry, 8.1)).toBeNull();
  });

  it('finds the layer at every height', () => {
    fc.assert(
      fc.property(stacks, fc.double({ min: 0, max: 1, noNaN: true }), (geometry, part) => {
        const upMm = part * geometry.heightMm;
        const place = layerAt(geometry, upMm) as number;
        expect(seamMm(geometry, place)).toBeLessThanOrEqual(upMm);
        expect(seamMm(geometry, place + 1)).toBeGreaterThanOrEqual(upMm);
      }),
      SEED,
    );
  });
});

describe('picking layers', () => {
  it('gives each layer its own part of the height, in order and without gaps', () => {
    fc.assert(
      fc.property(stacks, scales, fc.constantFrom(10, 28), (geometry, pxPerMm, minPx) => {
        const limits = pickLimitsPx(geometry, pxPerMm, minPx);
        for (let i = 0; i < geometry.count; i++) {
          expect(limits[i + 1] as number).toBeGreaterThan(limits[i] as number);
        }
        expect(limits[0]).toBeLessThanOrEqual(0);
        expect(limits[geometry.count] as number).toBeGreaterThanOrEqual(geometry.heightMm * pxPerMm - 1e-9);
      }),
      SEED,
    );
  });

  it('makes a thin layer between thick ones as high as a pointer needs', () => {
    const limits = pickLimitsPx(withFoil, 8, 10);
    expect((limits[2] as number) - (limits[1] as number)).toBeCloseTo(10, 9);
    // Its neighbours lose less than 5 px each of 240 and 160.
    expect((limits[1] as number) - (limits[0] as number)).toBeGreaterThan(234);
  });

  it('takes at most a third of a neighbour', () => {
    fc.assert(
      fc.property(stacks, scales, (geometry, pxPerMm) => {
        const limits = pickLimitsPx(geometry, pxPerMm, 10);
        for (let i = 0; i < geometry.count; i++) {
          const heightPx = thicknessOf(geometry, i) * pxPerMm;
          const picked = (limits[i + 1] as number) - (limits[i] as number);
          expect(picked).toBeGreaterThanOrEqual(heightPx / 3 - 1e-9);
        }
      }),
      SEED,
    );
  });

  it('picks a foil of 0.05 mm in a stack of 60 mm, some pixels off as well', () => {
    const foilPx = toPx(view, { acrossMm: 25, upMm: 29.975 });
    for (const off of [-4, -2, 0, 2, 4]) {
      expect(hitStack(withFoil, view, { xPx: 300, yPx: foilPx.yPx + off }, REACH.fine, null)).toEqual({
        kind: 'layer',
        place: 1,
      });
    }
    // A finger is less exact.
    expect(hitStack(withFoil, view, { xPx: 300, yPx: foilPx.yPx + 12 }, REACH.coarse, null)).toEqual({
      kind: 'layer',
      place: 1,
    });
    expect(hitStack(withFoil, view, { xPx: 300, yPx: foilPx.yPx + 40 }, REACH.coarse, null)).toEqual({
      kind: 'layer',
      place: 0,
    });
  });

  it('can pick every one of 400 layers of 0.15 mm once they are 2 px high', () => {
    const geometry = ofThicknesses(Array.from({ length: 400 }, () => 0.15));
    const zoomed: Viewport = { pxPerMm: 2 / 0.15, originPx: { xPx: 0, yPx: 900 } };
    const picked = new Set<number>();
    for (let yPx = 900; yPx >= 99; yPx--) {
      const hit = hitStack(geometry, zoomed, { xPx: 20, yPx }, REACH.fine, null);
      if (hit.kind === 'layer') picked.add(hit.place);
    }
    expect(picked.size).toBe(400);
  });

  it('takes the upper edge of a layer within 5 px, and nothing of a layer too thin for it', () => {
    const geometry = ofThicknesses([10, 10]);
    const seamPx = toPx(view, { acrossMm: 1, upMm: 10 }).yPx;
    const at = (off: number) => ({ xPx: 200, yPx: seamPx + off });
    expect(hitStack(geometry, view, at(4), REACH.fine, null)).toEqual({ kind: 'edge', place: 0 });
    expect(hitStack(geometry, view, at(-4), REACH.fine, null)).toEqual({ kind: 'edge', place: 0 });
    expect(hitStack(geometry, view, at(8), REACH.fine, null)).toEqual({ kind: 'layer', place: 0 });
    expect(hitStack(geometry, view, at(-8), REACH.fine, null)).toEqual({ kind: 'layer', place: 1 });
    // The top of the stack can be taken from above it as well.
    const topPx = toPx(view, { acrossMm: 1, upMm: 20 }).yPx;
    expect(hitStack(geometry, view, { xPx: 200, yPx: topPx - 4 }, REACH.fine, null)).toEqual({
      kind: 'edge',
      place: 1,
    });
  });

  it('never takes the bottom for an edge, and misses beside the stack', () => {
    const geometry = ofThicknesses([10, 10]);
    expect(hitStack(geometry, view, { xPx: 200, yPx: 599 }, REACH.fine, null)).toEqual({
      kind: 'layer',
      place: 0,
    });
    for (const at of [
      { xPx: 90, yPx: 550 },
      { xPx: 100 + 40 * 8 + 30, yPx: 550 },
      { xPx: 200, yPx: 620 },
      { xPx: 200, yPx: 400 },
    ]) {
      expect(hitStack(geometry, view, at, REACH.fine, null)).toEqual({ kind: 'empty' });
    }
  });

  it('offers the chosen layer a grip beside its upper edge, however thin it is', () => {
    const grip = gripAt(withFoil, view, 1);
    expect(grip.yPx).toBeCloseTo(600 - 30 * 8, 9);
    expect(hitStack(withFoil, view, grip, REACH.fine, 1)).toEqual({ kind: 'grip', place: 1 });
    expect(hitStack(withFoil, view, grip, REACH.fine, null)).toEqual({ kind: 'empty' });
  });

  it('frames the layers that a range of heights touches, either way round', () => {
    const geometry = ofThicknesses([3, 2, 3, 2]);
    expect([...layersBetween(geometry, 2, 6)]).toEqual([0, 1, 2]);
    expect([...layersBetween(geometry, 6, 2)]).toEqual([0, 1, 2]);
    expect([...layersBetween(geometry, -5, -1)]).toEqual([]);
    expect([...layersBetween(geometry, -5, 100)]).toEqual([0, 1, 2, 3]);
  });
});
