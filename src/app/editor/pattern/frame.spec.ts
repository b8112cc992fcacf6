import fc from 'fast-check';
import type { AreaPx, Viewport } from '../canvas/viewport';
import { type Frame, frameOf, rectIn, shareAt } from './frame';

const EXTENT = { widthMm: 280, heightMm: 42 };
const SCREEN: AreaPx = { leftPx: 0, topPx: 0, widthPx: 900, heightPx: 400 };

function view(pxPerMm: number, xPx = 30, yPx = 300): Viewport {
  return { pxPerMm, originPx: { xPx, yPx } };
}

describe('frameOf', () => {
  it('takes the whole surface where all of it is seen, a sample for each device pixel', () => {
    const frame = frameOf(EXTENT, view(3), SCREEN, 2) as Frame;
    expect(frame.window).toEqual({ left: 0, right: 1, bottom: 0, top: 1 });
    expect(frame.widthPx).toBe(280 * 3 * 2);
    expect(frame.heightPx).toBe(42 * 3 * 2);
    expect(frame.rect).toEqual({ left: 60, top: 600 - 252, width: 1680, height: 252 });
  });

  it('cuts out what is seen when the surface is larger than the screen', () => {
    const frame = frameOf(EXTENT, view(30, -3000, 700), SCREEN, 1) as Frame;
    // 100 mm of it lie to the left of the screen, 30 mm fill its width.
    expect(frame.window.left).toBeCloseTo(100 / 280, 9);
    expect(frame.window.right).toBeCloseTo(130 / 280, 9);
    expect(frame.window.bottom).toBeCloseTo(10 / 42, 9);
    expect(frame.window.top).toBeCloseTo(1 - (42 - 700 / 30) / 42, 9);
    expect([frame.widthPx, frame.heightPx]).toEqual([900, 400]);
    expect(frame.from.acrossMm).toBeCloseTo(100, 9);
    expect(frame.to.upMm).toBeCloseTo(700 / 30, 9);
  });

  it('is nothing where the surface is out of sight', () => {
    expect(frameOf(EXTENT, view(3, 1000, 300), SCREEN, 1)).toBeNull();
    expect(frameOf(EXTENT, view(3, 30, -5), SCREEN, 1)).toBeNull();
  });

  it('never asks for more pixels than can be made while somebody waits', () => {
    const wall: AreaPx = { leftPx: 0, topPx: 0, widthPx: 3800, heightPx: 2000 };
    const frame = frameOf(EXTENT, view(100, -900, 3000), wall, 2) as Frame;
    expect(frame.widthPx * frame.heightPx).toBeLessThan(2_420_000);
    expect(frame.rect.width).toBe(7600);
    expect(frame.widthPx / frame.heightPx).toBeCloseTo(7600 / 4000, 2);
  });

  it('stays within the surface whatever the view, and lies in its own view where it was cut out', () => {
    fc.assert(
      fc.property(
        fc.double({ min: 0.01, max: 2000, noNaN: true }),
        fc.integer({ min: -5000, max: 1200 }),
        fc.integer({ min: -100, max: 5000 }),
        fc.constantFrom(1, 1.25, 2),
        (pxPerMm, xPx, yPx, ratio) => {
          const viewport = view(pxPerMm, xPx, yPx);
          const frame = frameOf(EXTENT, viewport, SCREEN, ratio);
          if (frame === null) return;
          const { left, right, bottom, top } = frame.window;
          expect(left >= 0 && right <= 1 && left < right).toBeTrue();
          expect(bottom >= -1e-12 && top <= 1 && bottom < top).toBeTrue();
          expect(rectIn(frame, { ...viewport }, ratio)).toBe(frame.rect);
        },
      ),
      { seed: 4, numRuns: 300 },
    );
  });
});

describe('rectIn', () => {
  it('lays a picture of one view into another', () => {
    const frame = frameOf(EXTENT, view(3), SCREEN, 1) as Frame;
    expect(rectIn(frame, view(6, 10, 350), 1)).toEqual({ left: 10, top: 98, width: 1680, height: 252 });
  });
});

describe('shareAt', () => {
  it('reads a place on the screen as a place of the surface, from the lower left', () => {
    const at = shareAt(EXTENT, view(3), { xPx: 30 + 210, yPx: 300 - 31.5 });
    expect(at?.across).toBeCloseTo(0.25, 12);
    expect(at?.up).toBeCloseTo(0.25, 12);
    expect(shareAt(EXTENT, view(3), { xPx: 29, yPx: 290 })).toBeNull();
    expect(shareAt(EXTENT, view(3), { xPx: 40, yPx: 301 })).toBeNull();
  });
});
