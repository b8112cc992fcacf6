import { formatFor } from '@shared/units';
import type { PicturePart } from '../../core/compute/messages';
import { linesOf, pngOf, savedCanvas, savedLayout } from './saved-picture';

describe('linesOf', () => {
  const measure = (text: string): number => text.length;

  it('breaks between words, and leaves a word that is too long whole', () => {
    expect(linesOf('top face ground deep', 10, measure)).toEqual(['top face', 'ground', 'deep']);
    expect(linesOf('a extraordinarily b', 8, measure)).toEqual(['a', 'extraordinarily', 'b']);
    expect(linesOf('   ', 8, measure)).toEqual([]);
  });
});

describe('savedLayout', () => {
  it('keeps the surface’s proportions', () => {
    expect(savedLayout(280, 42, 2400).pictureHeightPx).toBe(360);
    expect(savedLayout(280, 0.01, 200).pictureHeightPx).toBe(1);
  });
});

describe('savedCanvas', () => {
  const part: PicturePart = {
    stage: 'done',
    widthPx: 300,
    heightPx: 450,
    pixels: new Uint8ClampedArray(4 * 300 * 450).map((_, i) =>
      i % 4 === 3 ? (i < 4 * 300 * 225 ? 255 : 0) : 70,
    ),
    counters: { samples: 0, stepEvaluations: 0, reused: 0 },
  };

  it('sets the picture over a scale bar as long as it says, and its caption on white', async () => {
    const layout = savedLayout(100, 150, 300);
    const canvas = await savedCanvas(part, layout, 100, 'Ladder: top face', formatFor('mm'));
    expect(canvas.width).toBe(300);
    const at = (x: number, y: number): readonly number[] => [
      ...(canvas.getContext('2d')?.getImageData(x, y, 1, 1).data ?? []),
    ];
    expect(at(10, 10)).toEqual([70, 70, 70, 255]);
    expect(at(10, 440)).toEqual([255, 255, 255, 255]);
    // A quarter of the width is 25 mm: the bar says 20, which are 60 px.
    const rule = 450 + layout.marginPx + Math.round(layout.fontPx * 0.5) - 1;
    const dark = Array.from({ length: 300 }, (_, x) => x).filter((x) => (at(x, rule)[0] ?? 255) < 128);
    expect(dark.length).toBe(60);
    expect(dark[0]).toBe(layout.marginPx);
    const blob = await pngOf(canvas);
    expect(blob.type).toBe('image/png');
    expect([...new Uint8Array(await blob.slice(1, 4).arrayBuffer())]).toEqual([0x50, 0x4e, 0x47]);
  });
});
