import { blankSchema } from './blank.js';

const SIZE = { lengthMm: 240, widthMm: 40, thicknessMm: 5 };

describe('the blank', () => {
  it('needs its size alone', () => {
    expect(blankSchema.safeParse(SIZE).success).toBeTrue();
    expect(blankSchema.safeParse({ lengthMm: 240, widthMm: 40 }).success).toBeFalse();
    expect(blankSchema.safeParse({ ...SIZE, colour: 'blue' }).success).toBeFalse();
  });

  it('takes an outline by name or by points from the heel to the tip', () => {
    const heel = { alongShare: 0, spineShare: 0, edgeShare: 1 };
    const tip = { alongShare: 1, spineShare: 0.4, edgeShare: 0.4 };
    const allows = (outline: unknown): boolean => blankSchema.safeParse({ ...SIZE, outline }).success;
    expect(allows('spear')).toBeTrue();
    expect(allows('dagger of legend')).toBeFalse();
    expect(allows({ points: [heel, { alongShare: 0.5, spineShare: 0.1, edgeShare: 0.9 }, tip] })).toBeTrue();
    expect(allows({ points: [heel] }))
      .withContext('one point')
      .toBeFalse();
    expect(allows({ points: [tip, heel] }))
      .withContext('backwards')
      .toBeFalse();
    expect(allows({ points: [heel, { ...tip, alongShare: 0.8 }] }))
      .withContext('short of the tip')
      .toBeFalse();
    expect(allows({ points: [{ ...heel, spineShare: 0.7, edgeShare: 0.3 }, tip] }))
      .withContext('edge above spine')
      .toBeFalse();
  });
});
