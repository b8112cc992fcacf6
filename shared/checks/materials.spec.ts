import type { Design } from '../design/index.js';
import { evaluate } from '../forging/index.js';
import { LOSSLESS, type StepPlan, barFrom, billet, designOf, stackOf } from '../forging/testing/designs.js';
import { type Warning, type WarningSeverity, warningsOf } from './index.js';
import { layersOf, steelOf } from './testing/cases.js';

const LOSS = { allowances: LOSSLESS } as const;
const WELD: StepPlan = { kind: 'weld' };
const SEALED: StepPlan = { kind: 'weld', method: 'sealed' };

const found = (design: Design, code: string): readonly Warning[] =>
  warningsOf(evaluate(design)).filter((warning) => warning.code === code);

/** Severity of the only warning of a code, or null when there is none. */
function severityOf(design: Design, code: string): WarningSeverity | null {
  const own = found(design, code);
  expect(own.length).withContext(code).toBeLessThan(2);
  return own[0]?.severity ?? null;
}

describe('warning welding-range', () => {
  // Plain steel: ceiling 1493 − 175.63 (C − 0.17) − 100, so with flux (from 1100 °C) the range is 293 − 175.63 (C − 0.17).
  const withCarbon = (carbon: number, weld: StepPlan = WELD): Design =>
    billet(layersOf(['own', '15n20']), [weld], { ...LOSS, steels: [steelOf('own', { C: carbon })] });
  const rows: [number, WarningSeverity | null][] = [
    [1.15, null], // 120.9 °C
    [1.16, 'note'], // 119.1 °C
    [1.38, 'note'], // 80.5 °C
    [1.39, 'caution'], // 78.7 °C
    [1.66, 'caution'], // 31.3 °C
    [1.67, 'stop'], // 29.6 °C
  ];
  for (const [carbon, severity] of rows) {
    it(`${severity ?? 'nothing'} at ${carbon} % C`, () => {
      expect(severityOf(withCarbon(carbon), 'welding-range')).toBe(severity);
    });
  }

  it('says by how much, to what end and what to aim at', () => {
    const [warning] = found(withCarbon(1.25), 'welding-range');
    // 293 − 175.63 · 1.08 = 103.3; aim 1203.3 − 20, to 5 °C.
    expect(warning?.stepId).toBe('billet-1');
    expect(warning?.values['widthK']).toBeCloseTo(103.32, 1);
    expect(warning?.values['aimC']).toBe(1185);
    expect(warning?.message).toContain('105 °C wide: 1100 °C to 1205 °C with flux');
    expect(warning?.remedy).toContain('1185 °C');
  });

  it('is wider sealed', () => {
    expect(severityOf(withCarbon(1.67, SEALED), 'welding-range')).toBeNull();
  });

  it('is missing for D2 under flux, and narrow sealed', () => {
    const d2 = (weld: StepPlan): Design => billet(layersOf(['1084', 'd2']), [weld], LOSS);
    const [stop] = found(d2(WELD), 'welding-range');
    expect(stop?.severity).toBe('stop');
    expect(stop?.message).toContain('No common welding range');
    expect(severityOf(d2(SEALED), 'welding-range')).toBe('caution');
  });

  it('is told once for each set of steels and method', () => {
    const own = steelOf('own', { C: 1.25 });
    const pieces = [{ bar: 'a' }, { bar: 'a' }];
    const design = designOf(
      [
        barFrom('a', stackOf(layersOf(['own', '15n20'])), [WELD, { kind: 'draw', lengthMm: 300 }, WELD]),
        barFrom('b', { kind: 'assembly', along: 'thickness', pieces }, [WELD]),
      ],
      { ...LOSS, steels: [own] },
    );
    expect(found(design, 'welding-range').map(({ stepId }) => stepId)).toEqual(['a-1']);
  });

  it('is seen as soon as steels are laid, before a weld is planned', () => {
    const [warning] = found(billet(layersOf(['1084', 'd2']), [], LOSS), 'welding-range');
    expect(warning?.stepId).toBeNull();
    expect(severityOf(billet(layersOf(['d2']), [], LOSS), 'welding-range')).toBeNull();
  });
});

describe('warning weld-heat', () => {
  // 1084 + 15N20: 1100 to 1262.8 °C with flux; 1084 begins to melt at 1362.8 °C.
  const at = (temperatureC: number): WarningSeverity | null =>
    severityOf(billet(layersOf(['1084', '15n20']), [{ kind: 'weld', temperatureC }], LOSS), 'weld-heat');

  it('fires above the ceiling and under the lower end, silent between', () => {
    expect(at(1099)).toBe('caution');
    expect(at(1100)).toBeNull();
    expect(at(1262)).toBeNull();
    expect(at(1263)).toBe('caution');
    expect(at(1362)).toBe('caution');
    expect(at(1363)).toBe('stop');
  });

  it('holds for the allowances’ heat too, told once', () => {
    const hot = { allowances: { ...LOSSLESS, weldTemperatureC: 1300 } };
    const welds = billet(
      layersOf(['1084', '15n20']),
      [WELD, { kind: 'weld', temperatureC: 1200 }, WELD],
      hot,
    );
    const told = found(welds, 'weld-heat');
    expect(told.map(({ stepId, severity }) => [stepId, severity])).toEqual([['billet-1', 'caution']]);
    expect(told[0]?.remedy).toContain('in the allowances');
  });
});

describe('warning forging-heat', () => {
  // Forging maxima of the catalogue: 1084 1190 °C, 15N20 1200 °C, copper 900 °C.
  const at = (temperatureC: number, steels = ['1084', '15n20']): WarningSeverity | null =>
    severityOf(billet(layersOf(steels), [{ kind: 'draw', heats: 1, temperatureC }], LOSS), 'forging-heat');

  it('fires above the forging maximum of the tenderest steel', () => {
    expect(at(1190)).toBeNull();
    expect(at(1191)).toBe('note');
    expect(at(1240)).toBe('note');
    expect(at(1241)).toBe('caution');
  });

  it('stops where the metal melts', () => {
    expect(at(1084, ['1084', 'copper'])).toBe('caution');
    expect(at(1085, ['1084', 'copper'])).toBe('stop');
  });

  it('leaves cold work and welding heats alone', () => {
    const plans: StepPlan[] = [
      { kind: 'weld', heats: 1, temperatureC: 1250 },
      { kind: 'draw', temperatureC: 1250 },
    ];
    expect(severityOf(billet(layersOf(['1084', '15n20']), plans, LOSS), 'forging-heat')).toBeNull();
  });
});

describe('warning chromium', () => {
  const withChromium = (chromium: number, weld: StepPlan = WELD): Design =>
    billet(layersOf(['own', '1084']), [weld], {
      ...LOSS,
      steels: [steelOf('own', { C: 0.8, Cr: chromium })],
    });
  const rows: [number, StepPlan, WarningSeverity | null][] = [
    [0.8, WELD, null],
    [0.81, WELD, 'note'],
    [1.5, WELD, 'note'],
    [1.51, WELD, 'caution'],
    [3, WELD, 'caution'],
    [3.01, WELD, 'stop'],
    [3.01, SEALED, 'caution'],
    [13, SEALED, 'caution'],
    [3.01, { kind: 'weld', method: 'dry' }, 'stop'],
  ];
  for (const [chromium, weld, severity] of rows) {
    it(`${severity ?? 'nothing'} at ${chromium} % ${JSON.stringify(weld)}`, () => {
      expect(severityOf(withChromium(chromium, weld), 'chromium')).toBe(severity);
    });
  }

  it('names the steel and its content', () => {
    const [warning] = found(withChromium(1.45), 'chromium');
    expect(warning?.message).toContain('own has 1.45 % chromium');
    expect(warning?.values['steel']).toBe('own');
  });
});

describe('warning metal-unweldable', () => {
  it('stops at brass, bronze, and a steel of the shop with zinc or lead', () => {
    for (const id of ['cartridge-brass', 'free-cutting-brass', 'phosphor-bronze', 'nickel-silver']) {
      expect(severityOf(billet(layersOf(['1084', id]), [WELD], LOSS), 'metal-unweldable'))
        .withContext(id)
        .toBe('stop');
    }
    const galvanised = steelOf('galvanised', { C: 0.1, Zn: 0.1 });
    const clean = steelOf('clean', { C: 0.1, Zn: 0.09 });
    const rest = { ...LOSS, steels: [galvanised, clean] };
    expect(severityOf(billet(layersOf(['1084', 'galvanised']), [WELD], rest), 'metal-unweldable')).toBe(
      'stop',
    );
    expect(severityOf(billet(layersOf(['1084', 'clean']), [WELD], rest), 'metal-unweldable')).toBeNull();
  });

  it('lets nickel and copper pass', () => {
    expect(
      severityOf(billet(layersOf(['nickel-200', 'copper']), [WELD], LOSS), 'metal-unweldable'),
    ).toBeNull();
  });
});

describe('warning analysis-unknown', () => {
  it('fires for scrap and for a steel without a carbon content, not for the catalogue’s grades', () => {
    const unknown = steelOf('found', { Mn: 0.7 });
    const rest = { ...LOSS, steels: [unknown] };
    expect(
      severityOf(billet(layersOf(['leaf-spring-reclaimed', '15n20']), [], rest), 'analysis-unknown'),
    ).toBe('caution');
    expect(severityOf(billet(layersOf(['found', '15n20']), [], rest), 'analysis-unknown')).toBe('caution');
    expect(
      severityOf(billet(layersOf(['1084', 'nickel-200', 'copper']), [], rest), 'analysis-unknown'),
    ).toBeNull();
  });

  it('is placed where the steel is first laid', () => {
    const pieces = [{ bar: 'a' }, { bar: 'b' }];
    const design = designOf([
      barFrom('a', stackOf(layersOf(['1084']))),
      barFrom('b', stackOf(layersOf(['wire-rope']))),
      barFrom('c', { kind: 'assembly', along: 'thickness', pieces }),
    ]);
    expect(found(design, 'analysis-unknown').map(({ bar, stepId }) => [bar, stepId])).toEqual([['b', null]]);
  });
});

describe('warning nickel-seam', () => {
  const seams = (design: Design): readonly (number | string | undefined)[] =>
    found(design, 'nickel-seam').map(({ values }) => values['seams']);
  const fold: StepPlan = { kind: 'fold' };

  it('fires at a fold whose top face is nickel, not where steel lies on top', () => {
    expect(seams(billet(layersOf(['1084', 'nickel-200']), [fold], LOSS))).toEqual([1]);
    expect(seams(billet(layersOf(['nickel-200', '1084']), [fold], LOSS))).toEqual([]);
    expect(seams(billet(layersOf(['1084', 'a203e']), [fold], LOSS))).toEqual([]);
  });

  it('is silent once the nickel is ground off the faces that meet', () => {
    const grind: StepPlan = { kind: 'fold', grindPerFaceMm: 6 };
    expect(seams(billet(layersOf(['1084', 'nickel-200']), [grind], LOSS))).toEqual([]);
  });

  it('counts the seams of a restack, turned over or not', () => {
    const restack = (pieces: number, turnAlternate: boolean): StepPlan => ({
      kind: 'restack',
      pieces,
      turnAlternate,
    });
    const sandwich = layersOf(['nickel-200', '1084', 'nickel-201']);
    expect(seams(billet(sandwich, [restack(4, false)], LOSS))).toEqual([3]);
    const pair = layersOf(['1084', 'nickel-200']);
    expect(seams(billet(pair, [restack(3, false)], LOSS))).toEqual([]);
    // Up, over, up: nickel meets nickel at the first seam, steel meets steel at the second.
    expect(seams(billet(pair, [restack(3, true)], LOSS))).toEqual([1]);
  });

  it('sees the faces of pieces and of neighbours in a stack', () => {
    const pieces = [{ bar: 'a' }, { bar: 'a', quarterTurns: 2 as const }, { bar: 'a' }];
    const bars = [
      barFrom('a', stackOf(layersOf(['1084', 'nickel-200']))),
      barFrom('b', { kind: 'assembly', along: 'thickness', pieces }),
    ];
    const [warning] = found(designOf(bars, LOSS), 'nickel-seam');
    expect(warning?.bar).toBe('b');
    expect(warning?.values).toEqual({ seams: 1, at: 'assembly' });
    expect(seams(billet(layersOf(['nickel-200', 'nickel-201', '1084']), [], LOSS))).toEqual([1]);
  });

  it('is silent where the layers stand on edge: only their edges meet', () => {
    const plans: StepPlan[] = [{ kind: 'turn', onto: 'edge' }, fold];
    expect(seams(billet(layersOf(['1084', 'nickel-200', '1084', 'nickel-200']), plans, LOSS))).toEqual([]);
  });
});

describe('warning like-layers', () => {
  it('fires where one steel lies on itself, and counts the places', () => {
    const [warning] = found(
      billet(layersOf(['1084', '15n20', '15n20', '1084', '1084']), [], LOSS),
      'like-layers',
    );
    expect(warning?.severity).toBe('note');
    expect(warning?.values).toEqual({ seams: 2, firstLayer: 2, steel: '15n20', steelName: '15N20 strip' });
    expect(warning?.message).toContain('Layers 2 and 3 from the bottom are both 15N20 strip');
    expect(found(billet(layersOf(['1084', '15n20', '1084']), [], LOSS), 'like-layers')).toEqual([]);
  });
});
