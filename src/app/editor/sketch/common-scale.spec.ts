import { setStackSize } from '@shared/design';
import { evaluate } from '@shared/forging';
import { STRAIGHT, starter } from '../testing/designs';
import { commonScale } from './common-scale';

describe('commonScale', () => {
  const box = { widthPx: 174, heightPx: 60 };

  it('lets every state of every bar fit', () => {
    for (const id of ['straight', 'feather', 'five-bars', 'four-way']) {
      const forging = evaluate(starter(id));
      const scale = commonScale(forging, box);
      for (const { states } of forging.bars) {
        for (const { bar } of states) {
          expect(bar.lengthMm * scale).toBeLessThanOrEqual(box.widthPx + 1e-9);
          expect(bar.thicknessMm * scale).toBeLessThanOrEqual(box.heightPx + 1e-9);
        }
      }
    }
  });

  it('stays while sizes change a little', () => {
    const before = commonScale(evaluate(STRAIGHT), box);
    const after = commonScale(evaluate(setStackSize(STRAIGHT, 'billet', { lengthMm: 96 })), box);
    expect(after).toBe(before);
  });
});
