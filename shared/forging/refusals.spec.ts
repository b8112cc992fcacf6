import {
  type StepPlan,
  LOSSLESS,
  alternating,
  barFrom,
  billet,
  designOf,
  stackOf,
} from './testing/designs.js';
import { evaluate } from './index.js';

describe('evaluate: refusals', () => {
  const refusalOf = (plan: StepPlan) => evaluate(billet(alternating(13), [plan])).bars[0]?.refusal;

  it('names the step, the field and both numbers', () => {
    expect(refusalOf({ kind: 'trim', perEndMm: 80 })).toEqual(
      jasmine.objectContaining({
        bar: 'billet',
        code: 'nothing-left',
        field: 'perEndMm',
        asked: 160,
        available: 150,
      }),
    );
    expect(refusalOf({ kind: 'grind', perFaceMm: 20, faces: 'flats' })?.available).toBeCloseTo(33, 9);
    expect(refusalOf({ kind: 'slice', sliceMm: 20, count: 10, turnAlternate: false })).toEqual(
      jasmine.objectContaining({ code: 'too-short', field: 'count', asked: 215, available: 150 }),
    );
    expect(refusalOf({ kind: 'draw', lengthMm: 300, widthMm: 40, thicknessMm: 10 })).toEqual(
      jasmine.objectContaining({ code: 'size-impossible', field: 'thicknessMm', asked: 10, available: 16.5 }),
    );
    expect(refusalOf({ kind: 'weld', heats: 50, temperatureC: 1200 })).toBeNull();
  });

  it('keeps everything before the refused step and has no result', () => {
    const forging = evaluate(
      billet(alternating(13), [
        { kind: 'weld' },
        { kind: 'trim', perEndMm: 80 },
        { kind: 'draw', thicknessMm: 5 },
      ]),
    );
    expect(forging.bars[0]?.states.length).toBe(2);
    expect(forging.bars[0]?.refusal?.step?.id).toBe('billet-2');
    expect(forging.result).toBeNull();
    expect(forging.totals).toBeNull();
  });

  it('a bar made of a refused bar is refused too', () => {
    const broken = barFrom('broken', stackOf(alternating(3)), [{ kind: 'trim', perEndMm: 100 }]);
    const pair = barFrom('pair', {
      kind: 'assembly',
      along: 'width',
      pieces: [{ bar: 'broken' }, { bar: 'broken' }],
    });
    const forging = evaluate(designOf([broken, pair]));
    expect(forging.bars[1]?.refusal).toEqual(jasmine.objectContaining({ code: 'piece-refused', step: null }));
  });

  it('refuses more than two million layers', () => {
    const plans: StepPlan[] = Array.from({ length: 5 }, (): StepPlan[] => [
      { kind: 'restack', pieces: 12, turnAlternate: false },
      { kind: 'draw', lengthMm: 1_000, widthMm: 40 },
    ]).flat();
    const refusal = evaluate(billet(alternating(13), plans, { allowances: LOSSLESS })).bars[0]?.refusal;
    expect(refusal).toEqual(
      jasmine.objectContaining({ code: 'too-many-layers', asked: 13 * 12 ** 5, available: 2_000_000 }),
    );
  });
});
