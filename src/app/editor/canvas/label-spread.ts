/**
 * Where labels go so that each is as near as can be to what it names and none touches another: their order is kept, the
 * sum of squared shifts is least (isotonic regression by pooling neighbours that would overlap).
 * @param wantedPx middle of what each label names, ascending
 * @param heightsPx height that each label takes
 * @param fromPx where the first may begin
 * @param toPx where the last must end
 * @returns the middle of each label. Without room for all of them they overlap, all by the same part of their height.
 */
export function spreadLabels(
  wantedPx: readonly number[],
  heightsPx: readonly number[],
  fromPx: number,
  toPx: number,
): readonly number[] {
  const totalPx = heightsPx.reduce((sum, height) => sum + height, 0);
  const roomPx = Math.max(0, toPx - fromPx);
  const squeeze = totalPx > roomPx ? roomPx / totalPx : 1;
  // With the room that the labels before take subtracted, "no two touch" is "never descending".
  const offsets: number[] = [];
  let usedPx = 0;
  for (const height of heightsPx) {
    offsets.push(usedPx + (height * squeeze) / 2);
    usedPx += height * squeeze;
  }
  const pools: { sum: number; size: number }[] = [];
  for (const [i, wanted] of wantedPx.entries()) {
    pools.push({ sum: wanted - (offsets[i] as number), size: 1 });
    while (pools.length > 1) {
      const last = pools[pools.length - 1] as { sum: number; size: number };
      const before = pools[pools.length - 2] as { sum: number; size: number };
      if (before.sum / before.size <= last.sum / last.size) break;
      before.sum += last.sum;
      before.size += last.size;
      pools.pop();
    }
  }
  const highestStart = Math.max(fromPx, toPx - usedPx);
  const middles: number[] = [];
  for (const pool of pools) {
    const start = Math.min(highestStart, Math.max(fromPx, pool.sum / pool.size));
    for (let i = 0; i < pool.size; i++) middles.push(start + (offsets[middles.length] as number));
  }
  return middles;
}
