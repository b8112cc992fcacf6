import {
  type CarbonDiffusionSet,
  carbonDiffusivityM2PerS,
  contentAtDepth,
  diffusedToReachM2,
  erf,
  erfInverse,
  layerMeanResidual,
  longTimeMeanResidual,
  longTimeMidResidual,
  midLayerResidual,
  secondsToMeanResidual,
} from './index.js';
import diffusion from './reference/carbon-diffusion.json';
import lamella from './reference/lamella.json';

/** |value − expected| as a part of expected. */
const off = (value: number, expected: number): number => Math.abs(value / expected - 1);

describe('diffusion of carbon in austenite', () => {
  it('agrees with the reference rows to 0.5 %', () => {
    expect(diffusion.diffusivity.length).toBe(20);
    expect(diffusion.table.length).toBe(42);
    for (const { set, temperatureC, carbonPercent, m2PerS } of [
      ...diffusion.diffusivity,
      ...diffusion.table,
    ]) {
      const own = carbonDiffusivityM2PerS(temperatureC, carbonPercent, set as CarbonDiffusionSet);
      expect(off(own, m2PerS))
        .withContext(`${set} ${temperatureC} °C ${carbonPercent} % C`)
        .toBeLessThan(0.005);
    }
  });

  it('reckons with Ågren’s set unless told otherwise', () => {
    expect(carbonDiffusivityM2PerS(1150, 0.8)).toBe(carbonDiffusivityM2PerS(1150, 0.8, 'agren'));
  });
});

describe('the error function', () => {
  it('has its tabulated values', () => {
    // Abramowitz & Stegun, table 7.1.
    const table: [number, number][] = [
      [0, 0],
      [0.5, 0.5204998778],
      [1, 0.8427007929],
      [2, 0.995322265],
      [3, 0.9999779095],
    ];
    for (const [x, value] of table) {
      expect(Math.abs(erf(x) - value)).toBeLessThan(1e-10);
      expect(Math.abs(erf(-x) + value)).toBeLessThan(1e-10);
    }
    expect(1 - erf(4)).toBeCloseTo(1.54172579e-8, 15);
    expect(erf(7)).toBe(1);
  });

  it('is undone by its inverse, which refuses what no error function gives', () => {
    for (const x of [-2.5, -0.3, 0, 0.01, 0.5, 1.5, 3]) expect(erfInverse(erf(x))).toBeCloseTo(x, 9);
    expect(() => erfInverse(1)).toThrowError(RangeError);
  });
});

describe('carbon in a skin', () => {
  it('takes as long as Callister’s two examples say, to 2 %', () => {
    const { carburising, design } = diffusion.skin;
    const diffused = diffusedToReachM2(carburising, carburising.wantedPercent, carburising.depthM);
    expect(off(diffused / carburising.m2PerS, carburising.seconds)).toBeLessThan(0.02);
    expect(off(carburising.depthM / (2 * Math.sqrt(diffused)), carburising.z)).toBeLessThan(0.001);

    const wanted = diffusedToReachM2(design, design.wantedPercent, design.depthM);
    expect(off(wanted, design.diffusedM2)).toBeLessThan(0.001);
    expect(design.hours.length).toBe(4);
    for (const { temperatureC, hours } of design.hours) {
      const kelvin = temperatureC + design.zeroCelsiusK;
      const m2PerS = design.d0M2PerS * Math.exp(-design.energyJPerMol / (design.gasConstant * kelvin));
      expect(off(wanted / m2PerS / 3600, hours))
        .withContext(`${temperatureC} °C`)
        .toBeLessThan(0.02);
    }
  });

  it('holds the wanted content at that depth at that time', () => {
    const profile = { startPercent: 0.25, surfacePercent: 1.2 };
    const diffused = diffusedToReachM2(profile, 0.8, 5e-4);
    expect(contentAtDepth(profile, 5e-4, diffused)).toBeCloseTo(0.8, 9);
    expect(contentAtDepth(profile, 0, diffused)).toBe(1.2);
  });
});

describe('levelling between layers', () => {
  it('leaves the reference residuals, to 10⁻⁵ of them', () => {
    expect(lamella.residuals.length).toBe(5);
    for (const { fo, midLayer, layerMean } of lamella.residuals) {
      expect(off(midLayerResidual(fo), midLayer))
        .withContext(`mid ${fo}`)
        .toBeLessThan(1e-5);
      expect(off(layerMeanResidual(fo), layerMean))
        .withContext(`mean ${fo}`)
        .toBeLessThan(1e-5);
    }
  });

  it('takes the reference times to 5 %, to 1 %', () => {
    expect(lamella.times.length).toBe(3);
    for (const { layerMm, m2PerS, seconds } of lamella.times) {
      expect(off(secondsToMeanResidual(0.05, layerMm, m2PerS), seconds)).toBeLessThan(0.01);
    }
    expect(lamella.table.length).toBe(18);
    for (const { temperatureC, layerMm, seconds } of lamella.table) {
      const own = secondsToMeanResidual(0.05, layerMm, carbonDiffusivityM2PerS(temperatureC, 0.8));
      expect(off(own, seconds)).withContext(`${temperatureC} °C ${layerMm} mm`).toBeLessThan(0.01);
    }
    expect(layerMeanResidual(lamella.foAtFivePercent)).toBeCloseTo(0.05, 5);
  });

  it('starts at 1, never rises, ends at 0', () => {
    expect(layerMeanResidual(0)).toBe(1);
    expect(midLayerResidual(0)).toBe(1);
    for (const residual of [layerMeanResidual, midLayerResidual]) {
      let before = 1;
      for (let fo = 0.0005; fo < 5; fo *= 1.1) {
        const now = residual(fo);
        expect(now).toBeLessThanOrEqual(before);
        expect(now).toBeGreaterThanOrEqual(0);
        before = now;
      }
      expect(residual(1e9)).toBe(0);
    }
  });

  it('has no step where the short-time form hands over to the series', () => {
    expect(Math.abs(layerMeanResidual(0.01 - 1e-15) - layerMeanResidual(0.01))).toBeLessThan(1e-11);
    expect(Math.abs(midLayerResidual(0.01 - 1e-15) - midLayerResidual(0.01))).toBeLessThan(1e-11);
  });

  it('follows its long-time form from Fo 0.05 on: the next terms are 0.25 % of the mean there, 0.65 % of the middle', () => {
    // Second terms over first: exp(−8π²·0.05)/9 = 0.00214 and exp(−8π²·0.05)/3 = 0.00643.
    for (const fo of [0.05, 0.1, 0.3, 1]) {
      expect(off(longTimeMeanResidual(fo), layerMeanResidual(fo))).toBeLessThan(0.0025);
      expect(off(longTimeMidResidual(fo), midLayerResidual(fo))).toBeLessThan(0.0065);
    }
  });
});
