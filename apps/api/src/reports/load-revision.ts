import { type Actor, schema, type Tx } from '@strandnote/db';
import { and, eq } from 'drizzle-orm';
import { AppError } from '../http/errors.ts';

const { reports, revisionCables, revisions } = schema;

export type RevisionRow = typeof revisions.$inferSelect;
export type ReportRow = typeof reports.$inferSelect;
export interface LoadedRevision {
  revision: RevisionRow;
  report: ReportRow;
}

/** A revision with its report. @throws AppError `not-found` also for what belongs to another firm */
export async function loadRevision(tx: Tx, revisionId: string): Promise<LoadedRevision> {
  const [found] = await tx
    .select({ revision: revisions, report: reports })
    .from(revisions)
    .innerJoin(reports, eq(reports.id, revisions.reportId))
    .where(eq(revisions.id, revisionId));
  if (!found) throw new AppError('not-found', 'There is no such revision.');
  return found;
}

/**
 * The same, with the revision's row locked until the transaction ends: ticks, remarks and moves of one revision come one
 * after another, so that an approval counts what is there and not what was.
 */
export async function lockRevision(tx: Tx, revisionId: string): Promise<LoadedRevision> {
  await tx.select({ id: revisions.id }).from(revisions).where(eq(revisions.id, revisionId)).for('no key update');
  return loadRevision(tx, revisionId);
}

/** The cables that a revision covers are those it was started with: they are those of each of its submissions. */
export async function coversCable(tx: Tx, revisionId: string, cableId: string): Promise<boolean> {
  const [covered] = await tx
    .select({ id: revisionCables.id })
    .from(revisionCables)
    .where(and(eq(revisionCables.revisionId, revisionId), eq(revisionCables.cableId, cableId)));
  return covered !== undefined;
}

export function isAuthorOrDeputy(revision: RevisionRow, actor: Actor): boolean {
  return revision.authorUserId === actor.userId || revision.deputyUserId === actor.userId;
}
