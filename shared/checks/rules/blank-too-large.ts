import { massKg, volumeMm3 } from '../../bar/index.js';
import { type Finding, check } from '../check.js';
import { lastStepId, resultBar } from '../walk.js';

type Values = {
  blankLengthMm: number;
  blankWidthMm: number;
  blankThicknessMm: number;
  lengthMm: number;
  widthMm: number;
  thicknessMm: number;
  blankMassKg: number;
  massKg: number;
};

/** Rounding, not a size, mm. */
const EXACT_MM = 1e-6;

/** A blank that doesn't fit into the finished bar; a stop when there isn't enough metal for it in any shape. */
export const blankTooLarge = check<Values>({
  code: 'blank-too-large',
  source:
    'Follows from the sizes: each side of the blank against the bar, and the mass of both at the bar’s density',
  find: (forging) => {
    const { blank } = forging.design;
    const end = forging.result?.bar;
    const bar = resultBar(forging);
    if (!blank || !end || !bar) return [];
    const isOver =
      blank.lengthMm > end.lengthMm + EXACT_MM ||
      blank.widthMm > end.widthMm + EXACT_MM ||
      blank.thicknessMm > end.thicknessMm + EXACT_MM;
    if (!isOver) return [];
    const values: Values = {
      blankLengthMm: blank.lengthMm,
      blankWidthMm: blank.widthMm,
      blankThicknessMm: blank.thicknessMm,
      lengthMm: end.lengthMm,
      widthMm: end.widthMm,
      thicknessMm: end.thicknessMm,
      blankMassKg: massKg(volumeMm3(blank), end.densityKgM3),
      massKg: massKg(volumeMm3(end), end.densityKgM3),
    };
    const severity = values.blankMassKg > values.massKg ? 'stop' : 'caution';
    return [{ severity, bar: bar.id, stepId: lastStepId(bar), values } satisfies Finding<Values>];
  },
  words: (values, severity, format) => {
    const short = [
      [values.blankLengthMm - values.lengthMm, 'long'] as const,
      [values.blankWidthMm - values.widthMm, 'wide'] as const,
      [values.blankThicknessMm - values.thicknessMm, 'thick'] as const,
    ]
      .filter(([missing]) => missing > EXACT_MM)
      .map(([missing, side]) => `${format.length(missing)} too ${side}`);
    const sizes = `The blank of ${format.size([values.blankLengthMm, values.blankWidthMm, values.blankThicknessMm])} doesn’t fit into the bar of ${format.size([values.lengthMm, values.widthMm, values.thicknessMm])}: it is ${short.join(', ')}.`;
    return severity === 'stop'
      ? {
          message: `${sizes} It weighs ${format.mass(values.blankMassKg)}, the bar ${format.mass(values.massKg)}: there is not enough steel in any shape.`,
          remedy: `Start with at least ${format.mass(values.blankMassKg - values.massKg)} more, and what the heats will take of it.`,
        }
      : {
          message: `${sizes} The bar’s ${format.mass(values.massKg)} would do for its ${format.mass(values.blankMassKg)}.`,
          remedy: 'Draw the bar to the sizes of the blank, or change the blank.',
        };
  },
});
