import { Column, Entity, Index, JoinColumn, ManyToOne, PrimaryColumn, type Relation } from 'typeorm';
import { ID, JSON_TEXT, SHA256, TIME } from '../columns.js';
import { Account } from './account.js';

/** A signed-in browser. The key is a hash of the cookie's secret, so a copy of the database opens no door. */
@Entity('session')
export class SessionRow {
  @PrimaryColumn(SHA256)
  id!: string;

  @Index('session_account')
  @Column({ ...ID, nullable: true })
  accountId!: string | null;

  @Column(JSON_TEXT)
  dataJson!: string;

  @Column(TIME)
  createdAt!: string;

  @Index('session_expiry')
  @Column(TIME)
  expiresAt!: string;

  @ManyToOne(() => Account, { onDelete: 'CASCADE', nullable: true })
  @JoinColumn({ name: 'accountId', foreignKeyConstraintName: 'session_account_fk' })
  account?: Relation<Account> | null;
}
