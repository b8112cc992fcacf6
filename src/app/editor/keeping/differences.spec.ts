import {
  editStep,
  insertLayers,
  moveStep,
  removeStep,
  renameDesign,
  setBlank,
  setThickness,
} from '@shared/design';
import { formatFor } from '@shared/units';
import { STRAIGHT, starter } from '../testing/designs';
import { differencesOf } from './differences';

describe('differencesOf', () => {
  const mm = formatFor('mm');
  const steps = STRAIGHT.bars[0]?.steps ?? [];
  const found = (theirs: typeof STRAIGHT) => differencesOf(STRAIGHT, theirs, mm);
  const at = (theirs: typeof STRAIGHT, where: string) =>
    found(theirs).find((difference) => difference.where === where);

  it('finds nothing between a design and its like', () => {
    expect(found(structuredClone(STRAIGHT))).toEqual([]);
  });

  it('names what a step asks for in each, and what comes of it', () => {
    const theirs = editStep(STRAIGHT, 'billet', steps[1]?.id ?? '', { thicknessMm: 12 });
    const step = at(theirs, '“Billet”, step 2');
    expect(step?.mine).toContain('14 mm thick');
    expect(step?.theirs).toContain('12 mm thick');
    expect(at(theirs, 'Outcome')).toBeDefined();
  });

  it('says what one of them does not have', () => {
    const theirs = removeStep(STRAIGHT, 'billet', steps[5]?.id ?? '');
    expect(at(theirs, '“Billet”, step 6')?.theirs).toBe('—');
  });

  it('sees steps in another order', () => {
    const theirs = moveStep(STRAIGHT, 'billet', steps[1]?.id ?? '', 2);
    const order = at(theirs, 'Order of the steps of “Billet”');
    expect(order?.mine).toContain('2 Draw out, 3 Restack');
    expect(order?.theirs).toContain('3 Restack, 2 Draw out');
  });

  it('counts layers and tells their thickness', () => {
    const more = insertLayers(STRAIGHT, 'billet', 13, [{ steel: '15n20', thicknessMm: 1 }]);
    const start = at(more, 'Stack of “Billet”');
    expect(start?.mine).toContain('13 layers');
    expect(start?.theirs).toContain('14 layers');
    const thicker = setThickness(STRAIGHT, 'billet', new Set([0]), 4);
    expect(at(thicker, 'Layers of “Billet”')?.theirs).toContain('4 mm');
  });

  it('compares name, blank and bars', () => {
    expect(at(renameDesign(STRAIGHT, 'X'), 'Name')?.theirs).toBe('X');
    expect(at(setBlank(STRAIGHT, undefined), 'Blank')?.theirs).toBe('none');
    expect(at(starter('san-mai'), 'Bar “Jacket”')?.mine).toBe('—');
  });

  it('speaks the reader’s units', () => {
    const theirs = editStep(STRAIGHT, 'billet', steps[1]?.id ?? '', { thicknessMm: 12.7 });
    const [difference] = differencesOf(STRAIGHT, theirs, formatFor('inch')).filter(({ where }) =>
      where.includes('step 2'),
    );
    expect(difference?.theirs).toContain('1/2 in');
  });
});
