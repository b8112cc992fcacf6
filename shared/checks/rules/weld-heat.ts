import { type WeldMethod, weldingWindow } from '../../metallurgy/index.js';
import { type Finding, check } from '../check.js';
import { METHOD_WORDS, aboutTemperature } from '../say.js';
import { type WeldEvent, firstOfEach, weldEvents } from '../walk.js';

type Values = {
  temperatureC: number;
  ceilingC: number;
  floorC: number;
  solidusC: number;
  aimC: number;
  steel: string;
  steelName: string;
  method: WeldMethod;
  /** Set at the step, or the welding heat of the allowances. */
  isOwn: 'yes' | 'no';
};

/** A range narrower than this is no plan at all, which its own warning says. */
const NO_PLAN_K = 30;

/** A welding heat outside the welding range of the steels in the bar; one that the allowances set is told once for each bar. */
export const weldHeat = check<Values>({
  code: 'weld-heat',
  source:
    'Common practice, no source: weld between 1100 °C (flux), 1050 °C (dry), 1000 °C (sealed) and 100–150 °C below the ' +
    'lowest solidus; at the solidus a steel burns. Solidus: line of the iron–carbon diagram, alloy slopes from memory: source to be confirmed',
  find: (forging) =>
    eachHeat(weldEvents(forging)).flatMap((event): Finding<Values>[] => {
      const { bar, stepId, method, temperatureC, steels } = event;
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
          values: {
            temperatureC,
            ceilingC,
            floorC,
            solidusC,
            aimC,
            steel: limitedBy,
            steelName,
            method,
            isOwn: event.isOwnTemperature ? 'yes' : 'no',
          },
        },
      ];
    }),
  words: (values, severity, format) => {
    const heat = format.temperature(values.temperatureC);
    const aim = aboutTemperature(values.aimC, format);
    const remedy =
      values.isOwn === 'yes'
        ? `Set this weld to about ${aim}.`
        : `Set the welding heat to about ${aim}, at the welds of this bar or in the allowances.`;
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

function eachHeat(events: readonly WeldEvent[]): readonly WeldEvent[] {
  return firstOfEach(events, ({ bar, stepId, method, isOwnTemperature }) =>
    JSON.stringify(isOwnTemperature ? [bar, stepId] : [bar, null, method]),
  );
}
