import type { CheckComment } from '@strandnote/api/contract';
import { schema, type Tx } from '@strandnote/db';
import { and, asc, eq, type SQL } from 'drizzle-orm';
import { AppError } from '../http/errors.ts';
import { loadMemberNames } from '../members/members.queries.ts';

const { cables, checkComments, submissions } = schema;

/** Remarks on a revision through all of its submissions, the oldest first. */
export async function listComments(tx: Tx, revisionId: string): Promise<CheckComment[]> {
  return selectComments(tx, eq(checkComments.revisionId, revisionId));
}

/** @throws AppError `not-found` where the revision has no such remark */
export async function loadComment(tx: Tx, { revisionId, commentId }: { revisionId: string; commentId: string }): Promise<CheckComment> {
  const [comment] = await selectComments(tx, and(eq(checkComments.revisionId, revisionId), eq(checkComments.id, commentId)));
  if (!comment) throw new AppError('not-found', 'There is no such remark.');
  return comment;
}

async function selectComments(tx: Tx, where: SQL | undefined): Promise<CheckComment[]> {
  const nameOf = await loadMemberNames(tx);
  const rows = await tx
    .select({ comment: checkComments, submissionNumber: submissions.number, cableReference: cables.reference })
    .from(checkComments)
    .innerJoin(submissions, eq(submissions.id, checkComments.submissionId))
    .leftJoin(cables, eq(cables.id, checkComments.cableId))
    .where(where)
    .orderBy(asc(checkComments.createdAt), asc(checkComments.id));
  return rows.map(({ comment, submissionNumber, cableReference }) => ({
    id: comment.id,
    cableId: comment.cableId,
    cableReference,
    field: comment.field,
    text: comment.text,
    authorName: nameOf(comment.authorUserId),
    createdAt: comment.createdAt.toISOString(),
    submissionNumber,
    state: comment.state,
    answer: comment.answer,
    answeredBy: comment.answeredBy === null ? null : nameOf(comment.answeredBy),
    answeredAt: comment.answeredAt?.toISOString() ?? null,
  }));
}
