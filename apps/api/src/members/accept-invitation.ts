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

/**
 * Makes the account where there is none yet, and the person a member. Somebody who has an account proves it with their password.
 * The lock makes two acceptances of one invitation wait for each other.
 */
export async function acceptInvitation(deps: AppDeps, token: string, { password }: AcceptInvitation): Promise<void> {
  const { firm_id: firmId, client_id: clientId } = await findInvitation(deps, token);
  const nobody = { firmId, userId: 'invitation', clientId };
  await withFirm(deps.db, nobody, async (tx) => {
    await tx.execute(sql`select pg_advisory_xact_lock(hashtextextended(${hashToken(token)}, 0))`);
    const invitation = await findInvitation(deps, token);
    const userId = await accountFor(deps, invitation, password);
    await tx.execute(sql`select set_config('strandnote.user_id', ${userId}, true)`);
    const { rows } = await tx.execute<{ member_id: string }>(
      sql`select * from accept_invitation(${hashToken(token)}, ${userId}, ${randomUUID()}::uuid, ${deps.clock().toISOString()}::timestamptz)`,
    );
    const { email, name, roles } = invitation;
    const member = { kind: 'member', id: rows[0]!.member_id };
    await recordEvent(tx, { firmId, userId, name }, 'member.joined', member, { email, roles }, deps.clock());
  });
}

async function accountFor(deps: AppDeps, person: { name: string; email: string }, password: string): Promise<string> {
  const found = await findAccount(deps, person.email);
  if (!found) return createAccount(deps, person, password);
  const context = await deps.auth.$context;
  const hash = found.accounts.find(({ providerId }) => providerId === 'credential')?.password;
  // Left behind by an acceptance that broke off; whoever holds the link has the mailbox and may finish it.
  if (!hash) await linkPassword(deps, found.user.id, password);
  else if (!(await context.password.verify({ hash, password }))) {
    throw AppError.ofField('password', 'You have an account already: type its password.');
  }
  return found.user.id;
}

async function findAccount(deps: AppDeps, email: string) {
  const context = await deps.auth.$context;
  return context.internalAdapter.findUserByEmail(email, { includeAccounts: true });
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
  await linkPassword(deps, user.id, password);
  return user.id;
}

async function linkPassword(deps: Pick<AppDeps, 'auth'>, userId: string, password: string): Promise<void> {
  const context = await deps.auth.$context;
  const hash = await context.password.hash(password);
  await context.internalAdapter.linkAccount({ userId, providerId: 'credential', accountId: userId, password: hash });
}
