import { type Source, type Steel, nominalPercent } from '../steels/index.js';
import { isCopper, isForeignToWelding, isPureNickel } from './solidus.js';

/** wt% that carbon's activity depends on. */
export interface ActivityContents {
  readonly Si?: number;
  readonly Mn?: number;
  readonly Cr?: number;
  readonly Ni?: number;
  readonly Mo?: number;
}

export const CARBON_ACTIVITY_SOURCE: Source = {
  text: 'Gunnarson 1967, made for carburising steels near 900–950 °C',
  status: 'from memory: source to be confirmed',
};

/** log10(1/k) for each wt%. */
const SLOPES = { Si: 0.055, Mn: -0.013, Cr: -0.04, Ni: 0.014, Mo: -0.013 } as const;

/**
 * How much carbon a layer takes at the same activity, against plain iron (1): > 1 with Cr, Mn, Mo, < 1 with Si and Ni.
 * Carbon levels its activity, not its percentage, so level layers hold carbon in proportion to this.
 *
 * log10(1/k) = 0.055 Si − 0.013 Mn − 0.040 Cr + 0.014 Ni − 0.013 Mo.
 *
 * **Source**: {@link CARBON_ACTIVITY_SOURCE}. **Valid for** low-alloy steel near 900–950 °C; a guess beyond about 3 % Cr.
 */
export function carbonAffinity(contents: ActivityContents): number {
  let exponent = 0;
  for (const element of Object.keys(SLOPES) as (keyof typeof SLOPES)[]) {
    exponent += SLOPES[element] * (contents[element] ?? 0);
  }
  return 10 ** -exponent;
}

/** {@link carbonAffinity} of a material by its nominal composition. */
export function carbonAffinityOf(steel: Pick<Steel, 'composition'>): number {
  const of = (element: keyof ActivityContents): number => nominalPercent(steel, element);
  return carbonAffinity({ Si: of('Si'), Mn: of('Mn'), Cr: of('Cr'), Ni: of('Ni'), Mo: of('Mo') });
}

/** A part of a whole in which carbon may move. */
export interface CarbonPart {
  /** Mass, in any unit common to all parts; ≥ 0. */
  readonly mass: number;
  readonly carbonPercent: number;
  /** See {@link carbonAffinity}. */
  readonly affinity: number;
}

/** wt% of carbon in each part once its activity is level: in proportion to the affinity, the mean kept. */
export function levelCarbonPercent(parts: readonly CarbonPart[]): readonly number[] {
  const mass = parts.reduce((sum, part) => sum + part.mass, 0);
  if (mass === 0) return parts.map((part) => part.carbonPercent);
  const carbon = parts.reduce((sum, part) => sum + part.mass * part.carbonPercent, 0);
  const affinity = parts.reduce((sum, part) => sum + part.mass * part.affinity, 0);
  return parts.map((part) => (carbon * part.affinity) / affinity);
}

/**
 * Whether a layer of the material is planned as a barrier to carbon: nickel and copper (and metals that have no place
 * in a weld). It neither gives nor takes carbon, and what lies on its two sides doesn't exchange any.
 * **Source**: common practice, no source: carbon does pass nickel, slowly; 0.1 mm of it or more holds it back enough.
 */
export function isCarbonBarrier(steel: Pick<Steel, 'kind' | 'composition'>): boolean {
  return isPureNickel(steel) || isCopper(steel) || isForeignToWelding(steel);
}
