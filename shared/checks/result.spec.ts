import type { Blank, Design } from '../design/index.js';
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

describe('warning bands-thin', () => {
  /** Ten bands, all alike, pressed to a thickness. */
  const pressed = (thicknessMm: number): Design =>
    billet(alternating(10, ['1084', '15n20'], [1, 1]), [WELD, { kind: 'draw', thicknessMm }], LOSS);

  it('notes bands under 0.05 mm, warns under 0.02 mm', () => {
    expect(severityOf(pressed(0.51), 'bands-thin')).toBeNull();
    expect(severityOf(pressed(0.49), 'bands-thin')).toBe('note');
    expect(severityOf(pressed(0.21), 'bands-thin')).toBe('note');
    expect(severityOf(pressed(0.19), 'bands-thin')).toBe('caution');
  });

  it('says how thin, at the last step of the result', () => {
    const [warning] = found(pressed(0.4), 'bands-thin');
    expect(warning?.stepId).toBe('billet-2');
    expect(warning?.values['bandMm']).toBeCloseTo(0.04, 9);
    expect(warning?.message).toContain('0.04 mm');
  });

  it('sees one thin sheet between thick ones, but not the rest of an outer layer', () => {
    const layers = alternating(5, ['1084', '15n20'], [5, 5]).map((layer, i) => ({
      ...layer,
      thicknessMm: i === 2 ? 0.04 : layer.thicknessMm,
    }));
    expect(severityOf(billet(layers, [], LOSS), 'bands-thin')).toBe('note');
    const grind: StepPlan = { kind: 'grind', perFaceMm: 4.99, faces: 'flats' };
    const skin = billet(alternating(5, ['1084', '15n20'], [5, 5]), [grind], LOSS);
    expect(evaluate(skin).result?.bar.section?.minBandMm).toBeCloseTo(0.01, 9);
    expect(severityOf(skin, 'bands-thin')).toBeNull();
  });

  it('carries the bands of a twisted bar along with its section', () => {
    // 20 bands of 1 mm in 20 mm square, twisted; drawn to 0.96 mm square: 0.048 mm.
    const layers = alternating(20, ['1084', '15n20'], [1, 1]);
    const square = (sideMm: number): Design =>
      designOf(
        [
          barFrom('b', stackOf(layers, 100, 20), [
            WELD,
            { kind: 'twist', turns: 1, hand: 'right', reversals: 0 },
            { kind: 'draw', widthMm: sideMm, thicknessMm: sideMm },
          ]),
        ],
        LOSS,
      );
    expect(severityOf(square(1.01), 'bands-thin')).toBeNull();
    const [warning] = found(square(0.96), 'bands-thin');
    expect(warning?.severity).toBe('note');
    expect(warning?.values['bandMm']).toBeCloseTo(0.048, 9);
    expect(warning?.values['isEstimate']).toBe('yes');
  });
});

describe('warning contrast-low', () => {
  const pair = (...steels: string[]): WarningSeverity | null =>
    severityOf(billet(layersOf(steels), [], LOSS), 'contrast-low');

  it('is silent for the pairs smiths use, and fires for steels that etch alike', () => {
    expect(pair('1084', '15n20')).toBeNull();
    expect(pair('1095', 'nickel-200')).toBeNull();
    expect(pair('1084', '5160')).toBe('caution');
    expect(pair('15n20', 'a203e')).toBe('caution');
    expect(pair('1084', '52100')).toBe('note');
  });

  it('keeps its thresholds: a tenth and a half under 0.15, a third under 0.3', () => {
    for (const steels of [
      ['1084', '5160'],
      ['15n20', 'a203e'],
      ['1084', '52100'],
    ]) {
      const [warning] = found(billet(layersOf(steels), [], LOSS), 'contrast-low');
      const contrast = Number(warning?.values['contrast']);
      expect(warning?.severity).toBe(contrast < 0.15 ? 'caution' : 'note');
      expect(contrast).toBeLessThan(0.3);
    }
  });

  it('notes a stack of one steel, and lets a plain bar be', () => {
    expect(pair('1084', '1084')).toBe('note');
    expect(pair('1084')).toBeNull();
  });

  it('looks at the result alone, with what its pieces bring', () => {
    const pieces = [{ bar: 'a' }, { bar: 'b' }];
    const bars = [
      barFrom('a', stackOf(layersOf(['1084', '5160']))),
      barFrom('b', stackOf(layersOf(['15n20']))),
      barFrom('c', { kind: 'assembly', along: 'thickness', pieces }),
    ];
    expect(found(designOf(bars, LOSS), 'contrast-low')).toEqual([]);
    expect(found(designOf(bars, { ...LOSS, result: 'a' }), 'contrast-low').map(({ bar }) => bar)).toEqual([
      'a',
    ]);
  });
});

describe('warning blank-too-large', () => {
  const fit = (blank: Blank): readonly Warning[] =>
    found(
      designOf([barFrom('b', stackOf(layersOf(['1084', '15n20'], 5), 200, 40))], { ...LOSS, blank }),
      'blank-too-large',
    );

  it('is silent for a blank of exactly the bar’s size', () => {
    expect(fit({ lengthMm: 200, widthMm: 40, thicknessMm: 10 })).toEqual([]);
  });

  it('is a caution when a side is too large but the metal would do', () => {
    const [warning] = fit({ lengthMm: 240, widthMm: 30, thicknessMm: 8 });
    expect(warning?.severity).toBe('caution');
    expect(warning?.message).toContain('40 mm too long');
  });

  it('stops when there isn’t enough metal, and says how much is missing', () => {
    // 200.1 · 40 · 10 mm³ against 200 · 40 · 10; 7850 kg/m³.
    const [warning] = fit({ lengthMm: 200.1, widthMm: 40, thicknessMm: 10 });
    expect(warning?.severity).toBe('stop');
    expect(Number(warning?.values['blankMassKg']) - Number(warning?.values['massKg'])).toBeCloseTo(
      40 * 7850e-9,
      12,
    );
  });
});
