import * as fc from 'fast-check';
import {
  cutSection,
  joinSections,
  mirrorSection,
  scaleSection,
  sectionOf,
  thicknessesMm,
  type Section,
} from './index.js';

const SEEDED = { seed: 20_260, numRuns: 500 } as const;

const layers = fc.array(
  fc.record({ steel: fc.integer({ min: 0, max: 3 }), mm: fc.double({ min: 0.01, max: 20, noNaN: true }) }),
  { minLength: 1, maxLength: 40 },
);
const sections = layers.map((list) =>
  sectionOf(
    Uint16Array.from(list, (layer) => layer.steel),
    Float64Array.from(list, (layer) => layer.mm),
  ),
);

/** Steel at a height above the start, the slow way. */
function steelAt(section: Section, mm: number): number | undefined {
  let top = 0;
  const thicknesses = thicknessesMm(section);
  for (const [i, thickness] of thicknesses.entries()) {
    top += thickness;
    if (mm < top) return section.steels[i];
  }
  return undefined;
}

describe('sections', () => {
  it('cut at both ends show what they showed before at the same place', () => {
    fc.assert(
      fc.property(
        sections,
        fc.double({ min: 0, max: 0.45, noNaN: true }),
        fc.double({ min: 0, max: 0.45, noNaN: true }),
        fc.double({ min: 0.001, max: 0.999, noNaN: true }),
        (section, startPart, endPart, at) => {
          const start = startPart * section.totalMm;
          const end = endPart * section.totalMm;
          const cut = cutSection(section, start, end);
          expect(cut.section).not.toBeNull();
          if (cut.section === null) return;
          expect(Math.abs(cut.section.totalMm - (section.totalMm - start - end))).toBeLessThan(
            1e-9 * section.totalMm,
          );
          expect(cut.eaten).toBe(section.steels.length - cut.section.steels.length);
          expect(steelAt(cut.section, at * cut.section.totalMm)).toBe(
            steelAt(section, start + at * cut.section.totalMm),
          );
        },
      ),
      SEEDED,
    );
  });

  it('cut away whole leave nothing', () => {
    fc.assert(
      fc.property(sections, (section) => {
        expect(cutSection(section, section.totalMm / 2, section.totalMm / 2).section).toBeNull();
        expect(cutSection(section, section.totalMm, 0).eaten).toBe(section.steels.length);
      }),
      SEEDED,
    );
  });

  it('scaled, cut and scaled back lose nothing of their layers', () => {
    fc.assert(
      fc.property(sections, fc.double({ min: 0.01, max: 50, noNaN: true }), (section, ratio) => {
        const back = scaleSection(scaleSection(section, ratio), 1 / ratio);
        const before = thicknessesMm(section);
        for (const [i, mm] of thicknessesMm(back).entries()) expect(mm).toBeCloseTo(before[i] as number, 9);
        expect(back.bands).toBe(section.bands);
        expect(back.minBandMm).toBeCloseTo(section.minBandMm, 9);
      }),
      SEEDED,
    );
  });

  it('mirrored twice are themselves, also after a cut', () => {
    fc.assert(
      fc.property(sections, (section) => {
        const cut = cutSection(section, section.totalMm * 0.1, section.totalMm * 0.2).section as Section;
        const back = mirrorSection(mirrorSection(cut));
        expect([...back.steels]).toEqual([...cut.steels]);
        expect([...thicknessesMm(back)]).toEqual([...thicknessesMm(cut)]);
        expect([...thicknessesMm(mirrorSection(cut))]).toEqual([...thicknessesMm(cut)].reverse());
      }),
      SEEDED,
    );
  });

  it('joined add up: layers, thickness, and bands less the seams where like meets like', () => {
    fc.assert(
      fc.property(sections, sections, (a, b) => {
        const joined = joinSections([a, b]);
        const isLike = a.steels[a.steels.length - 1] === b.steels[0];
        expect(joined.steels.length).toBe(a.steels.length + b.steels.length);
        expect(joined.totalMm).toBeCloseTo(a.totalMm + b.totalMm, 9);
        expect(joined.bands).toBe(a.bands + b.bands - (isLike ? 1 : 0));
        expect(joined.minMm).toBe(Math.min(a.minMm, b.minMm));
      }),
      SEEDED,
    );
  });

  it('refuses lists that do not match', () => {
    expect(() => sectionOf(Uint16Array.of(1), Float64Array.of(1, 2))).toThrowError(RangeError);
    expect(() => sectionOf(new Uint16Array(0), new Float64Array(0))).toThrowError(RangeError);
  });
});
