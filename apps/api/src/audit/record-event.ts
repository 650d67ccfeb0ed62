import { type Actor, schema, type Tx } from '@strandnote/db';

/** Everything that is written down, by name. */
export type AuditAct =
  | 'firm.changed'
  | 'member.invited'
  | 'member.joined'
  | 'member.changed'
  | 'invitation.revoked'
  | 'session.started'
  | 'session.ended'
  | 'password.changed'
  | 'password.reset'
  | 'client.created'
  | 'client.changed'
  | 'structure.created'
  | 'structure.changed'
  | 'section.created'
  | 'section.changed'
  | 'cable.created'
  | 'cable.changed'
  | 'reference.created'
  | 'reference.retired'
  | 'campaign.created'
  | 'campaign.edited'
  | 'cable.excused'
  | 'cable.excuse-withdrawn'
  | 'measurement.entered'
  | 'measurement.changed'
  | 'estimates.saved'
  | 'report.created'
  | 'revision.started'
  | 'revision.edited'
  | 'revision.submitted'
  | 'revision.recalled'
  | 'revision.returned'
  | 'revision.approved'
  | 'revision.rendered'
  | 'revision.issued'
  | 'revision.withdrawn'
  | 'cable.ticked'
  | 'cable.unticked'
  | 'remark.made'
  | 'remark.answered'
  | 'remark.closed'
  | 'remark.reopened'
  | 'report.downloaded'
  | 'results.downloaded'
  | 'content.downloaded';

export interface AuditSubject {
  kind: string;
  id: string;
}

/**
 * Writes down what was done, as the last thing in its transaction: the head of the firm's chain is locked until commit.
 */
export async function recordEvent(
  tx: Tx,
  actor: Pick<Actor, 'firmId' | 'userId' | 'name'>,
  act: AuditAct,
  subject: AuditSubject,
  details: Record<string, unknown>,
  at: Date,
): Promise<void> {
  await tx.insert(schema.auditEvents).values({
    firmId: actor.firmId,
    at,
    actorUserId: actor.userId,
    actorName: actor.name,
    act,
    subjectKind: subject.kind,
    subjectId: subject.id,
    details,
  });
}
