import { Column, Entity, Index, PrimaryColumn } from 'typeorm';
import { EMAIL, ID, LONG_TEXT, NAME, TIME } from '../columns.js';

/** Someone who can sign in. */
@Entity('account')
export class Account {
  @PrimaryColumn(ID)
  id!: string;

  @Column(NAME)
  name!: string;

  /** Trimmed and in lower case. */
  @Index('account_email', { unique: true })
  @Column(EMAIL)
  email!: string;

  @Column(LONG_TEXT)
  passwordHash!: string;

  @Column(TIME)
  createdAt!: string;
}
