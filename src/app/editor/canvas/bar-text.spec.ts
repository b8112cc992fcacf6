import { type BarState, sectionOf } from '@shared/bar';
import { formatFor } from '@shared/units';
import { barText, lieText, overhangTexts } from './bar-text';

const format = formatFor('mm');
const bar: BarState = {
  lengthMm: 300,
  widthMm: 40,
  thicknessMm: 7,
  densityKgM3: 7850,
  layers: 3,
  lie: 'thickness',
  section: sectionOf(Uint16Array.from([0, 1, 0]), Float64Array.from([3, 1, 3])),
  openSeams: 0,
};

describe('what a drawing of a bar says', () => {
  it('gives its size and how its layers lie', () => {
    expect(barText(bar, [], 'thickness', format)).toBe(
      'Bar, 300 mm long, 40 mm wide, 7 mm thick: side view and end section, to scale. 3 layers, lying flat, one on the other.',
    );
  });

  it('counts bands where they are fewer than the layers', () => {
    const folded = sectionOf(Uint16Array.from([0, 1, 1, 0]), Float64Array.from([1, 1, 1, 1]));
    expect(lieText({ ...bar, layers: 4, section: folded, lie: 'width' }, format)).toBe(
      '4 layers, 3 bands, standing on edge, side by side',
    );
  });

  it('says why layers are not drawn', () => {
    expect(lieText({ ...bar, lie: 'mixed', section: null }, format)).toContain('twisted or joined at odds');
    expect(lieText({ ...bar, section: null }, format)).toContain('in several pictures beside each other');
  });

  it('says what sticks out, pieces that agree together', () => {
    const overhangs = [
      { lengthMm: 0, acrossMm: 3 },
      { lengthMm: 0.001, acrossMm: 0.001 },
      { lengthMm: 4, acrossMm: 3 },
      { lengthMm: 0, acrossMm: 3 },
    ];
    expect(overhangTexts(overhangs, 'thickness', format)).toEqual([
      'Pieces 1 and 4 stick out 1.5 mm on each side',
      'Piece 3 sticks out 1.5 mm on each side and 4 mm at the far end',
    ]);
    expect(overhangTexts(overhangs, 'width', format)[0]).toContain('above and below');
    expect(barText(bar, overhangs, 'thickness', format)).toContain(
      '4 pieces one on the other. Pieces 1 and 4',
    );
  });
});
