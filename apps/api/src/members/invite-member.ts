import { createHash, randomBytes } from 'node:crypto';
import type { Invite } from '@strandnote/api/contract';
import { type Actor, schema, withFirm } from '@strandnote/db';
import { and, eq } from 'drizzle-orm';
import { assertCan } from '../access/permissions.ts';
import { recordEvent } from '../audit/record-event.ts';
import type { AppDeps } from '../deps.ts';
import { AppError } from '../http/errors.ts';
import { enqueueMail } from '../mail/enqueue-mail.ts';

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
    const [stored] = await tx.select().from(invitations).where(eq(invitations.id, body.id));
    if (stored) {
      if (stored.email === body.email) return;
      throw new AppError('conflict', 'Another invitation has this identifier already.');
    }
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
    await tx
      .insert(invitations)
      .values({ ...body, firmId: actor.firmId, tokenSha256: hashToken(token), expiresAt, invitedBy: actor.userId });
    const [firm] = await tx.select({ name: firms.name }).from(firms);
    await enqueueMail(tx, [
      {
        to: body.email,
        subject: `Invitation to ${firm!.name}`,
        text: `${actor.name} invites you to ${firm!.name} as ${body.roles.join(', ')}. The invitation holds for ${daysToAccept} days:\n\n${deps.env.publicUrl}/invitation/${token}`,
      },
    ]);
    await recordEvent(
      tx,
      actor,
      'member.invited',
      { kind: 'invitation', id: body.id },
      { email: body.email, roles: body.roles, clientId: body.clientId },
    );
  });
}
