import type { CreateClient, EditClient } from '@strandnote/api/contract';
import { type Actor, schema, withFirm } from '@strandnote/db';
import { eq } from 'drizzle-orm';
import { assertCan } from '../access/permissions.ts';
import { recordEvent } from '../audit/record-event.ts';
import type { AppDeps } from '../deps.ts';
import { AppError } from '../http/errors.ts';
import { insertOnce } from '../http/insert-once.ts';
import { changesOf, isSameEntry } from '../http/same-entry.ts';

const { clients } = schema;

export async function createClient(deps: AppDeps, actor: Actor, body: CreateClient): Promise<void> {
  assertCan(actor, 'client.edit');
  await withFirm(deps.db, actor, async (tx) => {
    const values = { ...body, firmId: actor.firmId };
    if (!(await insertOnce(tx, clients, { values, sent: body, noun: 'client' }))) return;
    await recordEvent(tx, actor, 'client.created', { kind: 'client', id: body.id }, { name: body.name }, deps.clock());
  });
}

export async function editClient(deps: AppDeps, actor: Actor, clientId: string, body: EditClient): Promise<void> {
  assertCan(actor, 'client.edit');
  await withFirm(deps.db, actor, async (tx) => {
    const [stored] = await tx.select().from(clients).where(eq(clients.id, clientId)).for('update');
    if (!stored) throw new AppError('not-found', 'There is no such client.');
    if (isSameEntry(stored, body)) return;
    await tx.update(clients).set(body).where(eq(clients.id, clientId));
    await recordEvent(tx, actor, 'client.changed', { kind: 'client', id: clientId }, changesOf(stored, body), deps.clock());
  });
}
