import type { Bar, Design } from '../design/index.js';
import { type StepRefusal, evaluate } from '../forging/index.js';
import {
  LOSSLESS,
  type StepPlan,
  alternating,
  barFrom,
  billet,
  designOf,
  stackOf,
} from '../forging/testing/designs.js';
import { formatFor } from '../units/index.js';
import { refusalReason, refusalWords } from './index.js';
import { layersOf } from './testing/cases.js';

const MM = formatFor('mm');

/** Words for the first refusal of a design. */
function wordsFor(design: Design, format = MM): string {
  const refusal = evaluate(design).bars.find((bar) => bar.refusal)?.refusal;
  return refusal ? refusalWords(refusal, design, format) : 'nothing refused';
}

/** 13 layers, 33 mm high, 150 × 40 mm, no losses but the saw's. */
const after = (...plans: StepPlan[]): Design =>
  billet(alternating(13), plans, { allowances: { ...LOSSLESS, kerfMm: 1.5 } });

describe('refusalWords', () => {
  const cases: [string, Design, string][] = [
    [
      'scale that leaves nothing',
      billet(layersOf(['1084'], 1), [{ kind: 'weld', heats: 10 }], { allowances: { scaleMmPerHeat: 0.08 } }),
      '“Forge weld” in “billet”: the scale of 10 heats takes 1.6 mm of 1 mm, nothing would be left.',
    ],
    [
      'a grind that leaves nothing',
      after({ kind: 'grind', perFaceMm: 17, faces: 'flats' }),
      '“Grind clean” in “billet”: “Off each face” takes 34 mm of 33 mm, nothing would be left.',
    ],
    [
      'ends longer than the bar',
      after({ kind: 'trim', perEndMm: 80 }),
      '“Trim the ends” in “billet”: “Off each end” takes 160 mm of 150 mm, nothing would be left.',
    ],
    [
      'saw cuts that use up a bar',
      after({ kind: 'draw', lengthMm: 4, widthMm: 40 }, { kind: 'restack', pieces: 4, turnAlternate: false }),
      '“Restack” in “billet”: 4 pieces need 4.5 mm of saw cuts, the bar is 4 mm long.',
    ],
    [
      'more slices than the bar gives',
      after({ kind: 'slice', sliceMm: 6, count: 21, turnAlternate: false }),
      '“Slice across” in “billet”: 21 slices need 157.5 mm with the saw cuts, the bar is 150 mm long.',
    ],
    [
      'grooves through the bar',
      after({
        kind: 'groove',
        pitchMm: 12,
        depthMm: 17,
        radiusMm: 4,
        angleDeg: 0,
        faces: 'bothOpposed',
        finish: 'forgeFlat',
      }),
      '“Groove (ladder)” in “billet”: “Depth” takes 34 mm in all, the bar is 33 mm thick.',
    ],
    [
      'three sides at once',
      after({ kind: 'draw', lengthMm: 300, widthMm: 40, thicknessMm: 20 }),
      '“Draw out” in “billet”: “To thickness” asks for 20 mm, the volume gives 16.5 mm at the length and width given. Leave one of the three out.',
    ],
    [
      'too many layers',
      billet(
        alternating(400, ['1084', '15n20'], [1, 1]),
        [12, 12, 12, 12].flatMap((pieces): StepPlan[] => [
          { kind: 'restack', pieces, turnAlternate: false },
          { kind: 'draw', lengthMm: 3000, widthMm: 40 },
        ]),
        { allowances: LOSSLESS },
      ),
      '“Restack” in “billet”: “Pieces” asks for 8\u00a0294\u00a0400 layers, at most 2\u00a0000\u00a0000 can be followed.',
    ],
  ];
  for (const [name, design, words] of cases) {
    it(`says ${name}`, () => expect(wordsFor(design)).toBe(words));
  }

  it('says which piece of an assembly can’t be made', () => {
    const bars: Bar[] = [
      { ...barFrom('core', stackOf(layersOf(['1084'])), [{ kind: 'trim', perEndMm: 80 }]), name: 'Core' },
      {
        ...barFrom('all', { kind: 'assembly', along: 'width', pieces: [{ bar: 'core' }, { bar: 'core' }] }),
        name: 'All',
      },
    ];
    const design = designOf(bars);
    const refusal = evaluate(design).bars[1]?.refusal as StepRefusal;
    expect(refusalWords(refusal, design, MM)).toBe(
      'The start of “All”: piece 1 (“Core”) can’t be made, 0 pieces are there.',
    );
  });

  it('says saw cuts between the pieces of an assembly that use up a bar', () => {
    const bars: Bar[] = [
      barFrom('core', stackOf(layersOf(['1084']), 1)),
      barFrom('all', { kind: 'assembly', along: 'width', pieces: [{ bar: 'core' }, { bar: 'core' }] }),
    ];
    expect(wordsFor(designOf(bars))).toBe(
      'The start of “all”: the saw cuts between the pieces take 1.5 mm, the bar is 1 mm long.',
    );
  });

  it('speaks the reader’s units, and does without the place where that is plain', () => {
    const design = after({ kind: 'trim', perEndMm: 76.2 });
    expect(wordsFor(design, formatFor('inch'))).toContain('takes 6 in of 5.906 in');
    const refusal = evaluate(design).bars[0]?.refusal as StepRefusal;
    expect(refusalReason(refusal, design, MM)).toBe(
      '“Off each end” takes 152.4 mm of 150 mm, nothing would be left.',
    );
  });

  it('has words for every code', () => {
    const step = after({ kind: 'draw', lengthMm: 0.1 }).bars[0]?.steps[0] ?? null;
    const base = { bar: 'billet', field: 'lengthMm', asked: 2, available: 1, unit: 'mm', step } as const;
    const codes: StepRefusal['code'][] = [
      'nothing-left',
      'too-short',
      'cut-too-deep',
      'size-impossible',
      'too-many-layers',
      'unknown-steel',
      'piece-refused',
    ];
    for (const code of codes) {
      const words = refusalWords({ ...base, code }, after(), MM);
      expect(words)
        .withContext(code)
        .toMatch(/^“Draw out” in “billet”: .*2.*1.*\.$/);
    }
  });
});
