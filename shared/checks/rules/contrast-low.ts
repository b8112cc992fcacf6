import { isForeignToWelding, steelsOfBar } from '../../metallurgy/index.js';
import { etchBrightness } from '../../steels/index.js';
import { type Finding, check, severityBelow } from '../check.js';
import { lastStepId, resultBar } from '../walk.js';

type Values = {
  steels: number;
  darkest: string;
  darkestBrightness: number;
  brightest: string;
  brightestBrightness: number;
  contrast: number;
};

/** Difference of brightness (0 blackest, 1 nickel) under which a pattern is faint, or hardly there. */
const LIMITS = { note: 0.3, caution: 0.15 } as const;

/** Steels of the result too alike in the etch. */
export const contrastLow = check<Values>({
  code: 'contrast-low',
  source:
    'Common practice, no source: order of darkening in dilute ferric chloride, from nickel and stainless over nickel ' +
    'steel, iron and mild steel to high-carbon and manganese steel; the scale of brightness and its limits are ours',
  find: (forging) => {
    const bar = resultBar(forging);
    const start = bar?.states[0]?.bar;
    if (bar === undefined || start === undefined || start.layers < 2) return [];
    const tones = steelsOfBar(forging, bar.id)
      .filter((steel) => !isForeignToWelding(steel))
      .map((steel) => ({ name: steel.name, brightness: etchBrightness(steel) }))
      .sort((a, b) => a.brightness - b.brightness);
    const darkest = tones[0];
    const brightest = tones[tones.length - 1];
    if (darkest === undefined || brightest === undefined) return [];
    const contrast = brightest.brightness - darkest.brightness;
    const severity = tones.length === 1 ? 'note' : severityBelow(contrast, LIMITS);
    if (severity === null) return [];
    const values: Values = {
      steels: tones.length,
      darkest: darkest.name,
      darkestBrightness: darkest.brightness,
      brightest: brightest.name,
      brightestBrightness: brightest.brightness,
      contrast,
    };
    return [{ severity, bar: bar.id, stepId: lastStepId(bar), values } satisfies Finding<Values>];
  },
  words: (values, severity, format) => {
    const remedy =
      'Set a bright steel (about 2 % nickel or more) against a dark one (high carbon, 0.8 % manganese or more).';
    if (values.steels === 1) {
      return {
        message: `All layers are ${values.darkest}: only the weld lines will show, faintly.`,
        remedy,
      };
    }
    return {
      message:
        `From ${values.darkest} to ${values.brightest} the etched tone differs by ${format.percent(values.contrast, { digits: 0 })} of the way from black to nickel: ` +
        (severity === 'caution' ? 'the pattern will hardly show.' : 'the pattern will be faint.'),
      remedy,
    };
  },
});
