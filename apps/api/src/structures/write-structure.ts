import type { CreateStructure, EditStructure } from '@strandnote/api/contract';
import { type Actor, schema, type Tx, withFirm } from '@strandnote/db';
import { eq } from 'drizzle-orm';
import { assertCan } from '../access/permissions.ts';
import { recordEvent } from '../audit/record-event.ts';
import type { AppDeps } from '../deps.ts';
import { assertTimeZone } from '../firms/edit-firm.ts';
import { AppError } from '../http/errors.ts';
import { insertOnce } from '../http/insert-once.ts';
import { changesOf, isSameEntry } from '../http/same-entry.ts';

const { clients, structures } = schema;

export async function createStructure(deps: AppDeps, actor: Actor, body: CreateStructure): Promise<void> {
  assertCan(actor, 'structure.edit');
  assertTimeZone(body.timeZone);
  await withFirm(deps.db, actor, async (tx) => {
    await assertClient(tx, body.clientId);
    const values = { ...body, firmId: actor.firmId };
    if (!(await insertOnce(tx, structures, { values, sent: body, noun: 'structure' }))) return;
    await recordEvent(tx, actor, 'structure.created', { kind: 'structure', id: body.id }, { name: body.name }, deps.clock());
  });
}

export async function editStructure(deps: AppDeps, actor: Actor, structureId: string, body: EditStructure): Promise<void> {
  assertCan(actor, 'structure.edit');
  if (body.timeZone !== undefined) assertTimeZone(body.timeZone);
  await withFirm(deps.db, actor, async (tx) => {
    const [stored] = await tx.select().from(structures).where(eq(structures.id, structureId)).for('update');
    if (!stored) throw new AppError('not-found', 'There is no such structure.');
    if (isSameEntry(stored, body)) return;
    await assertClient(tx, body.clientId ?? null);
    await tx.update(structures).set(body).where(eq(structures.id, structureId));
    await recordEvent(tx, actor, 'structure.changed', { kind: 'structure', id: structureId }, changesOf(stored, body), deps.clock());
  });
}

async function assertClient(tx: Tx, clientId: string | null): Promise<void> {
  if (clientId === null) return;
  const [client] = await tx.select({ id: clients.id }).from(clients).where(eq(clients.id, clientId));
  if (!client) throw AppError.ofField('clientId', 'Choose a client of the firm.');
}
