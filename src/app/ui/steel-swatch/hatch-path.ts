import type { Hatch, Tone } from '@shared/steels';

/** Edge of the square that a hatch repeats in, px. */
export const HATCH_TILE_PX = 8;

/** Lines of each hatch inside one tile, as an SVG path to be stroked; they run on from tile to tile. */
export const HATCH_PATHS: Readonly<Record<Hatch, string>> = {
  plain: '',
  dots: 'M2 2h.01M6 6h.01',
  dashes: 'M0 2h4M4 6h4',
  horizontal: 'M0 4h8',
  vertical: 'M4 0v8',
  diagonal: 'M-1 5L5 -1M-1 9L9 -1M3 9L9 3',
  'back-diagonal': 'M-1 3L5 9M-1 -1L9 9M3 -1L9 5',
  cross: 'M-1 9L9 -1M-1 -1L9 9',
  grid: 'M0 4h8M4 0v8',
  zigzag: 'M0 6L4 2L8 6',
  waves: 'M0 4c2 -4 2 -4 4 0s2 4 4 0',
  rings: 'M4 1.8a2.2 2.2 0 1 0 .01 0',
};

/** Colour of a hatch's lines on its tone: light on dark, dark on bright, quiet on either. */
export function hatchColour(tone: Pick<Tone, 'brightness'>): string {
  return tone.brightness < 0.5 ? 'rgba(255,255,255,0.5)' : 'rgba(0,0,0,0.42)';
}

/** A steel's tone with its hatch as CSS backgrounds: one element draws it. */
export function swatchBackground(tone: Tone, hatch: Hatch = tone.hatch): string {
  const path = HATCH_PATHS[hatch];
  if (path === '') return tone.hex;
  const size = HATCH_TILE_PX;
  const svg =
    `<svg xmlns='http://www.w3.org/2000/svg' width='${size}' height='${size}'>` +
    `<path d='${path}' fill='none' stroke='${hatchColour(tone)}' stroke-width='1' stroke-linecap='round'/></svg>`;
  return `url("data:image/svg+xml,${encodeURIComponent(svg)}") ${tone.hex}`;
}
