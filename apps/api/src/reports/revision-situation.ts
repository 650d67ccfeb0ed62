import type { RevisionAct } from '@strandnote/api/contract';
import { type Actor, schema, type Tx } from '@strandnote/db';
import { and, eq, sql } from 'drizzle-orm';
import { AppError } from '../http/errors.ts';
import { authorOnly, type RevisionSituation, whyNot } from './acts-now.ts';
import { isAuthorOrDeputy, type LoadedRevision } from './load-revision.ts';
import { latestSubmission } from './submissions.queries.ts';

const { cableChecks, checkComments, revisionCables, revisions } = schema;

export const ownWorkSentence = 'You prepared part of this revision, so someone else must check it.';

/** What decides which acts this member may do now, read in one place for the screen and for the commands. */
export async function loadSituation(tx: Tx, actor: Actor, { revision }: LoadedRevision, blockerCount: number): Promise<RevisionSituation> {
  const submission = await latestSubmission(tx, revision.id);
  const [ticked] = await tx
    .select({ count: sql<number>`count(*)::int` })
    .from(cableChecks)
    .where(submission ? eq(cableChecks.submissionId, submission.id) : sql`false`);
  const [open] = await tx
    .select({ count: sql<number>`count(*)::int` })
    .from(checkComments)
    .where(and(eq(checkComments.revisionId, revision.id), eq(checkComments.state, 'open')));
  // The cables of a revision are changed only while it is a draft, so their number is that of the submission in check.
  const [covered] = await tx
    .select({ count: sql<number>`count(*)::int` })
    .from(revisionCables)
    .where(eq(revisionCables.revisionId, revision.id));
  const letters = await tx.select({ letter: revisions.letter }).from(revisions).where(eq(revisions.reportId, revision.reportId));
  return {
    state: revision.state,
    isLatest: letters.every(({ letter }) => isNotAfter(letter, revision.letter)),
    roles: actor.roles,
    isAuthorOrDeputy: isAuthorOrDeputy(revision, actor),
    ownWork: submission && (await hasPrepared(tx, actor, submission.id)) ? ownWorkSentence : null,
    blockerCount,
    cableCount: covered!.count,
    tickedCount: ticked!.count,
    openRemarkCount: open!.count,
    pdfReady: revision.unsignedFileId !== null,
  };
}

function isNotAfter(letter: string, other: string): boolean {
  return letter.length === other.length ? letter <= other : letter.length < other.length;
}

/** Asks the database's own rule, so that what a screen says is what the database would do. */
async function hasPrepared(tx: Tx, actor: Actor, submissionId: string): Promise<boolean> {
  const { rows } = await tx.execute<{ prepared: boolean }>(
    sql`select has_prepared(${actor.firmId}::uuid, ${submissionId}::uuid, ${actor.userId}) as prepared`,
  );
  return rows[0]!.prepared;
}

/**
 * Refuses an act that this member cannot do now, with the sentence that the screen shows.
 *
 * @throws AppError `own-work`, `forbidden` (author and deputy only) or `conflict`
 */
export async function assertNow(tx: Tx, actor: Actor, loaded: LoadedRevision, act: RevisionAct): Promise<void> {
  const situation = await loadSituation(tx, actor, loaded, 0);
  const reason = whyNot(act, situation);
  if (reason === null) return;
  if (reason === situation.ownWork) throw new AppError('own-work', reason);
  throw new AppError(reason === authorOnly ? 'forbidden' : 'conflict', reason);
}
