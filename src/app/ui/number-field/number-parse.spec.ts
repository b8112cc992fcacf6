import { parseNumber } from './number-parse';

describe('parseNumber', () => {
  for (const [text, value] of [
    ['12', 12],
    [' 12.5 ', 12.5],
    ['12,5', 12.5],
    ['.5', 0.5],
    ['1 200', 1200],
    ['1\u00a0200', 1200],
    ['−5', -5],
    ['1150 °C', 1150],
    ['1150°c', 1150],
    ['45°', 45],
  ] as const) {
    it(`reads ${JSON.stringify(text)}`, () => {
      expect(parseNumber(text, ['°C', '°'])).toEqual({ ok: true, value });
    });
  }

  for (const text of ['', '  ', 'twelve', '1.2.3', '1/2', '5 kg', '∞']) {
    it(`refuses ${JSON.stringify(text)}`, () => {
      const reading = parseNumber(text, ['°C']);
      expect(reading.ok).toBeFalse();
      if (!reading.ok && text.trim()) expect(reading.reason).toContain(text.trim());
    });
  }
});
