import type { EditFirm } from '@strandnote/api/contract';
import { type Actor, schema, withFirm } from '@strandnote/db';
import { assertCan } from '../access/permissions.ts';
import { recordEvent } from '../audit/record-event.ts';
import type { AppDeps } from '../deps.ts';
import { AppError } from '../http/errors.ts';

export async function editFirm(deps: AppDeps, actor: Actor, body: EditFirm): Promise<void> {
  assertCan(actor, 'firm.edit');
  if (body.timeZone !== undefined) assertTimeZone(body.timeZone);
  await withFirm(deps.db, actor, async (tx) => {
    if (Object.keys(body).length === 0) return;
    await tx.update(schema.firms).set(body);
    await recordEvent(tx, actor, 'firm.changed', { kind: 'firm', id: actor.firmId }, { to: body });
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
