import type { EditCampaignCable } from '@strandnote/api/contract';
import { type Actor, schema, withFirm } from '@strandnote/db';
import { and, eq } from 'drizzle-orm';
import { assertCan } from '../access/permissions.ts';
import { type AuditAct, recordEvent } from '../audit/record-event.ts';
import type { AppDeps } from '../deps.ts';
import { AppError } from '../http/errors.ts';
import { closedCampaign } from './edit-campaign.ts';
import { loadCampaign } from './load-campaign-detail.ts';

const { campaignCables } = schema;

interface Place {
  campaignId: string;
  cableId: string;
}

/** Says why a cable was not measured in a campaign, or takes that back. */
export async function excuseCable(deps: AppDeps, actor: Actor, place: Place, { notMeasuredReason }: EditCampaignCable): Promise<void> {
  assertCan(actor, 'campaign.edit');
  await withFirm(deps.db, actor, async (tx) => {
    const { campaign } = await loadCampaign(tx, place.campaignId);
    const here = and(eq(campaignCables.campaignId, place.campaignId), eq(campaignCables.cableId, place.cableId));
    const [stored] = await tx.select().from(campaignCables).where(here).for('no key update');
    if (!stored) throw new AppError('not-found', 'The campaign does not cover this cable.');
    if (stored.notMeasuredReason === notMeasuredReason) return;
    if (campaign.state === 'closed') throw new AppError('conflict', closedCampaign);
    await tx.update(campaignCables).set({ notMeasuredReason }).where(here);
    const act: AuditAct = notMeasuredReason === null ? 'cable.excuse-withdrawn' : 'cable.excused';
    await recordEvent(
      tx,
      actor,
      act,
      { kind: 'campaign', id: place.campaignId },
      { cableId: place.cableId, reason: notMeasuredReason },
      deps.clock(),
    );
  });
}
