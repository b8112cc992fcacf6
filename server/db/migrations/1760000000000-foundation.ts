import { type MigrationInterface, type QueryRunner, Table } from 'typeorm';
import { EMAIL, ID, JSON_TEXT, LONG_TEXT, NAME, SHA256, TIME, WHOLE, WORD, tableColumn } from '../columns.js';

const account = new Table({
  name: 'account',
  columns: [
    tableColumn('id', ID, { isPrimary: true }),
    tableColumn('name', NAME),
    tableColumn('email', EMAIL),
    tableColumn('passwordHash', LONG_TEXT),
    tableColumn('createdAt', TIME),
  ],
  indices: [{ name: 'account_email', columnNames: ['email'], isUnique: true }],
});

const shop = new Table({
  name: 'shop',
  columns: [
    tableColumn('id', ID, { isPrimary: true }),
    tableColumn('name', NAME),
    tableColumn('createdAt', TIME),
  ],
});

const membership = new Table({
  name: 'membership',
  columns: [
    tableColumn('shopId', ID, { isPrimary: true }),
    tableColumn('accountId', ID, { isPrimary: true }),
    tableColumn('role', WORD),
    tableColumn('createdAt', TIME),
  ],
  indices: [{ name: 'membership_account', columnNames: ['accountId'] }],
  foreignKeys: [
    belongsTo('membership_shop_fk', 'shopId', 'shop'),
    belongsTo('membership_account_fk', 'accountId', 'account'),
  ],
});

const design = new Table({
  name: 'design',
  columns: [
    tableColumn('id', ID, { isPrimary: true }),
    tableColumn('shopId', ID),
    tableColumn('ownerId', ID),
    tableColumn('name', NAME),
    tableColumn('searchKey', NAME),
    tableColumn('documentJson', JSON_TEXT),
    tableColumn('summaryJson', JSON_TEXT),
    tableColumn('revision', WHOLE),
    tableColumn('createdAt', TIME),
    tableColumn('updatedAt', TIME),
    tableColumn('deletedAt', TIME, { isNullable: true }),
  ],
  indices: [
    { name: 'design_shop', columnNames: ['shopId'] },
    { name: 'design_owner', columnNames: ['ownerId', 'updatedAt'] },
  ],
  foreignKeys: [
    belongsTo('design_shop_fk', 'shopId', 'shop'),
    belongsTo('design_owner_fk', 'ownerId', 'account'),
  ],
});

const session = new Table({
  name: 'session',
  columns: [
    tableColumn('id', SHA256, { isPrimary: true }),
    tableColumn('accountId', ID, { isNullable: true }),
    tableColumn('dataJson', JSON_TEXT),
    tableColumn('createdAt', TIME),
    tableColumn('expiresAt', TIME),
  ],
  indices: [
    { name: 'session_account', columnNames: ['accountId'] },
    { name: 'session_expiry', columnNames: ['expiresAt'] },
  ],
  foreignKeys: [belongsTo('session_account_fk', 'accountId', 'account')],
});

const TABLES = [account, shop, membership, design, session];

/** Accounts, shops and who belongs to them, designs, and signed-in browsers. */
export class Foundation1760000000000 implements MigrationInterface {
  readonly name = 'Foundation1760000000000';

  async up(runner: QueryRunner): Promise<void> {
    for (const table of TABLES) await runner.createTable(table.clone());
  }

  async down(runner: QueryRunner): Promise<void> {
    for (const table of [...TABLES].reverse()) await runner.dropTable(table.name);
  }
}

function belongsTo(name: string, column: string, table: string) {
  return {
    name,
    columnNames: [column],
    referencedTableName: table,
    referencedColumnNames: ['id'],
    onDelete: 'CASCADE',
  };
}
