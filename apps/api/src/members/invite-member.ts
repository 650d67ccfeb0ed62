import { createHash, randomBytes } from 'node:crypto';
import type { Invite } from '@strandnote/api/contract';
import { type Actor, schema, withFirm } from '@strandnote/db';
import { and, eq } from 'drizzle-orm';
import { assertCan } from '../access/permissions.ts';
import { recordEvent } from '../audit/record-event.ts';
import type { AppDeps } from '../deps.ts';
import { AppError } from '../http/errors.ts';
import { insertOnce } from '../http/insert-once.ts';
import { enqueueMail } from '../mail/enqueue-mail.ts';
import { invitationMail } from '../mail/invitation-mail.ts';

const { clients, firms, invitations, members } = schema;
const daysToAccept = 14;

/** The token goes out by mail only; the database keeps its hash. */
export function hashToken(token: string): string {
  return createHash('sha256').update(token).digest('hex');
}

/** Invites a person by mail. Accounts come about in no other way. */
export async function inviteMember(deps: AppDeps, actor: Actor, body: Invite): Promise<void> {
  assertCan(actor, 'member.invite');
  await withFirm(deps.db, actor, async (tx) => {
    const [member] = await tx
      .select({ id: members.id })
      .from(members)
      .where(and(eq(members.email, body.email), eq(members.active, true)));
    if (member) throw AppError.ofField('email', 'A person with this address is a member of the firm already.');
    if (body.clientId !== null) {
      const [client] = await tx.select({ id: clients.id }).from(clients).where(eq(clients.id, body.clientId));
      if (!client) throw AppError.ofField('clientId', 'Choose a client of the firm.');
    }
    const token = randomBytes(24).toString('base64url');
    const expiresAt = new Date(deps.clock().getTime() + daysToAccept * 24 * 60 * 60 * 1000);
    const values = { ...body, firmId: actor.firmId, tokenSha256: hashToken(token), expiresAt, invitedBy: actor.userId };
    // A repeated request sends no second message: its token is not the one that the row keeps.
    if (!(await insertOnce(tx, invitations, { values, sent: body, noun: 'invitation' }))) return;
    const [firm] = await tx.select({ name: firms.name }).from(firms);
    const link = `${deps.env.publicUrl}/invitation/${token}`;
    await enqueueMail(tx, [
      invitationMail({ to: body.email, from: actor.name, firmName: firm!.name, roles: body.roles, days: daysToAccept, link }),
    ]);
    await recordEvent(
      tx,
      actor,
      'member.invited',
      { kind: 'invitation', id: body.id },
      { email: body.email, roles: body.roles, clientId: body.clientId },
      deps.clock(),
    );
  });
}
