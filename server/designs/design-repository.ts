import { type FindOperator, IsNull, LessThan, Raw } from 'typeorm';
import { Design, Membership } from '../db/entities/index.js';
import type { Unit, Units } from '../db/units.js';
import type { DesignFigures } from '../compute/tasks.js';
import { summaryFrom } from './summary.js';

/** What a list shows of a design. */
export interface ListedDesign {
  readonly id: string;
  readonly name: string;
  readonly revision: number;
  readonly updatedAt: string;
  readonly summary: DesignFigures;
}

/** A design as it is kept. */
export interface StoredDesign extends ListedDesign {
  readonly shopId: string;
  readonly ownerId: string;
  readonly createdAt: string;
  readonly deletedAt: string | null;
  /** The document as JSON text; what reads it parses it. */
  readonly documentJson: string;
}

export type DesignChange = Partial<
  Pick<StoredDesign, 'name' | 'revision' | 'updatedAt' | 'deletedAt' | 'summary' | 'documentJson'>
>;

/** Designs in the database. Several calls within `all` are one unit: all of it happens, or nothing. */
export class DesignRepository {
  constructor(private readonly units: Units) {}

  all<T>(unit: Unit<T>): Promise<T> {
    return this.units.write(unit);
  }

  /** Whose design it is, deleted or not; null when there is none. */
  async ownerOf(id: string): Promise<string | null> {
    const row = await this.units.read((manager) =>
      manager.findOne(Design, { where: { id }, select: { ownerId: true } }),
    );
    return row?.ownerId ?? null;
  }

  async find(id: string): Promise<StoredDesign | null> {
    const row = await this.units.read((manager) => manager.findOneBy(Design, { id }));
    return row && stored(row);
  }

  /** The designs that someone has and has not deleted, the one worked on last first. */
  async list(ownerId: string, search: string): Promise<readonly ListedDesign[]> {
    const rows = await this.units.read((manager) =>
      manager.find(Design, {
        where: {
          ownerId,
          deletedAt: IsNull(),
          ...(search === '' ? {} : { searchKey: containing(searchKeyOf(search)) }),
        },
        select: { id: true, name: true, revision: true, updatedAt: true, summaryJson: true },
        order: { updatedAt: 'DESC', id: 'ASC' },
      }),
    );
    return rows.map(listed);
  }

  count(ownerId: string): Promise<number> {
    return this.units.read((manager) => manager.countBy(Design, { ownerId }));
  }

  async add(design: StoredDesign): Promise<void> {
    const { summary, ...columns } = design;
    await this.units.write((manager) =>
      manager.insert(Design, {
        ...columns,
        summaryJson: JSON.stringify(summary),
        searchKey: searchKeyOf(design.name),
      }),
    );
  }

  async change(id: string, change: DesignChange): Promise<void> {
    const { summary, ...columns } = change;
    await this.units.write((manager) =>
      manager.update(
        Design,
        { id },
        {
          ...columns,
          ...(summary ? { summaryJson: JSON.stringify(summary) } : {}),
          ...(change.name === undefined ? {} : { searchKey: searchKeyOf(change.name) }),
        },
      ),
    );
  }

  /** Removes for good what was deleted before a moment. */
  async removeDeletedBefore(moment: string): Promise<void> {
    await this.units.write((manager) => manager.delete(Design, { deletedAt: LessThan(moment) }));
  }

  /** The shop that someone's new designs belong to: the first that they own, else the first they belong to. */
  async homeShopOf(accountId: string): Promise<string | null> {
    const memberships = await this.units.read((manager) =>
      manager.find(Membership, { where: { accountId }, order: { createdAt: 'ASC' } }),
    );
    return (memberships.find(({ role }) => role === 'owner') ?? memberships[0])?.shopId ?? null;
  }
}

/** Capitals and the way accents are written make no difference to a search. */
function searchKeyOf(text: string): string {
  return text.normalize('NFKC').toLowerCase();
}

function containing(text: string): FindOperator<string> {
  const pattern = `%${text.replace(/[%_\\]/g, '\\$&')}%`;
  // Its type says nothing of the column.
  return Raw((column) => `${column} LIKE :pattern ESCAPE '\\'`, { pattern }) as FindOperator<string>;
}

function listed(row: Design): ListedDesign {
  const { id, name, revision, updatedAt, summaryJson } = row;
  return { id, name, revision, updatedAt, summary: summaryFrom(summaryJson) };
}

function stored(row: Design): StoredDesign {
  const { shopId, ownerId, createdAt, deletedAt, documentJson } = row;
  return { ...listed(row), shopId, ownerId, createdAt, deletedAt, documentJson };
}
