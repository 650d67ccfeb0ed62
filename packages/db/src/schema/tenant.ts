import { sql } from 'drizzle-orm';
import { type AnyPgColumn, check, doublePrecision, foreignKey, primaryKey, timestamp, uuid } from 'drizzle-orm/pg-core';

/** The columns that every tenant table begins with. Keys are over both, so that a row cannot point into another firm. */
export const tenantColumns = { firmId: uuid('firm_id').notNull(), id: uuid('id').notNull() };

export function tenantKey(table: { firmId: AnyPgColumn; id: AnyPgColumn }) {
  return primaryKey({ columns: [table.firmId, table.id] });
}

/** A foreign key that stays within the firm. */
export function withinFirm(
  table: { firmId: AnyPgColumn },
  column: AnyPgColumn,
  target: { firmId: AnyPgColumn; id: AnyPgColumn },
  name: string,
) {
  return foreignKey({
    name,
    columns: [table.firmId, column] as [AnyPgColumn, AnyPgColumn],
    foreignColumns: [target.firmId, target.id] as [AnyPgColumn, AnyPgColumn],
  });
}

/** A column of words, of which there is a fixed list. */
export function oneOf(column: AnyPgColumn, words: readonly string[]) {
  return check(`${column.name}_is_known`, sql`${column} in (${sql.raw(words.map((word) => `'${word}'`).join(', '))})`);
}

/** Quantities above zero and finite. PostgreSQL holds NaN for greater than every number, so the upper bound shuts it out too. */
export function positive(name: string, ...columns: AnyPgColumn[]) {
  return check(
    name,
    sql.join(
      columns.map((column) => sql`${column} > 0 and ${column} < 'Infinity'`),
      sql` and `,
    ),
  );
}

/** Quantities that may be zero, and are finite. */
export function notNegative(name: string, ...columns: AnyPgColumn[]) {
  return check(
    name,
    sql.join(
      columns.map((column) => sql`${column} >= 0 and ${column} < 'Infinity'`),
      sql` and `,
    ),
  );
}

/** A SHA-256 as 64 hexadecimal digits. */
export function isSha256(column: AnyPgColumn) {
  return check(`${column.name}_is_sha256`, sql`${column} ~ '^[0-9a-f]{64}$'`);
}

export const moment = (name: string) => timestamp(name, { withTimezone: true, mode: 'date' });
export const si = (name: string) => doublePrecision(name);
