import { type Format, MM_PER_INCH } from '@shared/units';

/** A bar of a round length to hold a picture against. */
export interface ScaleBar {
  readonly lengthMm: number;
  readonly widthPx: number;
  readonly label: string;
}

/** Lengths in inches that a rule has marks for; past them, one, two and five of every power of ten. */
const INCHES = [1 / 64, 1 / 32, 1 / 16, 1 / 8, 1 / 4, 1 / 2];

/** The longest round length that is not longer than `mostPx`, in the reader's units. */
export function scaleBar(pxPerMm: number, mostPx: number, format: Format): ScaleBar {
  const mostMm = mostPx / pxPerMm;
  const lengthMm =
    format.system === 'inch' ? MM_PER_INCH * roundInch(mostMm / MM_PER_INCH) : roundLength(mostMm);
  return { lengthMm, widthPx: lengthMm * pxPerMm, label: format.length(lengthMm) };
}

function roundInch(most: number): number {
  const fractions = INCHES.filter((inch) => inch <= most);
  return most >= 1 || fractions.length === 0 ? roundLength(most) : Math.max(...fractions);
}

/** The greatest of 1, 2 and 5 times a power of ten that is not greater than `most`. */
function roundLength(most: number): number {
  const power = 10 ** Math.floor(Math.log10(most) + 1e-9);
  const times = most / power;
  return (times >= 5 - 1e-9 ? 5 : times >= 2 - 1e-9 ? 2 : 1) * power;
}
