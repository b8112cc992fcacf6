import type { EntityManager } from 'typeorm';
import { Account, type Design, Membership, Shop } from '../db/entities/index.js';

const TIME = '2026-01-01T00:00:00.000Z';

/** Adds an account with its shop, `owner` in both, so that designs have someone to belong to. */
export async function addOwner(manager: EntityManager, owner = 'owner-1', shop = 'shop-1'): Promise<void> {
  await manager.insert(Account, {
    id: owner,
    name: 'A smith',
    email: `${owner}@forge.example`,
    passwordHash: 'none',
    createdAt: TIME,
  });
  await manager.insert(Shop, { id: shop, name: 'A forge', createdAt: TIME });
  await manager.insert(Membership, { shopId: shop, accountId: owner, role: 'owner', createdAt: TIME });
}

/** A design row; what it holds does not matter to the database. */
export function designRow(id: string, more: Partial<Design> = {}): Partial<Design> & { id: string } {
  return {
    shopId: 'shop-1',
    ownerId: 'owner-1',
    name: id,
    searchKey: id,
    documentJson: '{}',
    summaryJson: '{}',
    revision: 1,
    createdAt: TIME,
    updatedAt: TIME,
    deletedAt: null,
    ...more,
    id,
  };
}
