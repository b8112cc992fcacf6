import { MM_PER_INCH, type UnitSystem } from './unit-system.js';

/** Below these sizes an arrow key moves by the step beside it, mm. */
const MM_STEPS = [
  [1, 0.05],
  [10, 0.1],
  [100, 1],
  [Infinity, 5],
] as const;

/** Below these sizes (mm) an arrow key moves by this many sixty-fourths of an inch. */
const INCH_STEPS = [
  [MM_PER_INCH / 2, 1],
  [4 * MM_PER_INCH, 4],
  [Infinity, 16],
] as const;

/**
 * The length that so many presses of an arrow key lead to, on a sensible grid of the reader's system: 0.05, 0.1, 1 or
 * 5 mm; 1/64, 1/16 or 1/4 in, the larger the length the coarser. A length between two marks goes to the next mark.
 * @param mm finite, ≥ 0
 * @param presses whole number; negative makes it shorter. Never goes below 0.
 */
export function steppedLength(mm: number, system: UnitSystem, presses: number): number {
  let length = mm;
  const direction = Math.sign(presses);
  for (let press = 0; press < Math.abs(presses); press++) {
    length = system === 'mm' ? oneMetricStep(length, direction) : oneInchStep(length, direction);
  }
  return length;
}

function oneMetricStep(mm: number, direction: number): number {
  const step = stepFor(mm, direction, MM_STEPS);
  // Twentieths of a millimetre as whole numbers, so that ten steps of 0.1 make 1 and not 0.9999….
  return (nextMark(mm / step, direction) * Math.round(step * 20)) / 20;
}

function oneInchStep(mm: number, direction: number): number {
  const marks = stepFor(mm, direction, INCH_STEPS);
  const next = nextMark((mm * 64) / (MM_PER_INCH * marks), direction) * marks;
  return (127 * next) / (5 * 64);
}

function stepFor(mm: number, direction: number, steps: readonly (readonly [number, number])[]): number {
  // On the border, going down uses the finer step and going up the coarser.
  const found = steps.find(([below]) => (direction < 0 ? mm <= below * (1 + 1e-9) : mm < below * (1 - 1e-9)));
  return (found ?? steps[steps.length - 1])?.[1] ?? 1;
}

function nextMark(place: number, direction: number): number {
  const nearest = Math.round(place);
  if (Math.abs(place - nearest) < 1e-6) return Math.max(0, nearest + direction);
  return Math.max(0, direction < 0 ? Math.floor(place) : Math.ceil(place));
}
