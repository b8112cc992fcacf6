import { type BarState, layerCount, layerThicknessMm } from '@shared/bar';
import { type SteelInk, drawLayers } from './draw-layers';
import type { HatchTiles } from './hatch-tiles';
import type { Paper } from './paper';
import type { AreaPx } from './viewport';

/** From which side a bar is looked at. */
export type BarView = 'side' | 'end';

/** What of a bar's layers a view shows: a pile, one layer, or nothing that could be drawn layer by layer. */
export type ShownLayers =
  | { readonly kind: 'pile'; readonly direction: 'up' | 'right' }
  | { readonly kind: 'one'; readonly index: number }
  | { readonly kind: 'mixed' };

/**
 * What a view shows of a bar. From the left side, layers on edge show their leftmost; at the near end, layers that
 * follow each other along the bar show their first.
 */
export function shownLayers(bar: BarState, view: BarView): ShownLayers {
  if (bar.section === null || bar.lie === 'mixed') return { kind: 'mixed' };
  if (layerCount(bar.section) === 1) return { kind: 'one', index: 0 };
  if (bar.lie === 'thickness') return { kind: 'pile', direction: 'up' };
  const lengthwise = view === 'side' ? 'length' : 'width';
  return bar.lie === lengthwise ? { kind: 'pile', direction: 'right' } : { kind: 'one', index: 0 };
}

/** Draws what a view shows of a bar's layers into a rectangle. */
export function drawBarView(
  context: CanvasRenderingContext2D,
  pixelRatio: number,
  bar: BarState,
  view: BarView,
  box: AreaPx,
  inks: readonly SteelInk[],
  tiles: HatchTiles,
  paper: Paper,
): void {
  const shown = shownLayers(bar, view);
  const { leftPx, topPx, widthPx, heightPx } = box;
  const { section } = bar;
  if (shown.kind === 'mixed' || section === null) {
    context.fillStyle = paper.colours.raised;
    context.fillRect(leftPx, topPx, widthPx, heightPx);
    context.fillStyle = tiles.neutral(context, paper.colours.edge, pixelRatio) ?? paper.colours.line;
    context.fillRect(leftPx, topPx, widthPx, heightPx);
    return;
  }
  const isUp = shown.kind === 'one' || shown.direction === 'up';
  const lengthPx = isUp ? heightPx : widthPx;
  const isOne = shown.kind === 'one';
  const startPx = isUp ? topPx + heightPx : leftPx;
  drawLayers(
    context,
    pixelRatio,
    {
      layers: isOne
        ? { count: 1, thicknessMm: () => 1, tone: () => section.steels[shown.index] as number }
        : {
            count: layerCount(section),
            thicknessMm: (i) => layerThicknessMm(section, i),
            tone: (i) => section.steels[i] as number,
          },
      inks,
      maxMm: isOne ? 1 : section.maxMm,
      direction: isUp ? 'up' : 'right',
      startPx,
      pxPerMm: lengthPx / (isOne ? 1 : section.totalMm),
      seenPx: isUp ? [topPx, topPx + heightPx] : [leftPx, leftPx + widthPx],
      acrossPx: isUp ? [leftPx, leftPx + widthPx] : [topPx, topPx + heightPx],
    },
    tiles,
  );
}
