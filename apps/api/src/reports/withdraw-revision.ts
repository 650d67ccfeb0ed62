import type { WithdrawRevision } from '@strandnote/api/contract';
import { type Actor, withFirm } from '@strandnote/db';
import { assertCan } from '../access/permissions.ts';
import { recordEvent } from '../audit/record-event.ts';
import type { AppDeps } from '../deps.ts';
import { enqueueMail } from '../mail/enqueue-mail.ts';
import { lockRevision } from './load-revision.ts';
import { moveRevision } from './move-revision.ts';
import { withdrawnMail } from './revision-mail.ts';
import { assertNow } from './revision-situation.ts';
import { contentOf, loadSubmission } from './submissions.queries.ts';

/** Withdraws an issued revision with a reason. Its file stays as it is; whoever verifies it is told. */
export async function withdrawRevision(deps: AppDeps, actor: Actor, revisionId: string, { reason }: WithdrawRevision): Promise<void> {
  assertCan(actor, 'revision.withdraw');
  await withFirm(deps.db, actor, async (tx) => {
    const loaded = await lockRevision(tx, revisionId);
    await assertNow(tx, actor, loaded, 'withdraw');
    const at = deps.clock();
    await moveRevision(tx, revisionId, {
      from: ['issued', 'superseded'],
      to: 'withdrawn',
      at,
      set: { withdrawnAt: at, withdrawnReason: reason },
    });
    const submission = (await loadSubmission(tx, loaded.revision.approvedSubmissionId!))!;
    await enqueueMail(tx, await withdrawnMail(tx, { loaded, content: contentOf(submission), reason }));
    await recordEvent(tx, actor, 'revision.withdrawn', { kind: 'revision', id: revisionId }, { reason, from: loaded.revision.state }, at);
  });
}
