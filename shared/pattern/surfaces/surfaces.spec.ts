import { type Blank, STARTERS } from '../../design/index.js';
import { alternating, barFrom, designOf, LOSSLESS, stackOf } from '../../forging/testing/designs.js';
import type { Program } from '../program/program.js';
import { referenceTracer } from '../reference/tracer.js';
import { origins, programOf } from '../testing/tracing.js';
import { edgeSteels } from './edge.js';
import { outlineOf, outlinePoints } from './outline.js';
import { surfaceMap, surfacePoints } from './surface-map.js';
import type { Surface } from './surface.js';

const BAR = { lengthMm: 200, widthMm: 40, thicknessMm: 6 };

function corners(surface: Surface): readonly (readonly [number, number, number])[] {
  const { x, y, z } = surfacePoints(surfaceMap(surface, BAR), 2, 2);
  return Array.from(x, (xi, i) => [xi, y[i] as number, z[i] as number] as const);
}

/** A stack of equal layers, of the size of {@link BAR}. */
function flatStack(layerMm: number): Program {
  const layers = alternating(Math.round(BAR.thicknessMm / layerMm), ['1084', '15n20'], [layerMm, layerMm]);
  const start = stackOf(layers, BAR.lengthMm, BAR.widthMm);
  return programOf(designOf([barFrom('billet', start)], { allowances: LOSSLESS }));
}

/** A blade without taper or point: its outline is the blank's rectangle. */
const SLAB: Blank = {
  lengthMm: 180,
  widthMm: 30,
  thicknessMm: 5,
  tipThicknessMm: 5,
  edgeThicknessMm: 0,
  outline: {
    points: [
      { alongShare: 0, spineShare: 0, edgeShare: 1 },
      { alongShare: 1, spineShare: 0, edgeShare: 1 },
    ],
  },
};

/** Places (mm over the edge) at which the layer changes on a line up the blade's left side, half way along. */
function bordersUp(program: Program, blank: Blank): readonly number[] {
  const map = surfaceMap({ kind: 'blade', side: 'left' }, program, blank);
  const rows = 60_000;
  const { x, y, z } = surfacePoints(map, 1, rows);
  const points = Array.from(x, (xi, i) => [xi, y[i] as number, z[i] as number] as const);
  const layers = origins(referenceTracer(program), points).map(({ layer }) => layer);
  return layers
    .flatMap((layer, i) => (i > 0 && layer !== layers[i - 1] ? [(1 - i / rows) * map.heightMm] : []))
    .reverse();
}

describe('surfaces', () => {
  it('lie as agreed: from the top left pixel on, row by row', () => {
    expect(corners({ kind: 'face', face: 'top', depthMm: 1 })).toEqual([
      [50, 30, 5],
      [150, 30, 5],
      [50, 10, 5],
      [150, 10, 5],
    ]);
    expect(corners({ kind: 'face', face: 'near', depthMm: 2 })).toEqual([
      [2, 10, 4.5],
      [2, 30, 4.5],
      [2, 10, 1.5],
      [2, 30, 1.5],
    ]);
    expect(corners({ kind: 'face', face: 'right', depthMm: 4 })[0]).toEqual([50, 36, 4.5]);
    expect(corners({ kind: 'face', face: 'left', depthMm: 4 })[0]).toEqual([50, 4, 4.5]);
    expect(corners({ kind: 'face', face: 'far', depthMm: 4 })[0]).toEqual([196, 10, 4.5]);
    expect(corners({ kind: 'section', across: 'length', atMm: 70 })[0]).toEqual([70, 10, 4.5]);
    expect(corners({ kind: 'section', across: 'width', atMm: 7 })[0]).toEqual([50, 7, 4.5]);
  });

  it('show the same at the bottom’s depth 0 and the top’s whole thickness', () => {
    expect(corners({ kind: 'face', face: 'bottom', depthMm: 0 })).toEqual(
      corners({ kind: 'face', face: 'top', depthMm: BAR.thicknessMm }),
    );
  });

  it('show bands t/tan θ wide on a flat-ground bevel [metallurgy 9.5: 0.3 mm, 30 × 5 → 3.60000 in side view]', () => {
    const borders = bordersUp(flatStack(0.3), SLAB);
    // Half of the 5 mm: layers of 0.3 mm from the middle plane, which is a border of layers, outward.
    expect(borders.length).toBe(8);
    borders.forEach((border, i) => expect(border).toBeCloseTo((i + 1) * 3.6, 2));
  });

  it('follow the layers where the bevels are forged: one layer from spine to edge but for what is cleaned off', () => {
    const ground = bordersUp(flatStack(0.3), SLAB).length;
    const forged = bordersUp(flatStack(0.3), { ...SLAB, bevels: 'forged', edgeThicknessMm: 1 }).length;
    // Cleaned by 0.25 mm, a place forged to 0.5 mm half thickness shows 0.5/0.75 of the half thickness 2.75 mm.
    expect(ground).toBe(8);
    expect(forged).toBe(2);
  });

  it('leave the ricasso flat up to the plunge', () => {
    const map = surfaceMap({ kind: 'blade', side: 'left' }, BAR, { ...SLAB, plungeMm: 40 });
    const { z } = surfacePoints(map, 180, 3);
    const middle = BAR.thicknessMm / 2;
    expect((z[2 * 180 + 20] as number) - middle).toBeCloseTo(2.5, 9);
    expect((z[2 * 180 + 60] as number) - middle).toBeCloseTo(2.5 / 6, 9);
  });

  it('taper towards the tip, and grind sabre, convex and hollow bevels', () => {
    const halfAt = (blank: Partial<Blank>, up: number): number => {
      const map = surfaceMap({ kind: 'blade', side: 'left' }, BAR, { ...SLAB, ...blank });
      const points = {
        x: new Float64Array(1),
        y: new Float64Array(1),
        z: new Float64Array(1),
        isMetal: new Uint8Array(1),
        slope: new Float32Array(1),
      };
      map.place(Float64Array.of(0.5), Float64Array.of(up), 1, points);
      return (points.z[0] as number) - BAR.thicknessMm / 2;
    };
    expect(halfAt({ tipThicknessMm: 2 }, 1)).toBeCloseTo(1.75, 9);
    expect(halfAt({ grind: 'sabre', bevelShare: 0.5 }, 0.25)).toBeCloseTo(1.25, 9);
    expect(halfAt({ grind: 'sabre', bevelShare: 0.5 }, 0.75)).toBeCloseTo(2.5, 9);
    expect(halfAt({ grind: 'convex' }, 0.5)).toBeCloseTo(2.5 * 0.75, 9);
    expect(halfAt({ grind: 'hollow', bevelShare: 1 }, 0.5)).toBeCloseTo((2.5 * 0.5 * 2) / 3, 9);
  });

  it('lay the blade’s left side up when its edge is to the left, and the edge below whichever side it is on', () => {
    const lowest = (edge: 'left' | 'right', side: 'left' | 'right'): readonly number[] => {
      const map = surfaceMap({ kind: 'blade', side }, BAR, { ...SLAB, edge });
      const { y, z } = surfacePoints(map, 1, 1000);
      return [y[999] as number, Math.sign((z[0] as number) - BAR.thicknessMm / 2)];
    };
    expect(lowest('left', 'left')[0]).toBeCloseTo(5.015, 6);
    expect(lowest('right', 'left')[0]).toBeCloseTo(34.985, 6);
    expect(lowest('left', 'left')[1]).toBe(1);
    expect(lowest('left', 'right')[1]).toBe(-1);
    expect(lowest('right', 'left')[1]).toBe(-1);
    expect(lowest('right', 'right')[1]).toBe(1);
  });

  it('have no metal outside the outline, nor where the blank sticks out of the bar', () => {
    const spear: Blank = { ...SLAB, outline: 'spear' };
    const map = surfaceMap({ kind: 'blade', side: 'left' }, BAR, spear);
    const { isMetal } = surfacePoints(map, 60, 20);
    expect(isMetal[0]).toBe(1);
    expect(isMetal[59]).toBe(0);
    const high = surfaceMap({ kind: 'blade', side: 'left' }, BAR, { ...SLAB, nearMm: 100 });
    const metal = surfacePoints(high, 180, 1).isMetal;
    expect(metal[99]).toBe(1);
    expect(metal[100]).toBe(0);
  });

  it('run every named outline from the heel to a point, inside the blank, the edge never above the spine', () => {
    for (const name of ['straightBack', 'drop', 'spear', 'kitchen', 'leaf'] as const) {
      const { spineAt, edgeAt } = outlineOf({ outline: name });
      for (let i = 0; i <= 500; i++) {
        const spine = spineAt(i / 500);
        const edge = edgeAt(i / 500);
        expect(spine >= 0 && edge <= 1 + 1e-12 && edge - spine >= -1e-12)
          .withContext(`${name} ${i}`)
          .toBeTrue();
      }
      expect(edgeAt(1)).toBeCloseTo(spineAt(1), 12);
      const points = outlinePoints(name);
      expect(outlineOf({ outline: { points } }).edgeAt(0.7)).toBe(edgeAt(0.7));
    }
  });

  it('know the steel of the edge: a san mai’s core', () => {
    const sanMai = STARTERS.find(({ id }) => id === 'san-mai');
    if (!sanMai) throw new Error('There is no san mai among the starters.');
    const shares = edgeSteels(referenceTracer(programOf(sanMai.design)), sanMai.design.blank);
    expect(shares).toEqual([{ steel: '26c3', share: 1 }]);
  });
});
