import { Column, Entity, Index, JoinColumn, ManyToOne, PrimaryColumn, type Relation } from 'typeorm';
import { ID, JSON_TEXT, NAME, TIME, WHOLE } from '../columns.js';
import { Account } from './account.js';
import { Shop } from './shop.js';

/** A design as it is kept: the document, and beside it what a list shows without opening it. */
@Entity('design')
@Index('design_owner', ['ownerId', 'updatedAt'])
export class Design {
  @PrimaryColumn(ID)
  id!: string;

  @Index('design_shop')
  @Column(ID)
  shopId!: string;

  @Column(ID)
  ownerId!: string;

  @Column(NAME)
  name!: string;

  /** The name as a search compares it. */
  @Column(NAME)
  searchKey!: string;

  @Column(JSON_TEXT)
  documentJson!: string;

  @Column(JSON_TEXT)
  summaryJson!: string;

  /** 1 for a new design, one more for every save. */
  @Column(WHOLE)
  revision!: number;

  @Column(TIME)
  createdAt!: string;

  @Column(TIME)
  updatedAt!: string;

  /** Set while a deleted design can still be brought back. */
  @Column({ ...TIME, nullable: true })
  deletedAt!: string | null;

  @ManyToOne(() => Shop, { onDelete: 'CASCADE' })
  @JoinColumn({ name: 'shopId', foreignKeyConstraintName: 'design_shop_fk' })
  shop?: Relation<Shop>;

  @ManyToOne(() => Account, { onDelete: 'CASCADE' })
  @JoinColumn({ name: 'ownerId', foreignKeyConstraintName: 'design_owner_fk' })
  owner?: Relation<Account>;
}
