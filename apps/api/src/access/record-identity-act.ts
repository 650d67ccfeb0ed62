import { withFirm } from '@strandnote/db';
import { anchorHead } from '../audit/anchor-heads.ts';
import { recordEvent } from '../audit/record-event.ts';
import type { AppDeps } from '../deps.ts';
import type { IdentityAct } from './auth.ts';
import { membershipsOf } from './require-member.ts';

/**
 * Signing in and out and new passwords concern no firm by themselves: they are written down in every firm of the person. Signing
 * in also anchors the firm's chain outside the database, so that anchors are as frequent as work is.
 */
export async function recordIdentityAct(
  deps: Pick<AppDeps, 'db' | 'env' | 'clock' | 'log'>,
  userId: string,
  act: IdentityAct,
): Promise<void> {
  for (const membership of await membershipsOf(deps.db, userId)) {
    const { firm_id: firmId, member_id: id, member_name: name, client_id: clientId } = membership;
    const actor = { firmId, userId, name, clientId };
    await withFirm(deps.db, actor, (tx) => recordEvent(tx, actor, act, { kind: 'member', id }, {}, deps.clock()));
    // A client does not see the head of the chain.
    if (act === 'session.started' && clientId === null) await anchorHead(deps, actor);
  }
}
