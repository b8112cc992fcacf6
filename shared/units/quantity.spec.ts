import fc from 'fast-check';
import { formatFor } from './format.js';
import { formatCount, formatNumber } from './number-text.js';
import {
  celsiusOf,
  fahrenheitOf,
  formatDuration,
  formatMass,
  formatPercent,
  formatTemperature,
  formatTemperatureDifference,
  formatVolume,
  massParts,
  temperatureDifferenceParts,
} from './quantity-format.js';
import { parseCount, parseDuration, parseMass, parsePercent, parseTemperature } from './quantity-parse.js';

// Expected figures are worked by hand: 1 lb = 0.45359237 kg, 1 oz = 1/16 lb, 1 in³ = 16387.064 mm³, °F = 1.8·°C + 32.

describe('mass', () => {
  const cases: readonly (readonly [number, string, string])[] = [
    [1.47188, '1.47 kg', '3.24 lb'],
    [0.35, '350 g', '12.3 oz'],
    [0.0254, '25.4 g', '0.9 oz'],
    [0.0012, '1.2 g', '0.042 oz'],
    [0.9996, '1 kg', '2.2 lb'],
    [0.45359237, '454 g', '1 lb'],
    [123.456, '123.5 kg', '272.2 lb'],
    [0, '0 kg', '0 lb'],
    [NaN, '– kg', '– lb'],
  ];
  for (const [kg, metric, imperial] of cases) {
    it(`writes ${String(kg)} kg as ${metric} and ${imperial}`, () => {
      expect(formatMass(kg, 'mm')).toBe(metric);
      expect(formatMass(kg, 'inch')).toBe(imperial);
    });
  }

  it('gives number and unit apart, with zeros kept if asked', () => {
    expect(massParts(1.5, 'mm', { trim: false })).toEqual({ number: '1.50', unit: 'kg' });
  });

  it('is read as it is typed', () => {
    expect(parseMass('1.2 kg', 'inch')).toEqual({ ok: true, kg: 1.2 });
    expect(parseMass('1,2', 'mm')).toEqual({ ok: true, kg: 1.2 });
    expect(parseMass('350 g', 'mm')).toEqual({ ok: true, kg: 0.35 });
    expect(parseMass('2', 'inch')).toEqual({ ok: true, kg: 2 * 0.45359237 });
    expect(parseMass('8 oz', 'mm')).toEqual({ ok: true, kg: 0.45359237 / 2 });
    expect(parseMass('2 lb 8 oz', 'mm')).toEqual({ ok: true, kg: 2.5 * 0.45359237 });
    for (const text of ['2 kg 8 oz', '2 8 oz', '2 oz 8 oz', '']) {
      expect(parseMass(text, 'inch').ok).withContext(text).toBeFalse();
    }
    expect(parseMass('heavy', 'mm')).toEqual({
      ok: false,
      reason: "“heavy” can't be read as a mass. Write it like 1.2 kg or 2 lb 3 oz.",
    });
  });
});

describe('temperature', () => {
  it('is written in the reader’s degrees', () => {
    expect(formatTemperature(850, 'mm')).toBe('850 °C');
    expect(formatTemperature(850, 'inch')).toBe('1562 °F');
    expect(formatTemperature(0, 'inch')).toBe('32 °F');
    expect(formatTemperature(-40, 'inch')).toBe('−40 °F');
    expect(formatTemperature(20.4, 'mm', { digits: 1 })).toBe('20.4 °C');
  });

  it('is rounded to the step that an estimate deserves', () => {
    expect(formatTemperature(727.4, 'mm', { step: 5 })).toBe('725 °C');
    expect(formatTemperature(727.4, 'inch', { step: 10 })).toBe('1340 °F');
  });

  it('keeps differences apart: they have no 32 in them', () => {
    expect(formatTemperatureDifference(25, 'mm')).toBe('25 °C');
    expect(formatTemperatureDifference(25, 'inch')).toBe('45 °F');
    expect(formatTemperatureDifference(0, 'inch')).toBe('0 °F');
    expect(temperatureDifferenceParts(-10, 'inch')).toEqual({ number: '−18', unit: '°F' });
  });

  it('has the fixed points exactly', () => {
    expect(fahrenheitOf(0)).toBe(32);
    expect(fahrenheitOf(100)).toBe(212);
    expect(celsiusOf(32)).toBe(0);
    expect(celsiusOf(212)).toBe(100);
    expect(celsiusOf(-40)).toBe(-40);
  });

  it('comes back from the other scale', () => {
    fc.assert(
      fc.property(fc.integer({ min: -273, max: 2000 }), (temperatureC) => {
        expect(celsiusOf(fahrenheitOf(temperatureC))).toBeCloseTo(temperatureC, 9);
        const parsed = parseTemperature(formatTemperature(temperatureC, 'mm'), 'inch');
        expect(parsed).toEqual({ ok: true, temperatureC });
      }),
      { seed: 451, numRuns: 2000 },
    );
  });

  it('is read as it is typed', () => {
    for (const text of ['850', '850 C', '850°C', '850 °c', '850 degrees C', '850 celsius', '850 ℃']) {
      expect(parseTemperature(text, 'mm')).withContext(text).toEqual({ ok: true, temperatureC: 850 });
    }
    for (const text of ['1562', '1562F', '1562 °F', '1562 ℉']) {
      expect(parseTemperature(text, 'inch')).withContext(text).toEqual({ ok: true, temperatureC: 850 });
    }
    expect(parseTemperature('1562 F', 'mm')).toEqual({ ok: true, temperatureC: 850 });
    expect(parseTemperature('−10', 'mm')).toEqual({ ok: true, temperatureC: -10 });
    expect(parseTemperature('-300', 'mm')).toEqual({ ok: false, reason: '“-300” is below absolute zero.' });
    expect(parseTemperature('red', 'mm').ok).toBeFalse();
    expect(parseTemperature('', 'mm')).toEqual({
      ok: false,
      reason: 'Nothing is typed. Give a temperature, such as 850 °C or 1560 °F.',
    });
  });
});

describe('volume, percent, count and time', () => {
  it('writes volumes', () => {
    expect(formatVolume(187_500, 'mm')).toBe('187.5 cm³');
    expect(formatVolume(187_500, 'inch')).toBe('11.44 in³');
    expect(formatVolume(16_387.064, 'inch')).toBe('1 in³');
    expect(formatVolume(2_500_000, 'mm')).toBe('2500 cm³');
  });

  it('writes and reads percent', () => {
    expect(formatPercent(0.125)).toBe('12.5 %');
    expect(formatPercent(1)).toBe('100 %');
    expect(formatPercent(0.12345, { digits: 2 })).toBe('12.35 %');
    expect(parsePercent('12.5 %')).toEqual({ ok: true, fraction: 0.125 });
    expect(parsePercent('12,5')).toEqual({ ok: true, fraction: 0.125 });
    expect(parsePercent('half').ok).toBeFalse();
  });

  it('writes and reads counts', () => {
    expect(formatCount(0)).toBe('0');
    expect(formatCount(1024)).toBe('1024');
    expect(formatCount(12_345)).toBe('12\u00a0345');
    expect(formatCount(2_000_000)).toBe('2\u00a0000\u00a0000');
    expect(formatCount(-12_345)).toBe('−12\u00a0345');
    expect(formatCount(NaN)).toBe('–');
    expect(parseCount('7')).toEqual({ ok: true, count: 7 });
    expect(parseCount('2\u00a0000\u00a0000')).toEqual({ ok: true, count: 2_000_000 });
    expect(parseCount('1,200')).toEqual({ ok: true, count: 1200 });
    for (const text of ['', '1.5', '-1', 'seven', '1 20'])
      expect(parseCount(text).ok).withContext(text).toBeFalse();
  });

  it('writes and reads times', () => {
    expect([0.5, 1, 4.5, 9.96, 45, 59.7, 60, 80, 125.2].map((minutes) => formatDuration(minutes))).toEqual([
      '30 s',
      '1 min',
      '4.5 min',
      '10 min',
      '45 min',
      '1 h',
      '1 h',
      '1 h 20 min',
      '2 h 5 min',
    ]);
    expect(formatDuration(NaN)).toBe('–');
    const minutesOf = (text: string): number => {
      const parsed = parseDuration(text);
      return parsed.ok ? parsed.minutes : NaN;
    };
    expect(['12', '12 min', '90 s', '1 h', '1.5 h', '1 h 20 min', '1h20', '1:20'].map(minutesOf)).toEqual([
      12, 12, 1.5, 60, 90, 80, 80, 80,
    ]);
    for (const text of ['', 'soon', '1:75', '-5']) expect(minutesOf(text)).withContext(text).toBeNaN();
  });

  it('writes bare numbers', () => {
    expect(formatNumber(0.8, 2)).toBe('0.8');
    expect(formatNumber(0.8, 2, { trim: false })).toBe('0.80');
    expect(formatNumber(-0.001, 2)).toBe('0');
    expect(formatNumber(100, 0)).toBe('100');
    expect(formatNumber(1.5, 2, { decimalSeparator: ',' })).toBe('1,5');
  });
});

describe('formatFor', () => {
  it('speaks the reader’s system throughout', () => {
    const metric = formatFor('mm');
    expect(metric.system).toBe('mm');
    expect(metric.length(2.4)).toBe('2.4 mm');
    expect(metric.roughLength(34.925)).toBe('35 mm');
    expect(metric.size([150, 25, 50])).toBe('150 × 25 × 50 mm');
    expect(metric.mass(1.47188)).toBe('1.47 kg');
    expect(metric.temperature(850)).toBe('850 °C');
    expect(metric.temperatureDifference(25)).toBe('25 °C');
    expect(metric.volume(187_500)).toBe('187.5 cm³');
    expect(metric.percent(0.125)).toBe('12.5 %');
    expect(metric.count(169)).toBe('169');
    expect(metric.number(0.8)).toBe('0.8');
    expect(metric.duration(80)).toBe('1 h 20 min');
    const inch = formatFor('inch');
    expect(inch.length(34.925)).toBe('1 3/8 in');
    expect(inch.lengthParts(34.925)).toEqual({ number: '1 3/8', unit: 'in' });
    expect(inch.roughLength(100)).toBe('3 15/16 in');
    expect(inch.massParts(0.45359237)).toEqual({ number: '1', unit: 'lb' });
    expect(inch.temperatureParts(850)).toEqual({ number: '1562', unit: '°F' });
    expect(inch.temperatureDifference(25)).toBe('45 °F');
  });

  it('keeps the reader’s habits, which single figures may outdo', () => {
    const format = formatFor('inch', { decimalSeparator: ',', fractionStyle: 'built', inchSign: '″' });
    expect(format.length(34.925)).toBe('1³⁄₈″');
    expect(format.length(2.4)).toBe('0,094″');
    expect(format.length(34.925, { fractionStyle: 'slash' })).toBe('1 3/8″');
    expect(format.mass(1.47188)).toBe('3,24 lb');
  });
});
