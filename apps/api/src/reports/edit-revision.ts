import type { EditRevision } from '@strandnote/api/contract';
import { type Actor, schema, type Tx, withFirm } from '@strandnote/db';
import { and, eq, inArray } from 'drizzle-orm';
import { assertCan } from '../access/permissions.ts';
import { recordEvent } from '../audit/record-event.ts';
import type { AppDeps } from '../deps.ts';
import { AppError } from '../http/errors.ts';
import { loadRevision, type RevisionRow } from './load-revision.ts';

const { members, revisions } = schema;

/** Saves the texts and the deputy of a draft, if nobody else has saved since they were read. */
export async function editRevision(deps: AppDeps, actor: Actor, revisionId: string, body: EditRevision): Promise<void> {
  assertCan(actor, 'report.write');
  await withFirm(deps.db, actor, async (tx) => {
    const { revision } = await loadRevision(tx, revisionId);
    if (body.deputyUserId !== null) await assertMayDeputise(tx, body.deputyUserId);
    const { texts, deputyUserId, textVersion } = body;
    const [saved] = await tx
      .update(revisions)
      .set({ texts, deputyUserId, textVersion: textVersion + 1, changedAt: deps.clock() })
      .where(and(eq(revisions.id, revisionId), inArray(revisions.state, ['draft', 'returned']), eq(revisions.textVersion, textVersion)))
      .returning({ id: revisions.id });
    if (!saved) throw await whyRefused(tx, revisionId);
    await recordEvent(tx, actor, 'revision.edited', { kind: 'revision', id: revisionId }, changesOf(revision, body), deps.clock());
  });
}

function changesOf(before: RevisionRow, after: EditRevision): Record<string, unknown> {
  const names = (['scope', 'conditions', 'deviations', 'conclusion'] as const).filter((name) => before.texts[name] !== after.texts[name]);
  const deputy = before.deputyUserId === after.deputyUserId ? {} : { deputyUserId: after.deputyUserId };
  return { texts: names, ...deputy, textVersion: after.textVersion + 1 };
}

async function assertMayDeputise(tx: Tx, userId: string): Promise<void> {
  const [member] = await tx.select().from(members).where(eq(members.userId, userId));
  if (!member?.active || !member.roles.includes('engineer')) {
    throw AppError.ofField('deputyUserId', 'The deputy must be an active engineer of the firm.');
  }
}

async function whyRefused(tx: Tx, revisionId: string): Promise<AppError> {
  const { revision } = await loadRevision(tx, revisionId);
  if (revision.state !== 'draft' && revision.state !== 'returned') {
    return new AppError('conflict', `The revision is ${revision.state}, so its texts are frozen.`);
  }
  return new AppError('changed-elsewhere', 'Somebody else has saved the texts since you opened them.', {
    extension: { texts: revision.texts, deputyUserId: revision.deputyUserId, textVersion: revision.textVersion },
  });
}
