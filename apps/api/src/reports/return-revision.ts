import type { ReturnRevision } from '@strandnote/api/contract';
import { type Actor, withFirm } from '@strandnote/db';
import { assertCan } from '../access/permissions.ts';
import { recordEvent } from '../audit/record-event.ts';
import type { AppDeps } from '../deps.ts';
import { enqueueMail } from '../mail/enqueue-mail.ts';
import { lockRevision } from './load-revision.ts';
import { moveRevision } from './move-revision.ts';
import { returnedMail } from './revision-mail.ts';
import { assertNow } from './revision-situation.ts';

/** A checker gives a revision back to its author with a reason; an approved one too, as long as it is not issued. */
export async function returnRevision(deps: AppDeps, actor: Actor, revisionId: string, { reason }: ReturnRevision): Promise<void> {
  assertCan(actor, 'revision.check');
  await withFirm(deps.db, actor, async (tx) => {
    const loaded = await lockRevision(tx, revisionId);
    await assertNow(tx, actor, loaded, 'return');
    await moveRevision(tx, revisionId, {
      from: ['in check', 'approved'],
      to: 'returned',
      at: deps.clock(),
      set: { returnedReason: reason, approvedSubmissionId: null, approvedAt: null, unsignedFileId: null },
    });
    await enqueueMail(tx, await returnedMail(tx, loaded, actor, reason));
    await recordEvent(
      tx,
      actor,
      'revision.returned',
      { kind: 'revision', id: revisionId },
      { reason, from: loaded.revision.state },
      deps.clock(),
    );
  });
}
