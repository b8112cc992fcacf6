import { type Losses, NO_LOSSES, addLosses, massKg, totalLoss, volumeMm3 } from '../bar/index.js';
import type { Design } from '../design/index.js';
import type { CutPlan } from './cut-plan.js';
import type { ForgedState, StockItem, Totals } from './forging.js';
import { type Ground, endOf, kerfMassKg } from './start.js';

/**
 * What goes in, what comes out and where the rest went, over every bar that ends in the result.
 * start = end + losses, to rounding: pieces cut for bars that don't end in the result count as trim.
 */
export function totalsOf(design: Design, ground: Ground, result: ForgedState): Totals {
  let startMassKg = 0;
  let welds = 0;
  let heats = 0;
  let lossesKg: Losses = leftOver(design, ground);
  for (const bar of design.bars) {
    const forged = ground.forged.get(bar.id);
    const start = forged?.states[0];
    if (!forged?.endsInResult || !start) continue;
    if (bar.start.kind === 'stack') startMassKg += massKg(volumeMm3(start.bar), start.bar.densityKgM3);
    for (const state of forged.states) {
      lossesKg = addLosses(lossesKg, state.lossesKg);
      heats += state.heats;
      if (state.step?.kind === 'weld' && !state.step.isOff) welds += 1;
    }
  }
  const endMassKg = massKg(volumeMm3(result.bar), result.bar.densityKgM3);
  return { startMassKg, endMassKg, yieldPercent: (endMassKg / startMassKg) * 100, welds, heats, lossesKg };
}

/** Difference between what went in and what is accounted for, kg; 0 but for rounding. */
export function unaccountedKg(totals: Totals): number {
  return totals.startMassKg - totals.endMassKg - totalLoss(totals.lossesKg);
}

/** Stock to cut for the bars that end in the result: equal pieces of one steel together, in the order of the document. */
export function stockOf(design: Design, cutPlan: CutPlan): readonly StockItem[] {
  const items = new Map<string, StockItem>();
  for (const bar of design.bars) {
    if (bar.start.kind !== 'stack' || !cutPlan.endsInResult.has(bar.id)) continue;
    const { lengthMm, widthMm, layers } = bar.start;
    for (const { steel, thicknessMm } of layers) {
      const key = JSON.stringify([steel, thicknessMm, widthMm, lengthMm]);
      const pieces = (items.get(key)?.pieces ?? 0) + 1;
      items.set(key, { steel, thicknessMm, widthMm, lengthMm, pieces });
    }
  }
  return [...items.values()];
}

/** Pieces, and their saw cuts, that go into bars which don't end in the result. */
function leftOver(design: Design, ground: Ground): Losses {
  const { cutPlan } = ground;
  let losses = NO_LOSSES;
  for (const bar of design.bars) {
    if (bar.start.kind !== 'assembly' || cutPlan.endsInResult.has(bar.id)) continue;
    for (const [i, { bar: id }] of bar.start.pieces.entries()) {
      const end = endOf(ground.forged.get(id));
      if (id === design.result || !cutPlan.endsInResult.has(id) || end === null) continue;
      const pieces = cutPlan.pieces.get(id) ?? 1;
      const kerf = kerfMassKg(end, ground.allowances);
      const pieceKg = (massKg(volumeMm3(end), end.densityKgM3) - (pieces - 1) * kerf) / pieces;
      const isCutFree = (cutPlan.places.get(bar.id)?.[i] ?? 0) > 0;
      losses = addLosses(losses, { ...NO_LOSSES, trim: pieceKg, kerf: isCutFree ? kerf : 0 });
    }
  }
  return losses;
}
