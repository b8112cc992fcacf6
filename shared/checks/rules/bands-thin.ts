import { type Section, layerCount, layerThicknessMm } from '../../bar/index.js';
import type { Forging } from '../../forging/index.js';
import { bandsInResultMm } from '../../metallurgy/index.js';
import { check, severityBelow } from '../check.js';
import { lastStepId, resultBar } from '../walk.js';

type Values = {
  /** The thinnest band inside the bar; the mean where no straight walk shows them. */
  bandMm: number;
  meanMm: number;
  /** "yes" where twisting or joining hides the layers and the mean is carried along. */
  isEstimate: 'yes' | 'no';
  bar: string;
};

/** Thinner bands read as a sheen; thinner still, polish and undercut remove them. mm. */
const LIMITS = { note: 0.05, caution: 0.02 } as const;

/** Bands of the result too thin to be seen. */
export const bandsThin = check<Values>({
  code: 'bands-thin',
  source:
    'Common practice, no source: under about 0.05 mm bands read as a grey sheen, under about 0.025 mm hand polish and ' +
    'the undercut of the etch remove the line; bands are about ± 20 % off the mean, thinnest in mid-width',
  find: (forging) => {
    const thinnest = thinnestBand(forging);
    const severity = thinnest && severityBelow(thinnest.bandMm, LIMITS);
    const bar = resultBar(forging);
    return thinnest && severity && bar
      ? [{ severity, bar: bar.id, stepId: lastStepId(bar), values: thinnest }]
      : [];
  },
  words: ({ bandMm, meanMm, isEstimate, bar }, severity, format) => ({
    message:
      (isEstimate === 'yes'
        ? `The bands of “${bar}” end about ${format.length(bandMm)} thick`
        : `The thinnest band ends ${format.length(bandMm)} thick, the mean ${format.length(meanMm)}`) +
      (severity === 'caution'
        ? ': polish and the undercut of the etch remove lines so fine.'
        : ': lines so fine read as a grey sheen.'),
    remedy: 'Fewer layers, one restack less, thicker starting layers, or a thicker finished bar.',
  }),
});

function thinnestBand(forging: Forging): Values | null {
  const section = forging.result?.bar.section;
  if (section) {
    if (section.bands < 2) return null;
    const meanMm = section.totalMm / section.bands;
    const bar = forging.design.bars.find(({ id }) => id === forging.design.result)?.name ?? '';
    return { bandMm: thinnestInside(section, meanMm), meanMm, isEstimate: 'no', bar };
  }
  const [thinnest] = [...bandsInResultMm(forging)].sort((a, b) => a.bandMm - b.bandMm);
  if (thinnest === undefined) return null;
  const { bandMm, name } = thinnest;
  return { bandMm, meanMm: bandMm, isEstimate: 'yes', bar: name };
}

/**
 * The thinnest band that is not just the rest of an outer layer after scale and grinding: such a skin goes with the
 * next grind anyway. Layers are only walked when the outer ones decide and the mean is above the limit, so a section
 * that is walked holds at most its height / 0.05 mm bands.
 */
function thinnestInside(section: Section, meanMm: number): number {
  const outermost = Math.min(section.firstMm, section.lastMm);
  if (meanMm < LIMITS.note || section.minBandMm >= LIMITS.note || outermost > section.minBandMm) {
    return section.minBandMm;
  }
  const bands: number[] = [];
  let steel = -1;
  for (let i = 0; i < layerCount(section); i++) {
    const thickness = layerThicknessMm(section, i);
    if (section.steels[i] === steel)
      bands[bands.length - 1] = (bands[bands.length - 1] as number) + thickness;
    else bands.push(thickness);
    steel = section.steels[i] as number;
  }
  const inside = bands.slice(1, -1);
  return inside.length === 0
    ? section.minBandMm
    : inside.reduce((thin, band) => Math.min(thin, band), Infinity);
}
