import type { Invitation, Member } from '@strandnote/api/contract';
import { schema, type Tx } from '@strandnote/db';
import { asc, desc } from 'drizzle-orm';

const { invitations, members } = schema;
type MemberRow = typeof members.$inferSelect;
type InvitationRow = typeof invitations.$inferSelect;

export function toMember(row: MemberRow): Member {
  const { id, userId, name, email, roles, clientId, licenceNumber, licenceJurisdiction, units, active } = row;
  return { id, userId, name, email, roles, clientId, licenceNumber, licenceJurisdiction, units, active };
}

export function toInvitation(row: InvitationRow, now: Date): Invitation {
  const { id, name, email, roles, clientId, expiresAt } = row;
  return { id, name, email, roles, clientId, expiresAt: expiresAt.toISOString(), state: stateOf(row, now) };
}

function stateOf({ acceptedAt, revokedAt, expiresAt }: InvitationRow, now: Date): Invitation['state'] {
  if (acceptedAt !== null) return 'accepted';
  if (revokedAt !== null) return 'revoked';
  return expiresAt <= now ? 'expired' : 'open';
}

export async function listMembers(tx: Tx): Promise<Member[]> {
  return (await tx.select().from(members).orderBy(asc(members.name))).map(toMember);
}

export async function listInvitations(tx: Tx, now: Date): Promise<Invitation[]> {
  return (await tx.select().from(invitations).orderBy(desc(invitations.createdAt))).map((row) => toInvitation(row, now));
}

/** Names of the firm's people by user, those who have left too. */
export async function loadMemberNames(tx: Tx): Promise<(userId: string) => string> {
  const rows = await tx.select({ userId: members.userId, name: members.name }).from(members);
  const names = new Map(rows.map(({ userId, name }) => [userId, name]));
  return (userId) => names.get(userId) ?? 'a former member';
}
