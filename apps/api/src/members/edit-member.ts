import type { EditMe, EditMember } from '@strandnote/api/contract';
import { type Actor, schema, withFirm } from '@strandnote/db';
import { and, arrayContains, eq } from 'drizzle-orm';
import { assertCan } from '../access/permissions.ts';
import { recordEvent } from '../audit/record-event.ts';
import type { AppDeps } from '../deps.ts';
import { AppError } from '../http/errors.ts';
import { changesOf, isSameEntry } from '../http/same-entry.ts';

const { clients, invitations, members } = schema;

/** Changes a member's roles or whether they are active; a firm always keeps an active administrator. */
export async function editMember(deps: AppDeps, actor: Actor, memberId: string, body: EditMember): Promise<void> {
  assertCan(actor, 'member.edit');
  await withFirm(deps.db, actor, async (tx) => {
    // All administrators are locked, so that two of them cannot each remove the other.
    const admins = await tx
      .select({ id: members.id })
      .from(members)
      .where(and(arrayContains(members.roles, ['admin']), eq(members.active, true)))
      .for('update');
    const [member] = await tx.select().from(members).where(eq(members.id, memberId));
    if (!member) throw new AppError('not-found', 'There is no such member.');
    const staysAdmin = body.active && body.roles.includes('admin');
    if (!staysAdmin && admins.every(({ id }) => id === memberId)) {
      throw AppError.ofField('roles', 'This is the only administrator. Make somebody else an administrator first.');
    }
    if (body.clientId !== null) {
      const [client] = await tx.select({ id: clients.id }).from(clients).where(eq(clients.id, body.clientId));
      if (!client) throw AppError.ofField('clientId', 'Choose a client of the firm.');
    }
    if (isSameEntry(member, body)) return;
    await tx.update(members).set(body).where(eq(members.id, memberId));
    await recordEvent(tx, actor, 'member.changed', { kind: 'member', id: memberId }, changesOf(member, body), deps.clock());
  });
}

/** What a member may change of themselves. */
export async function editMe(deps: AppDeps, actor: Actor, body: EditMe): Promise<void> {
  assertCan(actor, 'member.self');
  await withFirm(deps.db, actor, async (tx) => {
    const [member] = await tx.select().from(members).where(eq(members.userId, actor.userId)).for('update');
    if (!member || isSameEntry(member, body)) return;
    await tx.update(members).set(body).where(eq(members.id, member.id));
    await recordEvent(tx, actor, 'member.changed', { kind: 'member', id: member.id }, changesOf(member, body), deps.clock());
  });
}

export async function revokeInvitation(deps: AppDeps, actor: Actor, invitationId: string): Promise<void> {
  assertCan(actor, 'member.invite');
  await withFirm(deps.db, actor, async (tx) => {
    const [invitation] = await tx.select().from(invitations).where(eq(invitations.id, invitationId));
    if (!invitation) throw new AppError('not-found', 'There is no such invitation.');
    if (invitation.acceptedAt !== null) throw new AppError('conflict', 'The invitation was accepted. Change the member instead.');
    if (invitation.revokedAt !== null) return;
    await tx.update(invitations).set({ revokedAt: deps.clock() }).where(eq(invitations.id, invitationId));
    await recordEvent(tx, actor, 'invitation.revoked', { kind: 'invitation', id: invitationId }, { email: invitation.email }, deps.clock());
  });
}
