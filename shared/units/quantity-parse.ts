import { celsiusOf } from './quantity-format.js';
import { LONGEST_ENTRY, plainText, quoted, readNumber, type Refusal } from './typed-text.js';
import { KG_PER_OUNCE, KG_PER_POUND, type UnitSystem } from './unit-system.js';

const NUMBER = String.raw`(\d+(?:[.,]\d+)*[.,]?|[.,]\d+)`;

/** Absolute zero, °C. */
const COLDEST_C = -273.15;

/**
 * A temperature as people type it: `850`, `850 °C`, `1562 F`. A bare number is in the reader's degrees.
 * Refuses what is empty, no temperature, or below absolute zero.
 */
export function parseTemperature(
  text: string,
  system: UnitSystem,
): { readonly ok: true; readonly temperatureC: number } | Refusal {
  const typed = text.trim();
  const match = new RegExp(`^(-?) ?${NUMBER} ?(?:°|deg|degrees)? ?(c|f|celsius|fahrenheit)?$`).exec(
    plainEntry(text),
  );
  if (!match) return refuseTyped(typed, 'a temperature', '850 °C or 1560 °F');
  const number = readNumber(match[2] as string, typed);
  if (!number.ok) return number;
  const value = ((match[1] === '' ? 1 : -1) * number.numerator) / number.denominator;
  const isCelsius = match[3] === undefined ? system === 'mm' : match[3].startsWith('c');
  const temperatureC = isCelsius ? value : celsiusOf(value);
  if (temperatureC < COLDEST_C) return { ok: false, reason: `${quoted(typed)} is below absolute zero.` };
  return { ok: true, temperatureC };
}

/** A mass: `1.2 kg`, `350 g`, `2 lb 3 oz`, `12 oz`. A bare number is kilograms or pounds, as the reader's system has it. */
export function parseMass(
  text: string,
  system: UnitSystem,
): { readonly ok: true; readonly kg: number } | Refusal {
  const typed = text.trim();
  const plain = plainEntry(text);
  const match = new RegExp(
    `^${NUMBER} ?(kg|kilos?|g|grams?|lbs?|pounds?|#|oz|ounces?)?\\.?(?: ?${NUMBER} ?(?:oz|ounces?)\\.?)?$`,
  ).exec(plain);
  if (!match) return refuseTyped(typed, 'a mass', '1.2 kg or 2 lb 3 oz');
  const isGrams = match[2]?.startsWith('g') ?? false;
  const unitKg = kilogramsOf(match[2], system);
  const isPounds = match[2] !== undefined && unitKg === KG_PER_POUND;
  if (match[3] !== undefined && !isPounds) return refuseTyped(typed, 'a mass', '2 lb 3 oz');
  const first = readNumber(match[1] as string, typed);
  if (!first.ok) return first;
  const second = readNumber(match[3] ?? '0', typed);
  if (!second.ok) return second;
  // Grams are divided by 1000 and not multiplied by 0.001, which no double is: 350 g are 0.35 kg.
  const firstKg = isGrams
    ? first.numerator / (1000 * first.denominator)
    : (unitKg * first.numerator) / first.denominator;
  const kg = firstKg + (KG_PER_OUNCE * second.numerator) / second.denominator;
  return { ok: true, kg };
}

/** A time in minutes: `12`, `12 min`, `90 s`, `1 h 20 min`, `1:20` (hours and minutes). */
export function parseDuration(text: string): { readonly ok: true; readonly minutes: number } | Refusal {
  const typed = text.trim();
  const plain = plainEntry(text);
  const clock = /^(\d+):([0-5]\d)$/.exec(plain);
  if (clock) return { ok: true, minutes: 60 * Number(clock[1]) + Number(clock[2]) };
  const hours = /^(\d+) ?(?:h|hrs?|hours?) ?(?:and )?(\d+) ?(?:m|min|mins|minutes?)?$/.exec(plain);
  if (hours) return { ok: true, minutes: 60 * Number(hours[1]) + Number(hours[2]) };
  const match = new RegExp(`^${NUMBER} ?(s|sec|secs|seconds?|m|min|mins|minutes?|h|hrs?|hours?)?$`).exec(
    plain,
  );
  if (!match) return refuseTyped(typed, 'a time', '12 min or 1 h 20 min');
  const number = readNumber(match[1] as string, typed);
  if (!number.ok) return number;
  const unit = match[2] ?? 'm';
  const perMinute = unit.startsWith('s') ? 1 / 60 : unit.startsWith('h') ? 60 : 1;
  return { ok: true, minutes: (number.numerator / number.denominator) * perMinute };
}

/** A share in percent as a fraction: `12.5`, `12.5 %` are 0.125. */
export function parsePercent(text: string): { readonly ok: true; readonly fraction: number } | Refusal {
  const typed = text.trim();
  const match = new RegExp(`^${NUMBER} ?(?:%|percent)?$`).exec(plainEntry(text));
  if (!match) return refuseTyped(typed, 'a percentage', '12.5 %');
  const number = readNumber(match[1] as string, typed);
  return number.ok ? { ok: true, fraction: number.numerator / (number.denominator * 100) } : number;
}

/** A whole number: `7`, `1 200`, `1,200`. */
export function parseCount(text: string): { readonly ok: true; readonly count: number } | Refusal {
  const typed = text.trim();
  const plain = plainEntry(text);
  const count = Number(plain.replace(/[ ,.'](?=\d{3}(\D|$))/g, ''));
  if (
    plain === '' ||
    !/^\d+$/.test(plain.replace(/[ ,.'](?=\d{3}(\D|$))/g, '')) ||
    !Number.isSafeInteger(count)
  ) {
    return refuseTyped(typed, 'a whole number', '7');
  }
  return { ok: true, count };
}

/** Typed text made plain; empty for an entry too long to be a number, which nothing matches. */
function plainEntry(text: string): string {
  return text.trim().length > LONGEST_ENTRY ? '' : plainText(text);
}

function kilogramsOf(unit: string | undefined, system: UnitSystem): number {
  if (unit === undefined) return system === 'mm' ? 1 : KG_PER_POUND;
  if (unit.startsWith('k') || unit.startsWith('g')) return 1;
  return unit.startsWith('o') ? KG_PER_OUNCE : KG_PER_POUND;
}

function refuseTyped(typed: string, wanted: string, example: string): Refusal {
  return {
    ok: false,
    reason:
      typed === ''
        ? `Nothing is typed. Give ${wanted}, such as ${example}.`
        : `${quoted(typed)} can't be read as ${wanted}. Write it like ${example}.`,
  };
}
