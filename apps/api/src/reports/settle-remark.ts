import type { EditComment } from '@strandnote/api/contract';
import { type Actor, schema, type Tx, withFirm } from '@strandnote/db';
import { and, eq } from 'drizzle-orm';
import { assertCan } from '../access/permissions.ts';
import { type AuditAct, recordEvent } from '../audit/record-event.ts';
import type { AppDeps } from '../deps.ts';
import { AppError } from '../http/errors.ts';
import { lockRevision } from './load-revision.ts';
import { assertNow } from './revision-situation.ts';

const { checkComments } = schema;

type CommentRow = typeof checkComments.$inferSelect;
interface Place {
  revisionId: string;
  commentId: string;
}

/** The engineer answers a remark; the checker closes it or opens it again. */
export async function settleRemark(deps: AppDeps, actor: Actor, place: Place, body: EditComment): Promise<void> {
  if (body.answer === undefined && body.state === undefined) {
    throw AppError.ofField('answer', 'Write an answer, or close or reopen the remark.');
  }
  if (body.answer !== undefined) assertCan(actor, 'report.write');
  if (body.state !== undefined) assertCan(actor, 'revision.check');
  await withFirm(deps.db, actor, async (tx) => {
    const loaded = await lockRevision(tx, place.revisionId);
    const comment = await loadComment(tx, place);
    if (body.answer !== undefined && body.answer !== comment.answer) {
      await assertNow(tx, actor, loaded, 'answer');
      await save(tx, place, { answer: body.answer, answeredBy: actor.userId, answeredAt: deps.clock() });
      await record(tx, actor, 'remark.answered', place, deps.clock());
    }
    if (body.state !== undefined && body.state !== comment.state) {
      await assertNow(tx, actor, loaded, 'remark');
      const closed = body.state === 'closed';
      await save(tx, place, { state: body.state, closedBy: closed ? actor.userId : null, closedAt: closed ? deps.clock() : null });
      await record(tx, actor, closed ? 'remark.closed' : 'remark.reopened', place, deps.clock());
    }
  });
}

async function loadComment(tx: Tx, { revisionId, commentId }: Place): Promise<CommentRow> {
  const [comment] = await tx
    .select()
    .from(checkComments)
    .where(and(eq(checkComments.id, commentId), eq(checkComments.revisionId, revisionId)));
  if (!comment) throw new AppError('not-found', 'There is no such remark.');
  return comment;
}

async function save(tx: Tx, { commentId }: Place, set: Partial<CommentRow>): Promise<void> {
  await tx.update(checkComments).set(set).where(eq(checkComments.id, commentId));
}

async function record(tx: Tx, actor: Actor, act: AuditAct, { revisionId, commentId }: Place, at: Date): Promise<void> {
  await recordEvent(tx, actor, act, { kind: 'revision', id: revisionId }, { commentId }, at);
}
