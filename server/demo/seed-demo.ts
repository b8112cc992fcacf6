import type { AccountRepository } from '../auth/account-repository.js';
import type { Passwords } from '../auth/passwords.js';
import type { DesignService } from '../designs/design-service.js';
import { DEMO_DESIGNS } from './designs.js';
import { DEMO_PEOPLE, DEMO_SHOP } from './people.js';

interface SeedParts {
  readonly accounts: AccountRepository;
  readonly passwords: Passwords;
  readonly designs: DesignService;
  readonly now: () => Date;
  readonly newId: () => string;
}

/** Fills a new database with the invented shop: its people, and the designs each of them has. */
export async function seedDemo({ accounts, passwords, designs, now, newId }: SeedParts): Promise<void> {
  const shop = { id: newId(), name: DEMO_SHOP };
  const idOf = new Map<string, string>();
  for (const { role, name, email, password } of DEMO_PEOPLE) {
    const account = {
      id: newId(),
      name,
      email,
      passwordHash: await passwords.hash(password),
      createdAt: now().toISOString(),
    };
    if (role === 'owner') await accounts.addWithShop(account, shop);
    else await accounts.addToShop(account, shop.id, role);
    idOf.set(role, account.id);
  }
  for (const { author, design } of DEMO_DESIGNS) {
    const owner = idOf.get(author);
    if (owner !== undefined) await designs.create(owner, design);
  }
}
