import type { Format } from '@shared/units';
import type { PicturePart } from '../../core/compute/messages';
import { FIGURES, NAMES } from '../canvas/paper';
import { scaleBar } from './scale-bar';

/** A picture as a file: the surface, a scale bar under it, and what it is. */
export interface SavedLayout {
  readonly widthPx: number;
  /** Of the surface alone. */
  readonly pictureHeightPx: number;
  readonly fontPx: number;
  readonly marginPx: number;
}

/** Pixels of a file at most: browsers refuse larger canvases. */
export const MOST_SAVED_PIXELS = 40_000_000;
export const SAVED_WIDTH = { min: 200, max: 8_000, usual: 2_400 } as const;

/** @param widthPx of the file, which the surface fills from side to side */
export function savedLayout(widthMm: number, heightMm: number, widthPx: number): SavedLayout {
  const pictureHeightPx = Math.max(1, Math.round((widthPx * heightMm) / widthMm));
  const fontPx = Math.round(Math.min(48, Math.max(13, widthPx / 70)));
  return { widthPx, pictureHeightPx, fontPx, marginPx: Math.round(fontPx * 0.9) };
}

/** Words broken into lines that fit, longest first; a word that is too long stands alone. */
export function linesOf(text: string, mostPx: number, measure: (text: string) => number): readonly string[] {
  const lines: string[] = [];
  let line = '';
  for (const word of text.split(/\s+/).filter((one) => one !== '')) {
    const longer = line === '' ? word : `${line} ${word}`;
    if (line !== '' && measure(longer) > mostPx) {
      lines.push(line);
      line = word;
    } else {
      line = longer;
    }
  }
  return line === '' ? lines : [...lines, line];
}

/** Rows put onto the canvas at a time, so that nothing else has to wait. */
const ROWS = 200;

/**
 * Sets a picture over its scale bar and caption, black on white.
 * @param widthMm what the picture shows from side to side
 * @param caption may be empty
 */
export async function savedCanvas(
  part: PicturePart,
  layout: SavedLayout,
  widthMm: number,
  caption: string,
  format: Format,
): Promise<HTMLCanvasElement> {
  const { widthPx, pictureHeightPx, fontPx, marginPx } = layout;
  const names = `${fontPx}px ${NAMES}`;
  const figures = `${fontPx}px ${FIGURES}`;
  await Promise.all([document.fonts.load(names, caption), document.fonts.load(figures, '0123 mm')]).catch(
    // A font that doesn't come is no reason not to save.
    () => undefined,
  );
  const canvas = document.createElement('canvas');
  canvas.width = widthPx;
  const context = canvas.getContext('2d');
  if (context === null) throw new Error('This browser gives no canvas.');
  context.font = names;
  const rule = scaleBar(widthPx / widthMm, widthPx / 4, format);
  const lines = linesOf(caption, widthPx - 2 * marginPx, (text) => context.measureText(text).width);
  const lineHeightPx = Math.round(fontPx * 1.35);
  const ruleHeightPx = Math.round(fontPx * 0.5);
  canvas.height = pictureHeightPx + 2 * marginPx + ruleHeightPx + lineHeightPx + lines.length * lineHeightPx;
  context.fillStyle = '#ffffff';
  context.fillRect(0, 0, canvas.width, canvas.height);
  await putPicture(context, part);

  const top = pictureHeightPx + marginPx;
  const line = Math.max(1, Math.round(fontPx / 14));
  context.fillStyle = '#22262a';
  context.fillRect(marginPx, top + ruleHeightPx - line, rule.widthPx, line);
  context.fillRect(marginPx, top, line, ruleHeightPx);
  context.fillRect(marginPx + rule.widthPx - line, top, line, ruleHeightPx);
  context.textBaseline = 'alphabetic';
  context.font = figures;
  context.fillText(rule.label, marginPx, top + ruleHeightPx + fontPx);
  context.font = names;
  lines.forEach((text, i) =>
    context.fillText(text, marginPx, top + ruleHeightPx + lineHeightPx * (i + 1) + fontPx),
  );
  return canvas;
}

async function putPicture(
  context: CanvasRenderingContext2D,
  { pixels, widthPx, heightPx }: PicturePart,
): Promise<void> {
  const strip = document.createElement('canvas');
  strip.width = widthPx;
  const onStrip = strip.getContext('2d');
  for (let row = 0; row < heightPx; row += ROWS) {
    const rows = Math.min(ROWS, heightPx - row);
    strip.height = rows;
    const part = pixels.subarray(4 * widthPx * row, 4 * widthPx * (row + rows));
    onStrip?.putImageData(new ImageData(part, widthPx, rows), 0, 0);
    // Drawn, not put: what is not metal stays white.
    context.drawImage(strip, 0, row);
    await new Promise((resolve) => setTimeout(resolve));
  }
}

/** The canvas as a PNG. */
export function pngOf(canvas: HTMLCanvasElement): Promise<Blob> {
  return new Promise((resolve, reject) => {
    canvas.toBlob((blob) => {
      if (blob) resolve(blob);
      else reject(new Error('The picture is too large for this browser.'));
    }, 'image/png');
  });
}

/** "Ladder knife 2", "Top face" → "ladder-knife-2-top-face.png". */
export function pictureFileName(design: string, view: string): string {
  const plain = `${design} ${view}`
    .normalize('NFKD')
    .replace(/\p{M}/gu, '')
    .toLowerCase()
    .replace(/[^a-z0-9]+/g, '-')
    .replace(/^-|-$/g, '');
  return `${plain || 'surface'}.png`;
}
