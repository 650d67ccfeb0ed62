import { type Actor, schema, type Tx } from '@strandnote/db';
import { eq } from 'drizzle-orm';
import { AppError } from '../http/errors.ts';

const { reports, revisions } = schema;

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

export function isAuthorOrDeputy(revision: RevisionRow, actor: Actor): boolean {
  return revision.authorUserId === actor.userId || revision.deputyUserId === actor.userId;
}
