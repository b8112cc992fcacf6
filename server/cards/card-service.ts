import { cutList, forgeCard } from '../../shared/card/index.js';
import { refusalWords, warningsOf } from '../../shared/checks/index.js';
import { type Forging, type StepRefusal, evaluate } from '../../shared/forging/index.js';
import { type Format, type UnitSystem, formatFor } from '../../shared/units/index.js';
import type { StoredDesign } from '../designs/design-repository.js';
import { documentFrom } from '../designs/documents.js';
import { cutSheetPdf } from '../pdf/cut-sheet-pdf.js';
import { type SheetContext, forgeCardPdf } from '../pdf/forge-card-pdf.js';
import type { Paper } from '../pdf/sheet.js';

/** Which sheet, for whom. */
export interface SheetRequest {
  readonly designId: string;
  readonly paper: Paper;
  readonly units: UnitSystem;
  /** Languages the reader takes, best first; for the form of the date. */
  readonly languages: readonly string[];
}

export interface PrintedSheet {
  readonly bytes: Buffer;
  readonly revision: number;
}

/** Makes the sheets of stored designs. */
export class CardService {
  constructor(
    private readonly designOf: (id: string) => Promise<StoredDesign>,
    /** Address under which the application is reached, without a slash at the end. */
    private readonly publicUrl: string,
    private readonly now: () => Date,
  ) {}

  async forgeCard(request: SheetRequest): Promise<PrintedSheet> {
    const { stored, forging, format, context } = await this.prepared(request);
    const card = forgeCard(forging, {
      format,
      warnings: warningsOf(forging, format),
      refusalWords: (bar) => refusalWords(bar.refusal as StepRefusal, forging.design, format),
    });
    return { bytes: await forgeCardPdf(card, context), revision: stored.revision };
  }

  async cutSheet(request: SheetRequest): Promise<PrintedSheet> {
    const { stored, forging, format, context } = await this.prepared(request);
    return { bytes: await cutSheetPdf(cutList(forging), format, context), revision: stored.revision };
  }

  private async prepared(request: SheetRequest): Promise<{
    stored: StoredDesign;
    forging: Forging;
    format: Format;
    context: SheetContext;
  }> {
    const stored = await this.designOf(request.designId);
    const design = documentFrom(JSON.parse(stored.documentJson) as unknown, '');
    const printedOn = new Intl.DateTimeFormat(supportedLanguages(request.languages), {
      dateStyle: 'long',
      timeZone: 'UTC',
    }).format(this.now());
    return {
      stored,
      forging: evaluate(design),
      format: formatFor(request.units),
      context: {
        paper: request.paper,
        link: `${this.publicUrl}/designs/${stored.id}`,
        revision: `Revision ${stored.revision}, printed ${printedOn}`,
      },
    };
  }
}

/** The words on the sheet are English, so the date is too, in the reader's own order where that is a form of English. */
function supportedLanguages(languages: readonly string[]): readonly string[] {
  return [...languages.filter((language) => /^en(-|$)/i.test(language)), 'en-GB'];
}
