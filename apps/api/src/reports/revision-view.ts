import type { Revision, Signature } from '@strandnote/api/contract';
import type { ReportContent } from '@strandnote/core/report-content';
import { type Actor, schema, type Tx } from '@strandnote/db';
import { asc, eq } from 'drizzle-orm';
import { loadMemberNames } from '../members/members.queries.ts';
import { actsNow } from './acts-now.ts';
import { listComments } from './comments.queries.ts';
import { draftContent } from './draft-content.ts';
import type { Blocker } from './find-blockers.ts';
import { type LoadedRevision, loadRevision } from './load-revision.ts';
import { loadSituation } from './revision-situation.ts';
import { listRevisionSummaries } from './revisions.queries.ts';
import { checkedStatement, preparedStatement, signedRevisionOf } from './statements.ts';
import { contentOf, latestSubmission, loadSubmission } from './submissions.queries.ts';

const { cableChecks, revisions, signatures, submissions } = schema;

/** A revision as its page shows it: content, what stands in the way, ticks, remarks, signatures, and what this member may do. */
export async function loadRevisionView(tx: Tx, actor: Actor, revisionId: string): Promise<Revision> {
  const loaded = await loadRevision(tx, revisionId);
  const { revision } = loaded;
  const [summary] = await listRevisionSummaries(tx, eq(revisions.id, revisionId));
  const shown = await contentNow(tx, loaded);
  const nameOf = await loadMemberNames(tx);
  const signed = signedRevisionOf(shown.content);
  return {
    ...summary!,
    texts: revision.texts,
    textVersion: revision.textVersion,
    deputyUserId: revision.deputyUserId,
    authorUserId: revision.authorUserId,
    content: shown.content,
    contentSha256: shown.contentSha256,
    blockers: shown.blockers,
    ticks: await listTicks(tx, revisionId, nameOf),
    comments: await listComments(tx, revisionId),
    signatures: await listSignatures(tx, revisionId),
    statements: { prepared: preparedStatement(signed), checked: checkedStatement(signed) },
    returnedReason: revision.returnedReason,
    withdrawnReason: revision.withdrawnReason,
    verificationCode: revision.verificationCode,
    pdfReady: revision.unsignedFileId !== null,
    may: actsNow(await loadSituation(tx, actor, loaded, shown.blockers.length)),
  };
}

interface ShownContent {
  content: ReportContent;
  /** Its canonical JSON: the text that is hashed. */
  contentJson: string;
  contentSha256: string;
  blockers: Blocker[];
}

/** A draft's content as it would be frozen now; from the submission on, as it was frozen. */
export async function contentNow(tx: Tx, loaded: LoadedRevision): Promise<ShownContent> {
  const { state, approvedSubmissionId, id } = loaded.revision;
  if (state === 'draft' || state === 'returned') {
    const { content, text, contentSha256, blockers } = await draftContent(tx, loaded);
    return { content, contentJson: text, contentSha256, blockers };
  }
  const submission = await loadSubmission(tx, approvedSubmissionId ?? (await latestSubmission(tx, id))!.id);
  return { content: contentOf(submission!), contentJson: submission!.content, contentSha256: submission!.contentSha256, blockers: [] };
}

type NameOf = (userId: string) => string;

/** Ticks of the last submission; those of earlier ones speak of other content. */
async function listTicks(tx: Tx, revisionId: string, nameOf: NameOf): Promise<Revision['ticks']> {
  const submission = await latestSubmission(tx, revisionId);
  if (!submission) return [];
  const rows = await tx.select().from(cableChecks).where(eq(cableChecks.submissionId, submission.id)).orderBy(asc(cableChecks.checkedAt));
  return rows.map(({ cableId, checkedBy, checkedAt }) => ({ cableId, checkedBy: nameOf(checkedBy), checkedAt: checkedAt.toISOString() }));
}

export async function listSignatures(tx: Tx, revisionId: string): Promise<Signature[]> {
  const rows = await tx
    .select({ signature: signatures, submissionNumber: submissions.number })
    .from(signatures)
    .innerJoin(submissions, eq(submissions.id, signatures.submissionId))
    .where(eq(signatures.revisionId, revisionId))
    .orderBy(asc(signatures.signedAt), asc(submissions.number));
  return rows.map(({ signature, submissionNumber }) => ({
    meaning: signature.meaning,
    name: signature.name,
    licenceNumber: signature.licenceNumber,
    jurisdiction: signature.jurisdiction,
    statement: signature.statement,
    contentSha256: signature.contentSha256,
    signedAt: signature.signedAt.toISOString(),
    submissionNumber,
  }));
}
