import type { Campaign } from '@strandnote/api/contract';
import { schema, type Tx } from '@strandnote/db';
import { desc, eq, type SQL, sql } from 'drizzle-orm';
import { AppError } from '../http/errors.ts';
import { toCampaignFields } from './to-campaign-detail.ts';

const { campaigns, structures } = schema;

/** How many cables a campaign covers, how many were measured, and how many were left out with a reason. */
const counted = {
  cableCount: sql<number>`(select count(*) from campaign_cables c
    where c.firm_id = ${campaigns.firmId} and c.campaign_id = ${campaigns.id})::int`,
  measuredCount: sql<number>`(select count(distinct s.cable_id) from measurements m
    join spans s on s.firm_id = m.firm_id and s.id = m.span_id
    where m.firm_id = ${campaigns.firmId} and m.campaign_id = ${campaigns.id}
      and exists (select 1 from modal_peaks p where p.firm_id = m.firm_id and p.measurement_id = m.id and p.used))::int`,
  notMeasuredCount: sql<number>`(select count(*) from campaign_cables c
    where c.firm_id = ${campaigns.firmId} and c.campaign_id = ${campaigns.id} and c.not_measured_reason is not null)::int`,
};

export interface CountedCampaign extends Campaign {
  notMeasuredCount: number;
}

/** Campaigns, the latest first. */
export async function selectCampaigns(tx: Tx, where?: SQL): Promise<CountedCampaign[]> {
  const rows = await tx
    .select({ campaign: campaigns, structureName: structures.name, ...counted })
    .from(campaigns)
    .innerJoin(structures, eq(structures.id, campaigns.structureId))
    .where(where)
    .orderBy(desc(campaigns.startsOn), desc(campaigns.number), campaigns.id);
  return rows.map(({ campaign, ...rest }) => ({ ...toCampaignFields(campaign), ...rest }));
}

export async function listCampaigns(tx: Tx): Promise<Campaign[]> {
  return (await selectCampaigns(tx)).map(toCampaign);
}

/** @throws AppError `not-found` where the firm has no such structure */
export async function listCampaignsOfStructure(tx: Tx, structureId: string): Promise<Campaign[]> {
  const [structure] = await tx.select({ id: structures.id }).from(structures).where(eq(structures.id, structureId));
  if (!structure) throw new AppError('not-found', 'There is no such structure.');
  return (await selectCampaigns(tx, eq(campaigns.structureId, structureId))).map(toCampaign);
}

/** @throws AppError `not-found` also for what belongs to another firm */
export async function loadCampaignInShort(tx: Tx, campaignId: string): Promise<Campaign> {
  const [found] = await selectCampaigns(tx, eq(campaigns.id, campaignId));
  if (!found) throw new AppError('not-found', 'There is no such campaign.');
  return toCampaign(found);
}

function toCampaign({ notMeasuredCount: _left, ...campaign }: CountedCampaign): Campaign {
  return campaign;
}
