import { type WeldMethod, weldingWindow } from '../../metallurgy/index.js';
import { check, severityBelow } from '../check.js';
import { METHOD_WORDS, aboutDifference, aboutTemperature } from '../say.js';
import { firstOfEach, weldEvents } from '../walk.js';

type Values = {
  method: WeldMethod;
  /** Of the steel that sets the ceiling. */
  steel: string;
  steelName: string;
  solidusC: number;
  marginK: number;
  ceilingC: number;
  floorC: number;
  widthK: number;
  /** Where there is one. */
  aimC?: number;
  /** Width if the seam were sealed. */
  sealedWidthK: number;
};

/** Widths in K under which a welding range is worth a word, risky, no plan. */
const LIMITS = { note: 120, caution: 80, stop: 30 } as const;

/** A welding range that is missing or narrow, for each set of steels and method once. */
export const weldingRange = check<Values>({
  code: 'welding-range',
  source:
    'Common practice, no source: ceiling 100 °C below the lowest solidus (150 °C with an unknown analysis or dirty ' +
    'steel), at most 1290 °C; lower end 1100 °C with flux, 1050 °C dry, 1000 °C sealed; narrow under 120 °C, risky ' +
    'under 80 °C, no plan under 30 °C. Solidus: line of the iron–carbon diagram, alloy slopes from memory: source to be confirmed',
  find: (forging) => {
    const events = firstOfEach(weldEvents(forging), ({ method, steels }) =>
      JSON.stringify([method, ...steels.map((steel) => steel.id)]),
    );
    return events.flatMap(({ bar, stepId, method, steels }) => {
      const window = weldingWindow(steels, method);
      const severity = window && severityBelow(window.widthK, LIMITS);
      if (!window || !severity) return [];
      const values: Values = {
        method,
        steel: window.limitedBy,
        steelName: steels.find((steel) => steel.id === window.limitedBy)?.name ?? window.limitedBy,
        solidusC: window.solidusC,
        marginK: window.marginK,
        ceilingC: window.ceilingC,
        floorC: window.floorC,
        widthK: window.widthK,
        ...(window.aimC === null ? {} : { aimC: window.aimC }),
        sealedWidthK: weldingWindow(steels, 'sealed')?.widthK ?? window.widthK,
      };
      return [{ severity, bar, stepId, values }];
    });
  },
  words: (values, severity, format) => {
    const ceiling = aboutTemperature(values.ceilingC, format);
    const floor = aboutTemperature(values.floorC, format);
    const reason = `Above it ${values.steelName} burns (it begins to melt near ${aboutTemperature(values.solidusC, format)}), below it the seams don’t take.`;
    const sealing =
      values.method !== 'sealed' && values.sealedWidthK >= LIMITS.stop
        ? `, or shut the air out (sealed can, welded seams): the range is then ${aboutDifference(values.sealedWidthK, format)} wide`
        : '';
    if (severity === 'stop') {
      const what =
        values.widthK <= 0
          ? `No common welding range: ${values.steelName} must stay under ${ceiling}, a weld ${METHOD_WORDS[values.method]} takes at least ${floor}.`
          : `The welding range is only ${aboutDifference(values.widthK, format)} wide: ${floor} to ${ceiling} ${METHOD_WORDS[values.method]}.`;
      return { message: `${what} ${reason}`, remedy: `Replace ${values.steelName}${sealing}.` };
    }
    return {
      message: `The welding range is ${aboutDifference(values.widthK, format)} wide: ${floor} to ${ceiling} ${METHOD_WORDS[values.method]}. ${reason}`,
      remedy: `Aim at ${aboutTemperature(values.aimC ?? values.ceilingC, format)}, measured, not by colour, and soak no longer than needed${sealing}.`,
    };
  },
});
