import { findSteel, type Steel } from '../steels/index.js';
import {
  carbonAffinity,
  carbonAffinityOf,
  fractionLostFromFaces,
  ironOxidation,
  isCarbonBarrier,
  levelCarbonPercent,
  twistShear,
} from './index.js';
import pairs from './reference/carbon-activity.json';
import scale from './reference/scale.json';
import twists from './reference/twist.json';

const off = (value: number, expected: number): number => Math.abs(value / expected - 1);

describe('carbon activity', () => {
  it('agrees with the reference pairs to 10⁻⁴', () => {
    expect(pairs.length).toBe(4);
    for (const { a, b } of pairs) {
      const parts = [a, b].map(({ contents }) => ({
        mass: 1,
        carbonPercent: contents.C,
        affinity: carbonAffinity(contents),
      }));
      const level = levelCarbonPercent(parts);
      [a, b].forEach((side, i) => {
        expect(Math.abs((parts[i]?.affinity ?? 0) - side.affinity))
          .withContext(side.id)
          .toBeLessThan(1e-4);
        expect(Math.abs((level[i] ?? 0) - side.levelPercent))
          .withContext(side.id)
          .toBeLessThan(1e-4);
      });
    }
  });

  it('reads the catalogue’s grades as the reference does', () => {
    for (const { id, affinity } of pairs.flatMap(({ a, b }) => [a, b])) {
      expect(Math.abs(carbonAffinityOf(findSteel(id) as Steel) - affinity))
        .withContext(id)
        .toBeLessThan(1e-4);
    }
  });

  it('keeps the mean, whatever the masses', () => {
    const parts = [
      { mass: 2, carbonPercent: 1, affinity: 0.9 },
      { mass: 3, carbonPercent: 0.2, affinity: 1.2 },
    ];
    const [first, second] = levelCarbonPercent(parts) as [number, number];
    expect(2 * first + 3 * second).toBeCloseTo(2.6, 12);
    expect(first / second).toBeCloseTo(0.9 / 1.2, 12);
  });

  it('plans nickel, copper and fittings as barriers, steel and iron not', () => {
    for (const id of ['nickel-200', 'nickel-201', 'copper', 'cartridge-brass']) {
      expect(isCarbonBarrier(findSteel(id) as Steel))
        .withContext(id)
        .toBeTrue();
    }
    for (const id of ['1084', '15n20', 'a203e', '304l', 'wrought-iron']) {
      expect(isCarbonBarrier(findSteel(id) as Steel))
        .withContext(id)
        .toBeFalse();
    }
  });
});

describe('scale', () => {
  it('agrees with the reference rows to 0.5 %', () => {
    expect(scale.oxidation.length).toBe(3);
    expect(scale.table.length).toBe(10);
    for (const row of [...scale.oxidation, ...scale.table]) {
      const own = ironOxidation(row.temperatureC, row.seconds);
      expect(off(own.rateCm2PerS, row.rateCm2PerS)).toBeLessThan(0.005);
      expect(off(own.oxideMm, row.oxideMm)).toBeLessThan(0.005);
      expect(off(own.metalLostMm, row.metalMm)).toBeLessThan(0.005);
    }
  });

  it('takes the reference fractions off a block', () => {
    expect(scale.fractions.length).toBe(2);
    for (const { sidesMm, perFaceMm, fraction } of scale.fractions) {
      const sides = sidesMm as unknown as readonly [number, number, number];
      expect(off(fractionLostFromFaces(sides, perFaceMm), fraction)).toBeLessThan(1e-5);
    }
  });
});

describe('twist', () => {
  it('shears as the geometry of the helix says', () => {
    expect(twists.length).toBe(4);
    for (const row of twists) {
      const own = twistShear(row.diameterMm, row.turns, row.lengthMm);
      expect(Math.abs(own.shear - row.shear)).toBeLessThan(1e-4);
      expect(Math.abs(own.angleDeg - row.angleDeg)).toBeLessThan(1e-4);
      expect(Math.abs(own.pitchMm - row.pitchMm)).toBeLessThan(1e-4);
      expect(Math.abs(own.fibreStretch - row.fibreStretch)).toBeLessThan(1e-4);
    }
  });
});
