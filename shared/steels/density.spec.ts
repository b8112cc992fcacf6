import fc from 'fast-check';
import { findSteel } from './catalogue/index.js';
import { mixDensityByMass, mixDensityByVolume, SLAG_DENSITY_KG_M3 } from './density.js';
import densities from './reference/densities.json';

const part = fc.record({
  densityKgM3: fc.double({ min: 1000, max: 20000, noNaN: true }),
  share: fc.double({ min: 0.001, max: 1000, noNaN: true }),
});
const parts = fc.array(part, { minLength: 1, maxLength: 12 });

describe('density of a mix', () => {
  // Expected figures: reference/densities.json, sources in the README beside it.
  it('is that of its parts when they are alike', () => {
    const { volumeMm3, densityKgM3, massKg, toleranceKg } = densities.billet;
    const mean = mixDensityByVolume([
      { densityKgM3, share: 2 },
      { densityKgM3, share: 5 },
    ]);
    expect(Math.abs(mean * volumeMm3 * 1e-9 - massKg)).toBeLessThan(toleranceKg);
  });

  it('goes by volume in a sandwich of steel and nickel', () => {
    const { densitiesKgM3, volumeFractions, volumeMm3, ...expected } = densities.sandwich;
    const mean = mixDensityByVolume(
      densitiesKgM3.map((densityKgM3, i) => ({ densityKgM3, share: volumeFractions[i] ?? 0 })),
    );
    expect(Math.abs(mean - expected.densityKgM3)).toBeLessThan(expected.toleranceKgM3);
    expect(Math.abs(mean * volumeMm3 * 1e-9 - expected.massKg)).toBeLessThan(expected.toleranceKg);
  });

  it('goes by mass in wrought iron with its slag', () => {
    const { ironKgM3, slagKgM3, slagMassFraction, ...expected } = densities.wroughtIron;
    expect(SLAG_DENSITY_KG_M3).toBe(slagKgM3);
    const mean = mixDensityByMass([
      { densityKgM3: ironKgM3, share: 1 - slagMassFraction },
      { densityKgM3: slagKgM3, share: slagMassFraction },
    ]);
    expect(Math.abs(mean - expected.densityKgM3)).toBeLessThan(expected.toleranceKgM3);
  });

  it('finds the catalogue’s wrought iron at the density that its slag gives', () => {
    const iron = findSteel('pure-iron');
    const wrought = findSteel('wrought-iron');
    const slag = wrought?.composition.slag?.nominalPercent ?? 0;
    const mean = mixDensityByMass([
      { densityKgM3: iron?.densityKgM3 ?? 0, share: 100 - slag },
      { densityKgM3: SLAG_DENSITY_KG_M3, share: slag },
    ]);
    // The catalogue rounds to 100 kg/m³; published figures run from 7600 to 7800.
    expect(Math.abs(mean - (wrought?.densityKgM3 ?? 0))).toBeLessThan(50);
  });

  it('lies between the lightest and the heaviest part, by mass never above by volume', () => {
    fc.assert(
      fc.property(parts, (mix) => {
        const byVolume = mixDensityByVolume(mix);
        const byMass = mixDensityByMass(mix);
        const lightest = Math.min(...mix.map((p) => p.densityKgM3));
        const heaviest = Math.max(...mix.map((p) => p.densityKgM3));
        expect(byVolume).toBeGreaterThanOrEqual(lightest * (1 - 1e-12));
        expect(byVolume).toBeLessThanOrEqual(heaviest * (1 + 1e-12));
        expect(byMass).toBeGreaterThanOrEqual(lightest * (1 - 1e-12));
        expect(byMass).toBeLessThanOrEqual(byVolume * (1 + 1e-12));
      }),
      { seed: 1084, numRuns: 1000 },
    );
  });

  it('is the same by mass as by the volumes that those masses fill', () => {
    fc.assert(
      fc.property(parts, (mix) => {
        const volumes = mix.map((p) => ({ ...p, share: p.share / p.densityKgM3 }));
        expect(mixDensityByMass(mix) / mixDensityByVolume(volumes)).toBeCloseTo(1, 10);
      }),
      { seed: 1095, numRuns: 1000 },
    );
  });

  it('refuses a mix of nothing', () => {
    expect(() => mixDensityByVolume([])).toThrowError(RangeError, /mixDensityByVolume.*0/);
    expect(() => mixDensityByMass([{ densityKgM3: 7850, share: 0 }])).toThrowError(RangeError);
  });
});
