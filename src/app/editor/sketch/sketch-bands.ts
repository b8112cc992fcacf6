import { type BarState, type Section, layerCount, layerThicknessMm } from '@shared/bar';
import { type Steel, toneOf } from '@shared/steels';

/** Bands of one tone, as an SVG path in px. */
export interface SketchFill {
  readonly colour: string;
  readonly path: string;
}

/** How the side of a bar is drawn: a ground, bands on it, and fine lines where the bands are too fine to be drawn. */
export interface Sketch {
  readonly widthPx: number;
  readonly heightPx: number;
  readonly ground: string;
  readonly fills: readonly SketchFill[];
  /** Lines that stand for layers; empty where the bands themselves are drawn. */
  readonly lines: string;
}

/** Bands finer than this can't be told apart in a sketch, px. */
const FINEST_BAND_PX = 1.1;
/** Distance of the lines that stand for many fine layers, px. */
const LINE_PITCH_PX = 2.5;
/** Layers looked at, at most, for the mean tone of a section. */
const MOST_SAMPLES = 2000;
const UNKNOWN_GREY = 150;

/** A bar seen from its left side to scale: x to the right, z upward. */
export function sketchOf(bar: BarState, steels: readonly Steel[], pxPerMm: number): Sketch {
  const widthPx = Math.max(2, bar.lengthMm * pxPerMm);
  const heightPx = Math.max(2, bar.thicknessMm * pxPerMm);
  const plain = { widthPx, heightPx, fills: [], lines: '' };
  const { section } = bar;
  if (section === null) {
    return { ...plain, ground: grey(UNKNOWN_GREY), lines: waves(widthPx, heightPx) };
  }
  // Layers that stand on edge show the first of them; a single one shows itself.
  if (bar.lie === 'width' || layerCount(section) === 1) {
    return { ...plain, ground: hexOf(steels[section.steels[0] ?? 0]) };
  }
  const isUpright = bar.lie === 'length';
  const extentPx = isUpright ? widthPx : heightPx;
  if (extentPx / section.bands >= FINEST_BAND_PX && layerCount(section) <= MOST_SAMPLES) {
    const fills = bands(section, steels, isUpright, widthPx, heightPx);
    return { ...plain, ground: meanTone(section, steels), fills };
  }
  const lines = isUpright ? uprights(widthPx, heightPx) : levels(widthPx, heightPx);
  return { ...plain, ground: meanTone(section, steels), lines };
}

function bands(
  section: Section,
  steels: readonly Steel[],
  isUpright: boolean,
  widthPx: number,
  heightPx: number,
): readonly SketchFill[] {
  const paths = new Map<number, string>();
  const pxPerMm = (isUpright ? widthPx : heightPx) / section.totalMm;
  let atPx = 0;
  for (let i = 0; i < layerCount(section); i++) {
    const steel = section.steels[i] as number;
    const px = layerThicknessMm(section, i) * pxPerMm;
    const rectangle = isUpright
      ? `M${round(atPx)} 0h${round(px)}v${round(heightPx)}h${round(-px)}z`
      : `M0 ${round(heightPx - atPx - px)}h${round(widthPx)}v${round(px)}h${round(-widthPx)}z`;
    paths.set(steel, (paths.get(steel) ?? '') + rectangle);
    atPx += px;
  }
  return [...paths].map(([steel, path]) => ({ colour: hexOf(steels[steel]), path }));
}

/** The grey of all layers together, by their share. */
function meanTone(section: Section, steels: readonly Steel[]): string {
  const stride = Math.max(1, Math.floor(layerCount(section) / MOST_SAMPLES));
  const tones = steels.map((steel) => toneOf(steel).rgb[1]);
  let sum = 0;
  let mm = 0;
  for (let i = 0; i < layerCount(section); i += stride) {
    const thickness = layerThicknessMm(section, i);
    sum += thickness * (tones[section.steels[i] as number] ?? UNKNOWN_GREY);
    mm += thickness;
  }
  return grey(Math.round(sum / mm));
}

function levels(widthPx: number, heightPx: number): string {
  return lines(heightPx, (y) => `M0 ${y}h${round(widthPx)}`);
}

function uprights(widthPx: number, heightPx: number): string {
  return lines(widthPx, (x) => `M${x} 0v${round(heightPx)}`);
}

/** Twisted or joined at odds: no walk through it shows the layers one by one. */
function waves(widthPx: number, heightPx: number): string {
  const pitch = Math.max(4, heightPx / 2);
  const path: string[] = [];
  for (let x = -pitch; x < widthPx + pitch; x += pitch) {
    path.push(
      `M${round(x)} ${round(heightPx)}q${round(pitch)} ${round(-heightPx / 4)} ${round(pitch)} ${round(-heightPx)}`,
    );
  }
  return path.join('');
}

function lines(extentPx: number, line: (atPx: number) => string): string {
  const count = Math.floor(extentPx / LINE_PITCH_PX);
  return Array.from({ length: count }, (_, i) => line(round(((i + 0.5) * extentPx) / count))).join('');
}

function hexOf(steel: Steel | undefined): string {
  return steel === undefined ? grey(UNKNOWN_GREY) : toneOf(steel).hex;
}

function grey(level: number): string {
  return `rgb(${level},${level},${level})`;
}

function round(px: number): number {
  return Math.round(px * 100) / 100;
}
