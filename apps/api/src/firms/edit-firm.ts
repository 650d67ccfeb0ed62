import type { EditFirm } from '@strandnote/api/contract';
import { type Actor, schema, withFirm } from '@strandnote/db';
import { eq } from 'drizzle-orm';
import { assertCan } from '../access/permissions.ts';
import { recordEvent } from '../audit/record-event.ts';
import type { AppDeps } from '../deps.ts';
import { AppError } from '../http/errors.ts';
import { changesOf, isSameEntry } from '../http/same-entry.ts';

export async function editFirm(deps: AppDeps, actor: Actor, body: EditFirm): Promise<void> {
  assertCan(actor, 'firm.edit');
  if (body.timeZone !== undefined) assertTimeZone(body.timeZone);
  await withFirm(deps.db, actor, async (tx) => {
    const { firms } = schema;
    const [stored] = await tx.select().from(firms).where(eq(firms.id, actor.firmId)).for('update');
    if (!stored || isSameEntry(stored, body)) return;
    await tx.update(firms).set(body).where(eq(firms.id, actor.firmId));
    await recordEvent(tx, actor, 'firm.changed', { kind: 'firm', id: actor.firmId }, changesOf(stored, body), deps.clock());
  });
}

/** @throws AppError beside the field when the platform does not know the zone */
export function assertTimeZone(timeZone: string): void {
  try {
    new Intl.DateTimeFormat('en', { timeZone });
  } catch {
    throw AppError.ofField('timeZone', 'A time zone looks like Europe/London.');
  }
}
