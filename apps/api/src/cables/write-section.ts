import type { CreateSection, EditSection } from '@strandnote/api/contract';
import { type Actor, schema, type Tx, withFirm } from '@strandnote/db';
import { eq } from 'drizzle-orm';
import { assertCan } from '../access/permissions.ts';
import { recordEvent } from '../audit/record-event.ts';
import type { AppDeps } from '../deps.ts';
import { AppError } from '../http/errors.ts';
import { insertOnce } from '../http/insert-once.ts';
import { changesOf, isSameEntry } from '../http/same-entry.ts';
import { loadStructure } from '../structures/structures.queries.ts';

const { sections } = schema;

export async function createSection(deps: AppDeps, actor: Actor, structureId: string, body: CreateSection): Promise<void> {
  assertCan(actor, 'structure.edit');
  await withFirm(deps.db, actor, async (tx) => {
    await loadStructure(tx, structureId);
    const values = { ...body, firmId: actor.firmId, structureId };
    if (!(await insertOnce(tx, sections, { values, sent: { ...body, structureId }, noun: 'section' }))) return;
    await recordEvent(tx, actor, 'section.created', { kind: 'section', id: body.id }, { structureId, name: body.name }, deps.clock());
  });
}

export async function editSection(deps: AppDeps, actor: Actor, sectionId: string, body: EditSection): Promise<void> {
  assertCan(actor, 'structure.edit');
  await withFirm(deps.db, actor, async (tx) => {
    const stored = await lockSection(tx, sectionId);
    if (isSameEntry(stored, body)) return;
    const { bendingStiffnessLow = stored.bendingStiffnessLow, bendingStiffnessHigh = stored.bendingStiffnessHigh } = body;
    if (bendingStiffnessLow > bendingStiffnessHigh) {
      throw AppError.ofField('bendingStiffnessHigh', 'The upper bound must not be below the lower bound.');
    }
    await tx.update(sections).set(body).where(eq(sections.id, sectionId));
    await recordEvent(tx, actor, 'section.changed', { kind: 'section', id: sectionId }, changesOf(stored, body), deps.clock());
  });
}

async function lockSection(tx: Tx, sectionId: string) {
  const [stored] = await tx.select().from(sections).where(eq(sections.id, sectionId)).for('update');
  if (!stored) throw new AppError('not-found', 'There is no such section.');
  return stored;
}
