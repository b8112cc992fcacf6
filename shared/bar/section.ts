/**
 * The layers met on one straight walk through a bar, in the direction in which they lie.
 *
 * A section is a view: `baseMm` may be shared with other sections and holds thicknesses before `scale`; the first
 * and the last layer carry their own thickness, since they are the ones that scale and grinding cut into. So drawing
 * or trimming two million layers copies nothing.
 */
export interface Section {
  /** Index of each layer's steel in the design's steel table. */
  readonly steels: Uint16Array;
  /** Thickness of each layer in mm before `scale`; the first and last entries are not used. */
  readonly baseMm: Float64Array;
  readonly scale: number;
  readonly firstMm: number;
  readonly lastMm: number;
  /** Bands that can be told apart: neighbouring layers of one steel are one band. */
  readonly bands: number;
  readonly minMm: number;
  readonly maxMm: number;
  /** Smallest and largest band, mm; a band is at least as thick as its thinnest layer. */
  readonly minBandMm: number;
  readonly totalMm: number;
}

/** The most layers a section may hold; past it a step is refused. */
export const MAX_SECTION_LAYERS = 2_000_000;

/** A rest thinner than this (mm) is rounding, not a layer. */
const NOTHING_MM = 1e-9;

/** Number of layers left in the section. */
export function layerCount(section: Section): number {
  return section.steels.length;
}

/** Thickness in mm of layer `index`, counted from the bottom (or left, or near) side. */
export function layerThicknessMm(section: Section, index: number): number {
  if (index === section.steels.length - 1) return section.lastMm;
  if (index === 0) return section.firstMm;
  return (section.baseMm[index] ?? 0) * section.scale;
}

/**
 * A section from a list of layers.
 * @param steels steel index of each layer, bottom first; at least one
 * @param thicknessMm thickness of each layer, mm, > 0
 */
export function sectionOf(steels: Uint16Array, thicknessMm: Float64Array): Section {
  const count = steels.length;
  if (count === 0 || count !== thicknessMm.length) {
    throw new RangeError(
      `sectionOf: ${count} steels and ${thicknessMm.length} thicknesses; both must be equal and > 0`,
    );
  }
  return measured(steels, thicknessMm, 1, thicknessMm[0] as number, thicknessMm[count - 1] as number);
}

/** The same layers, each `ratio` times as thick (`ratio` > 0). */
export function scaleSection(section: Section, ratio: number): Section {
  return {
    ...section,
    scale: section.scale * ratio,
    firstMm: section.firstMm * ratio,
    lastMm: section.lastMm * ratio,
    minMm: section.minMm * ratio,
    maxMm: section.maxMm * ratio,
    minBandMm: section.minBandMm * ratio,
    totalMm: section.totalMm * ratio,
  };
}

/** What a cut leaves, and how many whole layers it took. */
export interface SectionCut {
  /** Null when nothing is left. */
  readonly section: Section | null;
  readonly eaten: number;
}

/** Takes `startMm` off the first side and `endMm` off the other (both ≥ 0). */
export function cutSection(section: Section, startMm: number, endMm: number): SectionCut {
  const count = section.steels.length;
  if (startMm <= 0 && endMm <= 0) return { section, eaten: 0 };
  if (section.totalMm - startMm - endMm <= NOTHING_MM) return { section: null, eaten: count };
  let from = 0;
  let firstRest = layerThicknessMm(section, 0) - startMm;
  while (firstRest <= NOTHING_MM && from < count - 1) firstRest += layerThicknessMm(section, ++from);
  let to = count - 1;
  let lastRest = (to === from ? firstRest : layerThicknessMm(section, to)) - endMm;
  while (lastRest <= NOTHING_MM && to > from) {
    to -= 1;
    lastRest += to === from ? firstRest : layerThicknessMm(section, to);
  }
  if (lastRest <= NOTHING_MM) return { section: null, eaten: count };
  const steels = section.steels.subarray(from, to + 1);
  const base = section.baseMm.subarray(from, to + 1);
  return {
    section: measured(steels, base, section.scale, from === to ? lastRest : firstRest, lastRest),
    eaten: count - (to - from + 1),
  };
}

/** The section seen from the other side. */
export function mirrorSection(section: Section): Section {
  return {
    ...section,
    steels: Uint16Array.from(section.steels).reverse(),
    baseMm: Float64Array.from(section.baseMm).reverse(),
    firstMm: section.steels.length === 1 ? section.firstMm : section.lastMm,
    lastMm: section.steels.length === 1 ? section.lastMm : section.firstMm,
  };
}

/** The sections one after another. The sum of their layers must not pass {@link MAX_SECTION_LAYERS}. */
export function joinSections(sections: readonly Section[]): Section {
  const count = sections.reduce((sum, part) => sum + part.steels.length, 0);
  if (count > MAX_SECTION_LAYERS) {
    throw new RangeError(`joinSections: ${count} layers, at most ${MAX_SECTION_LAYERS}`);
  }
  const steels = new Uint16Array(count);
  const thicknessMm = new Float64Array(count);
  let at = 0;
  for (const part of sections) {
    const partCount = part.steels.length;
    steels.set(part.steels, at);
    for (let i = 0; i < partCount; i++) thicknessMm[at + i] = (part.baseMm[i] as number) * part.scale;
    thicknessMm[at] = part.firstMm;
    thicknessMm[at + partCount - 1] = part.lastMm;
    at += partCount;
  }
  return sectionOf(steels, thicknessMm);
}

/** Thickness in mm of each layer, bottom first: a new array, for pictures and tests. */
export function thicknessesMm(section: Section): Float64Array {
  return Float64Array.from(section.steels, (_, index) => layerThicknessMm(section, index));
}

/** How many seams in the section join two layers of the steel with index `steel`. */
export function likeSeams(section: Section, steel: number): number {
  let seams = 0;
  for (let i = 1; i < section.steels.length; i++) {
    if (section.steels[i] === steel && section.steels[i - 1] === steel) seams += 1;
  }
  return seams;
}

function measured(
  steels: Uint16Array,
  baseMm: Float64Array,
  scale: number,
  firstMm: number,
  lastMm: number,
): Section {
  const last = steels.length - 1;
  let bands = 0;
  let minMm = Infinity;
  let maxMm = 0;
  let minBandMm = Infinity;
  let totalMm = 0;
  let bandMm = 0;
  let steelBefore = -1;
  for (let i = 0; i <= last; i++) {
    const thickness = i === last ? lastMm : i === 0 ? firstMm : (baseMm[i] as number) * scale;
    const steel = steels[i] as number;
    if (steel !== steelBefore) {
      if (bands > 0 && bandMm < minBandMm) minBandMm = bandMm;
      bands += 1;
      bandMm = 0;
      steelBefore = steel;
    }
    bandMm += thickness;
    totalMm += thickness;
    if (thickness < minMm) minMm = thickness;
    if (thickness > maxMm) maxMm = thickness;
  }
  if (bandMm < minBandMm) minBandMm = bandMm;
  return { steels, baseMm, scale, firstMm, lastMm, bands, minMm, maxMm, minBandMm, totalMm };
}
