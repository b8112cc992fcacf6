import type { Blank } from '@shared/design';
import { USUAL_LOOK } from '@shared/pattern';
import { formatFor } from '@shared/units';
import { FIRST_SIGHT, remembered } from './sight';
import { FIRST_CHOICE, type Place, movedTo, shownView, viewGroups } from './views';

const MM = formatFor('mm');
const BAR = { lengthMm: 300, widthMm: 40, thicknessMm: 6 };
const BLANK: Blank = { lengthMm: 250, widthMm: 38, thicknessMm: 5 };

describe('shownView', () => {
  it('begins with the blade where there is one, else with the top face, a little ground', () => {
    expect(shownView(FIRST_CHOICE, BAR, BLANK, MM).surface).toEqual({ kind: 'blade', side: 'left' });
    const bar = shownView(FIRST_CHOICE, BAR, undefined, MM);
    expect(bar.surface).toEqual({ kind: 'face', face: 'top', depthMm: 0.15 * 6 });
    expect([bar.widthMm, bar.heightMm]).toEqual([300, 40]);
    expect(shownView(FIRST_CHOICE, { ...BAR, thicknessMm: 60 }, undefined, MM).place?.mm).toBe(1);
  });

  it('grinds no deeper than the bar is thick', () => {
    const { place } = shownView({ ...FIRST_CHOICE, view: 'top', depthMm: 9 }, BAR, undefined, MM);
    expect(place?.mm).toBe(6);
    expect(place?.maxMm).toBe(6);
    const side = shownView({ ...FIRST_CHOICE, view: 'left', depthMm: 9 }, BAR, undefined, MM).place;
    expect([side?.mm, side?.maxMm]).toEqual([9, 40]);
  });

  it('keeps a cut at the same part of the bar after a draw', () => {
    const choice = { ...FIRST_CHOICE, view: 'cross' as const };
    const { place } = shownView(choice, BAR, undefined, MM);
    const moved = movedTo(choice, place as Place, 75);
    expect(shownView(moved, BAR, undefined, MM).surface).toEqual({
      kind: 'section',
      across: 'length',
      atMm: 75,
    });
    const longer = shownView(moved, { ...BAR, lengthMm: 600 }, undefined, MM);
    expect(longer.surface).toEqual({ kind: 'section', across: 'length', atMm: 150 });
  });

  it('offers the blade only where it is ground', () => {
    expect(viewGroups(false).map(({ label }) => label)).toEqual(['Faces', 'Cuts']);
    expect(viewGroups(true).flatMap(({ views }) => views).length).toBe(10);
  });
});

describe('remembered', () => {
  it('takes what makes sense and leaves the rest as at first sight', () => {
    expect(remembered(null)).toEqual(FIRST_SIGHT);
    expect(remembered({ mode: 'hologram', choice: 7, look: { etch: 'much' } })).toEqual(FIRST_SIGHT);
    const kept = {
      mode: 'solid' as const,
      choice: { view: 'cross' as const, depthMm: 2.5, cutShare: 0.25 },
      look: { ...USUAL_LOOK, etch: 0.5 },
      isGrey: true,
    };
    expect(remembered(JSON.parse(JSON.stringify(kept)))).toEqual(kept);
    expect(remembered({ ...kept, choice: { ...kept.choice, depthMm: -1, cutShare: 3 } }).choice).toEqual({
      view: 'cross',
      depthMm: null,
      cutShare: 0.5,
    });
  });
});
