import { CATALOGUE, findSteel } from './catalogue/index.js';
import limitsTables from './reference/published-limits.json';
import {
  designationList,
  ELEMENTS,
  ETCH_TONES,
  isReclaimed,
  kindWords,
  nominalPercent,
  SOURCE_STATUSES,
  STEEL_KINDS,
  type Content,
  type Element,
} from './steel.js';

/** Ids are for ever: saved documents hold them. Add to this list, take nothing away. */
const IDS = [
  '1018',
  '1045',
  '1060',
  '1075',
  'c75s',
  '1080',
  '1084',
  '1085',
  '1095',
  'c100s',
  'c105u',
  'w1',
  'w2',
  '26c3',
  'music-wire',
  'wire-rope',
  'o1',
  'o2',
  '90mncrv8',
  'l6',
  '5160',
  '6150',
  '9260',
  '52100',
  '80crv2',
  '8670',
  '15n20',
  'nickel-saw-strip',
  'a203e',
  '4140',
  '4340',
  '45nicrmo16',
  '55nicrmov7',
  's7',
  'a2',
  'd2',
  'h13',
  'wrought-iron',
  'phosphoric-iron',
  'pure-iron',
  'nickel-200',
  'nickel-201',
  '304l',
  '316l',
  '410',
  '420',
  '440c',
  '13c26',
  'leaf-spring-reclaimed',
  'roller-chain-reclaimed',
  'canister-skin',
  'powder-1084',
  'copper',
  'cartridge-brass',
  'free-cutting-brass',
  'phosphor-bronze',
  'nickel-silver',
];

describe('catalogue', () => {
  it('holds the 57 materials, each once', () => {
    expect(CATALOGUE.length).toBe(57);
    expect(CATALOGUE.map((steel) => steel.id).sort()).toEqual([...IDS].sort());
    expect(new Set(CATALOGUE.map((steel) => steel.name)).size).toBe(57);
  });

  it('finds a material by its id, and nothing for an unknown one', () => {
    for (const id of IDS) expect(findSteel(id)?.id).toBe(id);
    expect(findSteel('unobtainium')).toBeUndefined();
    expect(findSteel('constructor')).toBeUndefined();
  });

  for (const steel of CATALOGUE) {
    describe(steel.id, () => {
      it('is complete, with a source for every value', () => {
        expect(steel.id).toMatch(/^[a-z0-9]+(-[a-z0-9]+)*$/);
        expect(steel.name.trim()).not.toBe('');
        expect(STEEL_KINDS).toContain(steel.kind);
        expect(kindWords(steel.kind)).not.toBe('');
        expect(ETCH_TONES).toContain(steel.etchTone);
        expect(steel.etchWhy).not.toBe('');
        expect(Object.keys(steel.composition).length).toBeGreaterThan(0);
        expect(designationList(steel).length).toBeGreaterThan(0);
        for (const source of [steel.sources.composition, steel.sources.density, steel.sources.forging]) {
          expect(SOURCE_STATUSES).toContain(source.status);
          expect(source.text ?? '').not.toBe('');
        }
      });

      it('has limits in order round what is reckoned with, and no more than 100 %', () => {
        let sum = 0;
        for (const [element, content] of Object.entries(steel.composition) as [Element, Content][]) {
          expect(ELEMENTS).toContain(element);
          const { minPercent, maxPercent, nominalPercent: nominal } = content;
          expect(minPercent ?? 0)
            .withContext(element)
            .toBeGreaterThanOrEqual(0);
          expect(minPercent ?? 0)
            .withContext(element)
            .toBeLessThanOrEqual(nominal);
          expect(nominal)
            .withContext(element)
            .toBeLessThanOrEqual(maxPercent ?? 100);
          sum += nominal;
        }
        // Copper alloys are given by all their elements, each rounded.
        expect(sum).toBeLessThanOrEqual(100.5);
      });

      it('has a density and a forging window that metals have', () => {
        // Lightest: a high-chromium or slag-rich iron; heaviest: copper at 8960 (handbook limits, from memory).
        expect(steel.densityKgM3).toBeGreaterThanOrEqual(7600);
        expect(steel.densityKgM3).toBeLessThanOrEqual(8960);
        const { startMaxC, finishMinC } = steel.forging;
        expect(finishMinC).toBeGreaterThanOrEqual(500);
        expect(startMaxC).toBeGreaterThanOrEqual(finishMinC + 100);
        // Pure iron melts at 1538 °C, copper at 1085 °C, brasses from about 885 °C.
        expect(startMaxC).toBeLessThanOrEqual(
          steel.kind === 'fitting' ? 870 : steel.id === 'copper' ? 1020 : 1350,
        );
      });
    });
  }

  it('tells scrap from stock', () => {
    expect(
      CATALOGUE.filter(isReclaimed)
        .map((steel) => steel.id)
        .sort(),
    ).toEqual(['leaf-spring-reclaimed', 'nickel-saw-strip', 'roller-chain-reclaimed', 'wire-rope']);
  });

  it('gives 0 for an element that a composition does not speak of', () => {
    const steel = findSteel('1084');
    expect(steel && nominalPercent(steel, 'C')).toBe(0.84);
    expect(steel && nominalPercent(steel, 'Ni')).toBe(0);
  });

  it('lists the names under which a material is sold', () => {
    const names = (id: string): string[] => designationList(findSteel(id) ?? { designations: {} });
    expect(names('1084')).toEqual(['SAE 1084', 'UNS G10840', 'EN C85S near', '1.1269 near']);
    expect(names('nickel-200')).toEqual(['UNS N02200', '2.4060/2.4066', 'ASTM B160/B162']);
    const foreign = { en: 'C85S', gost: '85', sae: '1084' };
    expect(designationList({ designations: foreign })).toEqual(['gost 85', 'SAE 1084', 'EN C85S']);
  });
});

type Limits = Readonly<Record<string, readonly (number | null)[]>>;

describe('catalogue against the limits of standards', () => {
  const rows = limitsTables.flatMap(({ grades, ...table }) =>
    (Object.entries(grades) as [string, Limits][]).map(([id, limits]) => ({ ...table, id, limits })),
  );

  it('has its 54 rows', () => {
    expect(rows.length).toBe(54);
    expect(new Set(rows.map((row) => row.id)).size).toBe(47);
  });

  for (const { id, standard, form, status, limits } of rows) {
    it(`${id}: ${standard}, ${form} (${status})`, () => {
      const steel = findSteel(id);
      for (const [element, [minPercent, maxPercent]] of Object.entries(limits)) {
        const content = steel?.composition[element as Element];
        if (content === undefined) {
          fail(`${id} says nothing of ${element}`);
          continue;
        }
        if (typeof minPercent === 'number') {
          expect(content.minPercent ?? 0)
            .withContext(element)
            .toBeLessThanOrEqual(minPercent);
          expect(content.nominalPercent).withContext(element).toBeGreaterThanOrEqual(minPercent);
        }
        if (typeof maxPercent === 'number') {
          expect(content.maxPercent ?? 100)
            .withContext(element)
            .toBeGreaterThanOrEqual(maxPercent);
          expect(content.nominalPercent).withContext(element).toBeLessThanOrEqual(maxPercent);
        }
      }
    });
  }

  // Nominal analysis. 13C26: the maker's data sheet (2024). 26C3: two articles on the grade. Both published.
  it('reckons with the nominal analysis that makers publish', () => {
    const nominal = (id: string): number[] =>
      (['C', 'Si', 'Mn', 'Cr'] as const).map((element) => {
        const steel = findSteel(id);
        return steel ? nominalPercent(steel, element) : NaN;
      });
    expect(nominal('13c26')).toEqual([0.68, 0.4, 0.7, 13]);
    expect(nominal('26c3')).toEqual([1.25, 0.25, 0.4, 0.3]);
  });

  // Welding glossary: slag 1–4 wt%, P about 0.10; encyclopaedia article: P 0.1–0.25, Si 0.075–0.15. Both published.
  it('has wrought iron within what is published of it', () => {
    const wrought = findSteel('wrought-iron')?.composition;
    expect(wrought?.slag).toEqual({ minPercent: 1, maxPercent: 4, nominalPercent: 2.5 });
    expect(wrought?.P?.nominalPercent).toBeGreaterThanOrEqual(0.1);
    expect(wrought?.P?.nominalPercent).toBeLessThanOrEqual(0.25);
    expect(wrought?.Si?.nominalPercent).toBeGreaterThanOrEqual(0.075);
    expect(wrought?.Si?.nominalPercent).toBeLessThanOrEqual(0.15);
    expect(wrought?.C?.nominalPercent).toBe(0.03);
  });
});
