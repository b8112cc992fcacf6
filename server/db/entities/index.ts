import { Account } from './account.js';
import { Design } from './design.js';
import { Membership } from './membership.js';
import { SessionRow } from './session.js';
import { Shop } from './shop.js';

/** Every entity, listed by hand so that no search of the file system decides what the database is. */
export const ENTITIES = [Account, Shop, Membership, Design, SessionRow];

export { Account, Design, Membership, SessionRow, Shop };
export { ROLES, type Role } from './membership.js';
