import type { WeldMethod } from '../../metallurgy/index.js';
import { nominalPercent } from '../../steels/index.js';
import { type Finding, check, severityAbove } from '../check.js';
import { METHOD_WORDS } from '../say.js';
import { firstOfEach, weldEvents } from '../walk.js';

type Values = { steel: string; steelName: string; chromiumPercent: number; method: WeldMethod };

/** wt% of chromium past which a weld is worth a word, risky, or can't be done unless the air is shut out. */
const LIMITS = { note: 0.8, caution: 1.5, stop: 3 } as const;
/** From here on chromium closes its own oxide film over the steel. */
const FILM_PERCENT = 10.5;

/** Chromium in a steel that is welded, for each steel and method once. */
export const chromium = check<Values>({
  code: 'chromium',
  source:
    'Common practice, no source: chromium above 0.8 % needs a clean, tight, reducing weld, above 1.5 % it is risky, ' +
    'above 3 % it needs a sealed can or welded seams; a smith’s published log reports five flux mixes, none of which welded stainless',
  find: (forging) => {
    const findings = weldEvents(forging).flatMap(({ bar, stepId, method, steels }) =>
      steels.flatMap((steel): Finding<Values>[] => {
        const chromiumPercent = nominalPercent(steel, 'Cr');
        const stop = method === 'sealed' ? undefined : LIMITS.stop;
        const severity = severityAbove(chromiumPercent, { ...LIMITS, stop });
        const values = { steel: steel.id, steelName: steel.name, chromiumPercent, method };
        return severity ? [{ severity, bar, stepId, values }] : [];
      }),
    );
    return firstOfEach(findings, ({ values }) => `${values.steel}/${values.method}`);
  },
  words: (values, severity, format) => {
    const content = `${values.steelName} has ${format.number(values.chromiumPercent)} % chromium`;
    if (severity === 'stop') {
      return {
        message:
          `${content} and is welded ${METHOD_WORDS[values.method]}: ` +
          (values.chromiumPercent > FILM_PERCENT
            ? 'a tight film of chromium oxide forms that flux doesn’t dissolve, and the seam stays open.'
            : 'flux doesn’t dissolve its chromium oxide reliably, and seams stay open.'),
        remedy:
          'Shut the air out before the first heat (sealed can, welded seams or foil) and set the weld to “sealed”, or take another steel.',
      };
    }
    if (values.method === 'sealed') {
      return {
        message: `${content}: it welds only while the air stays out. One pinhole in the can or seam oxidises the faces for good.`,
        remedy:
          'Grind the faces bright, seal them at once, check every bead; leave a vent hole until moisture and oil vapour are out, and never heat a sealed can that holds liquid.',
      };
    }
    return {
      message: `${content} and is welded ${METHOD_WORDS[values.method]}: oxide rich in chromium forms at the faces, and flux dissolves it slowly.`,
      remedy:
        severity === 'caution'
          ? 'Weld the perimeter shut or seal the stack in a can; with flux alone test the seam on a coupon first.'
          : 'Grind the faces bright, clamp them tight, flux early and keep the fire reducing.',
    };
  },
});
