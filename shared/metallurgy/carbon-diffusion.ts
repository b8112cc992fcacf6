import type { Source } from '../steels/index.js';

/** Gas constant, J/(mol K), and 0 °C in K, as the published sets use them. */
const GAS_CONSTANT = 8.314;
const ZERO_CELSIUS_K = 273.15;

const CARBON_G_PER_MOL = 12.011;
const IRON_G_PER_MOL = 55.845;

/** Published sets for the diffusion of carbon in austenite. */
export type CarbonDiffusionSet =
  'agren' | 'callister' | 'steel-matter' | 'wells-batz-mehl' | 'slycke-ericsson';

/** What the planner reckons with. Callister's textbook value is the slow bound: 0.4–0.7 of the others at forging heat. */
export const DEFAULT_CARBON_DIFFUSION: CarbonDiffusionSet = 'agren';

export const CARBON_DIFFUSION_SOURCES: Readonly<Record<CarbonDiffusionSet, Source>> = {
  agren: { text: 'Ågren’s equation for carbon in austenite, in public code', status: 'published' },
  callister: {
    text: 'Callister, Materials Science and Engineering: 2.3·10⁻⁵ m²/s, 148 kJ/mol',
    status: 'published',
  },
  'steel-matter': { text: 'SteelMatter teaching site: 1.5·10⁻⁵ m²/s, 135 kJ/mol', status: 'published' },
  'wells-batz-mehl': {
    text: 'Wells, Batz & Mehl 1950: 0.12 cm²/s, 32 kcal/mol, low carbon',
    status: 'from memory: source to be confirmed',
  },
  'slycke-ericsson': {
    text: 'Slycke & Ericsson 1981; factor in public code, energy from memory',
    status: 'from memory: source to be confirmed',
  },
};

/** Sets of the plain form D0·exp(−Q/RT): m²/s and J/mol. */
const ARRHENIUS = {
  callister: { d0M2PerS: 2.3e-5, energyJPerMol: 148_000 },
  'steel-matter': { d0M2PerS: 1.5e-5, energyJPerMol: 135_000 },
  'wells-batz-mehl': { d0M2PerS: 1.2e-5, energyJPerMol: 133_900 },
} as const;

/**
 * Diffusivity of carbon in austenite, m²/s.
 *
 * Ågren: 4.53·10⁻⁷ [1 + y(1 − y)·8339.9/T] exp{−(1/T − 2.221·10⁻⁴)(17767 − 26436 y)}, y the atoms of carbon to one of
 * iron. Slycke & Ericsson: 4.84·10⁻⁵ exp(−320x/R)/(1 − 5x)·exp(−(155 000 − 570 000 x)/RT), x the mole fraction.
 *
 * **Source**: {@link CARBON_DIFFUSION_SOURCES}. **Valid for** austenite only (above Ac3 or Acm), up to about 1.5 % C.
 * **Accuracy**: the sets differ by a factor of 2.5 at forging heat.
 * @param temperatureC °C
 * @param carbonPercent wt%, 0–2; only Ågren's and Slycke & Ericsson's sets depend on it
 */
export function carbonDiffusivityM2PerS(
  temperatureC: number,
  carbonPercent: number,
  set: CarbonDiffusionSet = DEFAULT_CARBON_DIFFUSION,
): number {
  const kelvin = temperatureC + ZERO_CELSIUS_K;
  const y = carbonPercent / CARBON_G_PER_MOL / ((100 - carbonPercent) / IRON_G_PER_MOL);
  if (set === 'agren') {
    const factor = 4.53e-7 * (1 + (y * (1 - y) * 8339.9) / kelvin);
    return factor * Math.exp(-(1 / kelvin - 2.221e-4) * (17767 - 26436 * y));
  }
  if (set === 'slycke-ericsson') {
    const x = y / (1 + y);
    const factor = (4.84e-5 * Math.exp((-320 * x) / GAS_CONSTANT)) / (1 - 5 * x);
    return factor * Math.exp(-(155_000 - 570_000 * x) / (GAS_CONSTANT * kelvin));
  }
  const { d0M2PerS, energyJPerMol } = ARRHENIUS[set];
  return d0M2PerS * Math.exp(-energyJPerMol / (GAS_CONSTANT * kelvin));
}
