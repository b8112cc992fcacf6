import { type Finding, check } from '../check.js';
import { counted } from '../say.js';

type Values = { seams: number; firstLayer: number; steel: string; steelName: string };

/** Neighbouring layers of one steel in a stack. */
export const likeLayers = check<Values>({
  code: 'like-layers',
  source: 'Follows from the stack: neighbouring layers of one steel etch as one band',
  find: (forging) =>
    forging.design.bars.flatMap((bar): Finding<Values>[] => {
      if (bar.start.kind !== 'stack') return [];
      const { layers } = bar.start;
      const upper = layers.flatMap((layer, i) => (i > 0 && layers[i - 1]?.steel === layer.steel ? [i] : []));
      const first = upper[0];
      if (first === undefined) return [];
      const steel = layers[first]?.steel ?? '';
      const steelName = forging.steels.find(({ id }) => id === steel)?.name ?? steel;
      const values = { seams: upper.length, firstLayer: first, steel, steelName };
      return [{ severity: 'note', bar: bar.id, stepId: null, values }];
    }),
  words: ({ seams, firstLayer, steelName }, _severity, format) => ({
    message:
      `Layers ${format.count(firstLayer)} and ${format.count(firstLayer + 1)} from the bottom are both ${steelName}` +
      (seams > 1 ? ` (like meets like at ${counted(seams, 'seam', 'seams', format)} of this stack)` : '') +
      ': they show as one thick band.',
    remedy: 'Lay another steel between them, or make it one thicker layer: that saves a seam to weld.',
  }),
});
