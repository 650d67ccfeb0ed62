import { type AuditEvent, auditList, auditQuery, auditVerification } from '@strandnote/api/contract';
import { type Actor, schema, type Tx, withFirm } from '@strandnote/db';
import { and, desc, eq, inArray, lt, or, type SQL } from 'drizzle-orm';
import { firmRoute } from '../http/route.ts';
import { verifyChain } from './verify-chain.ts';

const { auditEvents, cableChecks, revisions, submissions } = schema;

const pageLength = 200;

function toAuditEvent(row: typeof auditEvents.$inferSelect): AuditEvent {
  const { sequence, at, actorName, act, subjectKind, subjectId, details, hash } = row;
  return { sequence, at: at.toISOString(), actorName, act, subjectKind, subjectId, details, hash };
}

export const auditRoutes = [
  firmRoute({
    method: 'get',
    path: '/audit',
    access: 'audit.read',
    summary: 'The last 200 events, or those before one: all for an administrator, of their own work or of what they check for others',
    query: auditQuery,
    reply: auditList,
    handle: ({ deps, who, query: { before } }) =>
      withFirm(deps.db, who, async (tx) => {
        const rows = await tx
          .select()
          .from(auditEvents)
          .where(and(await visibleTo(tx, who), before === undefined ? undefined : lt(auditEvents.sequence, before)))
          .orderBy(desc(auditEvents.sequence))
          .limit(pageLength);
        return { items: rows.map(toAuditEvent) };
      }),
  }),
  firmRoute({
    method: 'get',
    path: '/audit/verification',
    access: 'audit.verify',
    summary: 'Recomputes the whole chain of the firm and compares it with the anchors outside the database',
    reply: auditVerification,
    handle: async ({ deps, who }) => {
      const { events, head, faults } = await verifyChain(deps.db, who, deps.env.ANCHOR_FILE);
      return { events, head, intact: faults.length === 0, firstProblem: faults[0] ?? null };
    },
  }),
];

/** An engineer sees events of revisions that they wrote and their own acts; a checker those of revisions that were submitted. */
async function visibleTo(tx: Tx, actor: Actor): Promise<SQL | undefined> {
  if (actor.roles.includes('admin')) return undefined;
  const own = eq(auditEvents.actorUserId, actor.userId);
  const subjects: string[] = [];
  if (actor.roles.includes('engineer')) {
    const rows = await tx.select({ id: revisions.id }).from(revisions).where(eq(revisions.authorUserId, actor.userId));
    subjects.push(...rows.map(({ id }) => id));
  }
  if (actor.roles.includes('checker')) {
    const rows = await tx
      .selectDistinct({ id: submissions.revisionId })
      .from(submissions)
      .innerJoin(cableChecks, eq(cableChecks.submissionId, submissions.id))
      .where(eq(cableChecks.checkedBy, actor.userId));
    const inCheck = await tx.select({ id: revisions.id }).from(revisions).where(eq(revisions.state, 'in check'));
    subjects.push(...rows.map(({ id }) => id), ...inCheck.map(({ id }) => id));
  }
  return subjects.length === 0 ? own : or(own, and(eq(auditEvents.subjectKind, 'revision'), inArray(auditEvents.subjectId, subjects)));
}
