import { randomUUID } from 'node:crypto';
import { type Actor, schema, type Tx, withFirm } from '@strandnote/db';
import { and, eq } from 'drizzle-orm';
import { assertCan } from '../access/permissions.ts';
import { recordEvent } from '../audit/record-event.ts';
import type { AppDeps } from '../deps.ts';
import { AppError } from '../http/errors.ts';
import { coversCable, lockRevision } from './load-revision.ts';
import { assertNow } from './revision-situation.ts';
import { latestSubmission } from './submissions.queries.ts';

const { cableChecks } = schema;

/** A checker marks a cable of the submission in check as looked at. Ticking twice is ticking once. */
export async function tickCable(deps: AppDeps, actor: Actor, revisionId: string, cableId: string): Promise<void> {
  assertCan(actor, 'revision.check');
  await withFirm(deps.db, actor, async (tx) => {
    const submission = await submissionInCheck(tx, actor, revisionId, cableId);
    const [ticked] = await tx
      .insert(cableChecks)
      .values({
        firmId: actor.firmId,
        id: randomUUID(),
        submissionId: submission.id,
        cableId,
        checkedBy: actor.userId,
        checkedAt: deps.clock(),
      })
      .onConflictDoNothing()
      .returning({ id: cableChecks.id });
    if (ticked) await recordEvent(tx, actor, 'cable.ticked', { kind: 'revision', id: revisionId }, { cableId }, deps.clock());
  });
}

/** A checker takes a tick back while the revision is in check. */
export async function untickCable(deps: AppDeps, actor: Actor, revisionId: string, cableId: string): Promise<void> {
  assertCan(actor, 'revision.check');
  await withFirm(deps.db, actor, async (tx) => {
    const submission = await submissionInCheck(tx, actor, revisionId, cableId);
    const [unticked] = await tx
      .delete(cableChecks)
      .where(and(eq(cableChecks.submissionId, submission.id), eq(cableChecks.cableId, cableId)))
      .returning({ id: cableChecks.id });
    if (unticked) await recordEvent(tx, actor, 'cable.unticked', { kind: 'revision', id: revisionId }, { cableId }, deps.clock());
  });
}

async function submissionInCheck(tx: Tx, actor: Actor, revisionId: string, cableId: string): Promise<{ id: string }> {
  await assertNow(tx, actor, await lockRevision(tx, revisionId), 'tick');
  if (!(await coversCable(tx, revisionId, cableId))) throw new AppError('not-found', 'The revision does not cover this cable.');
  return (await latestSubmission(tx, revisionId))!;
}
