import type { IssuedDetail, IssuedReport } from '@strandnote/api/contract';
import { schema, type Tx } from '@strandnote/db';
import { and, desc, eq, inArray, type SQL, sql } from 'drizzle-orm';
import { AppError } from '../http/errors.ts';
import { listSignatures } from '../reports/revision-view.ts';
import { contentOf } from '../reports/submissions.queries.ts';

const { files, reports, revisions, submissions } = schema;

/**
 * Issued reports, the latest first. Names come out of the frozen content and not from live tables: what is listed is what
 * was issued, and a client, who reads nothing else, gets the same list.
 */
async function selectIssued(tx: Tx, where?: SQL): Promise<IssuedReport[]> {
  const frozen = (...path: string[]) => sql<string>`${submissions.content}::jsonb #>> ${`{${path.join(',')}}`}::text[]`;
  const rows = await tx
    .select({
      revision: revisions,
      report: reports,
      file: files,
      structureName: frozen('structure', 'name'),
      campaignName: frozen('campaign', 'name'),
      clientName: frozen('client', 'name'),
      supersededByLetter: sql<string | null>`(select later.letter from revisions later
        where later.firm_id = ${revisions.firmId} and later.id = ${revisions.supersededBy})`,
    })
    .from(revisions)
    .innerJoin(reports, eq(reports.id, revisions.reportId))
    .innerJoin(submissions, eq(submissions.id, revisions.approvedSubmissionId))
    .innerJoin(files, eq(files.id, revisions.signedFileId))
    .where(and(inArray(revisions.state, ['issued', 'superseded', 'withdrawn']), where))
    .orderBy(desc(revisions.issuedAt), desc(revisions.createdAt));
  return rows.map(({ revision, report, file, ...names }) => ({
    revisionId: revision.id,
    reportNumber: report.number,
    title: report.title,
    letter: revision.letter,
    state: revision.state as IssuedReport['state'],
    issuedAt: revision.issuedAt!.toISOString(),
    withdrawnReason: revision.withdrawnReason,
    sha256: file.sha256,
    bytes: file.bytes,
    verificationCode: revision.verificationCode,
    ...names,
  }));
}

export async function listIssued(tx: Tx): Promise<IssuedReport[]> {
  return selectIssued(tx);
}

/** @throws AppError `not-found` also for what is not issued, or was addressed to somebody else */
export async function loadIssued(tx: Tx, revisionId: string): Promise<IssuedDetail> {
  const { submission } = await loadIssuedRows(tx, revisionId);
  const [issued] = await selectIssued(tx, eq(revisions.id, revisionId));
  const signatures = (await listSignatures(tx, revisionId)).filter(({ submissionNumber }) => submissionNumber === submission.number);
  return { ...issued!, content: contentOf(submission), contentSha256: submission.contentSha256, signatures };
}

export interface IssuedRows {
  revision: typeof revisions.$inferSelect;
  report: typeof reports.$inferSelect;
  submission: typeof submissions.$inferSelect;
}

/** @throws AppError `not-found` also for what is not issued, or was addressed to somebody else */
export async function loadIssuedRows(tx: Tx, revisionId: string): Promise<IssuedRows> {
  const [found] = await tx
    .select({ revision: revisions, report: reports, submission: submissions })
    .from(revisions)
    .innerJoin(reports, eq(reports.id, revisions.reportId))
    .innerJoin(submissions, eq(submissions.id, revisions.approvedSubmissionId))
    .where(and(eq(revisions.id, revisionId), inArray(revisions.state, ['issued', 'superseded', 'withdrawn'])));
  if (!found) throw new AppError('not-found', 'There is no such issued report.');
  return found;
}
