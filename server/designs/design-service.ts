import type { Logger } from 'pino';
import type { Design } from '../../shared/design/index.js';
import type { Compute, DesignFigures } from '../compute/tasks.js';
import { requireCurrent } from '../http/etag.js';
import { Problem } from '../http/problem.js';
import type { DesignRepository, ListedDesign, StoredDesign } from './design-repository.js';
import { isNewerDocument } from './documents.js';
import { unknownSummary } from './summary.js';

/** As many as one person keeps; each costs room in every snapshot. */
const MAX_DESIGNS = 1000;

/** How long a deleted design can be brought back. */
export const UNDELETE_MS = 30 * 24 * 60 * 60_000;

interface DesignParts {
  readonly designs: DesignRepository;
  readonly compute: Compute;
  readonly log: Logger;
  readonly now: () => Date;
  readonly newId: () => string;
}

/** A person's designs. Who may do what was decided before. */
export class DesignService {
  constructor(private readonly parts: DesignParts) {}

  list(ownerId: string, search: string): Promise<readonly ListedDesign[]> {
    return this.parts.designs.list(ownerId, search);
  }

  async get(id: string): Promise<StoredDesign> {
    return present(await this.parts.designs.find(id));
  }

  async create(ownerId: string, document: Design): Promise<StoredDesign> {
    const { designs, newId, now } = this.parts;
    const time = now().toISOString();
    const summary = await this.#summaryOf(document);
    return designs.all(async () => {
      if ((await designs.count(ownerId)) >= MAX_DESIGNS) {
        throw new Problem('too-many-designs', {
          detail: `There is room for ${MAX_DESIGNS}. Delete some first.`,
        });
      }
      const shopId = await designs.homeShopOf(ownerId);
      if (shopId === null) throw new Error(`The account ${ownerId} belongs to no shop.`);
      const design: StoredDesign = {
        id: newId(),
        shopId,
        ownerId,
        name: document.name,
        revision: 1,
        createdAt: time,
        updatedAt: time,
        deletedAt: null,
        summary,
        documentJson: JSON.stringify(document),
      };
      await designs.add(design);
      return design;
    });
  }

  /** Saves a new document over the revision that `ifMatch` names, and over no other. */
  async save(id: string, document: Design, ifMatch: readonly string[]): Promise<StoredDesign> {
    const summary = await this.#summaryOf(document);
    return this.#changed(id, ifMatch, (design) => {
      if (isNewerDocument(design.documentJson)) {
        throw new Problem('newer-stored-document', {
          detail: 'It was left as it is. Update this program to change it.',
        });
      }
      return { name: document.name, summary, documentJson: JSON.stringify(document) };
    });
  }

  /** Takes a design off the bench; `restore` brings it back. */
  async delete(id: string, ifMatch: readonly string[]): Promise<void> {
    await this.#changed(id, ifMatch, () => ({ deletedAt: this.parts.now().toISOString() }));
  }

  /** Brings a deleted design back; one that is there is left as it is. */
  async restore(id: string): Promise<StoredDesign> {
    const { designs, now } = this.parts;
    return designs.all(async () => {
      const design = await designs.find(id);
      if (!design) throw new Problem('not-found');
      if (design.deletedAt === null) return design;
      const change = { deletedAt: null, revision: design.revision + 1, updatedAt: now().toISOString() };
      await designs.change(id, change);
      return { ...design, ...change };
    });
  }

  /** Figures for the list. That they cannot be worked out is no reason not to keep the design. */
  async #summaryOf(document: Design): Promise<DesignFigures> {
    try {
      return await this.parts.compute.run('summary', document);
    } catch (error) {
      this.parts.log.warn({ err: error }, 'The summary of a design could not be worked out');
      return unknownSummary(document.bars.length);
    }
  }

  #changed(
    id: string,
    ifMatch: readonly string[],
    changeOf: (design: StoredDesign) => Partial<StoredDesign>,
  ): Promise<StoredDesign> {
    const { designs, now } = this.parts;
    return designs.all(async () => {
      const design = present(await designs.find(id));
      requireCurrent(ifMatch, design);
      const change = { ...changeOf(design), revision: design.revision + 1, updatedAt: now().toISOString() };
      await designs.change(id, change);
      return { ...design, ...change };
    });
  }
}

function present(design: StoredDesign | null): StoredDesign {
  if (!design || design.deletedAt !== null) throw new Problem('not-found');
  return design;
}
