import type { Reading } from '../typed-entry/typed-entry';

/**
 * Reads a number as people type it: `12`, `12.5`, `12,5`, `1 200`, with or without its unit behind it.
 * @param units what may stand behind the number
 */
export function parseNumber(text: string, units: readonly string[] = []): Reading<number> {
  const typed = text.trim();
  if (typed === '') return { ok: false, reason: 'Nothing is typed. Give a number.' };
  let plain = typed
    .replace(/[\s\u00a0\u202f]+/gu, '')
    .replace(/[‐‑‒–—―−]/gu, '-')
    .toLowerCase();
  for (const unit of units) {
    const sign = unit.toLowerCase();
    if (sign !== '' && plain.endsWith(sign)) plain = plain.slice(0, -sign.length);
  }
  if (!/^[-+]?(?:\d+(?:[.,]\d*)?|[.,]\d+)$/.test(plain)) {
    return { ok: false, reason: `“${typed}” is not a number.` };
  }
  return { ok: true, value: Number(plain.replace(',', '.')) };
}
