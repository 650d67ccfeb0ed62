import type { RevisionSummary } from '@strandnote/api/contract';
import { schema, type Tx } from '@strandnote/db';
import { asc, desc, eq, type SQL, sql } from 'drizzle-orm';

const { campaigns, clients, members, reports, revisions, structures, submissions } = schema;

/** Revisions in a few words, the one changed last first. */
export async function listRevisionSummaries(tx: Tx, where?: SQL): Promise<RevisionSummary[]> {
  const rows = await tx
    .select({
      revision: revisions,
      report: reports,
      campaignName: campaigns.name,
      structureName: structures.name,
      clientName: clients.name,
      authorName: members.name,
      submissionNumber: sql<number>`coalesce((select max(s.number) from ${submissions} s
        where s.firm_id = ${revisions.firmId} and s.revision_id = ${revisions.id}), 0)::int`,
    })
    .from(revisions)
    .innerJoin(reports, eq(reports.id, revisions.reportId))
    .innerJoin(campaigns, eq(campaigns.id, reports.campaignId))
    .innerJoin(structures, eq(structures.id, campaigns.structureId))
    .innerJoin(clients, eq(clients.id, reports.clientId))
    .leftJoin(members, eq(members.userId, revisions.authorUserId))
    .where(where)
    .orderBy(desc(revisions.changedAt), asc(revisions.id));
  return rows.map(({ revision, report, authorName, ...names }) => ({
    id: revision.id,
    reportId: report.id,
    reportNumber: report.number,
    title: report.title,
    campaignId: report.campaignId,
    letter: revision.letter,
    state: revision.state,
    authorName: authorName ?? 'A former member',
    changedAt: revision.changedAt.toISOString(),
    ...names,
  }));
}
