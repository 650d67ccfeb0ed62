import { schema, type Tx } from '@strandnote/db';
import { eq } from 'drizzle-orm';
import type { AppDeps } from '../deps.ts';
import type { LoadedRevision } from './load-revision.ts';
import { renderReport } from './pdf/render-report.ts';
import { listSignatures } from './revision-view.ts';
import { contentOf, loadSubmission } from './submissions.queries.ts';

const { auditHeads } = schema;

/** The final PDF of an approved revision, unsigned: its frozen content, who prepared and checked it, and how to verify it. */
export async function renderRevision(deps: AppDeps, tx: Tx, { revision, report }: LoadedRevision): Promise<Buffer> {
  const submission = (await loadSubmission(tx, revision.approvedSubmissionId!))!;
  const signatures = await listSignatures(tx, revision.id);
  const [head] = await tx.select().from(auditHeads).where(eq(auditHeads.firmId, report.firmId));
  return renderReport({
    content: contentOf(submission),
    contentJson: submission.content,
    contentSha256: submission.contentSha256,
    signatures: signatures.filter(({ submissionNumber }) => submissionNumber === submission.number),
    verificationCode: revision.verificationCode,
    verificationUrl: `${deps.env.publicUrl}/verify/${revision.verificationCode}`,
    auditHead: head ? { sequence: head.sequence, hash: head.hash } : null,
    renderedAt: deps.clock(),
    draft: false,
  });
}
