import { type ReportContent, reportContent } from '@strandnote/core/report-content';
import { schema, type Tx } from '@strandnote/db';
import { desc, eq, getTableColumns } from 'drizzle-orm';

const { submissions } = schema;

export type SubmissionRow = typeof submissions.$inferSelect;

/** The last submission of a revision, without its content, which may be megabytes; null where it was never submitted. */
export async function latestSubmission(tx: Tx, revisionId: string): Promise<Omit<SubmissionRow, 'content'> | null> {
  const { content: _content, ...columns } = getTableColumns(submissions);
  const [row] = await tx
    .select(columns)
    .from(submissions)
    .where(eq(submissions.revisionId, revisionId))
    .orderBy(desc(submissions.number))
    .limit(1);
  return row ?? null;
}

export async function loadSubmission(tx: Tx, submissionId: string): Promise<SubmissionRow | null> {
  const [row] = await tx.select().from(submissions).where(eq(submissions.id, submissionId));
  return row ?? null;
}

/** Frozen content on its way out: parsed by its own schema, whatever became of the tables since. */
export function contentOf(submission: Pick<SubmissionRow, 'content'>): ReportContent {
  return reportContent.parse(JSON.parse(submission.content));
}
