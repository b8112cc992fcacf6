import { weldingWindow } from '../../metallurgy/index.js';
import { type Finding, check } from '../check.js';
import { METHOD_WORDS, aboutTemperature } from '../say.js';
import { weldEvents } from '../walk.js';
import type { WeldMethod } from '../../metallurgy/index.js';

type Values = {
  temperatureC: number;
  ceilingC: number;
  floorC: number;
  solidusC: number;
  aimC: number;
  steel: string;
  steelName: string;
  method: WeldMethod;
};

/** A range narrower than this is no plan at all, which its own warning says. */
const NO_PLAN_K = 30;

/** A welding heat outside the welding range of the steels in the bar. */
export const weldHeat = check<Values>({
  code: 'weld-heat',
  source:
    'Common practice, no source: weld between 1100 °C (flux), 1050 °C (dry), 1000 °C (sealed) and 100–150 °C below the ' +
    'lowest solidus; at the solidus a steel burns. Solidus: line of the iron–carbon diagram, alloy slopes from memory: source to be confirmed',
  find: (forging) =>
    weldEvents(forging).flatMap(({ bar, stepId, method, temperatureC, steels }): Finding<Values>[] => {
      const window = weldingWindow(steels, method);
      if (temperatureC === null || window === null || window.aimC === null || window.widthK < NO_PLAN_K)
        return [];
      if (temperatureC <= window.ceilingC && temperatureC >= window.floorC) return [];
      const { ceilingC, floorC, solidusC, aimC, limitedBy } = window;
      const steelName = steels.find((steel) => steel.id === limitedBy)?.name ?? limitedBy;
      return [
        {
          severity: temperatureC >= solidusC ? 'stop' : 'caution',
          bar,
          stepId,
          values: { temperatureC, ceilingC, floorC, solidusC, aimC, steel: limitedBy, steelName, method },
        },
      ];
    }),
  words: (values, severity, format) => {
    const heat = format.temperature(values.temperatureC);
    const remedy = `Set this weld to about ${aboutTemperature(values.aimC, format)}.`;
    if (values.temperatureC < values.floorC) {
      return {
        message: `A welding heat of ${heat} is too cool: a weld ${METHOD_WORDS[values.method]} takes at least ${aboutTemperature(values.floorC, format)}. The seams may not take.`,
        remedy,
      };
    }
    const over =
      severity === 'stop'
        ? `${values.steelName} begins to melt near ${aboutTemperature(values.solidusC, format)}. It burns and crumbles.`
        : `${values.steelName} should stay under ${aboutTemperature(values.ceilingC, format)}. Films rich in phosphorus and sulphur melt before the steel does: it burns at the edges first.`;
    return { message: `A welding heat of ${heat} is too hot: ${over}`, remedy };
  },
});
