import type { Format } from '@shared/units';
import type { Probe } from '../../core/compute/probe';

/** What a probe found, in words. */
export interface ProbeWords {
  readonly steel: string;
  /** "Layer 5 of 13", with the bar where there are several. */
  readonly layer: string;
  /** "band 0.42 mm, shows 1.6 mm wide"; empty where it can't be told. */
  readonly band: string;
  /** "121.3 mm along, 12 mm across, 5.3 mm up": from the near end, the left side and the bottom. */
  readonly place: string;
}

/** @param names of steels by id, and of bars by id where there are several */
export function probeWords(
  probe: Probe,
  names: { readonly steels: ReadonlyMap<string, string>; readonly bars: ReadonlyMap<string, string> },
  format: Format,
): ProbeWords {
  const { steel, bar, place, layersInStack, bandMm, showsMm } = probe;
  const where = names.bars.size > 1 ? ` of ${names.bars.get(bar) ?? bar}` : '';
  return {
    steel: names.steels.get(steel) ?? steel,
    layer: `Layer ${format.count(place + 1)} of ${format.count(layersInStack)}${where}`,
    band: bandText(bandMm, showsMm, format),
    place: [
      `${format.length(Math.max(0, probe.xMm))} along`,
      `${format.length(Math.max(0, probe.yMm))} across`,
      `${format.length(Math.max(0, probe.zMm))} up`,
    ].join(', '),
  };
}

/** The same in one sentence, to be read out. */
export function probeSentence({ steel, layer, band, place }: ProbeWords): string {
  return `${[steel, lowered(layer), band].filter((part) => part !== '').join(', ')}. ${place}.`;
}

function bandText(bandMm: number | null, showsMm: number | null, format: Format): string {
  const band = bandMm === null ? '' : `band ${format.length(bandMm)}`;
  const shows = showsMm === null ? 'level with the surface' : `shows ${format.length(showsMm)} wide`;
  if (bandMm === null) return showsMm === null ? '' : shows;
  // What is cut square shows as wide as it is.
  return showsMm !== null && Math.abs(showsMm - bandMm) < 0.02 * bandMm ? band : `${band}, ${shows}`;
}

function lowered(text: string): string {
  return text.charAt(0).toLowerCase() + text.slice(1);
}
