import type { Layer, Stack } from '@shared/design';
import { formatFor } from '@shared/units';
import { selectionText, stackText } from './stack-text';

const steels = new Map([
  ['1084', { name: '1084' }],
  ['15n20', { name: '15N20' }],
]);
const dark: Layer = { steel: '1084', thicknessMm: 3 };
const bright: Layer = { steel: '15n20', thicknessMm: 2 };
const metric = formatFor('mm');

function stackOf(layers: readonly Layer[]): Stack {
  return { kind: 'stack', lengthMm: 95, widthMm: 40, layers };
}

describe('what a drawing of a stack says', () => {
  it('counts, measures and names the layers from the bottom', () => {
    const layers = [dark, bright, dark, bright, dark];
    expect(stackText(stackOf(layers), steels, metric)).toBe(
      'Stack of 5 layers, 13 mm high, 40 mm wide, 95 mm long. From the bottom: 2 times 1084 3 mm and 15N20 2 mm; 1084 3 mm.',
    );
  });

  it('says the same in inches', () => {
    const layers = [{ steel: '1084', thicknessMm: 25.4 / 8 }];
    const stack: Stack = { kind: 'stack', lengthMm: 152.4, widthMm: 25.4, layers };
    expect(stackText(stack, steels, formatFor('inch'))).toBe(
      'Stack of 1 layer, 1/8 in high, 1 in wide, 6 in long. From the bottom: 1084 1/8 in.',
    );
  });

  it('calls an unknown steel by its id', () => {
    expect(stackText(stackOf([{ steel: 'own-7', thicknessMm: 1 }]), steels, metric)).toContain('own-7 1 mm');
  });

  it('ends after forty items with the number of the rest', () => {
    // No two neighbours alike, no group repeated: thicknesses grow.
    const layers = Array.from({ length: 100 }, (_, i) => ({ steel: '1084', thicknessMm: 1 + i / 10 }));
    const text = stackText(stackOf(layers), steels, metric);
    expect(text.split(';').length).toBe(41);
    expect(text).toMatch(/; and 60 more\.$/);
  });

  it('says what is chosen', () => {
    const stack = stackOf([dark, bright, dark, bright]);
    expect(selectionText(stack, new Set([1]), steels, metric)).toBe('Layer 2 of 4, 15N20, 2 mm');
    expect(selectionText(stack, new Set([0, 1, 3]), steels, metric)).toBe('3 layers, 7 mm together');
    expect(selectionText(stack, new Set(), steels, metric)).toBe('Nothing selected');
    expect(selectionText(stack, new Set([9]), steels, metric)).toBe('Nothing selected');
  });
});
