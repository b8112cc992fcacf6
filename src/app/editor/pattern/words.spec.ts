import { formatFor } from '@shared/units';
import type { Probe } from '../../core/compute/probe';
import { pictureText, viewText } from './picture-text';
import { probeSentence, probeWords } from './probe-text';
import { pictureFileName } from './saved-picture';
import { standpointText } from './solid/solid-text';
import { FIRST_CHOICE, type ViewId, shownView } from './views';

const MM = formatFor('mm');
const BAR = { lengthMm: 281, widthMm: 45, thicknessMm: 6 };

const PROBE: Probe = {
  xMm: 121.34,
  yMm: 12,
  zMm: 5.3,
  steel: '15n20',
  bar: 'billet',
  place: 4,
  layersInStack: 13,
  bandMm: 0.42,
  showsMm: 1.6,
};
const NAMES = {
  steels: new Map([['15n20', '15N20 strip']]),
  bars: new Map([['billet', 'Core']]),
};

describe('probeWords', () => {
  it('name steel, layer, band and place', () => {
    expect(probeWords(PROBE, NAMES, MM)).toEqual({
      steel: '15N20 strip',
      layer: 'Layer 5 of 13',
      band: 'band 0.42 mm, shows 1.6 mm wide',
      place: '121.3 mm along, 12 mm across, 5.3 mm up',
    });
  });

  it('name the bar where there are several', () => {
    const bars = new Map([...NAMES.bars, ['edge', 'Edge bar']]);
    expect(probeWords(PROBE, { ...NAMES, bars }, MM).layer).toBe('Layer 5 of 13 of Core');
  });

  it('say a width once where the band is cut square, and what can’t be told not at all', () => {
    const band = (change: Partial<Probe>): string => probeWords({ ...PROBE, ...change }, NAMES, MM).band;
    expect(band({ showsMm: 0.4201 })).toBe('band 0.42 mm');
    expect(band({ showsMm: null })).toBe('band 0.42 mm, level with the surface');
    expect(band({ bandMm: null })).toBe('shows 1.6 mm wide');
    expect(band({ bandMm: null, showsMm: null })).toBe('');
  });

  it('make a sentence to be read out', () => {
    expect(probeSentence(probeWords(PROBE, NAMES, MM))).toBe(
      '15N20 strip, layer 5 of 13, band 0.42 mm, shows 1.6 mm wide. 121.3 mm along, 12 mm across, 5.3 mm up.',
    );
  });
});

describe('pictureText', () => {
  const text = (view: ViewId, change: object = {}): string =>
    viewText(shownView({ ...FIRST_CHOICE, view, ...change }, BAR, undefined, MM), MM);

  it('says what is seen, where and how large', () => {
    expect(text('top', { depthMm: 2 })).toBe('Top face ground 2 mm deep, 281 × 45 mm');
    expect(text('near', { depthMm: 0 })).toBe('Near end, not ground, 45 × 6 mm');
    expect(text('cross')).toBe('Cross-section, 140.5 mm from the near end, 45 × 6 mm');
    expect(text('lengthwise')).toBe('Cut lengthwise, 22.5 mm from the left side, 281 × 6 mm');
  });

  it('says of which bar, when, and of what', () => {
    const facts = {
      view: shownView({ ...FIRST_CHOICE, view: 'top', depthMm: 2 }, BAR, undefined, MM),
      moment: 'after Draw out',
      bar: 'Billet',
      layers: 45,
      steels: [
        { name: '15N20', tone: 'bright' },
        { name: '1084', tone: 'dark' },
      ],
    };
    expect(pictureText(facts, MM)).toBe(
      'Top face ground 2 mm deep, 281 × 45 mm: Billet after Draw out, 45 layers of 15N20 (bright) and 1084 (dark).',
    );
  });
});

describe('standpointText', () => {
  it('names the sides that are seen', () => {
    expect(standpointText({ aroundDeg: 0, aboveDeg: 0 })).toBe('from the left side');
    expect(standpointText({ aroundDeg: 45, aboveDeg: 31 })).toBe(
      'from the left side and the far end, 30° above',
    );
    expect(standpointText({ aroundDeg: 90, aboveDeg: -20 })).toBe('from the far end, 20° below');
    expect(standpointText({ aroundDeg: 180, aboveDeg: 0 })).toBe('from the right side');
    expect(standpointText({ aroundDeg: -90, aboveDeg: 10 })).toBe('from the near end, 10° above');
    expect(standpointText({ aroundDeg: 700, aboveDeg: 0 })).toBe('from the left side');
    expect(standpointText({ aroundDeg: 12, aboveDeg: 89.5 })).toBe('from straight above');
  });
});

describe('pictureFileName', () => {
  it('is plain', () => {
    expect(pictureFileName('Ładder, Søren’s Ééa 2', 'Top face')).toBe('adder-s-ren-s-eea-2-top-face.png');
    expect(pictureFileName('刀', '')).toBe('surface.png');
  });
});
