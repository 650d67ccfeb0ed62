import type { CreateReference } from '@strandnote/api/contract';
import { type Actor, schema, withFirm } from '@strandnote/db';
import { eq } from 'drizzle-orm';
import { assertCan } from '../access/permissions.ts';
import { recordEvent } from '../audit/record-event.ts';
import type { AppDeps } from '../deps.ts';
import { AppError } from '../http/errors.ts';
import { insertOnce } from '../http/insert-once.ts';

const { cables, referenceTensions } = schema;

/** Adds a tension that estimates of the cable are compared with. */
export async function addReference(deps: AppDeps, actor: Actor, cableId: string, body: CreateReference): Promise<void> {
  assertCan(actor, 'structure.edit');
  await withFirm(deps.db, actor, async (tx) => {
    const [cable] = await tx.select({ id: cables.id }).from(cables).where(eq(cables.id, cableId));
    if (!cable) throw new AppError('not-found', 'There is no such cable.');
    const values = { ...body, firmId: actor.firmId, cableId };
    if (!(await insertOnce(tx, referenceTensions, { values, sent: { ...body, cableId }, noun: 'reference tension' }))) return;
    await recordEvent(
      tx,
      actor,
      'reference.created',
      { kind: 'reference-tension', id: body.id },
      { cableId, kind: body.kind, value: body.value },
      deps.clock(),
    );
  });
}

/** A reference that no longer holds is retired; a wrong one is retired and entered anew. @returns its cable */
export async function retireReference(deps: AppDeps, actor: Actor, referenceId: string): Promise<string> {
  assertCan(actor, 'structure.edit');
  return withFirm(deps.db, actor, async (tx) => {
    const [stored] = await tx.select().from(referenceTensions).where(eq(referenceTensions.id, referenceId)).for('update');
    if (!stored) throw new AppError('not-found', 'There is no such reference tension.');
    if (stored.retiredAt !== null) return stored.cableId;
    await tx.update(referenceTensions).set({ retiredAt: deps.clock() }).where(eq(referenceTensions.id, referenceId));
    await recordEvent(
      tx,
      actor,
      'reference.retired',
      { kind: 'reference-tension', id: referenceId },
      { cableId: stored.cableId },
      deps.clock(),
    );
    return stored.cableId;
  });
}
