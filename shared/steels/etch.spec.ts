import { CATALOGUE, findSteel } from './catalogue/index.js';
import {
  distinctHatches,
  etchAttack,
  etchBrightness,
  etchClassOf,
  hatchOf,
  HATCHES,
  toneOf,
} from './etch.js';
import { ETCH_TONES, kindWords, type Steel } from './steel.js';

/**
 * Order of darkening in dilute ferric chloride, weakest attack first; steels of one row are alike.
 * Source: common practice, no source.
 */
const ORDER_OF_DARKENING: readonly (readonly string[])[] = [
  ['304l', '316l', 'nickel-200', 'nickel-201'],
  ['410', '420', '440c', '13c26'],
  ['a203e', '45nicrmo16'],
  ['15n20', 'l6', '4340', '55nicrmov7'],
  ['phosphoric-iron'],
  ['pure-iron', '1018', 'wrought-iron', 'canister-skin'],
  ['8670', 'a2', 's7', 'h13'],
  ['1045', '4140', '6150'],
  ['1095', '1075', 'w1', 'w2', 'c105u', '26c3'],
  ['1084', '1085', '5160'],
  ['o1', 'o2', '90mncrv8'],
];

/** Pairs that are forged together every day, and the usual claddings and interlayers. */
const PARTNERS: readonly (readonly [string, string])[] = [
  ['1084', '15n20'],
  ['1095', '15n20'],
  ['1075', '15n20'],
  ['1080', '15n20'],
  ['5160', '15n20'],
  ['80crv2', '15n20'],
  ['c75s', '15n20'],
  ['26c3', '15n20'],
  ['52100', '15n20'],
  ['o1', '15n20'],
  ['o1', 'l6'],
  ['o2', '15n20'],
  ['90mncrv8', '45nicrmo16'],
  ['90mncrv8', '15n20'],
  ['w2', 'a203e'],
  ['1095', 'l6'],
  ['1084', 'a203e'],
  ['1095', 'nickel-200'],
  ['1084', 'nickel-200'],
  ['15n20', 'nickel-200'],
  ['15n20', 'a203e'],
  ['1095', 'wrought-iron'],
  ['w1', 'wrought-iron'],
  ['w1', 'pure-iron'],
  ['phosphoric-iron', 'wrought-iron'],
  ['phosphoric-iron', '1045'],
  ['52100', '410'],
  ['26c3', '304l'],
  ['26c3', '410'],
  ['80crv2', '420'],
  ['13c26', '304l'],
  ['copper', '304l'],
  ['copper', '26c3'],
  ['copper', '410'],
  ['nickel-200', '304l'],
  ['nickel-200', '410'],
  ['powder-1084', 'canister-skin'],
  ['powder-1084', 'nickel-saw-strip'],
  ['wire-rope', 'nickel-saw-strip'],
  ['1084', '1095'],
  ['1095', '1018'],
  ['1084', '1018'],
  ['1084', '8670'],
  ['leaf-spring-reclaimed', 'wrought-iron'],
];

describe('etched tone', () => {
  it('keeps the order of darkening for every pair of steels out of different rows', () => {
    ORDER_OF_DARKENING.forEach((row, rank) => {
      for (const darker of ORDER_OF_DARKENING.slice(rank + 1).flat()) {
        for (const brighter of row) {
          expect(etchBrightness(steel(brighter)))
            .withContext(`${brighter} beside ${darker}`)
            .toBeGreaterThan(etchBrightness(steel(darker)));
        }
      }
    });
  });

  it('lies between 0 and 1 for every material', () => {
    for (const each of CATALOGUE) {
      expect(etchBrightness(each)).withContext(each.id).toBeGreaterThanOrEqual(0);
      expect(etchBrightness(each)).withContext(each.id).toBeLessThanOrEqual(1);
    }
  });

  it('shows every dark material darker than every grey one, and grey ones darker than bright ones', () => {
    const ofTone = (tone: string): number[] =>
      CATALOGUE.filter((s) => s.etchTone === tone).map(etchBrightness);
    expect(Math.max(...ofTone('dark'))).toBeLessThan(Math.min(...ofTone('grey')));
    expect(Math.max(...ofTone('grey'))).toBeLessThan(Math.min(...ofTone('bright'), ...ofTone('very-bright')));
  });

  it('orders steels of one class by the strength of the attack', () => {
    expect(etchBrightness(steel('1095'))).toBeGreaterThan(etchBrightness(steel('1080')));
    expect(etchBrightness(steel('15n20'))).toBeGreaterThan(etchBrightness(steel('l6')));
  });

  // Worked by hand from the stated formula.
  it('has the attack of the formula', () => {
    expect(etchAttack(steel('pure-iron'))).toBe(1);
    expect(etchAttack(steel('nickel-200'))).toBeCloseTo(0.1, 12);
    expect(etchAttack(steel('1084'))).toBeCloseTo(1 + (0.25 * 0.8) / 1.2, 12);
    expect(etchAttack(steel('90mncrv8'))).toBeCloseTo(1.25, 12);
    expect(etchAttack(steel('15n20'))).toBeCloseTo(1 - 0.9 * 0.4 * 2 + (0.25 * 0.4) / 1.2, 12);
  });

  it('believes a stated tone where there is no composition or the two can’t both be right', () => {
    const unknown = { kind: 'reclaimed', composition: {} } as const;
    const greys = (['very-bright', 'bright', 'grey', 'dark'] as const).map((etchTone) =>
      etchBrightness({ ...unknown, etchTone }),
    );
    expect(greys).toEqual([...greys].sort((a, b) => b - a));
    expect(new Set(greys).size).toBe(4);
    const plain = { ...steel('1084'), etchTone: 'bright' as const };
    expect(etchClassOf(plain)).toBe('nickel-steel');
    expect(etchClassOf({ ...steel('d2'), etchTone: 'grey' })).toBe('half-bright');
  });

  it('is a grey that grows with brightness, and red for copper alone', () => {
    for (const each of CATALOGUE) {
      const [red, green, blue] = toneOf(each).rgb;
      if (each.id === 'copper') expect(red).toBeGreaterThan(blue + 50);
      else expect([green, blue]).withContext(each.id).toEqual([red, red]);
    }
    const steels = CATALOGUE.filter((s) => s.id !== 'copper').sort(
      (a, b) => etchBrightness(a) - etchBrightness(b),
    );
    const channels = steels.map((s) => toneOf(s).rgb[0]);
    expect(channels).toEqual([...channels].sort((a, b) => a - b));
  });

  // L* 92 and 16 worked by hand: Y = ((L*+16)/116)³ = 0.8070 and 0.02104; sRGB 1.055·Y^(1/2.4) − 0.055.
  it('has greys at the lightness that it says', () => {
    expect(toneOf(steel('nickel-200')).hex).toBe('#e8e8e8');
    expect(toneOf(steel('90mncrv8')).hex).toBe('#282828');
  });

  it('shows what it doesn’t know as a middle grey, in the words of its document', () => {
    const foreign = { kind: 'meteoric', composition: {}, etchTone: 'iridescent' } as unknown as Steel;
    expect(etchClassOf(foreign)).toBe('medium-carbon');
    expect(toneOf(foreign).words).toBe('iridescent');
    expect(toneOf(foreign).hex).toMatch(/^#[0-9a-f]{6}$/);
    expect(toneOf({ ...foreign, etchTone: 'constructor' } as unknown as Steel).words).toBe('constructor');
    expect(kindWords(foreign.kind)).toBe('meteoric');
  });

  it('has words for every tone', () => {
    for (const etchTone of ETCH_TONES) {
      expect(toneOf({ kind: 'carbon', composition: {}, etchTone }).words).toMatch(/^[a-z ]+$/);
    }
  });
});

describe('hatch', () => {
  it('differs between usual partners', () => {
    for (const [one, other] of PARTNERS) {
      expect(hatchOf(steel(one)))
        .withContext(`${one} beside ${other}`)
        .not.toBe(hatchOf(steel(other)));
    }
  });

  it('is stable', () => {
    expect(
      ['15n20', '1084', '1095', '90mncrv8', 'nickel-200', '1018'].map((id) => hatchOf(steel(id))),
    ).toEqual(['plain', 'cross', 'diagonal', 'zigzag', 'dots', 'horizontal']);
  });

  it('can be made to differ among any twelve materials shown together', () => {
    const alike = [
      '1075',
      '1095',
      'c75s',
      '15n20',
      '1080',
      'w1',
      'w2',
      '26c3',
      'l6',
      'nickel-200',
      '304l',
      'o1',
    ];
    const hatches = distinctHatches(alike.map(steel));
    expect(hatches[0]).toBe('diagonal');
    expect(hatches[3]).toBe('plain');
    expect(new Set(hatches).size).toBe(HATCHES.length);
    expect(distinctHatches([...alike, '1084'].map(steel))[12]).toBe('cross');
  });
});

function steel(id: string): Steel {
  const found = findSteel(id);
  if (found === undefined) throw new RangeError(`no steel ${id} in the catalogue`);
  return found;
}
