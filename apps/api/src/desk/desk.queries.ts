import type { Desk, RevisionSummary } from '@strandnote/api/contract';
import { type Actor, schema, type Tx } from '@strandnote/db';
import { and, eq, ne, or, sql } from 'drizzle-orm';
import { selectCampaigns } from '../campaigns/campaigns.queries.ts';
import { listRevisionSummaries } from '../reports/revisions.queries.ts';
import { movedCables } from './moved-cables.ts';

const { campaigns, revisions } = schema;

/** What waits for this member: each list only for the role whose work it is. */
export async function loadDesk(tx: Tx, actor: Actor): Promise<Desk> {
  const isEngineer = actor.roles.includes('engineer');
  const mine = or(eq(revisions.authorUserId, actor.userId), eq(revisions.deputyUserId, actor.userId));
  const own = async (state: RevisionSummary['state']) =>
    isEngineer ? listRevisionSummaries(tx, and(eq(revisions.state, state), mine)) : [];
  return {
    campaigns: isEngineer ? await openCampaigns(tx) : [],
    drafts: await own('draft'),
    returned: await own('returned'),
    toCheck: actor.roles.includes('checker') ? await revisionsToCheck(tx, actor) : [],
    toIssue: await own('approved'),
    moved: isEngineer || actor.roles.includes('checker') ? await movedCables(tx) : [],
  };
}

async function openCampaigns(tx: Tx): Promise<Desk['campaigns']> {
  const open = await selectCampaigns(tx, eq(campaigns.state, 'open'));
  return open.map(({ id, name, structureId, structureName, startsOn, cableCount, measuredCount, notMeasuredCount }) => ({
    id,
    name,
    structureId,
    structureName,
    startsOn,
    cableCount,
    measuredCount,
    notMeasuredCount,
  }));
}

/** Revisions in check that this member took no part in preparing, with how far the check has come. */
async function revisionsToCheck(tx: Tx, actor: Actor): Promise<Desk['toCheck']> {
  const summaries = await listRevisionSummaries(tx, and(eq(revisions.state, 'in check'), ne(revisions.authorUserId, actor.userId)));
  if (summaries.length === 0) return [];
  const { rows } = await tx.execute<{ id: string; cables: number; ticked: number; open: number }>(sql`
    select r.id,
      (select count(*) from revision_cables c where c.firm_id = r.firm_id and c.revision_id = r.id)::int as cables,
      (select count(*) from cable_checks k where k.firm_id = s.firm_id and k.submission_id = s.id)::int as ticked,
      (select count(*) from check_comments m where m.firm_id = r.firm_id and m.revision_id = r.id and m.state = 'open')::int as open
    from revisions r
    join lateral (select * from submissions x where x.firm_id = r.firm_id and x.revision_id = r.id order by x.number desc limit 1) s on true
    where r.state = 'in check' and not has_prepared(r.firm_id, s.id, ${actor.userId})`);
  const progress = new Map(rows.map((row) => [row.id, row]));
  return summaries.flatMap((summary) => {
    const row = progress.get(summary.id);
    return row ? [{ ...summary, cableCount: row.cables, tickedCount: row.ticked, openComments: row.open }] : [];
  });
}
