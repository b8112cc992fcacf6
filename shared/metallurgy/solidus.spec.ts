import { CATALOGUE, type Steel, findSteel } from '../steels/index.js';
import { isForeignToWelding, solidusLineC, solidusOf, weldingWindow } from './index.js';
import reference from './reference/solidus.json';

const steel = (id: string): Steel => findSteel(id) as Steel;

describe('solidus', () => {
  it('agrees with the reference rows to 0.05 °C', () => {
    expect(reference.line.length).toBe(7);
    for (const { steel: id, contents, solidusC, ceilingC } of reference.line) {
      expect(Math.abs(solidusLineC(contents) - solidusC))
        .withContext(id)
        .toBeLessThan(0.05);
      expect(Math.abs(solidusLineC(contents) - 100 - ceilingC))
        .withContext(id)
        .toBeLessThan(0.05);
    }
  });

  it('gives the catalogue’s grades the same, by their nominal composition', () => {
    const ids: Record<string, string> = { '15N20': '15n20', '26C3': '26c3', '1.2842': '90mncrv8' };
    for (const { steel: name, solidusC } of reference.line) {
      const solidus = solidusOf(steel(ids[name] ?? name));
      expect(Math.abs((solidus?.temperatureC ?? 0) - solidusC))
        .withContext(name)
        .toBeLessThan(0.05);
      expect(solidus?.basis).toBe('carbon-line');
    }
  });

  it('stands at 1538 − 500 C below 0.09 % C, at 1493 °C up to 0.17 %, at 1147 °C from 2.14 %', () => {
    expect(solidusLineC({ C: 0 })).toBe(1538);
    expect(solidusLineC({ C: 0.08 })).toBeCloseTo(1498, 9);
    expect(solidusLineC({ C: 0.09 })).toBe(1493);
    expect(solidusLineC({ C: 0.16 })).toBe(1493);
    // The printed slope meets the eutectic within 0.01 °C.
    expect(Math.abs(solidusLineC({ C: 2.1399 }) - 1147)).toBeLessThan(0.05);
    expect(solidusLineC({ C: 3 })).toBe(1147);
  });

  it('takes families that the line does not hold for by their own figure, with a source', () => {
    const expected: Record<string, [number, string]> = {
      d2: [1150, 'carbide-eutectic'],
      '440c': [1150, 'carbide-eutectic'],
      a2: [1250, 'carbide-eutectic'],
      '13c26': [1250, 'carbide-eutectic'],
      '304l': [1375, 'stainless'],
      '316l': [1375, 'stainless'],
      '410': [1450, 'stainless'],
      '420': [1450, 'stainless'],
      'nickel-200': [1435, 'nickel'],
      copper: [1085, 'copper'],
    };
    for (const [id, [temperatureC, basis]] of Object.entries(expected)) {
      const solidus = solidusOf(steel(id));
      expect(solidus?.temperatureC).withContext(id).toBe(temperatureC);
      expect(solidus?.basis)
        .withContext(id)
        .toBe(basis as never);
    }
  });

  it('has a figure and a source for every material that may be welded, and none for the others', () => {
    for (const material of CATALOGUE) {
      const solidus = solidusOf(material);
      expect(solidus === null)
        .withContext(material.id)
        .toBe(isForeignToWelding(material));
      if (solidus) expect(solidus.source.text).withContext(material.id).toBeTruthy();
    }
    expect(CATALOGUE.filter(isForeignToWelding).map(({ id }) => id)).toEqual([
      'cartridge-brass',
      'free-cutting-brass',
      'phosphor-bronze',
      'nickel-silver',
    ]);
  });
});

describe('welding window', () => {
  it('agrees with the reference pairs: ceiling to 1 °C, aim exactly', () => {
    expect(reference.pairs.length).toBe(9);
    for (const { steels, solidusC, ceilingC, aimC } of reference.pairs) {
      const window = weldingWindow(steels.map(steel), 'flux');
      const name = steels.join(' + ');
      expect(Math.abs((window?.solidusC ?? 0) - solidusC))
        .withContext(name)
        .toBeLessThan(1);
      expect(Math.abs((window?.ceilingC ?? 0) - ceilingC))
        .withContext(name)
        .toBeLessThan(1);
      expect(window?.aimC).withContext(name).toBe(aimC);
    }
  });

  it('reaches down to 1100 °C with flux, 1050 °C dry, 1000 °C sealed', () => {
    const pair = [steel('26c3'), steel('15n20')];
    // 26C3: 1294.94 − 100.
    expect(weldingWindow(pair, 'flux')?.widthK).toBeCloseTo(94.94, 1);
    expect(weldingWindow(pair, 'dry')?.widthK).toBeCloseTo(144.94, 1);
    expect(weldingWindow(pair, 'sealed')?.widthK).toBeCloseTo(194.94, 1);
  });

  it('keeps 150 °C below the lowest solidus with an unknown analysis anywhere in the stack', () => {
    const window = weldingWindow([steel('1084'), steel('leaf-spring-reclaimed')], 'flux');
    expect(window?.marginK).toBe(150);
    expect(window?.ceilingC).toBeCloseTo(1212.8, 1);
    expect(window?.limitedBy).toBe('1084');
  });

  it('keeps 150 °C below the solidus of a steel with more than 0.035 % P or S, and of that steel alone', () => {
    const dirty: Steel = {
      ...steel('1084'),
      id: 'dirty',
      composition: {
        ...steel('1084').composition,
        S: { minPercent: null, maxPercent: null, nominalPercent: 0.036 },
      },
    };
    // 1084 with 0.036 instead of 0.015 % S: 183.9 · 0.021 = 3.86 °C lower.
    expect(weldingWindow([dirty, steel('15n20')], 'flux')?.ceilingC).toBeCloseTo(1362.8 - 3.86 - 150, 1);
    expect(weldingWindow([steel('1084'), steel('wrought-iron')], 'flux')?.ceilingC).toBeCloseTo(1262.8, 1);
  });

  it('never goes past 1290 °C, nor past 1020 °C with copper', () => {
    expect(weldingWindow([steel('1018'), steel('pure-iron')], 'flux')?.ceilingC).toBe(1290);
    const copper = weldingWindow([steel('1084'), steel('copper')], 'flux');
    expect(copper?.ceilingC).toBe(1020);
    expect(copper?.widthK).toBe(-80);
    expect(copper?.aimC).toBeNull();
  });

  it('is none for metals that are not forge welded', () => {
    expect(weldingWindow([steel('cartridge-brass')], 'flux')).toBeNull();
  });
});
