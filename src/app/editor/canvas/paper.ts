import { DestroyRef, type Signal, inject, signal } from '@angular/core';

/** Colours of the theme that drawings use; each is named for what it does. */
const COLOUR_NAMES = [
  'ground',
  'raised',
  'ink',
  'quiet',
  'line',
  'edge',
  'ember',
  'on-ember',
  'ember-ground',
  'steel',
  'on-steel',
  'steel-ground',
  'straw',
  'straw-ground',
  'stop',
] as const;
type ColourName = (typeof COLOUR_NAMES)[number];

/** What a drawing is made on and with, read from the page. */
export interface Paper {
  readonly colours: Readonly<Record<ColourName, string>>;
  /** Grows when the fonts for figures and names came in, so that what was measured is measured again. */
  readonly fontsAt: number;
}

/** Figures stand in the monospaced face, names in the other. CSS font shorthand without the size. */
export const FIGURES = '"IBM Plex Mono", monospace';
export const NAMES = '"IBM Plex Sans", sans-serif';

/** Everything that a drawing may write, so that every part of the fonts is fetched before it does. */
const FONT_SAMPLE = 'Layer 0123456789 mm × − ° ″ ¹³⁄₁₆ →';

/**
 * The paper under an element, for as long as the caller lives: changes with the theme and when fonts arrive.
 * Call it where `inject` may be called.
 */
export function paperUnder(element: HTMLElement): Signal<Paper> {
  const paper = signal(readPaper(element, 0));
  let fontsAt = 0;
  const read = (): void => paper.set(readPaper(element, fontsAt));
  // The theme is a rule on the root element, or the system's; either way the colours are new after the next styles.
  const root = new MutationObserver(read);
  root.observe(document.documentElement, { attributes: true });
  const media = ['(prefers-color-scheme: dark)', '(forced-colors: active)'].map((query) => matchMedia(query));
  for (const query of media) query.addEventListener('change', read);
  let isGone = false;
  void Promise.all(
    [`400 12px ${FIGURES}`, `500 12px ${FIGURES}`, `400 13px ${NAMES}`, `500 13px ${NAMES}`].map((font) =>
      document.fonts.load(font, FONT_SAMPLE),
    ),
  )
    // A font that doesn't come is no reason not to draw.
    .catch(() => undefined)
    .then(() => {
      fontsAt += 1;
      if (!isGone) read();
    });
  inject(DestroyRef).onDestroy(() => {
    isGone = true;
    root.disconnect();
    for (const query of media) query.removeEventListener('change', read);
  });
  return paper.asReadonly();
}

function readPaper(element: HTMLElement, fontsAt: number): Paper {
  const style = getComputedStyle(element);
  const colours = Object.fromEntries(
    // The theme registers them as colours: what comes back is one, not the rule that it came from.
    COLOUR_NAMES.map((name) => [name, style.getPropertyValue(`--lw-${name}`).trim() || style.color]),
  ) as Record<ColourName, string>;
  return { colours, fontsAt };
}

/** Width of a text in px, in a font given as CSS shorthand. */
export type Measure = (text: string, font: string) => number;

/** Measures text as the canvas will write it. One small canvas serves every drawing. */
export const measureText: Measure = (text, font) => {
  measuring ??= document.createElement('canvas').getContext('2d');
  if (measuring === null) return text.length * 7;
  measuring.font = font;
  return measuring.measureText(text).width;
};
let measuring: CanvasRenderingContext2D | null = null;

/** The text, shortened with … where it would be wider than `widthPx`. */
export function shortened(text: string, font: string, widthPx: number, measure: Measure): string {
  if (measure(text, font) <= widthPx) return text;
  let low = 0;
  let high = text.length;
  while (low < high) {
    const mid = (low + high + 1) >> 1;
    if (measure(`${text.slice(0, mid).trimEnd()}…`, font) <= widthPx) low = mid;
    else high = mid - 1;
  }
  return low === 0 ? '' : `${text.slice(0, low).trimEnd()}…`;
}
