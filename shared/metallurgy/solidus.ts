import { type Source, type Steel, nominalPercent } from '../steels/index.js';

/** Contents that the solidus line reckons with, wt%. */
export interface SolidusContents {
  readonly C: number;
  readonly Si?: number;
  readonly Mn?: number;
  readonly Ni?: number;
  readonly Cr?: number;
  readonly P?: number;
  readonly S?: number;
}

/** How a solidus was found: on the iron–carbon line, or as a figure for a family that the line doesn't hold for. */
export type SolidusBasis = 'carbon-line' | 'carbide-eutectic' | 'stainless' | 'nickel' | 'copper';

/** Where a metal begins to melt. */
export interface Solidus {
  readonly temperatureC: number;
  readonly basis: SolidusBasis;
  readonly source: Source;
}

/** Points of the iron–carbon diagram, °C and wt%. 1493 and 1147 °C published (lecture notes); the rest from memory. */
const IRON_MELTS_C = 1538;
const DELTA_SLOPE_K_PER_PERCENT = 500;
const PERITECTIC = { temperatureC: 1493, ferritePercent: 0.09, austenitePercent: 0.17 } as const;
const EUTECTIC = { temperatureC: 1147, austenitePercent: 2.14 } as const;
const LINE_SLOPE_K_PER_PERCENT = 175.63;

/** How much each wt% lowers the solidus, K. */
const ALLOY_SLOPES_K_PER_PERCENT = { Si: 12.3, Mn: 6.8, Ni: 4.3, Cr: 1.4, P: 124.5, S: 183.9 } as const;

const LINE_SOURCE: Source = {
  text:
    'straight line of the iron–carbon diagram from 0.17 % C, 1493 °C to 2.14 % C, 1147 °C (temperatures: lecture ' +
    'notes); alloy slopes after Takeuchi & Brimacombe',
  status: 'from memory: source to be confirmed',
};

/**
 * Solidus of carbon and low-alloy steel, °C: where the first drop of liquid forms.
 *
 * 1493 − 175.63 (C − 0.17) between 0.17 and 2.14 % C, 1493 from 0.09 on, 1538 − 500 C below, each less
 * 12.3 Si + 6.8 Mn + 4.3 Ni + 1.4 Cr + 124.5 P + 183.9 S. From 2.14 % C on it stays at the eutectic.
 *
 * **Source**: straight line through the peritectic and eutectic points; alloy slopes after Takeuchi & Brimacombe,
 * from memory: source to be confirmed (their own carbon slope is for low carbon and is not used).
 * **Valid for** carbon and low-alloy steel; not for ledeburitic or stainless steel, see {@link solidusOf}.
 * **Accuracy**: ± 6 °C up to 1.5 % C against a solidus worked out from assessed thermodynamic functions.
 * @param contents wt%, each ≥ 0
 */
export function solidusLineC(contents: SolidusContents): number {
  const carbon = contents.C;
  let lowered = 0;
  for (const element of Object.keys(
    ALLOY_SLOPES_K_PER_PERCENT,
  ) as (keyof typeof ALLOY_SLOPES_K_PER_PERCENT)[]) {
    lowered += ALLOY_SLOPES_K_PER_PERCENT[element] * (contents[element] ?? 0);
  }
  return plainSolidusC(carbon) - lowered;
}

function plainSolidusC(carbonPercent: number): number {
  if (carbonPercent < PERITECTIC.ferritePercent) {
    return IRON_MELTS_C - DELTA_SLOPE_K_PER_PERCENT * carbonPercent;
  }
  if (carbonPercent < PERITECTIC.austenitePercent) return PERITECTIC.temperatureC;
  if (carbonPercent >= EUTECTIC.austenitePercent) return EUTECTIC.temperatureC;
  return PERITECTIC.temperatureC - LINE_SLOPE_K_PER_PERCENT * (carbonPercent - PERITECTIC.austenitePercent);
}

const MEMORY = 'from memory: source to be confirmed';

/** Families that the line doesn't hold for. Where a range is given in the trade, its careful end is used. */
const FIXED = {
  ledeburitic: fixed(
    1150,
    'carbide-eutectic',
    'carbide eutectics of D2, 440C and high-speed steel melt near 1150–1250 °C; the lower end is used',
  ),
  carbideForming: fixed(
    1250,
    'carbide-eutectic',
    'carbide eutectics melt near 1150–1250 °C; the upper end is used for steels with little of them (A2, 13C26)',
  ),
  austenitic: fixed(
    1375,
    'stainless',
    'melting ranges of 304 and 316 start at 1375–1400 °C in handbooks; the lower end is used',
  ),
  stainless: fixed(
    1450,
    'stainless',
    'melting ranges of 410 and 420 start at 1450–1480 °C in handbooks; the lower end is used',
  ),
  nickel: fixed(1435, 'nickel', 'nickel 200 melts at 1435–1446 °C'),
  copper: fixed(1085, 'copper', 'copper melts at 1085 °C'),
} as const;

function fixed(temperatureC: number, basis: SolidusBasis, text: string): Solidus {
  return { temperatureC, basis, source: { text, status: MEMORY } };
}

/** Nearly pure nickel, whose faces don't weld to each other under flux. */
export function isPureNickel(steel: Pick<Steel, 'kind' | 'composition'>): boolean {
  return steel.kind === 'nickel' || (steel.kind !== 'fitting' && nominalPercent(steel, 'Ni') >= 50);
}

/** Nearly pure copper, as for an interlayer. */
export function isCopper(steel: Pick<Steel, 'kind' | 'composition'>): boolean {
  return steel.kind === 'non-ferrous' && nominalPercent(steel, 'Cu') >= 95;
}

/** Whether a material has no place in a forge weld at all: metals for fittings, and non-ferrous ones but nickel and copper. */
export function isForeignToWelding(steel: Pick<Steel, 'kind' | 'composition'>): boolean {
  const isPoisonous = nominalPercent(steel, 'Zn') >= 0.1 || nominalPercent(steel, 'Pb') >= 0.1;
  return (
    steel.kind === 'fitting' ||
    isPoisonous ||
    (steel.kind === 'non-ferrous' && !isCopper(steel) && !isPureNickel(steel))
  );
}

/**
 * Where a material of the catalogue or a shop's own begins to melt, by its nominal composition.
 * @returns null for metals that have no place in a forge weld (brass, bronze, …)
 */
export function solidusOf(steel: Pick<Steel, 'kind' | 'composition'>): Solidus | null {
  if (isForeignToWelding(steel)) return null;
  if (isCopper(steel)) return FIXED.copper;
  if (isPureNickel(steel)) return FIXED.nickel;
  const of = (element: Parameters<typeof nominalPercent>[1]): number => nominalPercent(steel, element);
  const carbon = of('C');
  const chromium = of('Cr');
  const isHighSpeed = carbon >= 0.7 && of('W') + 2 * of('Mo') >= 10;
  if (isHighSpeed || (chromium >= 10 && carbon >= 0.9)) return FIXED.ledeburitic;
  if (chromium >= 4 && carbon >= 0.5) return FIXED.carbideForming;
  if (chromium >= 10.5) return of('Ni') >= 6 ? FIXED.austenitic : FIXED.stainless;
  return {
    temperatureC: solidusLineC({
      C: carbon,
      Si: of('Si'),
      Mn: of('Mn'),
      Ni: of('Ni'),
      Cr: chromium,
      P: of('P'),
      S: of('S'),
    }),
    basis: 'carbon-line',
    source: LINE_SOURCE,
  };
}
