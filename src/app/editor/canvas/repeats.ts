/** A run of layers: a group that is laid several times on itself, or a stretch without order. */
export interface Repeat {
  readonly from: number;
  /** Number of layers in the group. */
  readonly period: number;
  /** How often the group is laid; 1 for a stretch without order. */
  readonly times: number;
}

/** The longest group that is looked for. */
const MAX_PERIOD = 12;

/**
 * The repeated groups in a row of layers, from the bottom: `1084 15N20 1084 15N20 1084` is twice `1084 15N20` and once
 * `1084`. From each place on the group that covers most is taken, of those the shortest; so the result says the same as
 * the row and is read as a smith would say it.
 */
export function repeatsOf<T>(row: readonly T[], isSame: (a: T, b: T) => boolean): readonly Repeat[] {
  const repeats: Repeat[] = [];
  let from = 0;
  let loose = 0;
  const closeLoose = (): void => {
    if (loose > 0) repeats.push({ from: from - loose, period: loose, times: 1 });
    loose = 0;
  };
  while (from < row.length) {
    const best = bestRepeat(row, from, isSame);
    if (best === null) {
      loose += 1;
      from += 1;
      continue;
    }
    closeLoose();
    repeats.push(best);
    from += best.period * best.times;
  }
  closeLoose();
  return repeats;
}

function bestRepeat<T>(row: readonly T[], from: number, isSame: (a: T, b: T) => boolean): Repeat | null {
  let best: Repeat | null = null;
  for (let period = 1; period <= MAX_PERIOD && from + 2 * period <= row.length; period++) {
    let matched = 0;
    while (
      from + period + matched < row.length &&
      isSame(row[from + matched] as T, row[from + period + matched] as T)
    ) {
      matched += 1;
    }
    const times = 1 + Math.floor(matched / period);
    if (times > 1 && (best === null || period * times > best.period * best.times)) {
      best = { from, period, times };
    }
  }
  return best;
}
