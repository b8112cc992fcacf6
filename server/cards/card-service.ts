import type { UnitSystem } from '../../shared/units/index.js';
import type { Compute } from '../compute/tasks.js';
import type { StoredDesign } from '../designs/design-repository.js';
import { documentFrom } from '../designs/documents.js';
import type { Paper } from '../pdf/sheet.js';
import type { SheetOrder } from './print.js';

/** Which sheet, for whom. */
export interface SheetRequest {
  readonly designId: string;
  readonly paper: Paper;
  readonly units: UnitSystem;
  /** Languages the reader takes, best first; for the form of the date. */
  readonly languages: readonly string[];
  /** Origin by which the reader reached the server. */
  readonly reachedAt: string;
}

export interface PrintedSheet {
  readonly bytes: Uint8Array;
  readonly revision: number;
}

export interface CardServiceParts {
  readonly designs: { readonly get: (id: string) => Promise<StoredDesign> };
  readonly compute: Compute;
  /** Where people reach the application, when the settings say; otherwise the way the reader came. */
  readonly publicOrigin: string | null;
  readonly now: () => Date;
}

/** Prints the sheets of stored designs. */
export class CardService {
  readonly #parts: CardServiceParts;

  constructor(parts: CardServiceParts) {
    this.#parts = parts;
  }

  forgeCard(request: SheetRequest): Promise<PrintedSheet> {
    return this.#print('forgeCard', request);
  }

  cutSheet(request: SheetRequest): Promise<PrintedSheet> {
    return this.#print('cutSheet', request);
  }

  async #print(task: 'forgeCard' | 'cutSheet', request: SheetRequest): Promise<PrintedSheet> {
    const stored = await this.#parts.designs.get(request.designId);
    const order: SheetOrder = {
      design: documentFrom(JSON.parse(stored.documentJson) as unknown, ''),
      units: request.units,
      context: {
        paper: request.paper,
        link: `${this.#parts.publicOrigin ?? request.reachedAt}/designs/${stored.id}`,
        revision: `Revision ${stored.revision}, printed ${this.#today(request.languages)}`,
      },
    };
    return { bytes: await this.#parts.compute.run(task, order), revision: stored.revision };
  }

  /** The words on a sheet are English, so the date is too, in the reader's own order where that is a form of English. */
  #today(languages: readonly string[]): string {
    const english = languages.filter((language) => /^en(-[a-z]{2})?$/i.test(language));
    return new Intl.DateTimeFormat([...english, 'en-GB'], { dateStyle: 'long', timeZone: 'UTC' }).format(
      this.#parts.now(),
    );
  }
}
