import { MM_PER_INCH, type UnitSystem } from '@shared/units';

/** Steps of an arrow key: from this length on (mm), this many mm; or, on the inch rule, so many marks an inch. */
const MM_STEPS = [
  [200, 5],
  [20, 1],
  [5, 0.5],
  [0, 0.1],
] as const;
const INCH_MARKS = [
  [6 * MM_PER_INCH, 8],
  [1 * MM_PER_INCH, 16],
  [0.25 * MM_PER_INCH, 32],
  [0, 64],
] as const;

/**
 * The next length by arrow key, on the marks of the rule in use: tenths below 5 mm, half millimetres below 20, whole ones below
 * 200, fives above; sixty-fourths below ¼ in, thirty-seconds below 1 in, sixteenths below 6 in, eighths above.
 * A big step is ten of these, or eight marks of the inch rule.
 * @param mm finite, ≥ 0
 * @returns mm, never below 0
 */
export function steppedLengthMm(mm: number, direction: 1 | -1, isBig: boolean, system: UnitSystem): number {
  const size = system === 'mm' ? mmStep(mm, direction) : 1 / marksAt(mm, direction);
  const inUnit = system === 'mm' ? mm : mm / MM_PER_INCH;
  const marks = inUnit / size;
  const isOnMark = Math.abs(marks - Math.round(marks)) < 1e-6;
  const count = isBig ? (system === 'mm' ? 10 : 8) : 1;
  const from = isOnMark ? Math.round(marks) : direction === 1 ? Math.floor(marks) : Math.ceil(marks);
  const next = Math.max(0, from + direction * count);
  // Division last: n marks of an inch rule are exactly what `parseLength` reads for them.
  return system === 'mm' ? Math.round(next * size * 1000) / 1000 : (next * 127) / (5 * Math.round(1 / size));
}

function mmStep(mm: number, direction: 1 | -1): number {
  return bySize(mm, direction, MM_STEPS);
}

function marksAt(mm: number, direction: 1 | -1): number {
  return bySize(mm, direction, INCH_MARKS);
}

/** Going down from a limit takes the finer step, so that up and down undo each other. */
function bySize(mm: number, direction: 1 | -1, table: readonly (readonly [number, number])[]): number {
  const isPast = (from: number): boolean => (direction === 1 ? mm >= from - 1e-9 : mm > from + 1e-9);
  return (table.find(([from]) => isPast(from)) ?? table[table.length - 1] ?? [0, 1])[1];
}
