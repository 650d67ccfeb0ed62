import type { ApproveRevision } from '@strandnote/api/contract';
import { type Actor, withFirm } from '@strandnote/db';
import { assertCan } from '../access/permissions.ts';
import { verifyPassword } from '../access/verify-password.ts';
import { recordEvent } from '../audit/record-event.ts';
import type { AppDeps } from '../deps.ts';
import { AppError } from '../http/errors.ts';
import { enqueue } from '../jobs/enqueue.ts';
import { enqueueMail } from '../mail/enqueue-mail.ts';
import { lockRevision } from './load-revision.ts';
import { moveRevision } from './move-revision.ts';
import { approvedMail } from './revision-mail.ts';
import { assertNow } from './revision-situation.ts';
import { signSubmission } from './sign-submission.ts';
import { checkedStatement, signedRevisionOf } from './statements.ts';
import { contentOf, latestSubmission, loadSubmission } from './submissions.queries.ts';

/**
 * A checker approves a revision in check and signs for the hash that they looked at. Nobody approves what they prepared,
 * whatever their role; nobody approves while a remark is open or a cable is not ticked. The PDF is rendered after.
 */
export async function approveRevision(deps: AppDeps, actor: Actor, revisionId: string, body: ApproveRevision): Promise<void> {
  assertCan(actor, 'revision.check');
  await verifyPassword(deps, actor, body.password);
  await withFirm(deps.db, actor, async (tx) => {
    const loaded = await lockRevision(tx, revisionId);
    await assertNow(tx, actor, loaded, 'approve');
    const submission = (await loadSubmission(tx, (await latestSubmission(tx, revisionId))!.id))!;
    if (submission.contentSha256 !== body.contentSha256) {
      throw new AppError('stale-content', 'This is not the content that is in check now. Look at it again, then sign.');
    }
    const at = deps.clock();
    const { contentSha256 } = submission;
    const { name, licenceNumber, jurisdiction } = body;
    await signSubmission(
      tx,
      actor,
      { submissionId: submission.id, revisionId, contentSha256 },
      {
        meaning: 'checked and approved',
        name,
        licenceNumber,
        jurisdiction,
        statement: checkedStatement(signedRevisionOf(contentOf(submission))),
        at,
      },
    );
    // The state is in the WHERE clause: of two approvals at once, one updates no row.
    await moveRevision(tx, revisionId, {
      from: ['in check'],
      to: 'approved',
      at,
      set: { approvedSubmissionId: submission.id, approvedAt: at, returnedReason: null },
    });
    await enqueue(tx, 'render-report', { revisionId, submissionId: submission.id });
    await enqueueMail(tx, await approvedMail(tx, loaded, actor));
    await recordEvent(
      tx,
      actor,
      'revision.approved',
      { kind: 'revision', id: revisionId },
      { contentSha256, name, licenceNumber, jurisdiction },
      at,
    );
  });
}
