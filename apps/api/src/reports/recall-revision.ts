import { type Actor, withFirm } from '@strandnote/db';
import { assertCan } from '../access/permissions.ts';
import { recordEvent } from '../audit/record-event.ts';
import type { AppDeps } from '../deps.ts';
import { lockRevision } from './load-revision.ts';
import { moveRevision } from './move-revision.ts';
import { assertNow } from './revision-situation.ts';

/** The author takes a revision back out of check. What was submitted stays frozen; the next submission is another. */
export async function recallRevision(deps: AppDeps, actor: Actor, revisionId: string): Promise<void> {
  assertCan(actor, 'report.write');
  await withFirm(deps.db, actor, async (tx) => {
    await assertNow(tx, actor, await lockRevision(tx, revisionId), 'recall');
    await moveRevision(tx, revisionId, { from: ['in check'], to: 'draft', at: deps.clock() });
    await recordEvent(tx, actor, 'revision.recalled', { kind: 'revision', id: revisionId }, {}, deps.clock());
  });
}
