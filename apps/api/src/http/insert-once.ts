import type { Tx } from '@strandnote/db';
import { eq } from 'drizzle-orm';
import type { AnyPgColumn, PgTable } from 'drizzle-orm/pg-core';
import { AppError } from './errors.ts';
import { isSameEntry } from './same-entry.ts';

type TenantTable = PgTable & { firmId: AnyPgColumn; id: AnyPgColumn };

export interface NewRow<Table extends TenantTable> {
  values: Table['$inferInsert'] & { id: string };
  /** What the client sent of it: a stored row that holds the same is the same request again. */
  sent: Record<string, unknown>;
  /** What it is called when another one has its identifier: "cable". */
  noun: string;
}

/**
 * Inserts a row under the identifier that its client made. The same request sent twice, even at the same moment, happens once:
 * the second insert waits for the first and then finds its row.
 *
 * @returns whether the row is new
 * @throws AppError `conflict` when another row has the identifier
 */
export async function insertOnce<Table extends TenantTable>(tx: Tx, table: Table, { values, sent, noun }: NewRow<Table>): Promise<boolean> {
  const inserted = await tx
    .insert(table)
    .values(values as never)
    .onConflictDoNothing({ target: [table.firmId, table.id] })
    .returning({ id: table.id });
  if (inserted.length > 0) return true;
  const [stored] = await tx
    .select()
    .from(table as PgTable)
    .where(eq(table.id, values.id));
  if (stored && isSameEntry(stored, sent)) return false;
  throw new AppError('conflict', `Another ${noun} has this identifier already.`);
}
