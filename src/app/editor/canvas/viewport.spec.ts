import fc from 'fast-check';
import {
  type AreaPx,
  type Viewport,
  fitted,
  panned,
  pinched,
  refitted,
  showing,
  toMm,
  toPx,
  zoomedAbout,
} from './viewport';

const SEED = { seed: 20_260 };
const area: AreaPx = { leftPx: 60, topPx: 30, widthPx: 600, heightPx: 400 };
const viewports = fc.record({
  pxPerMm: fc.double({ min: 0.01, max: 2000, noNaN: true }),
  originPx: fc.record({
    xPx: fc.double({ min: -5000, max: 5000, noNaN: true }),
    yPx: fc.double({ min: -5000, max: 5000, noNaN: true }),
  }),
});
const points = fc.record({
  xPx: fc.double({ min: -2000, max: 2000, noNaN: true }),
  yPx: fc.double({ min: -2000, max: 2000, noNaN: true }),
});
const extents = fc.record({
  acrossMm: fc.double({ min: 0.1, max: 1000, noNaN: true }),
  upMm: fc.double({ min: 0.1, max: 1000, noNaN: true }),
});

describe('viewport', () => {
  it('puts millimetres where a drawing to scale has them: right is right, up is up', () => {
    const viewport: Viewport = { pxPerMm: 10, originPx: { xPx: 100, yPx: 300 } };
    expect(toPx(viewport, { acrossMm: 0, upMm: 0 })).toEqual({ xPx: 100, yPx: 300 });
    expect(toPx(viewport, { acrossMm: 4, upMm: 2.5 })).toEqual({ xPx: 140, yPx: 275 });
  });

  it('takes every point there and back', () => {
    fc.assert(
      fc.property(viewports, points, (viewport, point) => {
        const back = toPx(viewport, toMm(viewport, point));
        expect(back.xPx).toBeCloseTo(point.xPx, 6);
        expect(back.yPx).toBeCloseTo(point.yPx, 6);
      }),
      SEED,
    );
  });

  it('fits everything into the area, touching it one way and centred the other', () => {
    // 40 × 33 mm into 600 × 400 px: the height decides, 400 / 33 px a millimetre.
    const viewport = fitted({ acrossMm: 40, upMm: 33 }, area);
    expect(viewport.pxPerMm).toBeCloseTo(400 / 33, 9);
    const low = toPx(viewport, { acrossMm: 0, upMm: 0 });
    const high = toPx(viewport, { acrossMm: 40, upMm: 33 });
    expect(low.yPx).toBeCloseTo(430, 6);
    expect(high.yPx).toBeCloseTo(30, 6);
    expect((low.xPx + high.xPx) / 2).toBeCloseTo(360, 6);
  });

  it('keeps what is under the pointer under it while zooming in', () => {
    fc.assert(
      fc.property(
        extents,
        fc.double({ min: 0, max: 1, noNaN: true }),
        fc.double({ min: 0, max: 1, noNaN: true }),
        fc.double({ min: 1, max: 8, noNaN: true }),
        (extent, u, v, factor) => {
          const fit = fitted(extent, area);
          fc.pre(fit.pxPerMm * factor <= 2000);
          const under = { acrossMm: u * extent.acrossMm, upMm: v * extent.upMm };
          const at = toPx(fit, under);
          const zoomed = zoomedAbout(fit, at, factor, extent, area);
          const after = toPx(zoomed, under);
          expect(zoomed.pxPerMm).toBeCloseTo(fit.pxPerMm * factor, 6);
          expect(after.xPx).toBeCloseTo(at.xPx, 4);
          expect(after.yPx).toBeCloseTo(at.yPx, 4);
        },
      ),
      SEED,
    );
  });

  it('stops at half the fitting scale and at 2000 px a millimetre', () => {
    const extent = { acrossMm: 50, upMm: 40 };
    const fit = fitted(extent, area);
    const middle = { xPx: 360, yPx: 230 };
    expect(zoomedAbout(fit, middle, 1e-9, extent, area).pxPerMm).toBeCloseTo(fit.pxPerMm / 2, 9);
    expect(zoomedAbout(fit, middle, 1e9, extent, area).pxPerMm).toBe(2000);
  });

  it('never lets the drawing leave the area, however far it is pushed', () => {
    fc.assert(
      fc.property(
        extents,
        fc.double({ min: -1e5, max: 1e5, noNaN: true }),
        fc.double({ min: -1e5, max: 1e5, noNaN: true }),
        fc.double({ min: 0.5, max: 20, noNaN: true }),
        (extent, dx, dy, factor) => {
          const middle = { xPx: 360, yPx: 230 };
          const zoomed = zoomedAbout(fitted(extent, area), middle, factor, extent, area);
          const moved = panned(zoomed, dx, dy, extent, area);
          const low = toPx(moved, { acrossMm: 0, upMm: 0 });
          const high = toPx(moved, extent);
          expect(high.xPx).toBeGreaterThan(area.leftPx - 1e-6);
          expect(low.xPx).toBeLessThan(area.leftPx + area.widthPx + 1e-6);
          expect(low.yPx).toBeGreaterThan(area.topPx - 1e-6);
          expect(high.yPx).toBeLessThan(area.topPx + area.heightPx + 1e-6);
        },
      ),
      SEED,
    );
  });

  it('follows two fingers: the spread gives the scale, the middle the place', () => {
    const extent = { acrossMm: 50, upMm: 40 };
    const fit = fitted(extent, area);
    const from = [
      { xPx: 300, yPx: 200 },
      { xPx: 400, yPx: 200 },
    ] as const;
    const to = [
      { xPx: 280, yPx: 260 },
      { xPx: 480, yPx: 260 },
    ] as const;
    const view = pinched(fit, from, to, extent, area);
    expect(view.pxPerMm).toBeCloseTo(fit.pxPerMm * 2, 9);
    const under = toMm(fit, { xPx: 350, yPx: 200 });
    const after = toPx(view, under);
    expect(after.xPx).toBeCloseTo(380, 6);
    expect(after.yPx).toBeCloseTo(260, 6);
  });

  it('holds the scale while an edit still fits, and fits anew when it does not', () => {
    const before = fitted({ acrossMm: 40, upMm: 33 }, area);
    const thinner = refitted(before, { acrossMm: 40, upMm: 30 }, area);
    expect(thinner.pxPerMm).toBe(before.pxPerMm);
    // The bottom stays where it was: only the top comes down.
    expect(thinner.originPx.yPx).toBeCloseTo(before.originPx.yPx, 9);
    const taller = refitted(before, { acrossMm: 40, upMm: 36 }, area);
    expect(taller).toEqual(fitted({ acrossMm: 40, upMm: 36 }, area));
    const muchSmaller = refitted(before, { acrossMm: 30, upMm: 20 }, area);
    expect(muchSmaller).toEqual(fitted({ acrossMm: 30, upMm: 20 }, area));
    expect(refitted(null, { acrossMm: 40, upMm: 33 }, area)).toEqual(before);
  });

  it('after an edit everything is in view, whatever the view before', () => {
    fc.assert(
      fc.property(extents, extents, (first, second) => {
        const view = refitted(fitted(first, area), second, area);
        const low = toPx(view, { acrossMm: 0, upMm: 0 });
        const high = toPx(view, second);
        expect(low.xPx).toBeGreaterThan(area.leftPx - 1e-6);
        expect(high.xPx).toBeLessThan(area.leftPx + area.widthPx + 1e-6);
        expect(low.yPx).toBeLessThan(area.topPx + area.heightPx + 1e-6);
        expect(high.yPx).toBeGreaterThan(area.topPx - 1e-6);
      }),
      SEED,
    );
  });

  it('brings a range of heights into view with the least push', () => {
    const view: Viewport = { pxPerMm: 100, originPx: { xPx: 60, yPx: 430 } };
    expect(showing(view, 1, 2, area)).toBe(view);
    // 6 mm up is 170 px above the area's top edge.
    expect(showing(view, 5, 6, area).originPx.yPx).toBe(430 + 200);
    const below = showing(view, -2, -1, area);
    expect(toPx(below, { acrossMm: 0, upMm: -2 }).yPx).toBe(430);
    // What is taller than the area shows its top.
    const tall = showing(view, 0, 20, area);
    expect(toPx(tall, { acrossMm: 0, upMm: 20 }).yPx).toBe(30);
  });
});
