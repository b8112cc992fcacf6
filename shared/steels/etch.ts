import { nominalPercent, type EtchTone, type Source, type Steel } from './steel.js';

type Etched = Pick<Steel, 'composition' | 'kind' | 'etchTone'>;

/**
 * Classes of materials in the order of darkening in dilute ferric chloride, weakest attack first.
 * **Source**: common practice, no source. The last two stand outside the order.
 */
export const ETCH_CLASSES = [
  'nickel',
  'austenitic-stainless',
  'chromium-stainless',
  'high-nickel',
  'nickel-steel',
  'chromium-tool',
  'phosphoric-iron',
  'mild',
  'half-bright',
  'medium-carbon',
  'high-carbon',
  'manganese-carbon',
  'manganese-tool',
  'copper',
  'fitting',
] as const;
export type EtchClass = (typeof ETCH_CLASSES)[number];

/** Where the order of darkening and the greys come from. */
export const ETCH_SOURCE: Source = {
  text: 'order of darkening in dilute ferric chloride as bladesmiths know it; greys are ours',
  status: 'common practice, no source',
};

/**
 * The class a material etches like, from its nominal composition. Its stated tone decides where the composition leaves
 * it open (a `grey` 52100 or 9260 is no dark steel), where there is no composition, and where the two can't both be
 * right: whoever looked at the etch knows better.
 */
export function etchClassOf(steel: Etched): EtchClass {
  if (steel.etchTone === 'copper-red') return 'copper';
  if (steel.etchTone === 'n/a') return 'fitting';
  const expected = classByComposition(steel);
  return expected !== null && TONES_OF[expected].includes(steel.etchTone) ? expected : classByTone(steel);
}

function classByComposition(steel: Etched): EtchClass | null {
  if (Object.keys(steel.composition).length === 0) return null;
  const carbon = nominalPercent(steel, 'C');
  const manganese = nominalPercent(steel, 'Mn');
  const nickel = nominalPercent(steel, 'Ni');
  const chromium = nominalPercent(steel, 'Cr');
  if (nickel >= 50) return 'nickel';
  if (chromium >= 10) {
    if (nickel >= 6) return 'austenitic-stainless';
    return steel.kind.endsWith('stainless') ? 'chromium-stainless' : 'chromium-tool';
  }
  if (nickel >= 3) return 'high-nickel';
  if (nickel >= 1.2) return 'nickel-steel';
  if (nickel >= 0.5 || chromium >= 3) return 'half-bright';
  if (carbon < 0.25) return nominalPercent(steel, 'P') >= 0.2 ? 'phosphoric-iron' : 'mild';
  if (carbon < 0.55 || steel.etchTone === 'grey') return 'medium-carbon';
  if (manganese >= 1.2) return 'manganese-tool';
  return manganese >= 0.8 ? 'manganese-carbon' : 'high-carbon';
}

/** Tones that a class may show. */
const TONES_OF: Readonly<Record<EtchClass, readonly EtchTone[]>> = {
  nickel: ['very-bright'],
  'austenitic-stainless': ['very-bright'],
  'chromium-stainless': ['very-bright', 'bright'],
  'high-nickel': ['very-bright', 'bright'],
  'nickel-steel': ['very-bright', 'bright'],
  'chromium-tool': ['bright'],
  'phosphoric-iron': ['bright', 'grey'],
  mild: ['grey'],
  'half-bright': ['bright', 'grey'],
  'medium-carbon': ['grey', 'dark'],
  'high-carbon': ['dark'],
  'manganese-carbon': ['dark'],
  'manganese-tool': ['dark'],
  copper: ['copper-red'],
  fitting: ['n/a'],
};

const CLASS_BY_TONE: ReadonlyMap<string, EtchClass> = new Map<EtchTone, EtchClass>([
  ['very-bright', 'high-nickel'],
  ['bright', 'nickel-steel'],
  ['grey', 'medium-carbon'],
  ['dark', 'high-carbon'],
]);

/** Documents from elsewhere may hold tones that nobody knows here: those are shown as a middle grey. */
function classByTone(steel: Etched): EtchClass {
  if (steel.etchTone === 'grey' && nominalPercent(steel, 'Cr') >= 3) return 'half-bright';
  return CLASS_BY_TONE.get(steel.etchTone) ?? 'medium-carbon';
}

/**
 * Strength of the attack, from about 0.1 to 1.25. Orders steels of one class; no physical quantity.
 * **Source**: common practice, no source: 1 − 0.9·min(1, 0.40·Ni + 0.08·max(0, Cr − 1)), and 0.25·min(1, Mn/1.2) more
 * from 0.5 % C on.
 */
export function etchAttack(steel: Pick<Steel, 'composition'>): number {
  const noble = 0.4 * nominalPercent(steel, 'Ni') + 0.08 * Math.max(0, nominalPercent(steel, 'Cr') - 1);
  const smut = nominalPercent(steel, 'C') >= 0.5 ? 0.25 * Math.min(1, nominalPercent(steel, 'Mn') / 1.2) : 0;
  return 1 - 0.9 * Math.min(1, noble) + smut;
}

/** Where a class of materials lies between black and bright, and the attacks that mark its ends. */
interface Band {
  readonly darkest: number;
  readonly brightest: number;
  /** {@link etchAttack} of the darkest and of the brightest in the class; what lies outside is put at the end. */
  readonly attack: readonly [strongest: number, weakest: number];
}

const BANDS: Readonly<Record<EtchClass, Band>> = {
  nickel: { darkest: 0.97, brightest: 1, attack: [0.35, 0.1] },
  'austenitic-stainless': { darkest: 0.97, brightest: 1, attack: [0.35, 0.1] },
  'chromium-stainless': { darkest: 0.91, brightest: 0.95, attack: [0.35, 0.1] },
  'high-nickel': { darkest: 0.86, brightest: 0.9, attack: [0.35, 0.1] },
  'nickel-steel': { darkest: 0.77, brightest: 0.85, attack: [0.75, 0.25] },
  'chromium-tool': { darkest: 0.7, brightest: 0.75, attack: [0.5, 0.1] },
  'phosphoric-iron': { darkest: 0.64, brightest: 0.68, attack: [1, 0.8] },
  mild: { darkest: 0.56, brightest: 0.62, attack: [1, 0.8] },
  'half-bright': { darkest: 0.47, brightest: 0.53, attack: [1.1, 0.5] },
  'medium-carbon': { darkest: 0.35, brightest: 0.44, attack: [1.25, 0.9] },
  'high-carbon': { darkest: 0.2, brightest: 0.32, attack: [1.17, 1] },
  'manganese-carbon': { darkest: 0.11, brightest: 0.18, attack: [1.25, 1.05] },
  'manganese-tool': { darkest: 0, brightest: 0.08, attack: [1.25, 1.05] },
  copper: { darkest: 0.6, brightest: 0.6, attack: [1, 0] },
  fitting: { darkest: 0.75, brightest: 0.75, attack: [1, 0] },
};

/**
 * How bright a material stands in an etched surface: 0 the blackest, 1 nickel. For greys on a screen or a sheet: keeps
 * the order of {@link ETCH_CLASSES}, says nothing about reflectance.
 */
export function etchBrightness(steel: Etched): number {
  const { darkest, brightest, attack } = BANDS[etchClassOf(steel)];
  const [strongest, weakest] = attack;
  const weakness = (strongest - etchAttack(steel)) / (strongest - weakest);
  return darkest + (brightest - darkest) * Math.min(1, Math.max(0, weakness));
}

/** Patterns of lines that tell steels apart without their greys. */
export const HATCHES = [
  'plain',
  'dots',
  'dashes',
  'horizontal',
  'vertical',
  'diagonal',
  'back-diagonal',
  'cross',
  'grid',
  'zigzag',
  'waves',
  'rings',
] as const;
export type Hatch = (typeof HATCHES)[number];

const HATCH: Readonly<Record<EtchClass, Hatch>> = {
  nickel: 'dots',
  'austenitic-stainless': 'grid',
  'chromium-stainless': 'vertical',
  'high-nickel': 'dashes',
  'nickel-steel': 'plain',
  'chromium-tool': 'vertical',
  'phosphoric-iron': 'waves',
  mild: 'horizontal',
  'half-bright': 'back-diagonal',
  'medium-carbon': 'back-diagonal',
  'high-carbon': 'diagonal',
  'manganese-carbon': 'cross',
  'manganese-tool': 'zigzag',
  copper: 'rings',
  fitting: 'rings',
};

/** The hatch of a material, by the class it etches like: usual partners are of different classes, so they differ. */
export function hatchOf(steel: Etched): Hatch {
  return HATCH[etchClassOf(steel)];
}

/**
 * A hatch for each of the materials shown together, in their order: its own where that is free, else the next free one,
 * so that no two look alike. Past the number of hatches they repeat.
 */
export function distinctHatches(steels: readonly Etched[]): Hatch[] {
  const taken = new Set<Hatch>();
  return steels.map((steel) => {
    const own = hatchOf(steel);
    const start = HATCHES.indexOf(own);
    const free = HATCHES.map((_, step) => HATCHES[(start + step) % HATCHES.length] as Hatch).find(
      (h) => !taken.has(h),
    );
    taken.add(free ?? own);
    return free ?? own;
  });
}

/** How a material is drawn. */
export interface Tone {
  readonly name: EtchTone;
  /** The tone in words, for screen readers and legends. */
  readonly words: string;
  /** 0–1, see {@link etchBrightness}. */
  readonly brightness: number;
  readonly hatch: Hatch;
  /** sRGB, 0–255 each. */
  readonly rgb: readonly [red: number, green: number, blue: number];
  /** The same as `#rrggbb`. */
  readonly hex: string;
}

const TONE_WORDS: ReadonlyMap<string, string> = new Map<EtchTone, string>([
  ['very-bright', 'very bright'],
  ['bright', 'bright'],
  ['grey', 'grey'],
  ['dark', 'dark'],
  ['copper-red', 'copper red'],
  ['n/a', 'not etched'],
]);

/** CIE lightness of the blackest and the brightest tone. Equal steps of brightness look equal. */
const LIGHTNESS = { darkest: 16, brightest: 92 } as const;

/** How a material is drawn: tone, grey (copper red for copper) and hatch. */
export function toneOf(steel: Etched): Tone {
  const brightness = etchBrightness(steel);
  const grey = greyOfLightness(LIGHTNESS.darkest + (LIGHTNESS.brightest - LIGHTNESS.darkest) * brightness);
  const rgb: Tone['rgb'] = steel.etchTone === 'copper-red' ? [184, 115, 81] : [grey, grey, grey];
  const hex = `#${rgb.map((channel) => channel.toString(16).padStart(2, '0')).join('')}`;
  return {
    name: steel.etchTone,
    words: TONE_WORDS.get(steel.etchTone) ?? steel.etchTone,
    brightness,
    hatch: hatchOf(steel),
    rgb,
    hex,
  };
}

/** sRGB channel 0–255 of a grey with CIE lightness L* (0–100). **Source**: CIE 15 (L*), IEC 61966-2-1 (sRGB). */
function greyOfLightness(lightness: number): number {
  const luminance = lightness > 8 ? ((lightness + 16) / 116) ** 3 : lightness / 903.2963;
  const channel = luminance <= 0.0031308 ? 12.92 * luminance : 1.055 * luminance ** (1 / 2.4) - 0.055;
  return Math.round(255 * channel);
}
