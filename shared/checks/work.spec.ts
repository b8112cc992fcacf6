import type { Design } from '../design/index.js';
import { evaluate } from '../forging/index.js';
import {
  LOSSLESS,
  type StepPlan,
  alternating,
  barFrom,
  billet,
  designOf,
  stackOf,
} from '../forging/testing/designs.js';
import { type Warning, type WarningSeverity, warningsOf } from './index.js';
import { layersOf } from './testing/cases.js';

const LOSS = { allowances: LOSSLESS } as const;
const WELD: StepPlan = { kind: 'weld' };

const found = (design: Design, code: string): readonly Warning[] =>
  warningsOf(evaluate(design)).filter((warning) => warning.code === code);

function severityOf(design: Design, code: string): WarningSeverity | null {
  const own = found(design, code);
  expect(own.length).withContext(code).toBeLessThan(2);
  return own[0]?.severity ?? null;
}

/** A welded bar of two layers, `widthMm` × `thicknessMm`, 160 mm long, and what is done to it. */
const bar = (widthMm: number, thicknessMm: number, plan: StepPlan, rest: Partial<Design> = LOSS): Design =>
  designOf(
    [barFrom('b', stackOf(layersOf(['1084', '15n20'], thicknessMm / 2), 160, widthMm), [WELD, plan])],
    rest,
  );

describe('warning layers-eaten', () => {
  const skinned = (skinMm: number, plan: StepPlan, count = 13): Design => {
    const layers = alternating(count).map((layer, i, all) =>
      i === 0 || i === all.length - 1 ? { ...layer, thicknessMm: skinMm } : layer,
    );
    return billet(layers, [plan], { allowances: { scaleMmPerHeat: 0.08 } });
  };

  it('fires when scale takes the outer layers, silent while a skin is left', () => {
    const heat = (heats: number): StepPlan => ({ kind: 'weld', heats });
    expect(found(skinned(0.1, heat(1)), 'layers-eaten')).toEqual([]);
    const [warning] = found(skinned(0.1, heat(2)), 'layers-eaten');
    expect(warning?.stepId).toBe('billet-1');
    expect(warning?.values).toEqual({ scale: 2, grinding: 0, layers: 13 });
    expect(warning?.message).toContain('2 layers to scale, of 13');
  });

  it('fires when grinding does', () => {
    const grind = (perFaceMm: number): StepPlan => ({ kind: 'grind', perFaceMm, faces: 'flats' });
    expect(found(skinned(0.5, grind(0.49)), 'layers-eaten')).toEqual([]);
    expect(found(skinned(0.5, grind(0.51)), 'layers-eaten')[0]?.values).toEqual({
      scale: 0,
      grinding: 2,
      layers: 13,
    });
  });

  it('is a note up to a tenth of the layers, a caution past it', () => {
    const grind: StepPlan = { kind: 'grind', perFaceMm: 0.51, faces: 'flats' };
    expect(severityOf(skinned(0.5, grind, 20), 'layers-eaten')).toBe('note');
    expect(severityOf(skinned(0.5, grind, 19), 'layers-eaten')).toBe('caution');
  });
});

describe('warning seams-open', () => {
  const steps = (...plans: StepPlan[]): Design => billet(alternating(13), plans, LOSS);
  const draw: StepPlan = { kind: 'draw', lengthMm: 300 };
  const restack: StepPlan = { kind: 'restack', pieces: 4, turnAlternate: false };

  it('fires at the first step that works a loose stack, silent after a weld', () => {
    const [warning] = found(steps(draw, { kind: 'draw', lengthMm: 310 }, WELD), 'seams-open');
    expect(warning?.severity).toBe('caution');
    expect(warning?.stepId).toBe('billet-1');
    expect(warning?.values).toEqual({ seams: 12, work: 'draw' });
    expect(found(steps(WELD, draw), 'seams-open')).toEqual([]);
  });

  it('fires again after a restack that isn’t welded', () => {
    const open = found(steps(WELD, restack, draw, WELD), 'seams-open');
    expect(open.map(({ stepId, values }) => [stepId, values['seams']])).toEqual([['billet-3', 3]]);
  });

  it('lets turning, grinding and trimming pass, and a step switched off', () => {
    const plans: StepPlan[] = [
      { kind: 'turn', onto: 'edge' },
      { kind: 'grind', perFaceMm: 0.1, faces: 'all' },
      { kind: 'trim', perEndMm: 1 },
      { ...draw, isOff: true },
      WELD,
    ];
    expect(found(steps(...plans), 'seams-open')).toEqual([]);
  });

  it('notes seams left at the end, not for a stack that is only laid', () => {
    expect(severityOf(steps(WELD, restack), 'seams-open')).toBe('note');
    expect(severityOf(steps(), 'seams-open')).toBeNull();
  });

  it('leaves pieces to the weld of their assembly', () => {
    const pieces = [{ bar: 'a' }, { bar: 'a' }];
    const bars = [
      barFrom('a', stackOf(alternating(3)), [{ kind: 'trim', perEndMm: 1 }]),
      barFrom('b', { kind: 'assembly', along: 'thickness', pieces }, [WELD]),
    ];
    expect(found(designOf(bars, LOSS), 'seams-open')).toEqual([]);
  });
});

describe('warning taller-than-press', () => {
  const high = (openingMm: number | undefined, heightMm: number): Design =>
    billet(layersOf(['1084', '15n20'], heightMm / 2), [WELD, { kind: 'draw', thicknessMm: 30 }], {
      ...LOSS,
      ...(openingMm === undefined ? {} : { limits: { pressOpeningMm: openingMm } }),
    });

  it('stops at the shop’s own limit, fits at exactly that height', () => {
    expect(severityOf(high(60, 60), 'taller-than-press')).toBeNull();
    const [warning] = found(high(59.9, 60), 'taller-than-press');
    expect(warning?.severity).toBe('stop');
    expect(warning?.stepId).toBe('billet-1');
    expect(warning?.values).toEqual({ heightMm: 60, openingMm: 59.9, isOwnLimit: 'yes' });
  });

  it('is a caution against the usual press of 100 mm', () => {
    expect(severityOf(high(undefined, 100), 'taller-than-press')).toBeNull();
    expect(severityOf(high(undefined, 100.1), 'taller-than-press')).toBe('caution');
  });
});

describe('warning longer-than-forge', () => {
  const long = (forgeLengthMm: number, plan: StepPlan): WarningSeverity | null =>
    severityOf(bar(20, 20, plan, { ...LOSS, limits: { forgeLengthMm } }), 'longer-than-forge');

  it('fires for a heated bar longer than the forge: a caution to weld, a note to work', () => {
    expect(long(160, { kind: 'weld', heats: 1 })).toBeNull();
    expect(long(159.9, { kind: 'weld', heats: 1 })).toBe('caution');
    expect(long(159.9, { kind: 'corner', heats: 1 })).toBe('note');
  });

  it('lets a cold bar be as long as it likes', () => {
    expect(long(100, { kind: 'trim', perEndMm: 1 })).toBeNull();
  });

  it('counts the length a draw of several heats ends with', () => {
    const draw = (heats: number): StepPlan => ({ kind: 'draw', lengthMm: 200, heats });
    expect(long(180, draw(1))).toBeNull();
    expect(long(180, draw(2))).toBe('note');
  });
});

describe('warnings twist-not-square and corner-not-square', () => {
  const kinds: [string, StepPlan][] = [
    ['twist-not-square', { kind: 'twist', turns: 1, hand: 'left', reversals: 0 }],
    ['corner-not-square', { kind: 'corner' }],
  ];
  for (const [code, plan] of kinds) {
    it(`${code}: past 1.1 to 1 a caution, past 2 to 1 a stop`, () => {
      expect(severityOf(bar(22, 20, plan), code)).toBeNull();
      expect(severityOf(bar(22.1, 20, plan), code)).toBe('caution');
      expect(severityOf(bar(20, 22.1, plan), code)).toBe('caution');
      expect(severityOf(bar(40, 20, plan), code)).toBe('caution');
      expect(severityOf(bar(40.1, 20, plan), code)).toBe('stop');
    });
  }

  it('say the square to draw it to', () => {
    // √(40.1 · 20) = 28.3 mm.
    expect(found(bar(40.1, 20, { kind: 'corner' }), 'corner-not-square')[0]?.remedy).toContain('28.3 mm');
  });
});

describe('warning twist-shear', () => {
  // γ = π · 20 · N/160, so 2.5 in one heat is 6.366 turns, 1.5 is 3.820.
  const turned = (turns: number, heats?: number, steel = '15n20'): WarningSeverity | null =>
    severityOf(
      designOf(
        [
          barFrom('b', stackOf(layersOf(['1084', steel], 10), 160, 20), [
            WELD,
            { kind: 'twist', turns, hand: 'right', reversals: 3, ...(heats === undefined ? {} : { heats }) },
          ]),
        ],
        LOSS,
      ),
      'twist-shear',
    );

  it('fires past 2.5 in one heat, counted over the heats of the step', () => {
    expect(turned(6.36)).toBeNull();
    expect(turned(6.37)).toBe('caution');
    expect(turned(12.73, 2)).toBeNull();
    expect(turned(12.74, 2)).toBe('caution');
  });

  it('fires past 1.5 with nickel or wrought iron', () => {
    for (const steel of ['nickel-200', 'wrought-iron', 'phosphoric-iron']) {
      expect(turned(3.81, 1, steel))
        .withContext(steel)
        .toBeNull();
      expect(turned(3.82, 1, steel))
        .withContext(steel)
        .toBe('caution');
    }
  });

  it('says how many heats it takes', () => {
    // γ = 31.4159/… : 20 turns shear by 7.854, which is 4 heats of 2.5.
    const plan: StepPlan = { kind: 'twist', turns: 20, hand: 'right', reversals: 0 };
    const [warning] = found(bar(20, 20, plan), 'twist-shear');
    expect(warning?.values['shear']).toBeCloseTo(7.854, 3);
    expect(warning?.values['heatsNeeded']).toBe(4);
    expect(warning?.remedy).toContain('4 heats');
  });
});

describe('warning reduction-too-large', () => {
  // Usual limit 0.4 a heat: 20 mm may become 12 mm in one heat, 7.2 mm in two.
  const drawn = (thicknessMm: number, heats?: number): readonly Warning[] =>
    found(
      bar(20, 20, { kind: 'draw', thicknessMm, ...(heats === undefined ? {} : { heats }) }),
      'reduction-too-large',
    );

  it('fires past the limit for one heat, where none are given too', () => {
    expect(drawn(12)).toEqual([]);
    expect(drawn(12, 1)).toEqual([]);
    expect(drawn(11.99)[0]?.severity).toBe('caution');
    expect(drawn(11.99)[0]?.message).toContain('gives no heats');
  });

  it('compounds over heats and says how many it takes', () => {
    expect(drawn(7.2, 2)).toEqual([]);
    const [warning] = drawn(7.19, 2);
    expect(warning?.values['heatsNeeded']).toBe(3);
    expect(warning?.values['allowed']).toBeCloseTo(0.64, 9);
  });

  it('holds for the width, for a weld to a size and for the shop’s own limit', () => {
    const narrow: StepPlan = { kind: 'draw', widthMm: 11.9 };
    expect(found(bar(20, 20, narrow), 'reduction-too-large')[0]?.values['side']).toBe('width');
    const weld: StepPlan = { kind: 'weld', thicknessMm: 15, heats: 1 };
    const limits = (reductionPerHeat: number): Partial<Design> => ({ ...LOSS, limits: { reductionPerHeat } });
    expect(found(bar(20, 20, weld, limits(0.25)), 'reduction-too-large')).toEqual([]);
    expect(found(bar(20, 20, weld, limits(0.24)), 'reduction-too-large').length).toBe(1);
  });
});

describe('warning pieces-differ', () => {
  const together = (
    longMm: number,
    wideMm: number,
    along: 'thickness' | 'width' = 'thickness',
  ): readonly Warning[] => {
    const pieces = [{ bar: 'a' }, { bar: 'b' }];
    const bars = [
      barFrom('a', stackOf(layersOf(['1084']), 100, 20)),
      barFrom('b', stackOf(layersOf(['15n20']), longMm, wideMm)),
      barFrom('c', { kind: 'assembly', along, pieces }),
    ];
    return found(designOf(bars, LOSS), 'pieces-differ');
  };

  it('fires past half a millimetre, a caution past a tenth of the piece', () => {
    expect(together(100.5, 20.5)).toEqual([]);
    expect(together(100.6, 20)[0]?.severity).toBe('note');
    expect(together(100, 20.6)[0]?.severity).toBe('note');
    expect(together(111, 20)[0]?.severity).toBe('note');
    expect(together(112, 20)[0]?.severity).toBe('caution');
  });

  it('names the piece and by how much it sticks out', () => {
    const [warning] = together(104, 22);
    expect(warning?.bar).toBe('c');
    expect(warning?.stepId).toBeNull();
    expect(warning?.message).toContain('Piece 2 (“b”) sticks out by 4 mm in length and 2 mm in width');
    // 1 − (100/104)(20/22) = 12.59 %.
    expect(warning?.message).toContain('12.6 %');
  });

  it('ignores width along the width: it is the sum there', () => {
    expect(together(100, 30, 'width')).toEqual([]);
  });
});
