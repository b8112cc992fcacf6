import PDFDocument from 'pdfkit';
import { sheetFonts } from './fonts.js';

/** Papers that fit a shop wall; sizes in points (1/72 inch). */
export const PAPERS = {
  a5: { widthPt: (148 / 25.4) * 72, heightPt: (210 / 25.4) * 72, name: 'A5' },
  'half-letter': { widthPt: 5.5 * 72, heightPt: 8.5 * 72, name: 'half letter' },
} as const;
export type Paper = keyof typeof PAPERS;

export const MARGIN_PT = 28;
const FOOTER_PT = 18;
const INK = '#111111';
const QUIET = '#4A4A4A';

export type Face = 'sans' | 'sansBold' | 'mono' | 'monoBold';

/** How a piece of text is set. Sizes in points. */
export interface TextStyle {
  readonly face?: Face;
  readonly sizePt?: number;
  readonly isQuiet?: boolean;
  readonly align?: 'left' | 'right' | 'center';
}

/**
 * A sheet that is filled from top to bottom. It knows how much room is left, starts a new page when a block does not
 * fit, and numbers the pages at the end.
 */
export class Sheet {
  readonly left = MARGIN_PT;
  readonly width: number;
  private readonly document: PDFKit.PDFDocument;
  private readonly bottom: number;
  private readonly chunks: Buffer[] = [];
  private readonly finished: Promise<Buffer>;
  y = MARGIN_PT;

  constructor(
    paper: Paper,
    title: string,
    private readonly footer: string,
  ) {
    const { widthPt, heightPt } = PAPERS[paper];
    this.width = widthPt - 2 * MARGIN_PT;
    this.bottom = heightPt - MARGIN_PT - FOOTER_PT;
    this.document = new PDFDocument({
      size: [widthPt, heightPt],
      margin: 0,
      bufferPages: true,
      info: { Title: title, Creator: 'Layerwright' },
      lang: 'en',
    });
    for (const [name, bytes] of Object.entries(sheetFonts()))
      this.document.registerFont(name, bytes as Buffer);
    this.finished = new Promise((resolve, reject) => {
      this.document.on('data', (chunk: Buffer) => this.chunks.push(chunk));
      this.document.on('end', () => resolve(Buffer.concat(this.chunks)));
      this.document.on('error', reject);
    });
  }

  /** Room left on this page, points. */
  get room(): number {
    return this.bottom - this.y;
  }

  /** Starts a new page unless `heightPt` fit on this one. */
  ensure(heightPt: number): void {
    if (this.room >= heightPt || this.y === MARGIN_PT) return;
    this.document.addPage();
    this.y = MARGIN_PT;
  }

  heightOf(text: string, widthPt: number, style: TextStyle = {}): number {
    this.use(style);
    return this.document.heightOfString(text, { width: widthPt });
  }

  widthOf(text: string, style: TextStyle = {}): number {
    this.use(style);
    return this.document.widthOfString(text);
  }

  /** Sets text at a place; gives the height it took. Does not move `y`. */
  textAt(text: string, x: number, y: number, widthPt: number, style: TextStyle = {}): number {
    const height = this.heightOf(text, widthPt, style);
    this.document.text(text, x, y, { width: widthPt, align: style.align ?? 'left' });
    return height;
  }

  /** Sets text over the full width at `y` and moves on; breaks to a new page if it must. */
  paragraph(text: string, style: TextStyle = {}, gapPt = 3): void {
    this.ensure(this.heightOf(text, this.width, style));
    this.y += this.textAt(text, this.left, this.y, this.width, style) + gapPt;
  }

  rule(weightPt = 0.75): void {
    this.document
      .moveTo(this.left, this.y)
      .lineTo(this.left + this.width, this.y)
      .lineWidth(weightPt)
      .strokeColor(INK)
      .stroke();
  }

  box(x: number, y: number, widthPt: number, heightPt: number, weightPt = 1): void {
    this.document.rect(x, y, widthPt, heightPt).lineWidth(weightPt).strokeColor(INK).stroke();
  }

  /** A square code from its modules, dark where true. */
  code(modules: readonly (readonly boolean[])[], x: number, y: number, sidePt: number): void {
    const unit = sidePt / modules.length;
    modules.forEach((row, r) =>
      row.forEach((isDark, c) => {
        // A hair of overlap keeps renderers from showing seams between modules.
        if (isDark) this.document.rect(x + c * unit, y + r * unit, unit + 0.05, unit + 0.05);
      }),
    );
    this.document.fillColor(INK).fill();
  }

  /** Numbers the pages and gives the finished file. */
  async finish(): Promise<Buffer> {
    const { count } = this.document.bufferedPageRange();
    for (let page = 0; page < count; page++) {
      this.document.switchToPage(page);
      const y = this.bottom + 8;
      const style = { sizePt: 8, isQuiet: true } as const;
      this.textAt(this.footer, this.left, y, this.width - 50, style);
      this.textAt(`${page + 1} of ${count}`, this.left + this.width - 50, y, 50, {
        ...style,
        align: 'right',
      });
    }
    this.document.end();
    return this.finished;
  }

  private use(style: TextStyle): void {
    this.document
      .font(style.face ?? 'sans')
      .fontSize(style.sizePt ?? 10)
      .fillColor(style.isQuiet ? QUIET : INK);
  }
}
