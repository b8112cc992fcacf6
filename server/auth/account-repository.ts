import type { EntityManager } from 'typeorm';
import { Account, Membership, type Role, Shop } from '../db/entities/index.js';
import type { Units } from '../db/units.js';
import type { SignedInAccount } from './signed-in-account.js';

/** A shop that an account belongs to, and as what. */
export interface ShopMembership {
  readonly id: string;
  readonly name: string;
  readonly role: Role;
}

/** An account with what is needed to check its password. */
export interface StoredAccount extends SignedInAccount {
  readonly passwordHash: string;
}

export interface NewAccount extends StoredAccount {
  readonly createdAt: string;
}

/** Accounts, shops and who belongs to them. */
export class AccountRepository {
  constructor(private readonly units: Units) {}

  async find(id: string): Promise<SignedInAccount | null> {
    const row = await this.units.read((manager) => manager.findOneBy(Account, { id }));
    return row && { id: row.id, name: row.name, email: row.email };
  }

  async findByEmail(email: string): Promise<StoredAccount | null> {
    const row = await this.units.read((manager) => manager.findOneBy(Account, { email }));
    return row && { id: row.id, name: row.name, email: row.email, passwordHash: row.passwordHash };
  }

  async shopsOf(accountId: string): Promise<readonly ShopMembership[]> {
    const rows = await this.units.read((manager) =>
      manager.find(Membership, {
        where: { accountId },
        relations: { shop: true },
        order: { createdAt: 'ASC' },
      }),
    );
    return rows.flatMap(({ shop, role }) => (shop ? [{ id: shop.id, name: shop.name, role }] : []));
  }

  /** Adds an account that owns a shop of its own, all or nothing. False when the e-mail address is taken. */
  addWithShop(account: NewAccount, shop: { readonly id: string; readonly name: string }): Promise<boolean> {
    return this.units.write(async (manager) => {
      if (await manager.existsBy(Account, { email: account.email })) return false;
      await insertAccount(manager, account);
      await manager.insert(Shop, { ...shop, createdAt: account.createdAt });
      await insertMembership(manager, { shopId: shop.id, account, role: 'owner' });
      return true;
    });
  }

  /** Adds an account to a shop that is there already. */
  addToShop(account: NewAccount, shopId: string, role: Role): Promise<void> {
    return this.units.write(async (manager) => {
      await insertAccount(manager, account);
      await insertMembership(manager, { shopId, account, role });
    });
  }
}

async function insertAccount(manager: EntityManager, account: NewAccount): Promise<void> {
  const { id, name, email, passwordHash, createdAt } = account;
  await manager.insert(Account, { id, name, email, passwordHash, createdAt });
}

async function insertMembership(
  manager: EntityManager,
  member: { readonly shopId: string; readonly account: NewAccount; readonly role: Role },
): Promise<void> {
  const { shopId, account, role } = member;
  await manager.insert(Membership, { shopId, accountId: account.id, role, createdAt: account.createdAt });
}
