/** Why typed text was not understood, as a sentence for whoever typed it. */
export interface Refusal {
  readonly ok: false;
  readonly reason: string;
}

/** The most characters that an entry may have; nobody types a longer number. */
export const LONGEST_ENTRY = 80;

/** What was typed, in quotation marks and cut to what can be read at a glance. */
export function quoted(text: string): string {
  const typed = text.trim();
  return `“${typed.length > 40 ? `${typed.slice(0, 39)}…` : typed}”`;
}

const VULGAR: Readonly<Record<string, string>> = {
  '¼': '1/4',
  '½': '1/2',
  '¾': '3/4',
  '⅐': '1/7',
  '⅑': '1/9',
  '⅒': '1/10',
  '⅓': '1/3',
  '⅔': '2/3',
  '⅕': '1/5',
  '⅖': '2/5',
  '⅗': '3/5',
  '⅘': '4/5',
  '⅙': '1/6',
  '⅚': '5/6',
  '⅛': '1/8',
  '⅜': '3/8',
  '⅝': '5/8',
  '⅞': '7/8',
  '⅟': '1/',
};
const RAISED = '⁰¹²³⁴⁵⁶⁷⁸⁹';
const LOWERED = '₀₁₂₃₄₅₆₇₈₉';

/**
 * Typed text with every way of writing a sign brought to one: ready-made and built fractions to `a/b`, primes and
 * curly quotes to `'` and `"`, dashes to `-`, odd spaces to one plain space, capitals to small letters.
 */
export function plainText(text: string): string {
  return text
    .replace(/[¼½¾⅐-⅟]/gu, (sign) => ` ${VULGAR[sign] ?? sign}`)
    .replace(/(\d)(?=[⁰¹²³⁴-⁹])/gu, '$1 ')
    .replace(/[⁰¹²³⁴-⁹]/gu, (sign) => String(RAISED.indexOf(sign)))
    .replace(/[₀-₉]/gu, (sign) => String(LOWERED.indexOf(sign)))
    .normalize('NFKC')
    .replace(/[⁄∕÷]/gu, '/')
    .replace(/[‘’‛′ʹʼ´`]/gu, "'")
    .replace(/[“”„‟″ʺ]/gu, '"')
    .replace(/''/g, '"')
    .replace(/[‐‑‒–—―−]/gu, '-')
    .replace(/\s+/gu, ' ')
    .trim()
    .toLowerCase();
}

/** A decimal number as a fraction of whole numbers: 2.4 is 24/10. */
export interface DecimalNumber {
  readonly ok: true;
  readonly numerator: number;
  readonly denominator: number;
}

/** Digits that a whole number holds exactly with room left for a factor of 127; what is typed beyond is dropped. */
const MOST_DIGITS = 13;

/**
 * A decimal number with point or comma: `0.094`, `.094`, `2,4`, `1,234.5`, `1.234,5`. One comma before exactly three
 * digits could be either sign, so it is refused rather than guessed at.
 * @param text digits, points and commas only
 * @param typed the whole entry, for the reason
 */
export function readNumber(text: string, typed: string): DecimalNumber | Refusal {
  if (/^[1-9]\d{0,2},\d{3}$/.test(text)) {
    const [before, after] = text.split(',') as [string, string];
    return {
      ok: false,
      reason: `${quoted(typed)} could mean ${before}.${after} or ${before}${after}. Write the one you mean.`,
    };
  }
  const plain = withPoint(text);
  if (!Number.isFinite(Number(plain))) return { ok: false, reason: `${quoted(text)} is not a number.` };
  const [whole = '', decimals = ''] = plain.split('.');
  const digits = whole + decimals.slice(0, Math.max(0, MOST_DIGITS - whole.length));
  return { ok: true, numerator: Number(digits), denominator: 10 ** (digits.length - whole.length) };
}

function withPoint(text: string): string {
  if (/^\d{1,3}(,\d{3})+\.\d*$/.test(text) || /^\d{1,3}(,\d{3}){2,}$/.test(text))
    return text.replaceAll(',', '');
  if (/^\d{1,3}(\.\d{3})+,\d*$/.test(text) || /^\d{1,3}(\.\d{3}){2,}$/.test(text)) {
    return text.replaceAll('.', '').replace(',', '.');
  }
  return text.replace(',', '.');
}
