import type { CreateCable, EditCable, WriteSpan } from '@strandnote/api/contract';
import { type Actor, schema, type Tx, withFirm } from '@strandnote/db';
import { and, eq, inArray, isNull, ne } from 'drizzle-orm';
import { assertCan } from '../access/permissions.ts';
import { recordEvent } from '../audit/record-event.ts';
import type { AppDeps } from '../deps.ts';
import { AppError } from '../http/errors.ts';
import { insertOnce } from '../http/insert-once.ts';
import { changesOf, isSameEntry } from '../http/same-entry.ts';
import { loadStructure } from '../structures/structures.queries.ts';

const { cables, sections, spans } = schema;

export async function createCable(deps: AppDeps, actor: Actor, structureId: string, body: CreateCable): Promise<void> {
  assertCan(actor, 'structure.edit');
  const { spans: given, ...fields } = body;
  await withFirm(deps.db, actor, async (tx) => {
    await loadStructure(tx, structureId);
    await assertSection(tx, structureId, body.sectionId);
    await assertReferenceIsFree(tx, structureId, body.id, body.reference);
    const values = { ...fields, firmId: actor.firmId, structureId };
    if (!(await insertOnce(tx, cables, { values, sent: { ...fields, structureId }, noun: 'cable' }))) {
      return assertSameSpans(await currentSpans(tx, body.id), given);
    }
    await writeSpans(tx, actor, body.id, given);
    await recordEvent(tx, actor, 'cable.created', { kind: 'cable', id: body.id }, { structureId, reference: body.reference }, deps.clock());
  });
}

export async function editCable(deps: AppDeps, actor: Actor, cableId: string, body: EditCable): Promise<void> {
  assertCan(actor, 'structure.edit');
  const { spans: given, ...fields } = body;
  await withFirm(deps.db, actor, async (tx) => {
    const [stored] = await tx.select().from(cables).where(eq(cables.id, cableId)).for('update');
    if (!stored) throw new AppError('not-found', 'There is no such cable.');
    const before = await currentSpans(tx, cableId);
    if (fields.sectionId !== undefined) await assertSection(tx, stored.structureId, fields.sectionId);
    if (fields.reference !== undefined) await assertReferenceIsFree(tx, stored.structureId, cableId, fields.reference);
    const changesFields = !isSameEntry(stored, fields);
    // A row that is written anew counts as a contribution of whoever writes it: only what changes is written.
    if (changesFields) await tx.update(cables).set(fields).where(eq(cables.id, cableId));
    const changesSpans = given !== undefined && (await replaceSpans(tx, actor, cableId, before, given, deps.clock()));
    if (!changesFields && !changesSpans) return;
    const { from, to } = changesOf(stored, fields);
    const spansChanged = changesSpans ? [{ spans: before }, { spans: given }] : [{}, {}];
    await recordEvent(
      tx,
      actor,
      'cable.changed',
      { kind: 'cable', id: cableId },
      { from: { ...from, ...spansChanged[0] }, to: { ...to, ...spansChanged[1] } },
      deps.clock(),
    );
  });
}

type SpanRow = typeof spans.$inferSelect;

async function currentSpans(tx: Tx, cableId: string): Promise<SpanRow[]> {
  return tx
    .select()
    .from(spans)
    .where(and(eq(spans.cableId, cableId), isNull(spans.retiredAt)));
}

/** @throws AppError `conflict` when a cable that is sent again comes with other spans */
function assertSameSpans(stored: readonly SpanRow[], given: readonly WriteSpan[]): void {
  const same = given.every((span, position) => isSameEntry(stored.find(({ id }) => id === span.id) ?? {}, { ...span, position }));
  if (!same || stored.length !== given.length) throw new AppError('conflict', 'Another cable has this identifier already.');
}

async function writeSpans(tx: Tx, actor: Actor, cableId: string, given: readonly WriteSpan[]): Promise<void> {
  await tx.insert(spans).values(given.map((span, position) => ({ ...span, firmId: actor.firmId, cableId, position })));
}

/** Spans that are no longer named are retired: what was measured on them stays. */
async function replaceSpans(
  tx: Tx,
  actor: Actor,
  cableId: string,
  before: readonly SpanRow[],
  given: readonly WriteSpan[],
  at: Date,
): Promise<boolean> {
  let changed = false;
  for (const [position, span] of given.entries()) {
    const stored = before.find(({ id }) => id === span.id);
    if (stored && isSameEntry(stored, { ...span, position })) continue;
    changed = true;
    if (stored)
      await tx
        .update(spans)
        .set({ ...span, position })
        .where(eq(spans.id, span.id));
    else await tx.insert(spans).values({ ...span, firmId: actor.firmId, cableId, position });
  }
  const gone = before.filter(({ id }) => !given.some((span) => span.id === id)).map(({ id }) => id);
  if (gone.length > 0) await tx.update(spans).set({ retiredAt: at }).where(inArray(spans.id, gone));
  return changed || gone.length > 0;
}

async function assertSection(tx: Tx, structureId: string, sectionId: string): Promise<void> {
  const [section] = await tx
    .select({ id: sections.id })
    .from(sections)
    .where(and(eq(sections.id, sectionId), eq(sections.structureId, structureId)));
  if (!section) throw AppError.ofField('sectionId', 'Choose a section of this structure.');
}

async function assertReferenceIsFree(tx: Tx, structureId: string, cableId: string, reference: string): Promise<void> {
  const [other] = await tx
    .select({ id: cables.id })
    .from(cables)
    .where(and(eq(cables.structureId, structureId), eq(cables.reference, reference), ne(cables.id, cableId)));
  if (other) throw AppError.ofField('reference', `The structure has a cable ${reference} already.`);
}
