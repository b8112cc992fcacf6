import { STARTERS } from '../design/index.js';
import { evaluate } from '../forging/index.js';
import { formatFor } from '../units/index.js';
import { cautionsFor, cutLineText, cutList, forgeCard, stackRecipe } from './index.js';

const mm = formatFor('mm');
const design = (id: string) => {
  const found = STARTERS.find((starter) => starter.id === id);
  if (!found) throw new Error(`no starter ${id}`);
  return found.design;
};
const cardOf = (id: string, format = mm) =>
  forgeCard(evaluate(design(id)), { format, warnings: [], refusalWords: () => 'refused' });

describe('stackRecipe', () => {
  const layer = (steel: string) => ({ steel, thicknessMm: 1 });

  it('finds the group that repeats and what is left over', () => {
    const stack = ['a', 'b', 'a', 'b', 'a', 'b', 'a'].map(layer);
    expect(
      stackRecipe(stack).map((line) => [line.times, line.layers.map((one) => one.steel).join('')]),
    ).toEqual([
      [3, 'ab'],
      [1, 'a'],
    ]);
  });

  it('gives back every layer in its order, whatever the stack', () => {
    const stack = [...'aabcabcabcaddddb'].map(layer);
    const laid = stackRecipe(stack).flatMap((line) =>
      Array.from({ length: line.times }, () => line.layers).flat(),
    );
    expect(laid).toEqual(stack);
  });
});

describe('forgeCard', () => {
  it('numbers the steps and gives sizes to reach in the reader’s units', () => {
    const card = cardOf('straight');
    const [bar] = card.bars;
    expect(bar?.start).toEqual(['6 × (1084 3.2 mm + 15N20 strip 1.8 mm)', '1084 3.2 mm']);
    expect(bar?.steps.map((step) => step.number)).toEqual([1, 2, 3, 4, 5, 6]);
    const drawn = bar?.steps[1];
    expect(drawn?.targets.map((target) => target.label)).toEqual(['Length', 'Width', 'Thickness']);
    expect(drawn?.targets[2]?.value).toBe(mm.length(14));
    expect(drawn?.heat).toContain('4 heats');
    expect(cardOf('straight', formatFor('inch')).bars[0]?.steps[1]?.targets[1]?.value).toContain('in');
  });

  it('tells how the pieces of an assembly lie', () => {
    const billet = cardOf('san-mai').bars.find((bar) => bar.isResult);
    expect(billet?.start.length).toBe(3);
    expect(billet?.start[0]).toMatch(/^1 from the bottom: Jacket, /);
    expect(billet?.start[2]).toMatch(/turned over$/);
  });

  it('leaves out steps switched off', () => {
    const straight = design('straight');
    const [bar] = straight.bars;
    if (!bar) throw new Error('no bar');
    const steps = bar.steps.map((step, i) => (i === 5 ? { ...step, isOff: true } : step));
    const card = forgeCard(evaluate({ ...straight, bars: [{ ...bar, steps }] }), {
      format: mm,
      warnings: [],
      refusalWords: () => '',
    });
    expect(card.bars[0]?.steps.length).toBe(5);
  });

  it('shows the cautions that the plan calls for', () => {
    const codes = cautionsFor(evaluate(design('straight'))).map((caution) => caution.code);
    expect(codes).toEqual(['forge', 'flux', 'press', 'grinding', 'nickel-chromium-dust']);
  });
});

describe('cutList', () => {
  it('puts equal pieces together and counts a saw cut for each', () => {
    const list = cutList(evaluate(design('straight')));
    expect(list.lines.map((line) => [line.steel, line.pieces])).toEqual([
      ['1084', 7],
      ['15n20', 6],
    ]);
    expect(list.lines[0]?.barLengthMm).toBeCloseTo(7 * (95 + 1.5), 9);
    // 7 × 95 × 40 × 3.2 mm³ of 7850 kg/m³.
    expect(list.lines[0]?.massKg).toBeCloseTo(85_120 * 7850e-9, 12);
    expect(list.totalMassKg).toBeCloseTo(evaluate(design('straight')).totals?.startMassKg ?? 0, 12);
    expect(cutLineText(list.lines[0] as never, mm)).toContain('7 pieces of 1084');
  });
});
