import type { TableColumnOptions } from 'typeorm';

/**
 * The column types in use, and the only place that knows them. Each means the same on every database that the
 * entities are meant for; times are ISO 8601 text in UTC, identifiers and hashes are made by the program.
 */
export interface ColumnShape {
  readonly type: 'varchar' | 'text' | 'integer';
  readonly length?: string;
}

export const ID: ColumnShape = { type: 'varchar', length: '36' };
export const SHA256: ColumnShape = { type: 'varchar', length: '64' };
export const TIME: ColumnShape = { type: 'varchar', length: '24' };
export const WORD: ColumnShape = { type: 'varchar', length: '16' };
export const NAME: ColumnShape = { type: 'varchar', length: '200' };
export const EMAIL: ColumnShape = { type: 'varchar', length: '254' };
export const LONG_TEXT: ColumnShape = { type: 'text' };
/** JSON as text: what reads it back parses it by its schema. */
export const JSON_TEXT: ColumnShape = { type: 'text' };
export const WHOLE: ColumnShape = { type: 'integer' };

/** The column as a migration wants it; an entity's decorator takes the shape as it is. */
export function tableColumn(
  name: string,
  shape: ColumnShape,
  more: { readonly isPrimary?: boolean; readonly isNullable?: boolean } = {},
): TableColumnOptions {
  return { name, ...shape, ...more };
}
