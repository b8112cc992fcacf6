import type { BarState } from '@shared/bar';
import { ARROW_PX } from './dimension-line';
import type { BarsMap, MapLink } from './bars-map-layout';
import { drawBarView } from './draw-bar-view';
import type { SteelInk } from './draw-layers';
import { outline } from './draw-pieces';
import type { HatchTiles } from './hatch-tiles';
import { FIGURES, type Paper, measureText } from './paper';
import type { Paint } from './sheet';

/** The box of a thumbnail within its bar, px. */
export const THUMB_PX = { left: 10, top: 10, width: 156, height: 46 } as const;
const COUNT_FONT = `500 12px ${FIGURES}`;

/** Everything that the map is drawn from. */
export interface MapPicture {
  readonly map: BarsMap;
  /** The bars as they end, by id; one that can't be made is missing. */
  readonly ends: ReadonlyMap<string, BarState>;
  readonly chosen: string | null;
  readonly inks: readonly SteelInk[];
  readonly tiles: HatchTiles;
  readonly paper: Paper;
}

/** The lines between the bars, and the end section of each, all to one scale. */
export function paintBarsMap(picture: MapPicture): Paint {
  return (context, pixelRatio) => {
    for (const link of picture.map.links) drawLink(context, picture, link);
    const pxPerMm = commonScale(picture.ends.values());
    for (const node of picture.map.nodes) {
      const bar = picture.ends.get(node.barId);
      if (bar === undefined) continue;
      const widthPx = Math.max(2, bar.widthMm * pxPerMm);
      const heightPx = Math.max(2, bar.thicknessMm * pxPerMm);
      const box = {
        leftPx: Math.round(node.leftPx + THUMB_PX.left),
        // On one ground line, as bars lie on a bench.
        topPx: Math.round(node.topPx + THUMB_PX.top + THUMB_PX.height - heightPx),
        widthPx: Math.round(widthPx),
        heightPx: Math.round(heightPx),
      };
      drawBarView(context, pixelRatio, bar, 'end', box, picture.inks, picture.tiles, picture.paper);
      outline(context, picture.paper, box);
    }
  };
}

/** Px per mm at which the end section of every bar fits into its box. */
export function commonScale(bars: Iterable<BarState>): number {
  let pxPerMm = 4;
  for (const bar of bars) {
    pxPerMm = Math.min(pxPerMm, THUMB_PX.width / bar.widthMm, THUMB_PX.height / bar.thicknessMm);
  }
  return pxPerMm;
}

function drawLink(context: CanvasRenderingContext2D, picture: MapPicture, link: MapLink): void {
  const { paper, chosen } = picture;
  const isChosen = chosen !== null && (link.from === chosen || link.to === chosen);
  const colour = isChosen ? paper.colours.steel : paper.colours.edge;
  context.strokeStyle = colour;
  context.fillStyle = colour;
  context.lineWidth = isChosen ? 2.5 : 1.5;
  context.lineJoin = 'round';
  context.beginPath();
  for (const [x, y] of link.points) context.lineTo(Math.round(x) + 0.5, Math.round(y) + 0.5);
  context.stroke();
  const [x, y] = link.points[link.points.length - 1] as readonly [number, number];
  context.beginPath();
  context.moveTo(x, y + 0.5);
  context.lineTo(x - ARROW_PX, y - 3.5);
  context.lineTo(x - ARROW_PX, y + 4.5);
  context.fill();
  if (link.pieces === 1) return;
  context.font = COUNT_FONT;
  context.textAlign = 'center';
  context.textBaseline = 'middle';
  const figure = `${link.pieces} ×`;
  const [atX, atY] = link.figureAt;
  const widthPx = measureText(figure, COUNT_FONT) + 6;
  context.fillStyle = paper.colours.ground;
  context.fillRect(atX - widthPx / 2, atY - 9, widthPx, 18);
  context.fillStyle = isChosen ? paper.colours.ink : paper.colours.quiet;
  context.fillText(figure, atX, atY + 0.5);
}
