import { MM_PER_INCH, type UnitSystem } from '@shared/units';

/** Thinnest and thickest layer that a document may hold, mm. */
export const MIN_LAYER_MM = 0.01;
export const MAX_LAYER_MM = 500;

/** A stock thickness draws an edge from this far, px. */
const SNAP_PX = 7;
/** But never from further than this part of its own thickness, so that there are values between. */
const SNAP_OF_THICKNESS = 0.12;

const METRIC_STEPS_MM = [0.01, 0.02, 0.05, 0.1, 0.2, 0.5, 1, 2, 5] as const;
/** Sixty-fourths of an inch; below them thousandths. */
const INCH_STEPS_64 = [1, 2, 4, 8, 16] as const;

/** What a drawn edge comes to. */
export interface SnappedThickness {
  readonly thicknessMm: number;
  /** The stock thickness it stands on, or null. */
  readonly stockMm: number | null;
}

/** The step that a hand can hold at this scale: at least one pixel long, mm. */
export function thicknessStepMm(system: UnitSystem, pxPerMm: number): number {
  const onePixelMm = 1 / pxPerMm;
  if (system === 'mm') return METRIC_STEPS_MM.find((step) => step >= onePixelMm * 0.999) ?? 5;
  if (onePixelMm < MM_PER_INCH / 64 / 4) return MM_PER_INCH / 1000;
  const marks = INCH_STEPS_64.find((step) => (step * MM_PER_INCH) / 64 >= onePixelMm * 0.999) ?? 16;
  return (marks * MM_PER_INCH) / 64;
}

/**
 * The thickness that an edge takes when it is drawn to `askedMm`: the stock thickness nearby, else a round figure of the
 * reader's system.
 * @param stockMm thicknesses that can be had, mm, in any order
 * @param isFree the stock doesn't draw
 */
export function snappedThickness(
  askedMm: number,
  stockMm: readonly number[],
  pxPerMm: number,
  system: UnitSystem,
  isFree: boolean,
): SnappedThickness {
  const nearest = isFree ? null : nearestOf(stockMm, askedMm);
  if (nearest !== null) {
    const reachMm = Math.min(SNAP_PX / pxPerMm, nearest * SNAP_OF_THICKNESS);
    if (Math.abs(nearest - askedMm) <= reachMm) return { thicknessMm: nearest, stockMm: nearest };
  }
  const stepMm = thicknessStepMm(system, pxPerMm);
  const steps = Math.max(1, Math.round(askedMm / stepMm));
  const rounded = roundedMm(steps * stepMm);
  const thicknessMm = Math.min(MAX_LAYER_MM, Math.max(MIN_LAYER_MM, rounded));
  return { thicknessMm, stockMm: !isFree && stockMm.includes(thicknessMm) ? thicknessMm : null };
}

/** A mark beside the edge for a stock thickness. */
export interface StockTick {
  readonly stockMm: number;
  /** Whether its figure is written; ticks too near to each other keep only some. */
  readonly hasFigure: boolean;
}

/**
 * The stock thicknesses to be marked while an edge is drawn: those within a window about the edge, with figures where
 * there is room, the one it stands on always.
 */
export function stockTicks(
  stockMm: readonly number[],
  currentMm: number,
  pxPerMm: number,
  windowPx: number,
  figurePx: number,
): readonly StockTick[] {
  const windowMm = windowPx / pxPerMm;
  const near = [...new Set(stockMm)]
    .filter((mm) => mm > 0 && Math.abs(mm - currentMm) <= windowMm)
    .sort((a, b) => Math.abs(a - currentMm) - Math.abs(b - currentMm));
  const written: number[] = [];
  for (const mm of near) {
    if (written.every((other) => Math.abs(other - mm) * pxPerMm >= figurePx)) written.push(mm);
  }
  return near.sort((a, b) => a - b).map((mm) => ({ stockMm: mm, hasFigure: written.includes(mm) }));
}

function nearestOf(values: readonly number[], value: number): number | null {
  let nearest: number | null = null;
  for (const candidate of values) {
    if (candidate <= 0) continue;
    if (nearest === null || Math.abs(candidate - value) < Math.abs(nearest - value)) nearest = candidate;
  }
  return nearest;
}

/** Freed of binary dust: 0.30000000000000004 is 0.3. */
function roundedMm(mm: number): number {
  return Number(mm.toPrecision(12));
}
