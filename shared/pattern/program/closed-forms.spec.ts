import { billet, designOf, barFrom, stackOf, alternating, LOSSLESS } from '../../forging/testing/designs.js';
import type { StepPlan } from '../../forging/testing/designs.js';
import type { Layer } from '../../design/index.js';
import { between, randomFrom } from '../testing/random.js';
import { originOf, origins, pointsIn, programOf } from '../testing/tracing.js';
import { referenceTracer } from '../reference/tracer.js';
import { SEGMENT_WORDS } from './program.js';

/** Layers of one thickness in turn, in a bar of the given size, with nothing lost on the way. */
function layered(
  layerMm: number,
  count: number,
  size: { lengthMm: number; widthMm: number },
  plans: readonly StepPlan[],
): ReturnType<typeof programOf> {
  const layers = alternating(count, ['1084', '15n20'], [layerMm, layerMm]);
  const bar = barFrom('billet', stackOf(layers, size.lengthMm, size.widthMm), plans);
  return programOf(designOf([bar], { allowances: LOSSLESS }));
}

describe('the pattern by closed forms', () => {
  it('shows one layer at a depth of a flat stack, and the layer that the depth names', () => {
    const layers: readonly Layer[] = [
      { steel: '1084', thicknessMm: 3 },
      { steel: '15n20', thicknessMm: 2 },
      { steel: '1095', thicknessMm: 1 },
    ];
    const program = programOf(billet(layers, []));
    const points = pointsIn(program, randomFrom(1), 500);
    for (const [depthMm, steel] of [
      [0, '1095'],
      [0.99, '1095'],
      [1.01, '15n20'],
      [2.99, '15n20'],
      [3.01, '1084'],
      [6, '1084'],
    ] as const) {
      const flat = points.map(([x, y]) => [x, y, 6 - depthMm] as const);
      const seen = new Set(origins(referenceTracer(program), flat).map((origin) => origin.steel));
      expect([...seen])
        .withContext(`depth ${depthMm}`)
        .toEqual([steel]);
    }
  });

  it('shows only what scale and grinding leave: 3 + 2 + 3 mm less 3.1 mm from each face is all the middle layer', () => {
    const layers: readonly Layer[] = [
      { steel: '1084', thicknessMm: 3 },
      { steel: '15n20', thicknessMm: 2 },
      { steel: '1084', thicknessMm: 3 },
    ];
    const plans: StepPlan[] = [
      { kind: 'weld', heats: 2 },
      { kind: 'grind', perFaceMm: 2.9, faces: 'flats' },
    ];
    const program = programOf(billet(layers, plans, { allowances: { scaleMmPerHeat: 0.1 } }));
    expect(program.thicknessMm).toBeCloseTo(1.8, 9);
    const points = pointsIn(program, randomFrom(2), 500);
    expect(new Set(origins(referenceTracer(program), points).map(({ layer }) => layer))).toEqual(
      new Set([1]),
    );
    // Two heats take 0.2 mm off the near end and the left side as well.
    const corner = originOf(program, 0, 0, 0);
    expect(corner.x).toBeCloseTo(0.2, 9);
    expect(corner.y).toBeCloseTo(0.2, 9);
    expect(corner.z).toBeCloseTo(3.1, 9);
  });

  it('shows bands t/sin θ wide on a bevel [metallurgy 9.5: 0.1 → 1.25399 mm at 25 × 4, 0.3 → 3.61248 at 30 × 5]', () => {
    for (const [layerMm, bevelMm, thicknessMm, bandMm, perSide] of [
      [0.1, 25, 4, 1.25399, 20],
      [0.05, 20, 3, 0.66854, 30],
      [0.3, 30, 5, 3.61248, 8.333],
    ] as const) {
      const count = Math.ceil(thicknessMm / layerMm);
      const program = layered(layerMm, count, { lengthMm: 60, widthMm: bevelMm }, []);
      const middleMm = thicknessMm / 2;
      // Down the bevel: from the spine's corner to the edge in the middle of the thickness.
      const samples = 200_000;
      const points = Array.from({ length: samples }, (_, i) => {
        const share = (i + 0.5) / samples;
        return [10, share * bevelMm, thicknessMm - share * middleMm] as const;
      });
      const layersSeen = origins(referenceTracer(program), points).map(({ layer }) => layer);
      const borders = layersSeen.flatMap((layer, i) => (i > 0 && layer !== layersSeen[i - 1] ? [i] : []));
      const faceMm = Math.hypot(bevelMm, middleMm);
      const widths = borders.slice(1).map((at, i) => ((at - (borders[i] as number)) / samples) * faceMm);
      for (const width of widths) expect(width).toBeCloseTo(bandMm, 3);
      expect(borders.length).toBe(Math.ceil(perSide) - 1);
    }
  });

  it('rotates a twisted bar as u = h cos ψ + s sin ψ within 0.3 % of its width near the axis [9.3]', () => {
    // p = 10 mm, right hand; D = 40, so that the checked points lie in the inner circle.
    const program = layered(1, 40, { lengthMm: 100, widthMm: 40 }, [
      { kind: 'twist', turns: 10, hand: 'right', reversals: 0 },
    ]);
    for (const [h, s, x, u] of [
      [6, 2, 0, 6],
      [6, 2, 2.5, 2],
      [0, 3, 2.5, 3],
      [3, 4, 1.25, 4.94975],
    ] as const) {
      const origin = originOf(program, x, 20 + s, 20 + h);
      expect(Math.abs(origin.z - 20 - u))
        .withContext(`h ${h}, s ${s}, x ${x}`)
        .toBeLessThan(0.003 * 40);
    }
  });

  it('deviates from a rigid rotation by no more than it says: 0.2, 1.8 and 5.7 % of the half width', () => {
    const program = layered(1, 40, { lengthMm: 100, widthMm: 40 }, [
      { kind: 'twist', turns: 1, hand: 'right', reversals: 0 },
    ]);
    for (const [share, tolerance] of [
      [0.25, 0.0021],
      [0.5, 0.018],
      [0.7, 0.057],
    ] as const) {
      let worst = 0;
      for (let i = 0; i < 4000; i++) {
        const x = (i * 100) / 4000;
        const angle = i * 2.399963;
        const psi = (2 * Math.PI * x) / 100;
        const s = 20 * share * Math.sin(angle);
        const h = 20 * share * Math.cos(angle);
        const origin = originOf(program, x, 20 + s, 20 + h);
        const uError = origin.z - 20 - (h * Math.cos(psi) + s * Math.sin(psi));
        const vError = origin.y - 20 - (s * Math.cos(psi) - h * Math.sin(psi));
        worst = Math.max(worst, Math.hypot(uError, vError) / 20);
      }
      expect(worst).withContext(`at ${share} of the half width`).toBeLessThan(tolerance);
    }
  });

  it('turns the other way for a left hand, and back on itself at each reversal', () => {
    const twisted = (hand: 'left' | 'right', reversals: number): ReturnType<typeof programOf> =>
      layered(1, 20, { lengthMm: 120, widthMm: 20 }, [{ kind: 'twist', turns: 3, hand, reversals }]);
    const right = twisted('right', 0);
    const left = twisted('left', 0);
    const there = twisted('right', 2);
    for (const x of [3, 17.5, 38]) {
      // Mirrored across the width.
      const a = originOf(right, x, 13, 8);
      const b = originOf(left, x, 7, 8);
      expect(b.z).toBeCloseTo(a.z, 9);
      expect(b.y).toBeCloseTo(20 - a.y, 9);
      // Three turns shared out over three lengths of 40 mm: at the same rate, forth, back, forth.
      for (const same of [80 - x, 80 + x]) {
        expect(originOf(there, same, 13, 8).z).toBeCloseTo(a.z, 9);
      }
    }
  });

  it('forges the diagonals of a square bar into its middles, and a second corner makes a quarter turn', () => {
    const once = layered(1, 20, { lengthMm: 50, widthMm: 20 }, [{ kind: 'corner' }]);
    const twice = layered(1, 20, { lengthMm: 50, widthMm: 20 }, [{ kind: 'corner' }, { kind: 'corner' }]);
    // Along the new width through the middle, layers follow the old diagonal: both coordinates alike.
    for (const s of [-6, -2, 3, 7]) {
      const origin = originOf(once, 5, 10 + s, 10);
      expect(origin.y - 10).toBeCloseTo(origin.z - 10, 9);
      expect(Math.sign(origin.z - 10)).toBe(Math.sign(s));
      const turned = originOf(twice, 5, 10 + s, 10 + s / 3);
      expect(turned.z - 10).toBeCloseTo(s, 9);
      expect(turned.y - 10).toBeCloseTo(-s / 3, 9);
    }
  });

  it('opens dimples as rings of √(2ρv − v²) [9.4: ball 5, depth 1.2, layers 0.3 → 3.24962, 2.86182, 2.37487, 1.70587]', () => {
    const program = layered(0.3, 40, { lengthMm: 60, widthMm: 20 }, [
      {
        kind: 'dimple',
        pitchMm: 20,
        rowPitchMm: 20,
        depthMm: 1.2,
        radiusMm: 5,
        layout: 'square',
        seed: 0,
        faces: 'top',
        finish: 'forgeFlat',
      },
    ]);
    // A layer is 0.3 mm, a ring lies where the ball crosses the border of two layers below the face.
    const radii = ringRadii(program, 30, 10);
    const published = [1.70587, 2.37487, 2.86182];
    expect(radii.length).toBe(published.length);
    published.forEach((radius, i) => expect(radii[i]).toBeCloseTo(radius, 2));
    // The rim: the face's own layer on both sides of it, but cut into inside.
    expect(originOf(program, 30 + 3.2, 10, program.thicknessMm).z).toBeLessThan(12 - 0.01);
    expect(originOf(program, 30 + 3.25, 10, program.thicknessMm).z).toBeCloseTo(12, 9);
  });

  it('opens grooves as bands between the same distances, at (k + ½)·pitch along the slant', () => {
    const angleDeg = 30;
    const program = layered(0.3, 40, { lengthMm: 90, widthMm: 20 }, [
      {
        kind: 'groove',
        pitchMm: 18,
        depthMm: 1.2,
        radiusMm: 5,
        angleDeg,
        faces: 'top',
        finish: 'forgeFlat',
      },
    ]);
    const slant = (angleDeg * Math.PI) / 180;
    for (const y of [3, 10, 16]) {
      // Along x the distance to the groove's middle counts by cos of the slant.
      const middle = 2.5 * 18 - (y - 10) * Math.tan(slant);
      const radii = ringRadii(program, middle, y).map((alongX) => alongX * Math.cos(slant));
      const published = [1.70587, 2.37487, 2.86182];
      expect(radii.length).toBe(published.length);
      published.forEach((radius, i) => expect(radii[i]).toBeCloseTo(radius, 2));
    }
  });

  it('brings up the bottom of the cut to the face, and presses the face down to it the other way', () => {
    const grooved = (finish: 'forgeFlat' | 'grindFlat'): ReturnType<typeof programOf> =>
      layered(1, 10, { lengthMm: 120, widthMm: 20 }, [
        {
          kind: 'groove',
          pitchMm: 12,
          depthMm: 2.5,
          radiusMm: 4,
          angleDeg: 0,
          faces: 'bothStaggered',
          finish,
        },
      ]);
    const cut = grooved('forgeFlat');
    const pressed = grooved('grindFlat');
    expect(originOf(cut, 18, 5, cut.thicknessMm).z).toBeCloseTo(7.5, 9);
    expect(originOf(cut, 12, 5, cut.thicknessMm).z).toBeCloseTo(10, 9);
    expect(originOf(cut, 12, 5, 0).z).toBeCloseTo(2.5, 9);
    expect(originOf(cut, 18, 5, 0).z).toBeCloseTo(0, 9);
    expect(originOf(pressed, 18, 5, pressed.thicknessMm).z).toBeCloseTo(10, 9);
    expect(originOf(pressed, 12, 5, pressed.thicknessMm).z).toBeCloseTo(7.5, 9);
    expect(originOf(pressed, 12, 5, 0).z).toBeCloseTo(0, 9);
    expect(originOf(pressed, 18, 5, 0).z).toBeCloseTo(2.5, 9);
  });

  it('drags layers down into the wedge’s cut [9.6: drag 12, reach 4 → 12, 7.27837, 4.41455, 1.62402 mm]', () => {
    const program = layered(1, 60, { lengthMm: 40, widthMm: 60 }, [
      { kind: 'wedge', dragMm: 12, reachMm: 4 },
    ]);
    for (const [distance, drop] of [
      [0, 12],
      [2, 7.27837],
      [4, 4.41455],
      [8, 1.62402],
    ] as const) {
      for (const height of [5, 20, 33.3, 47]) {
        for (const side of [-1, 1]) {
          const origin = originOf(program, 11, 30 + side * distance, height);
          expect(origin.z).toBeCloseTo(height + drop, 4);
          expect(origin.layer).toBe(Math.floor(height + drop));
        }
      }
    }
  });

  it('turns: the top goes to the right, the near end goes to the top', () => {
    const onEdge = layered(1, 8, { lengthMm: 50, widthMm: 20 }, [{ kind: 'turn', onto: 'edge' }]);
    expect(onEdge.widthMm).toBeCloseTo(8, 9);
    expect(originOf(onEdge, 9, 7.5, 4).layer).toBe(7);
    expect(originOf(onEdge, 9, 0.5, 4).layer).toBe(0);
    const onEnd = layered(1, 8, { lengthMm: 50, widthMm: 20 }, [{ kind: 'turn', onto: 'end' }]);
    const nearEnd = originOf(onEnd, 2.5, 6, 50);
    expect(nearEnd).toEqual(jasmine.objectContaining({ x: 0, y: 6, layer: 2 }));
  });

  it('keeps points in the stack, whatever the hammer did, and leaves the faces alone', () => {
    const design = billet(alternating(13), [{ kind: 'draw', widthMm: 40, thicknessMm: 10 }], {
      unevenness: 1,
      seed: 7,
      allowances: LOSSLESS,
    });
    const program = programOf(design);
    const random = randomFrom(3);
    let moved = 0;
    for (let i = 0; i < 2_000; i++) {
      const x = between(random, 0, program.lengthMm);
      const y = between(random, 0, program.widthMm);
      const inside = originOf(program, x, y, between(random, 0, program.thicknessMm));
      expect(inside.z >= 0 && inside.z <= 33).toBeTrue();
      expect(originOf(program, x, y, 0).z).toBeCloseTo(0, 9);
      expect(originOf(program, x, y, program.thicknessMm).z).toBeCloseTo(33, 9);
      const middle = originOf(program, x, y, program.thicknessMm / 2);
      moved = Math.max(moved, Math.abs(middle.z - 16.5));
    }
    // A tenth of the thickness is the most that the strongest unevenness moves.
    expect(moved).toBeGreaterThan(1);
    expect(moved).toBeLessThan(3.3);
  });

  it('gives each seed its own unevenness, and the same seed the same', () => {
    const at = (seed: number): number =>
      originOf(
        programOf(
          billet(alternating(13), [{ kind: 'draw', widthMm: 40, thicknessMm: 10 }], {
            unevenness: 0.5,
            seed,
          }),
        ),
        60,
        20,
        5,
      ).z;
    expect(at(1)).toBe(at(1));
    expect(at(1)).not.toBe(at(2));
  });

  it('merges sizes, scale and turns in a row into one op', () => {
    const program = programOf(
      billet(alternating(5), [
        { kind: 'weld', heats: 2 },
        { kind: 'draw', heats: 3, widthMm: 30, thicknessMm: 10 },
        { kind: 'turn', onto: 'edge' },
        { kind: 'grind', perFaceMm: 0.2, faces: 'all' },
        { kind: 'trim', perEndMm: 3 },
      ]),
    );
    const entry = program.entry * SEGMENT_WORDS;
    expect((program.segments[entry + 1] as number) - (program.segments[entry] as number)).toBe(1);
  });
});

/** Distances along x from a middle at which the layer on the top face changes, smallest first. */
function ringRadii(program: ReturnType<typeof programOf>, middleX: number, y: number): number[] {
  const samples = 30_000;
  const reachMm = 6;
  const points = Array.from(
    { length: samples },
    (_, i) => [middleX + (i / samples) * reachMm, y, program.thicknessMm] as const,
  );
  const layers = origins(referenceTracer(program), points).map(({ layer }) => layer);
  return layers.flatMap((layer, i) => (i > 0 && layer !== layers[i - 1] ? [(i / samples) * reachMm] : []));
}
