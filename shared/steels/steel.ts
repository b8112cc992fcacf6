/** What a composition may speak of: chemical elements in wt%, and the slag of old iron. */
export const ELEMENTS = [
  'C',
  'Mn',
  'Si',
  'P',
  'S',
  'Ni',
  'Cr',
  'Mo',
  'W',
  'V',
  'Co',
  'Cu',
  'Al',
  'Ti',
  'Nb',
  'N',
  'B',
  'As',
  'Fe',
  'Zn',
  'Sn',
  'Pb',
  'slag',
] as const;
export type Element = (typeof ELEMENTS)[number];

/** How far a value may be trusted. It stays with the value all the way to the screen and the printed sheet. */
export const SOURCE_STATUSES = [
  'published',
  'partly published',
  'from memory: source to be confirmed',
  'common practice, no source',
] as const;
export type SourceStatus = (typeof SOURCE_STATUSES)[number];

/** Where a value comes from. */
export interface Source {
  /** Names the work, in words. */
  readonly text?: string;
  readonly status: SourceStatus;
}

/** Families of materials. */
export const STEEL_KINDS = [
  'carbon',
  'carbon-tool',
  'cold-work-tool',
  'hot-work-tool',
  'shock-tool',
  'low-alloy-tool',
  'low-alloy',
  'spring',
  'bearing',
  'structural-Ni',
  'martensitic-stainless',
  'austenitic-stainless',
  'iron',
  'nickel',
  'reclaimed',
  'powder',
  'non-ferrous',
  'fitting',
] as const;
export type SteelKind = (typeof STEEL_KINDS)[number];

/** What a material looks like after a dip in dilute ferric chloride; `n/a` where it is not etched with the blade. */
export const ETCH_TONES = ['very-bright', 'bright', 'grey', 'dark', 'copper-red', 'n/a'] as const;
export type EtchTone = (typeof ETCH_TONES)[number];

/** Content of one element, wt%. Null: the standard sets no limit on that side. */
export interface Content {
  readonly minPercent: number | null;
  readonly maxPercent: number | null;
  /** What is reckoned with. */
  readonly nominalPercent: number;
}

export type Composition = { readonly [element in Element]?: Content };

/** Names under which a material is sold. A word such as `near` or `class` says that the standard's grade is only alike. */
export interface Designations {
  readonly sae?: string;
  readonly aisi?: string;
  readonly uns?: string;
  readonly en?: string;
  readonly wnr?: string;
  readonly astm?: string;
  readonly other?: string;
}

/** A material of the catalogue, or one of the shop's own. */
export interface Steel {
  /** Stable key; documents hold it. */
  readonly id: string;
  readonly name: string;
  readonly designations: Designations;
  readonly composition: Composition;
  /** At room temperature, solid; kg/m³. */
  readonly densityKgM3: number;
  readonly kind: SteelKind;
  readonly etchTone: EtchTone;
  /** Why it etches so, in words. */
  readonly etchWhy: string;
  /** Highest temperature to start forging and lowest to go on, °C. Makers differ: their data sheet decides. */
  readonly forging: { readonly startMaxC: number; readonly finishMinC: number };
  /** What a smith should know about it; may be empty. */
  readonly note: string;
  readonly sources: {
    readonly composition: Required<Source>;
    readonly density: Source;
    readonly forging: Source;
  };
}

/** Nominal content in wt%; 0 where the composition doesn't speak of the element. */
export function nominalPercent(steel: Pick<Steel, 'composition'>, element: Element): number {
  return steel.composition[element]?.nominalPercent ?? 0;
}

/** Scrap whose composition is a guess until a coupon was tested. */
export function isReclaimed(steel: Pick<Steel, 'kind'>): boolean {
  return steel.kind === 'reclaimed';
}

const KIND_WORDS: ReadonlyMap<string, string> = new Map<SteelKind, string>([
  ['carbon', 'carbon steel'],
  ['carbon-tool', 'carbon tool steel'],
  ['cold-work-tool', 'cold-work tool steel'],
  ['hot-work-tool', 'hot-work tool steel'],
  ['shock-tool', 'shock-resisting tool steel'],
  ['low-alloy-tool', 'low-alloy tool steel'],
  ['low-alloy', 'low-alloy steel'],
  ['spring', 'spring steel'],
  ['bearing', 'bearing steel'],
  ['structural-Ni', 'nickel plate steel'],
  ['martensitic-stainless', 'martensitic stainless steel'],
  ['austenitic-stainless', 'austenitic stainless steel'],
  ['iron', 'iron'],
  ['nickel', 'nickel'],
  ['reclaimed', 'reclaimed, composition unknown'],
  ['powder', 'steel powder'],
  ['non-ferrous', 'non-ferrous metal'],
  ['fitting', 'metal for fittings'],
]);

/** A family of materials in words; one that nobody knows here as it is written in its document. */
export function kindWords(kind: SteelKind): string {
  return KIND_WORDS.get(kind) ?? kind;
}

const DESIGNATION_WORDS: ReadonlyMap<string, string> = new Map<keyof Designations, string>([
  ['sae', 'SAE '],
  ['aisi', 'AISI '],
  ['uns', 'UNS '],
  ['en', 'EN '],
  ['wnr', ''],
  ['astm', 'ASTM '],
  ['other', ''],
]);

/** The names under which a material is sold: `SAE 1084`, `UNS G10840`, `EN C85S near`, `1.1269 near`. */
export function designationList(steel: Pick<Steel, 'designations'>): string[] {
  const order = [...DESIGNATION_WORDS.keys()];
  return (Object.entries(steel.designations) as [string, string][])
    .sort(([one], [other]) => order.indexOf(one) - order.indexOf(other))
    .map(([system, name]) => (DESIGNATION_WORDS.get(system) ?? `${system} `) + name);
}
