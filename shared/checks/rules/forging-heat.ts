import {
  heatTemperatureC,
  isForeignToWelding,
  isWeldingStep,
  solidusOf,
  steelsOfBar,
} from '../../metallurgy/index.js';
import { type Finding, check } from '../check.js';
import { aboutTemperature } from '../say.js';
import { allWorkedSteps, firstOfEach } from '../walk.js';

type Values = { temperatureC: number; maximumC: number; steel: string; steelName: string; status: string };

/** Above the forging maximum by up to this much it is a note. */
const NOTE_UP_TO_K = 50;

/** A forging heat above what the tenderest material of the bar takes; said once for each bar and temperature. */
export const forgingHeat = check<Values>({
  code: 'forging-heat',
  source:
    'Forging maximum of each material in the catalogue, with its own source; makers differ and their data sheet decides. ' +
    'Up to 50 °C above it a note: common practice, no source',
  find: (forging) => {
    const findings = allWorkedSteps(forging).flatMap(({ bar, step, after }): Finding<Values>[] => {
      if (after.heats === 0 || isWeldingStep(step)) return [];
      const temperatureC = heatTemperatureC(step, forging.allowances);
      const [tender] = steelsOfBar(forging, bar.id)
        .filter((steel) => !isForeignToWelding(steel))
        .sort((a, b) => a.forging.startMaxC - b.forging.startMaxC);
      if (tender === undefined) return [];
      const maximumC = tender.forging.startMaxC;
      if (temperatureC <= maximumC) return [];
      const melts = temperatureC >= (solidusOf(tender)?.temperatureC ?? Infinity);
      return [
        {
          severity: melts ? 'stop' : temperatureC > maximumC + NOTE_UP_TO_K ? 'caution' : 'note',
          bar: bar.id,
          stepId: step.id,
          values: {
            temperatureC,
            maximumC,
            steel: tender.id,
            steelName: tender.name,
            status: tender.sources.forging.status,
          },
        },
      ];
    });
    return firstOfEach(findings, ({ bar, values }) => `${bar}/${values.temperatureC}`);
  },
  words: (values, severity, format) => ({
    message:
      `A forging heat of ${format.temperature(values.temperatureC)} is above the ${aboutTemperature(values.maximumC, format)} that ${values.steelName} takes (${values.status}). ` +
      (severity === 'stop'
        ? 'It melts.'
        : 'Grain grows fast there, and the steel may crumble under the hammer.'),
    remedy: `Set the heat to ${aboutTemperature(values.maximumC, format)} or less, or look into the maker’s data sheet.`,
  }),
});
