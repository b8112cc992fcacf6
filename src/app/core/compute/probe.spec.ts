import type { Blank, Design } from '@shared/design';
import { evaluate } from '@shared/forging';
import { LOSSLESS, alternating, billet } from '@shared/forging/testing/designs';
import { type Program, type Surface, compile, referenceTracer } from '@shared/pattern';
import { type Probe, probeAt } from './probe';

const CUT: Surface = { kind: 'section', across: 'length', atMm: 40 };

function probed(design: Design, surface: Surface, across: number, up: number): Probe | null {
  const program = compile(evaluate(design)) as Program;
  return probeAt(referenceTracer(program), surface, design.blank, across, up);
}

/** Seven layers, 3 and 2 mm in turn, the thicker below and above: 18 mm. */
function stack(steps: Parameters<typeof billet>[1] = [], rest: Partial<Design> = {}): Design {
  return billet(alternating(7), steps, { allowances: LOSSLESS, ...rest });
}

describe('probeAt', () => {
  it('tells the steel, the layer, its place and how thick it is', () => {
    expect(probed(stack(), CUT, 0.25, 4 / 18)).toEqual({
      xMm: 40,
      yMm: 10,
      zMm: 4,
      steel: '15n20',
      bar: 'billet',
      place: 1,
      layersInStack: 7,
      bandMm: jasmine.any(Number),
      showsMm: jasmine.any(Number),
    });
    const { bandMm, showsMm } = probed(stack(), CUT, 0.25, 4 / 18) as Probe;
    expect(bandMm).toBeCloseTo(2, 6);
    expect(showsMm).toBeCloseTo(2, 6);
  });

  it('measures the band as it is now, not as it was laid', () => {
    const drawn = stack([{ kind: 'draw', thicknessMm: 6 }]);
    expect((probed(drawn, CUT, 0.5, 0.05) as Probe).bandMm).toBeCloseTo(1, 6);
  });

  it('takes neighbouring layers of one steel for one band, from either side of the seam', () => {
    const restacked = stack([{ kind: 'restack', pieces: 2, turnAlternate: false }]);
    // 3 mm below the seam at 18 mm and 3 mm above it.
    for (const z of [15.5, 17.9, 18.1, 20.5]) {
      expect((probed(restacked, CUT, 0.5, z / 36) as Probe).bandMm)
        .withContext(`${z} mm`)
        .toBeCloseTo(6, 5);
    }
    const folded = stack([{ kind: 'fold', grindPerFaceMm: 0 }]);
    for (const z of [15.5, 18.1]) {
      expect((probed(folded, CUT, 0.5, z / 36) as Probe).bandMm).toBeCloseTo(6, 5);
    }
  });

  it('ends an outer band at the skin of the bar', () => {
    const ground = stack([{ kind: 'grind', perFaceMm: 1, faces: 'flats' }]);
    expect((probed(ground, CUT, 0.5, 0.5 / 16) as Probe).bandMm).toBeCloseTo(2, 5);
  });

  it('tells a band that runs level with the surface from one that is cut', () => {
    const face: Surface = { kind: 'face', face: 'top', depthMm: 4 };
    const { steel, bandMm, showsMm } = probed(stack(), face, 0.5, 0.5) as Probe;
    expect(steel).toBe('15n20');
    expect(bandMm).toBeCloseTo(2, 6);
    expect(showsMm).toBeNull();
  });

  it('says how wide a band shows on a bevel [metallurgy 9.5: 0.3 mm, 30 × 5 → 3.6 in side view]', () => {
    const blank: Blank = {
      lengthMm: 140,
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
    const layers = alternating(20, ['1084', '15n20'], [0.3, 0.3]);
    const design = billet(layers, [], { allowances: LOSSLESS, blank });
    const { bandMm, showsMm } = probed(design, { kind: 'blade', side: 'left' }, 0.5, 0.4) as Probe;
    expect(bandMm).toBeCloseTo(0.3, 6);
    expect(showsMm).toBeCloseTo(3.6, 4);
    const forged = { ...design, blank: { ...blank, bevels: 'forged' as const } };
    expect((probed(forged, { kind: 'blade', side: 'left' }, 0.5, 0.4) as Probe).bandMm).toBeNull();
  });

  it('finds nothing beside the blade', () => {
    const blank: Blank = { lengthMm: 140, widthMm: 30, thicknessMm: 5, outline: 'spear' };
    expect(probed(stack([], { blank }), { kind: 'blade', side: 'left' }, 0.99, 0.99)).toBeNull();
  });
});
