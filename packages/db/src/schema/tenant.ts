import { type AnyPgColumn, doublePrecision, foreignKey, primaryKey, timestamp, uuid } from 'drizzle-orm/pg-core';

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

export const moment = (name: string) => timestamp(name, { withTimezone: true, mode: 'date' });
export const si = (name: string) => doublePrecision(name);
