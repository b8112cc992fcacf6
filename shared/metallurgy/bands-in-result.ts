import type { Bar } from '../design/index.js';
import type { ForgedBar, Forging } from '../forging/index.js';
import { ratiosOf, stackBandsMm } from './band-thickness.js';
import { contentsOf, sharesOfResult } from './contents.js';

/** How thick the bands of one stack are in the result. */
export interface BandInResult {
  readonly bar: string;
  readonly name: string;
  /** Mean over its bands, mm. */
  readonly bandMm: number;
}

/**
 * Mean thickness in mm of the bands of each stack that ends in the result and has more than one, as the result shows
 * them: its own end, carried through the bars it goes into by their reduction. Where a bar goes into several, the mean.
 */
export function bandsInResultMm(forging: Forging): readonly BandInResult[] {
  const shares = sharesOfResult(forging);
  const contents = contentsOf(forging);
  /** Mean ratio of thickness from the end of a bar to the result, weighted by mass. */
  const later = new Map<string, number>([[forging.design.result, 1]]);
  const bands: BandInResult[] = [];
  for (let b = forging.bars.length - 1; b >= 0; b--) {
    const bar = forging.design.bars[b] as Bar;
    const forged = forging.bars[b] as ForgedBar;
    const share = shares.get(bar.id);
    const ratio = later.get(bar.id);
    if (share === undefined || ratio === undefined) continue;
    const ratios = ratiosOf(forged, forging.allowances);
    if (bar.start.kind === 'stack' && (forged.states[0]?.bar.section?.bands ?? 1) > 1) {
      const own = stackBandsMm(forged, forging.allowances);
      bands.push({ bar: bar.id, name: bar.name, bandMm: ratio * (own[own.length - 1] as number) });
    }
    for (const piece of contents.get(bar.id)?.pieces ?? []) {
      const weight = (share * piece.massFraction) / (shares.get(piece.from) as number);
      const through = ratio * (ratios[ratios.length - 1] as number);
      later.set(piece.from, (later.get(piece.from) ?? 0) + weight * through);
    }
  }
  return bands.reverse();
}
