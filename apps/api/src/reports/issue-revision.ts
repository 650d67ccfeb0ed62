import { type Actor, schema, type Tx, withFirm } from '@strandnote/db';
import { and, eq } from 'drizzle-orm';
import { assertCan } from '../access/permissions.ts';
import { verifyPassword } from '../access/verify-password.ts';
import { anchorHead } from '../audit/anchor-heads.ts';
import { recordEvent } from '../audit/record-event.ts';
import type { AppDeps } from '../deps.ts';
import { loadFile } from '../files/load-file.ts';
import { storeFile } from '../files/store-file.ts';
import { enqueueMail } from '../mail/enqueue-mail.ts';
import { type LoadedRevision, lockRevision } from './load-revision.ts';
import { moveRevision } from './move-revision.ts';
import { signReport } from './pdf/sign.ts';
import { issuedMail } from './revision-mail.ts';
import { assertNow } from './revision-situation.ts';
import { signSubmission } from './sign-submission.ts';
import { issuedStatement, signedRevisionOf } from './statements.ts';
import { contentOf, loadSubmission } from './submissions.queries.ts';

const { revisions } = schema;

/**
 * The author, or the deputy named by the author, issues an approved revision: the very bytes that were rendered at approval
 * are signed. State, signed file, superseding of the former revision, audit and mail commit together.
 */
export async function issueRevision(deps: AppDeps, actor: Actor, revisionId: string, { password }: { password: string }): Promise<void> {
  assertCan(actor, 'revision.issue');
  await verifyPassword(deps, actor, password);
  await withFirm(deps.db, actor, async (tx) => {
    const loaded = await lockRevision(tx, revisionId);
    await assertNow(tx, actor, loaded, 'issue');
    const submission = (await loadSubmission(tx, loaded.revision.approvedSubmissionId!))!;
    const content = contentOf(submission);
    const at = deps.clock();
    const signed = await signStored(deps, tx, loaded, at);
    const { contentSha256 } = submission;
    await signSubmission(
      tx,
      actor,
      { submissionId: submission.id, revisionId, contentSha256 },
      { meaning: 'issued', name: actor.name, statement: issuedStatement(signedRevisionOf(content)), at },
    );
    const { clientId } = loaded.report;
    // Before this one is issued: a report has one current revision at any moment.
    const superseded = await supersedeFormer(tx, loaded, at);
    await moveRevision(tx, revisionId, {
      from: ['approved'],
      to: 'issued',
      at,
      set: { signedFileId: signed.id, issuedAt: at, addressedClientId: clientId },
    });
    await enqueueMail(tx, await issuedMail(tx, loaded, content));
    await recordEvent(
      tx,
      actor,
      'revision.issued',
      { kind: 'revision', id: revisionId },
      { contentSha256, sha256: signed.sha256, clientId, superseded },
      at,
    );
  });
  await anchorHead(deps, actor);
}

/** Signs the bytes that were rendered at approval, as they are, and stores what comes out. */
async function signStored(deps: AppDeps, tx: Tx, { revision, report }: LoadedRevision, at: Date): Promise<{ id: string; sha256: string }> {
  const unsigned = await loadFile(tx, revision.unsignedFileId!);
  const bytes = await signReport(unsigned.bytes, await deps.signingIdentity(report.firmId), at);
  return storeFile(tx, report, { kind: 'report-signed', name: unsigned.name, mediaType: unsigned.mediaType, bytes });
}

/** The revision that was current until now; only status is added to it. */
async function supersedeFormer(tx: Tx, { revision }: LoadedRevision, at: Date): Promise<string | null> {
  const [former] = await tx
    .update(revisions)
    .set({ state: 'superseded', supersededAt: at, supersededBy: revision.id, changedAt: at })
    .where(and(eq(revisions.reportId, revision.reportId), eq(revisions.state, 'issued')))
    .returning({ id: revisions.id });
  return former?.id ?? null;
}
