import type { EditCampaign } from '@strandnote/api/contract';
import { type Actor, schema, withFirm } from '@strandnote/db';
import { and, eq } from 'drizzle-orm';
import { assertCan } from '../access/permissions.ts';
import { recordEvent } from '../audit/record-event.ts';
import type { AppDeps } from '../deps.ts';
import { AppError } from '../http/errors.ts';
import { canonicalJson } from '../reports/canonical-json.ts';
import { loadCampaign } from './load-campaign-detail.ts';

const { campaigns } = schema;

/** Changes what is said of a campaign, closes it, or opens a closed one again; a closed one takes no other change. */
export async function editCampaign(deps: AppDeps, actor: Actor, campaignId: string, body: EditCampaign): Promise<void> {
  assertCan(actor, 'campaign.edit');
  await withFirm(deps.db, actor, async (tx) => {
    const { campaign } = await loadCampaign(tx, campaignId);
    const changed = Object.entries(body).filter(([name, value]) => !sameJson(value, campaign[name as keyof EditCampaign]));
    if (changed.length === 0) return;
    const startsOn = body.startsOn ?? campaign.startsOn;
    const endsOn = body.endsOn === undefined ? campaign.endsOn : body.endsOn;
    if (endsOn !== null && endsOn < startsOn) throw AppError.ofField('endsOn', 'The last day must not be before the first.');
    const reopening = campaign.state === 'closed' && body.state === 'open';
    if (campaign.state === 'closed' && !reopening) throw new AppError('conflict', closedCampaign);
    const [saved] = await tx
      .update(campaigns)
      .set(Object.fromEntries(changed))
      .where(and(eq(campaigns.id, campaignId), eq(campaigns.state, campaign.state)))
      .returning({ id: campaigns.id });
    if (!saved) throw new AppError('conflict', closedCampaign);
    await recordEvent(tx, actor, 'campaign.edited', { kind: 'campaign', id: campaignId }, Object.fromEntries(changed), deps.clock());
  });
}

export const closedCampaign = 'The campaign is closed. Open it again before you change anything in it.';

function sameJson(a: unknown, b: unknown): boolean {
  return canonicalJson(a ?? null) === canonicalJson(b ?? null);
}
