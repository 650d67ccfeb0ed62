import type { CampaignDetail } from '@strandnote/api/contract';
import { schema, type Tx } from '@strandnote/db';
import { eq } from 'drizzle-orm';
import { AppError } from '../http/errors.ts';
import { loadMemberNames } from '../members/members.queries.ts';
import { type CampaignRow, loadSurveyRows, type SurveyRows } from './survey.queries.ts';
import { toCampaignDetail } from './to-campaign-detail.ts';

const { campaigns, structures } = schema;

export interface SurveyedCampaign {
  detail: CampaignDetail;
  structure: typeof structures.$inferSelect;
  rows: SurveyRows;
  nameOf: (userId: string) => string;
}

/**
 * A campaign whole, as the phone takes it along and as a report is put together from it.
 *
 * @param cableIds narrows it to these cables; null takes all
 */
export async function loadCampaignDetail(tx: Tx, campaignId: string, cableIds: string[] | null): Promise<SurveyedCampaign> {
  const { campaign, structure } = await loadCampaign(tx, campaignId);
  const rows = await loadSurveyRows(tx, campaign, cableIds);
  const nameOf = await loadMemberNames(tx);
  return { detail: toCampaignDetail(campaign, structure, rows, nameOf), structure, rows, nameOf };
}

/** @throws AppError `not-found` also for what belongs to another firm */
export async function loadCampaign(
  tx: Tx,
  campaignId: string,
): Promise<{ campaign: CampaignRow; structure: typeof structures.$inferSelect }> {
  const [found] = await tx
    .select({ campaign: campaigns, structure: structures })
    .from(campaigns)
    .innerJoin(structures, eq(structures.id, campaigns.structureId))
    .where(eq(campaigns.id, campaignId));
  if (!found) throw new AppError('not-found', 'There is no such campaign.');
  return found;
}
