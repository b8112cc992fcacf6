import type { Content, Source } from '../steel.js';

/** Limits on both sides, wt%. */
export function range(minPercent: number, maxPercent: number, nominalPercent: number): Content {
  return { minPercent, maxPercent, nominalPercent };
}

/** A maximum only, wt%. */
export function upTo(maxPercent: number, nominalPercent: number): Content {
  return { minPercent: null, maxPercent, nominalPercent };
}

/** A minimum only, wt%. */
export function atLeast(minPercent: number, nominalPercent: number): Content {
  return { minPercent, maxPercent: null, nominalPercent };
}

/** No limit known: the rest of the alloy, wt%. */
export function about(nominalPercent: number): Content {
  return { minPercent: null, maxPercent: null, nominalPercent };
}

/** Read in a public text, data sheet or table. */
export function published(text: string): Required<Source> {
  return { text, status: 'published' };
}

/** Some of the numbers were read in public, the rest not. */
export function partly(text: string): Required<Source> {
  return { text, status: 'partly published' };
}

/** Known from the named work, which was not at hand. */
export function memory(text: string): Required<Source> {
  return { text, status: 'from memory: source to be confirmed' };
}

/** What smiths reckon with; nobody measured it. */
export function practice(text: string): Required<Source> {
  return { text, status: 'common practice, no source' };
}

export const ASM_CARBON_LIMITS = published(
  'ASM Handbook vol. 1 carbon-steel plate/strip/shape limits table, read in a public copy; bar limits in SAE J403 are slightly narrower in C',
);
export const HANDBOOK_DENSITY = memory('handbook value for the grade');
export const FORGING_TABLES = memory('ASM Handbook forging tables');
export const TOOL_FORGING = memory('tool-steel data sheets');
