import type { CreateComment } from '@strandnote/api/contract';
import { type Actor, schema, type Tx, withFirm } from '@strandnote/db';
import { eq } from 'drizzle-orm';
import { assertCan } from '../access/permissions.ts';
import { recordEvent } from '../audit/record-event.ts';
import type { AppDeps } from '../deps.ts';
import { AppError } from '../http/errors.ts';
import { coversCable, lockRevision } from './load-revision.ts';
import { assertNow } from './revision-situation.ts';
import { latestSubmission } from './submissions.queries.ts';

const { checkComments } = schema;

/** A checker remarks on a cable, a field or the whole. An open remark stands in the way of approval. */
export async function remark(deps: AppDeps, actor: Actor, revisionId: string, body: CreateComment): Promise<void> {
  assertCan(actor, 'revision.check');
  await withFirm(deps.db, actor, async (tx) => {
    const loaded = await lockRevision(tx, revisionId);
    if (await isRepeated(tx, revisionId, body)) return;
    await assertNow(tx, actor, loaded, 'remark');
    const submission = (await latestSubmission(tx, revisionId))!;
    if (body.cableId !== null && !(await coversCable(tx, revisionId, body.cableId))) {
      throw AppError.ofField('cableId', 'The revision does not cover this cable.');
    }
    await tx.insert(checkComments).values({
      ...body,
      firmId: actor.firmId,
      revisionId,
      submissionId: submission.id,
      authorUserId: actor.userId,
      createdAt: deps.clock(),
    });
    const { id, cableId, field } = body;
    await recordEvent(tx, actor, 'remark.made', { kind: 'revision', id: revisionId }, { commentId: id, cableId, field }, deps.clock());
  });
}

async function isRepeated(tx: Tx, revisionId: string, body: CreateComment): Promise<boolean> {
  const [stored] = await tx.select().from(checkComments).where(eq(checkComments.id, body.id));
  if (!stored) return false;
  const same = stored.revisionId === revisionId && stored.text === body.text && stored.cableId === body.cableId;
  if (!same || stored.field !== body.field) throw new AppError('conflict', 'Another remark has this identifier already.');
  return true;
}
