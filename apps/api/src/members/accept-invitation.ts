import { randomUUID } from 'node:crypto';
import type { AcceptInvitation, InvitationByToken } from '@strandnote/api/contract';
import { withFirm } from '@strandnote/db';
import { sql } from 'drizzle-orm';
import { recordEvent } from '../audit/record-event.ts';
import type { AppDeps } from '../deps.ts';
import { AppError } from '../http/errors.ts';
import { hashToken } from './invite-member.ts';

type Found = {
  firm_id: string;
  firm_name: string;
  invitation_id: string;
  name: string;
  email: string;
  roles: InvitationByToken['roles'];
  client_id: string | null;
  expires_at: Date | string;
  accepted_at: Date | string | null;
  revoked_at: Date | string | null;
};

/** @throws AppError `gone` for an invitation that does not exist, was used, revoked or is too old: they are not told apart */
export async function findInvitation(deps: AppDeps, token: string): Promise<Found> {
  const { rows } = await deps.db.execute<Found>(sql`select * from invitation_by_token(${hashToken(token)})`);
  const found = rows[0];
  const open = found && found.accepted_at === null && found.revoked_at === null && new Date(found.expires_at) > deps.clock();
  if (!open) throw new AppError('gone', 'This invitation has been used or is too old. Ask for a new one.');
  return found;
}

export async function showInvitation(deps: AppDeps, token: string): Promise<InvitationByToken> {
  const { firm_name: firmName, name, email, roles } = await findInvitation(deps, token);
  return { firmName, name, email, roles, hasAccount: (await findAccount(deps, email)) !== null };
}

/** Makes the account where there is none yet, and the person a member. Somebody who has an account proves it with their password. */
export async function acceptInvitation(deps: AppDeps, token: string, { password }: AcceptInvitation): Promise<void> {
  const invitation = await findInvitation(deps, token);
  const userId = (await provenAccount(deps, invitation.email, password)) ?? (await createAccount(deps, invitation, password));
  const memberId = randomUUID();
  await withFirm(deps.db, { firmId: invitation.firm_id, userId, clientId: invitation.client_id }, async (tx) => {
    const { rows } = await tx.execute<{ member_id: string }>(
      sql`select * from accept_invitation(${hashToken(token)}, ${userId}, ${memberId}::uuid, ${deps.clock().toISOString()}::timestamptz)`,
    );
    if (!rows[0]) throw new AppError('gone', 'This invitation has been used or is too old. Ask for a new one.');
    const actor = { firmId: invitation.firm_id, userId, name: invitation.name };
    await recordEvent(
      tx,
      actor,
      'member.joined',
      { kind: 'member', id: rows[0].member_id },
      { email: invitation.email, roles: invitation.roles },
      deps.clock(),
    );
  });
}

async function findAccount(deps: AppDeps, email: string) {
  const context = await deps.auth.$context;
  return context.internalAdapter.findUserByEmail(email, { includeAccounts: true });
}

async function provenAccount(deps: AppDeps, email: string, password: string): Promise<string | null> {
  const context = await deps.auth.$context;
  const found = await findAccount(deps, email);
  if (!found) return null;
  const hash = found.accounts.find(({ providerId }) => providerId === 'credential')?.password;
  if (hash && (await context.password.verify({ hash, password }))) return found.user.id;
  throw AppError.ofField('password', 'You have an account already: type its password.');
}

/** Makes an account of better-auth past its sign-up, which is off. */
export async function createAccount(
  deps: Pick<AppDeps, 'auth'>,
  person: { name: string; email: string },
  password: string,
): Promise<string> {
  const context = await deps.auth.$context;
  const user = await context.internalAdapter.createUser(
    { name: person.name, email: person.email.toLowerCase(), emailVerified: true },
    { method: 'email-password' },
  );
  await context.internalAdapter.linkAccount({
    userId: user.id,
    providerId: 'credential',
    accountId: user.id,
    password: await context.password.hash(password),
  });
  return user.id;
}
