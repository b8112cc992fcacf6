import type { WeldMethod } from '../metallurgy/index.js';
import type { Format } from '../units/index.js';

/** An estimated temperature, no finer than it is known: 5 °C or 10 °F. */
export function aboutTemperature(temperatureC: number, format: Format): string {
  return format.temperature(temperatureC, { step: format.system === 'mm' ? 5 : 10 });
}

/** The same for a difference. */
export function aboutDifference(deltaK: number, format: Format): string {
  return format.temperatureDifference(deltaK, { step: format.system === 'mm' ? 5 : 10 });
}

/** "1 layer", "3 layers". */
export function counted(count: number, one: string, many: string, format: Format): string {
  return `${format.count(count)} ${count === 1 ? one : many}`;
}

/** How a weld keeps the air out, to follow "welded". */
export const METHOD_WORDS: Readonly<Record<WeldMethod, string>> = {
  flux: 'with flux',
  dry: 'dry under the press',
  sealed: 'sealed from the air',
};
