import type { Layer } from '../../design/index.js';
import { type Composition, type Element, type Steel, findSteel } from '../../steels/index.js';

/** A carbon steel of the catalogue with other contents, wt%. */
export function steelOf(
  id: string,
  contents: Partial<Record<Element, number>>,
  rest: Partial<Steel> = {},
): Steel {
  const composition: Composition = Object.fromEntries(
    Object.entries(contents).map(([element, nominalPercent]) => [
      element,
      { minPercent: null, maxPercent: null, nominalPercent },
    ]),
  );
  return { ...(findSteel('1084') as Steel), id, name: id, composition, ...rest };
}

/** Layers of the given thickness, bottom first. */
export function layersOf(steels: readonly string[], thicknessMm = 5): readonly Layer[] {
  return steels.map((steel) => ({ steel, thicknessMm }));
}
