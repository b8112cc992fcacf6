import { Column, Entity, Index, JoinColumn, ManyToOne, PrimaryColumn, type Relation } from 'typeorm';
import { ID, TIME, WORD } from '../columns.js';
import { Account } from './account.js';
import { Shop } from './shop.js';

/** What a member of a shop may be there. */
export const ROLES = ['owner', 'smith', 'student'] as const;
export type Role = (typeof ROLES)[number];

/** An account's place in a shop. */
@Entity('membership')
export class Membership {
  @PrimaryColumn(ID)
  shopId!: string;

  @Index('membership_account')
  @PrimaryColumn(ID)
  accountId!: string;

  @Column(WORD)
  role!: Role;

  @Column(TIME)
  createdAt!: string;

  @ManyToOne(() => Shop, { onDelete: 'CASCADE' })
  @JoinColumn({ name: 'shopId', foreignKeyConstraintName: 'membership_shop_fk' })
  shop?: Relation<Shop>;

  @ManyToOne(() => Account, { onDelete: 'CASCADE' })
  @JoinColumn({ name: 'accountId', foreignKeyConstraintName: 'membership_account_fk' })
  account?: Relation<Account>;
}
