import { type Finding, check } from '../check.js';
import { counted } from '../say.js';
import { allWorkedSteps } from '../walk.js';

type Values = { scale: number; grinding: number; layers: number };

/** More than this share of the layers gone in one step is more than a skin. Common practice, no source. */
const MUCH = 0.1;

/** Whole layers that a step burned or ground away. */
export const layersEaten = check<Values>({
  code: 'layers-eaten',
  source:
    'Follows from the sizes and the shop’s allowances: what comes off a face is compared with the layers under it',
  find: (forging) =>
    allWorkedSteps(forging).flatMap(({ bar, step, after }): Finding<Values>[] => {
      const { scale, grinding } = after.eatenLayers;
      if (scale + grinding === 0) return [];
      const values = { scale, grinding, layers: after.bar.layers };
      const severity = (scale + grinding) / after.bar.layers > MUCH ? 'caution' : 'note';
      return [{ severity, bar: bar.id, stepId: step.id, values }];
    }),
  words: ({ scale, grinding, layers }, _severity, format) => {
    const all = scale + grinding;
    const causes = [
      scale > 0 && `${counted(scale, 'layer', 'layers', format)} to scale`,
      grinding > 0 && `${counted(grinding, 'layer', 'layers', format)} to grinding`,
    ].filter((cause) => cause !== false);
    return {
      message: `This step loses ${causes.join(' and ')}, of ${format.count(layers)} counted: more comes off the faces than the outer ${all === 1 ? 'layer is' : 'layers are'} thick.`,
      remedy:
        scale > 0
          ? 'Start with thicker outer layers, work in fewer heats, or set a smaller scale allowance if your fire is that clean.'
          : 'Grind less off the faces, or start with thicker outer layers.',
    };
  },
});
