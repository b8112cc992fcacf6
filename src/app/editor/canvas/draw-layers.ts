import type { Hatch } from '@shared/steels';
import type { HatchTiles } from './hatch-tiles';
import { type LayerRow, type Rgb, toneRows } from './tone-rows';

/** How a steel is drawn. */
export interface SteelInk {
  readonly rgb: Rgb;
  /** 0–1, decides whether a hatch is drawn light or dark. */
  readonly brightness: number;
  readonly hatch: Hatch;
}

/** A pile of layers and where it is drawn. */
export interface LayerPile {
  readonly layers: LayerRow;
  readonly inks: readonly SteelInk[];
  /** Thickest layer, mm: nothing is drawn on layers where none is large enough for it. */
  readonly maxMm: number;
  /** `up`: the first layer is the lowest. `right`: it is the leftmost. */
  readonly direction: 'up' | 'right';
  /** Where the pile begins along its direction, px. */
  readonly startPx: number;
  readonly pxPerMm: number;
  /** The part of the sheet that is drawn along the direction, px, ascending. */
  readonly seenPx: readonly [number, number];
  /** From where to where each layer reaches across, px, ascending. */
  readonly acrossPx: readonly [number, number];
}

/** From these heights on a layer gets seams, and its hatch, px. */
const SEAM_FROM_PX = 3;
const HATCH_FROM_PX = 6;
/** A thin layer between thick ones is never drawn thinner than this, px: it must be found. */
const FOIL_PX = 1.5;

/** Draws layers by their tones, mixed where they are finer than a pixel, with seams and hatches where there is room. */
export function drawLayers(
  context: CanvasRenderingContext2D,
  pixelRatio: number,
  pile: LayerPile,
  tiles: HatchTiles,
): void {
  const { layers, pxPerMm } = pile;
  let totalMm = 0;
  for (let i = 0; i < layers.count; i++) totalMm += layers.thicknessMm(i);
  const lengthPx = totalMm * pxPerMm;
  const alongPx = (mm: number): number =>
    pile.direction === 'up' ? pile.startPx - mm * pxPerMm : pile.startPx + mm * pxPerMm;
  const [seenFrom, seenTo] = pile.seenPx;
  // How far along the pile what is seen begins and ends, on whole device pixels.
  const near = pile.direction === 'up' ? pile.startPx - seenTo : seenFrom - pile.startPx;
  const far = pile.direction === 'up' ? pile.startPx - seenFrom : seenTo - pile.startPx;
  const onPixel = (px: number): number => Math.round(px * pixelRatio) / pixelRatio;
  const offPx = onPixel(pile.startPx) - pile.startPx;
  const fromPx = onPixel(Math.max(0, near));
  const toPx = onPixel(Math.min(lengthPx, far));
  const rows = Math.round((toPx - fromPx) * pixelRatio);
  if (rows <= 0) return;
  context.save();
  const runs = toneRows(
    layers,
    pile.inks.map((ink) => ink.rgb),
    fromPx / pxPerMm,
    Math.min(totalMm, toPx / pxPerMm),
    rows,
  );
  for (const run of runs) {
    context.fillStyle = cssOf(run.rgb);
    const a = fromPx + run.from / pixelRatio;
    const b = fromPx + run.to / pixelRatio;
    fill(context, pile, alongPx(a / pxPerMm) + offPx, alongPx(b / pxPerMm) + offPx);
  }
  if (pile.maxMm * pxPerMm >= SEAM_FROM_PX) drawDetail(context, pixelRatio, pile, tiles, alongPx);
  context.restore();
}

function drawDetail(
  context: CanvasRenderingContext2D,
  pixelRatio: number,
  pile: LayerPile,
  tiles: HatchTiles,
  alongPx: (mm: number) => number,
): void {
  const { layers, pxPerMm, inks } = pile;
  const [seenFrom, seenTo] = pile.seenPx;
  let bottomMm = 0;
  let belowPx = 0;
  let belowRgb: Rgb | null = null;
  for (let i = 0; i < layers.count; i++) {
    const thicknessMm = layers.thicknessMm(i);
    const heightPx = thicknessMm * pxPerMm;
    const a = alongPx(bottomMm);
    const b = alongPx(bottomMm + thicknessMm);
    bottomMm += thicknessMm;
    const isSeen = Math.max(a, b) >= seenFrom && Math.min(a, b) <= seenTo;
    const ink = inks[layers.tone(i)];
    if (isSeen && ink) {
      if (heightPx >= HATCH_FROM_PX) drawHatch(context, pixelRatio, pile, tiles, ink, a, b);
      else if (heightPx < FOIL_PX && isAlone(pile, i, belowPx)) {
        context.fillStyle = cssOf(ink.rgb);
        const middle = (a + b) / 2;
        fill(context, pile, middle - FOIL_PX / 2, middle + FOIL_PX / 2);
      }
      if (belowRgb && belowPx >= SEAM_FROM_PX && heightPx >= SEAM_FROM_PX) {
        drawSeam(context, pixelRatio, pile, a, belowRgb, ink.rgb);
      }
    }
    belowPx = heightPx;
    belowRgb = ink?.rgb ?? null;
  }
}

/** Whether both neighbours of a thin layer are thick enough to stand back for it. */
function isAlone(pile: LayerPile, i: number, belowPx: number): boolean {
  const abovePx = i + 1 < pile.layers.count ? pile.layers.thicknessMm(i + 1) * pile.pxPerMm : Infinity;
  return (i === 0 || belowPx >= SEAM_FROM_PX) && abovePx >= SEAM_FROM_PX;
}

function drawHatch(
  context: CanvasRenderingContext2D,
  pixelRatio: number,
  pile: LayerPile,
  tiles: HatchTiles,
  ink: SteelInk,
  a: number,
  b: number,
): void {
  const [leftPx] = pile.acrossPx;
  // From the layer's own edge on, so that each layer of a steel looks like the others.
  const at =
    pile.direction === 'up' ? { xPx: leftPx, yPx: Math.max(a, b) } : { xPx: Math.min(a, b), yPx: leftPx };
  const pattern = tiles.pattern(context, ink.hatch, ink.brightness, pixelRatio, at);
  if (pattern === null) return;
  context.fillStyle = pattern;
  // Over a large area the lines of a swatch would drown the tone.
  context.globalAlpha = 0.62;
  const [seenFrom, seenTo] = pile.seenPx;
  const within = (px: number): number => Math.min(seenTo, Math.max(seenFrom, px));
  fill(context, pile, within(a), within(b));
  context.globalAlpha = 1;
}

function drawSeam(
  context: CanvasRenderingContext2D,
  pixelRatio: number,
  pile: LayerPile,
  atPx: number,
  below: Rgb,
  above: Rgb,
): void {
  // Between two dark steels a dark line would be lost.
  const isDark = below[0] + above[0] < 190;
  context.fillStyle = isDark ? 'rgba(255, 255, 255, 0.42)' : 'rgba(0, 0, 0, 0.5)';
  const sharp = Math.round(atPx * pixelRatio) / pixelRatio;
  fill(context, pile, sharp, sharp + Math.max(1, Math.round(pixelRatio * 0.75)) / pixelRatio);
}

/** A strip of the pile between two places along its direction. */
function fill(context: CanvasRenderingContext2D, pile: LayerPile, a: number, b: number): void {
  const [from, to] = pile.acrossPx;
  const low = Math.min(a, b);
  const size = Math.abs(b - a);
  if (pile.direction === 'up') context.fillRect(from, low, to - from, size);
  else context.fillRect(low, from, size, to - from);
}

export function cssOf(rgb: Rgb): string {
  return `rgb(${rgb[0]}, ${rgb[1]}, ${rgb[2]})`;
}
