import type { Steel } from '../steel.js';
import { CARBON_STEELS } from './carbon.js';
import { COPPER_ALLOYS } from './copper-alloy.js';
import { IRON_AND_NICKEL } from './iron-and-nickel.js';
import { LOW_ALLOY_STEELS } from './low-alloy.js';
import { RECLAIMED_AND_POWDER } from './reclaimed-and-powder.js';
import { STAINLESS_STEELS } from './stainless.js';
import { TOOL_STEELS } from './tool.js';

/** Every material that comes with the program, family by family. */
export const CATALOGUE: readonly Steel[] = [
  ...CARBON_STEELS,
  ...TOOL_STEELS,
  ...LOW_ALLOY_STEELS,
  ...STAINLESS_STEELS,
  ...IRON_AND_NICKEL,
  ...RECLAIMED_AND_POWDER,
  ...COPPER_ALLOYS,
];

const BY_ID: ReadonlyMap<string, Steel> = new Map(CATALOGUE.map((steel) => [steel.id, steel]));

/** The catalogue's material with this id, or undefined. */
export function findSteel(id: string): Steel | undefined {
  return BY_ID.get(id);
}
