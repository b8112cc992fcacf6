import { evaluate, figuresOf } from './index.js';
import type { State } from './index.js';
import type { Design } from '../design/index.js';
import {
  LOSSLESS,
  alternating,
  barFrom,
  billet,
  designOf,
  stackOf,
  type StepPlan,
} from './testing/designs.js';

/** All states of the result bar. */
function statesOf(design: Design): readonly State[] {
  const bar = evaluate(design).bars.find((candidate) => candidate.id === design.result);
  return (bar?.states ?? []).map(figuresOf);
}

function lastOf(design: Design): State {
  const states = statesOf(design);
  return states[states.length - 1] as State;
}

/** Bands after steps on `count` alternating layers, nothing lost. */
function bandsAfter(count: number, plans: readonly StepPlan[]): number | null {
  return lastOf(billet(alternating(count), plans, { allowances: LOSSLESS })).bands;
}

const restack = (pieces: number, turnAlternate = false): StepPlan => ({
  kind: 'restack',
  pieces,
  turnAlternate,
});

describe('evaluate: the start', () => {
  it('adds up a stack and mixes its density by volume', () => {
    // 7 × 3 mm of 7850 and 6 × 2 mm of 7850 kg/m³ on 150 × 40 mm: 33 × 150 × 40 mm³ = 198 000 mm³ = 1.5543 kg.
    const [start] = statesOf(billet(alternating(13), []));
    expect(start?.thicknessMm).toBeCloseTo(33, 12);
    expect(start?.volumeMm3).toBeCloseTo(198_000, 6);
    expect(start?.massKg).toBeCloseTo(1.5543, 10);
    expect(start?.layers).toBe(13);
    expect(start?.bands).toBe(13);
    expect(start?.lie).toBe('thickness');
    expect(start?.layerThicknessMm).toEqual({
      min: 2,
      mean: jasmine.any(Number) as unknown as number,
      max: 3,
    });
    expect(start?.layerThicknessMm?.mean).toBeCloseTo(33 / 13, 12);
  });

  it('weighs a sandwich of nine tenths steel and one tenth nickel, 25 × 50 × 150 mm, at 1.49138 kg', () => {
    // Rule of mixtures by volume: 0.9·7850 + 0.1·8890 = 7954 kg/m³; 187.5 cm³.
    const layers = [
      { steel: '1084', thicknessMm: 11.25 },
      { steel: 'nickel-200', thicknessMm: 2.5 },
      { steel: '1084', thicknessMm: 11.25 },
    ];
    const start = lastOf(designOf([barFrom('b', stackOf(layers, 150, 50))]));
    expect(Math.abs(start.massKg - 1.49138)).toBeLessThan(1e-4);
  });

  it('counts neighbours of one steel as one band', () => {
    const layers = [...alternating(2), { steel: '15n20', thicknessMm: 1 }, { steel: '1084', thicknessMm: 1 }];
    expect(lastOf(billet(layers, [])).bands).toBe(3);
    expect(lastOf(billet(layers, [])).layers).toBe(4);
  });
});

describe('evaluate: bands and layers (closed forms of counting)', () => {
  it('seven layers show 7, 13 and 49 bands after 0, 1 and 3 book folds', () => {
    const fold: StepPlan = { kind: 'fold' };
    expect(bandsAfter(7, [])).toBe(7);
    expect(bandsAfter(7, [fold])).toBe(13);
    expect(bandsAfter(7, [fold, fold, fold])).toBe(49);
  });

  it('twelve layers folded twice show 45 bands and count 48 layers', () => {
    const state = lastOf(
      billet(alternating(12), [{ kind: 'fold' }, { kind: 'fold' }], { allowances: LOSSLESS }),
    );
    expect(state.bands).toBe(45);
    expect(state.layers).toBe(48);
  });

  it('13 cut by 4 show 49, 12 cut by 4 show 48, 25 cut by 5 show 121', () => {
    expect(bandsAfter(13, [restack(4)])).toBe(49);
    expect(bandsAfter(12, [restack(4)])).toBe(48);
    expect(bandsAfter(25, [restack(5)])).toBe(121);
  });

  it('15 cut by 4, then by 3 show 57, then 169', () => {
    expect(bandsAfter(15, [restack(4)])).toBe(57);
    expect(bandsAfter(15, [restack(4), restack(3)])).toBe(169);
  });

  it('every second piece turned over lets like faces meet: 12 cut by 4 show 4·11 + 1 = 45', () => {
    expect(bandsAfter(12, [restack(4, true)])).toBe(45);
  });

  it('on edge or twisted, a restack leaves the number of layers', () => {
    const onEdge = billet(alternating(13), [{ kind: 'turn', onto: 'edge' }, restack(4)], {
      allowances: LOSSLESS,
    });
    expect(lastOf(onEdge).layers).toBe(13);
    expect(lastOf(onEdge).bands).toBe(13);
    expect(lastOf(onEdge).lie).toBe('width');
    const twisted = billet(
      alternating(8, undefined, [5, 5]),
      [{ kind: 'twist', turns: 4, hand: 'left', reversals: 0 }, restack(4)],
      { allowances: LOSSLESS },
    );
    expect(lastOf(twisted).layers).toBe(8);
    expect(lastOf(twisted).bands).toBeNull();
    expect(lastOf(twisted).lie).toBe('mixed');
  });

  it('slices of flat layers multiply them along the length', () => {
    const state = lastOf(
      billet(alternating(13), [{ kind: 'slice', sliceMm: 6, count: 5, turnAlternate: false }], {
        allowances: LOSSLESS,
      }),
    );
    expect(state.layers).toBe(65);
    // Odd stacks meet like on like: 5·(13 - 1) + 1.
    expect(state.bands).toBe(61);
    expect(state.lie).toBe('length');
    expect(state.lengthMm).toBeCloseTo(5 * 33, 9);
    expect(state.thicknessMm).toBe(6);
  });

  it('layers eaten by grinding are gone: 50 mm in 57 bands loses one whole band a face to 1 mm', () => {
    // 50 / 57 = 0.87719 mm a band; 1 mm takes 1.14 bands off each face, one of them whole.
    const layers = alternating(57, undefined, [50 / 57, 50 / 57]);
    const state = lastOf(
      billet(layers, [
        { kind: 'grind', perFaceMm: 1, faces: 'flats' },
        { kind: 'draw', thicknessMm: 12 },
      ]),
    );
    expect(state.bands).toBe(55);
    expect(state.layers).toBe(57);
    // 48 mm drawn to 12 mm: a full band of 0.877193 mm becomes 0.219298 mm.
    expect(state.layerThicknessMm?.max).toBeCloseTo(0.219298, 6);
    expect(state.layerThicknessMm?.min).toBeCloseTo((0.877193 * 2 - 1) / 4, 5);
  });

  it('two quarter turns put the layers back the other way up', () => {
    const layers = [
      { steel: '1084', thicknessMm: 3 },
      { steel: '15n20', thicknessMm: 2 },
      { steel: '1095', thicknessMm: 5 },
    ];
    const turned = evaluate(
      billet(layers, [
        { kind: 'turn', onto: 'edge' },
        { kind: 'turn', onto: 'edge' },
      ]),
    );
    const start = turned.bars[0]?.states[0]?.bar;
    expect(turned.result?.bar.lie).toBe('thickness');
    expect([...(turned.result?.bar.section?.steels ?? [])]).toEqual(
      [...(start?.section?.steels ?? [])].reverse(),
    );
    expect(turned.result?.bar.section?.firstMm).toBe(5);
    expect(turned.result?.bar.section?.lastMm).toBe(3);
  });
});

describe('evaluate: sizes and losses', () => {
  it('draws 50 × 50 × 100 with 6 % lost to 12 × 40 × 489.583 mm (volume constancy)', () => {
    // The 6 % is taken as a trim of 3 mm an end; then l = 50·50·94 / (12·40).
    const design = designOf([
      barFrom(
        'b',
        { kind: 'stack', lengthMm: 100, widthMm: 50, layers: [{ steel: '1084', thicknessMm: 50 }] },
        [
          { kind: 'trim', perEndMm: 3 },
          { kind: 'draw', widthMm: 40, thicknessMm: 12 },
        ],
      ),
    ]);
    expect(lastOf(design).lengthMm).toBeCloseTo(489.583, 3);
  });

  it('scale of δ on all faces of 25 × 50 × 150 costs 3.303 % at 0.25 mm and 7.828 % at 0.60 mm', () => {
    for (const [scaleMm, fraction] of [
      [0.25, 0.03303],
      [0.6, 0.07828],
    ] as const) {
      const design = designOf(
        [
          barFrom(
            'b',
            { kind: 'stack', lengthMm: 150, widthMm: 50, layers: [{ steel: '1084', thicknessMm: 25 }] },
            [{ kind: 'weld', heats: 1 }],
          ),
        ],
        { allowances: { scaleMmPerHeat: scaleMm } },
      );
      const { totals } = evaluate(design);
      expect((totals?.lossesKg.scale ?? 0) / (totals?.startMassKg ?? 1)).toBeCloseTo(fraction, 5);
      expect(totals?.welds).toBe(1);
      expect(totals?.heats).toBe(1);
    }
  });

  it('a draw with one size given holds the width, or the thickness when the width is given', () => {
    const start = { allowances: LOSSLESS };
    const long = lastOf(billet(alternating(13), [{ kind: 'draw', lengthMm: 300 }], start));
    expect([long.lengthMm, long.widthMm]).toEqual([300, 40]);
    expect(long.thicknessMm).toBeCloseTo(16.5, 12);
    const wide = lastOf(billet(alternating(13), [{ kind: 'draw', widthMm: 60 }], start));
    expect(wide.thicknessMm).toBeCloseTo(33, 12);
    expect(wide.lengthMm).toBeCloseTo(100, 12);
  });

  it('restacks 320 mm by 4 with 1.5 mm kerf and 0.5 mm a face to 78.875 mm, T = 4·(T - 1)', () => {
    const design = designOf([
      barFrom('b', { kind: 'stack', lengthMm: 320, widthMm: 40, layers: alternating(13) }, [restack(4)]),
    ]);
    const state = lastOf(design);
    expect(state.lengthMm).toBeCloseTo(78.875, 12);
    expect(state.thicknessMm).toBeCloseTo(4 * 32, 12);
    // Kerf 3 × 1.5 × 40 × 33 mm³; grinding 8 faces × 0.5 × 40 × 78.875 mm³; steel of 7850 kg/m³.
    expect(state.lossesKg.kerf).toBeCloseTo(5_940 * 7850e-9, 12);
    expect(state.lossesKg.grinding).toBeCloseTo(12_620 * 7850e-9, 12);
  });

  it('a fold halves the length and grinds only the faces that meet', () => {
    const state = lastOf(billet(alternating(13), [{ kind: 'fold', grindPerFaceMm: 0.5 }]));
    expect(state.lengthMm).toBe(75);
    expect(state.thicknessMm).toBeCloseTo(65, 12);
    expect(state.lossesKg.grinding).toBeCloseTo(2 * 0.5 * 40 * 75 * 7850e-9, 12);
  });

  it('slices cost a kerf each and the rest is trim', () => {
    // 10 slices of 5 mm and 10 kerfs of 1.5 mm use 65 of 150 mm; 85 mm are left over.
    const state = lastOf(
      billet(alternating(13), [{ kind: 'slice', sliceMm: 5, count: 10, turnAlternate: true }]),
    );
    const gramsPerMm = 40 * 33 * 7850e-9;
    expect(state.lossesKg.kerf).toBeCloseTo(15 * gramsPerMm, 12);
    expect(state.lossesKg.trim).toBeCloseTo(85 * gramsPerMm, 12);
    expect(state.lengthMm).toBeCloseTo(330, 9);
  });

  it('a step switched off changes nothing', () => {
    const plans: StepPlan[] = [{ kind: 'draw', thicknessMm: 10, heats: 3, isOff: true }];
    expect(lastOf(billet(alternating(13), plans)).thicknessMm).toBeCloseTo(33, 12);
    expect(evaluate(billet(alternating(13), plans)).totals?.heats).toBe(0);
  });
});

describe('evaluate: work shared between evaluations', () => {
  const plans: StepPlan[] = Array.from({ length: 60 }, (_, i) => ({ kind: 'draw', lengthMm: 150 + i }));

  it('an edit of the last step forges that step alone', () => {
    const design = billet(alternating(400, undefined, [0.5, 0.5]), plans);
    const first = evaluate(design);
    expect(first.stepsForged).toBe(60);
    const bar = design.bars[0] as Design['bars'][number];
    const steps = [...bar.steps.slice(0, -1), { id: 'billet-60', kind: 'draw' as const, lengthMm: 400 }];
    const second = evaluate({ ...design, bars: [{ ...bar, steps }] }, first);
    expect(second.stepsForged).toBe(1);
    expect(second.result?.bar.lengthMm).toBe(400);
    expect(second.bars[0]?.states[30]).toBe(first.bars[0]?.states[30]);
  });

  it('another allowance or another steel forges everything anew', () => {
    const design = billet(alternating(13), plans);
    const first = evaluate(design);
    expect(evaluate({ ...design, allowances: { kerfMm: 2 } }, first).stepsForged).toBe(60);
    expect(evaluate(design, first).stepsForged).toBe(0);
  });

  it('an assembly is kept while the bars it is made of are the same', () => {
    const pair = barFrom(
      'pair',
      { kind: 'assembly', along: 'width', pieces: [{ bar: 'one' }, { bar: 'one' }] },
      [{ kind: 'draw', thicknessMm: 10 }],
    );
    const one = barFrom('one', stackOf(alternating(5)), [{ kind: 'weld', heats: 1 }]);
    const design = designOf([one, pair]);
    const first = evaluate(design);
    const renamed = { ...design, name: 'Another name' };
    expect(evaluate(renamed, first).stepsForged).toBe(0);
    const heated = { ...one, steps: [{ id: 'one-1', kind: 'weld' as const, heats: 2 }] };
    expect(evaluate({ ...design, bars: [heated, pair] }, first).stepsForged).toBe(2);
  });
});
