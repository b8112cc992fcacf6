import type { BarState } from '@shared/bar';
import type { Format } from '@shared/units';
import { type BarScene, type LaidPiece, boxPx } from './bar-scene';
import { lieText, overhangTexts, sticksOut } from './bar-text';
import { drawDimension } from './draw-dimension';
import { amount, drawPieces, outline, seam, trimmed } from './draw-pieces';
import { type BarView, drawBarView } from './draw-bar-view';
import type { SteelInk } from './draw-layers';
import type { HatchTiles } from './hatch-tiles';
import { NAMES, type Paper, measureText, shortened } from './paper';
import type { Paint } from './sheet';
import type { AreaPx, PointPx } from './viewport';

const CAPTION_FONT = `500 13px ${NAMES}`;
const NOTE_FONT = `400 13px ${NAMES}`;
const BASELINE_PX = 16;

/** Everything that the drawing of a bar is made from. */
export interface BarPicture {
  readonly bar: BarState;
  readonly laid: readonly LaidPiece[];
  readonly along: 'thickness' | 'width';
  readonly scene: BarScene;
  readonly inks: readonly SteelInk[];
  readonly tiles: HatchTiles;
  readonly paper: Paper;
  readonly format: Format;
  readonly widthPx: number;
  readonly heightPx: number;
}

/** The side view and the end section of a bar, as a drawing office would set them out. */
export function paintBar(picture: BarPicture): Paint {
  return (context, pixelRatio) => {
    drawSide(context, pixelRatio, picture);
    drawEnd(context, pixelRatio, picture);
    drawCaptions(context, picture);
  };
}

function drawSide(context: CanvasRenderingContext2D, pixelRatio: number, picture: BarPicture): void {
  const { bar, scene, laid, along, paper, format } = picture;
  const whole = boxPx(scene.side, 0, 0, bar.lengthMm, bar.thicknessMm);
  if (laid.length > 0 && along === 'thickness') {
    for (const piece of laid) {
      const box = boxPx(scene.side, 0, piece.upMm, bar.lengthMm, piece.bar.thicknessMm);
      view(context, pixelRatio, picture, piece.bar, 'side', box);
    }
    for (const piece of laid.slice(1))
      seam(context, paper, boxPx(scene.side, 0, piece.upMm, bar.lengthMm, 0));
  } else {
    // What is thicker than the bar is cut off by the view, not squeezed into it.
    const [left] = laid;
    const box = left ? boxPx(scene.side, 0, left.upMm, bar.lengthMm, left.bar.thicknessMm) : whole;
    context.save();
    context.beginPath();
    context.rect(whole.leftPx, whole.topPx, whole.widthPx, whole.heightPx);
    context.clip();
    view(context, pixelRatio, picture, left?.bar ?? bar, 'side', box);
    context.restore();
  }
  outline(context, paper, whole);
  let furthestMm = 0;
  for (const piece of laid) {
    if (!sticksOut(piece.overhang.lengthMm)) continue;
    const upMm = along === 'thickness' ? piece.upMm : 0;
    const heightMm = along === 'thickness' ? piece.bar.thicknessMm : bar.thicknessMm;
    trimmed(context, paper, boxPx(scene.side, bar.lengthMm, upMm, piece.overhang.lengthMm, heightMm));
    furthestMm = Math.max(furthestMm, piece.overhang.lengthMm);
  }
  const belowPx = whole.topPx + whole.heightPx;
  if (furthestMm > 0) {
    const end = boxPx(scene.side, bar.lengthMm + furthestMm, 0, 0, bar.thicknessMm);
    amount(
      context,
      paper,
      `+${written(format, furthestMm)}`,
      end.leftPx + 6,
      whole.topPx + whole.heightPx / 2,
    );
  }
  dimensions(context, picture, whole, belowPx, written(format, bar.lengthMm));
}

function drawEnd(context: CanvasRenderingContext2D, pixelRatio: number, picture: BarPicture): void {
  const { bar, scene, laid, format } = picture;
  const whole = boxPx(scene.end, 0, 0, bar.widthMm, bar.thicknessMm);
  if (laid.length === 0) {
    view(context, pixelRatio, picture, bar, 'end', whole);
    outline(context, picture.paper, whole);
  } else drawPieces(context, pixelRatio, { ...picture, viewport: scene.end });
  const lowestMm = Math.min(0, ...laid.map((piece) => piece.upMm));
  const lowest = boxPx(scene.end, 0, lowestMm, 0, 0);
  dimensions(context, picture, whole, lowest.topPx, written(format, bar.widthMm));
}

/** Width below and thickness at the left of a view. */
function dimensions(
  context: CanvasRenderingContext2D,
  picture: BarPicture,
  box: AreaPx,
  lowestPx: number,
  across: string,
): void {
  const { paper, format, bar } = picture;
  drawDimension(
    context,
    paper,
    {
      direction: 'horizontal',
      fromPx: box.leftPx,
      toPx: box.leftPx + box.widthPx,
      atPx: lowestPx + 24,
      objectPx: box.topPx + box.heightPx,
      figure: across,
      seenPx: [4, picture.widthPx - 4],
    },
    measureText,
  );
  drawDimension(
    context,
    paper,
    {
      direction: 'vertical',
      hasRoomBeside: true,
      fromPx: box.topPx,
      toPx: box.topPx + box.heightPx,
      atPx: box.leftPx - 18,
      objectPx: box.leftPx,
      figure: written(format, bar.thicknessMm),
      seenPx: [4, picture.heightPx - 4],
    },
    measureText,
  );
}

function drawCaptions(context: CanvasRenderingContext2D, picture: BarPicture): void {
  const { scene, paper, format, bar } = picture;
  const ratio =
    scene.ratio === 1 ? 'same scale' : `${format.number(scene.ratio, { digits: 1 })} × the side view`;
  caption(context, picture, 'Side view', lieText(bar, format), scene.captions.side);
  caption(context, picture, 'End section', ratio, scene.captions.end);
  const notes = overhangTexts(
    picture.laid.map((piece) => piece.overhang),
    picture.along,
    format,
  );
  if (notes.length === 0) return;
  context.font = NOTE_FONT;
  context.fillStyle = paper.colours.straw;
  context.textAlign = 'left';
  context.textBaseline = 'alphabetic';
  const words = `${notes.join('; ')}: trimmed.`;
  context.fillText(shortened(words, NOTE_FONT, picture.widthPx - 20, measureText), 10, picture.heightPx - 6);
}

function caption(
  context: CanvasRenderingContext2D,
  picture: BarPicture,
  name: string,
  words: string,
  { xPx, yPx }: PointPx,
): void {
  context.textAlign = 'left';
  context.textBaseline = 'alphabetic';
  context.font = CAPTION_FONT;
  context.fillStyle = picture.paper.colours.ink;
  context.fillText(name, xPx, yPx + BASELINE_PX);
  const afterPx = xPx + measureText(name, CAPTION_FONT) + 10;
  context.font = NOTE_FONT;
  context.fillStyle = picture.paper.colours.quiet;
  const { side, end } = picture.scene.captions;
  const endPx = yPx === end.yPx && xPx === side.xPx ? end.xPx : picture.widthPx;
  const roomPx = (endPx > xPx ? endPx : picture.widthPx) - afterPx - 12;
  context.fillText(shortened(words, NOTE_FONT, roomPx, measureText), afterPx, yPx + BASELINE_PX);
}

function view(
  context: CanvasRenderingContext2D,
  pixelRatio: number,
  picture: BarPicture,
  bar: BarState,
  from: BarView,
  box: AreaPx,
): void {
  drawBarView(context, pixelRatio, bar, from, box, picture.inks, picture.tiles, picture.paper);
}

function written(format: Format, mm: number): string {
  return format.length(mm, { fractionStyle: 'built' });
}
