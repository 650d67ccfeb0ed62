import {
  campaign,
  campaignDetail,
  campaignList,
  createCampaign as createCampaignBody,
  done,
  editCampaign as editCampaignBody,
  editCampaignCable,
  id,
} from '@strandnote/api/contract';
import { withFirm } from '@strandnote/db';
import { z } from 'zod';
import { firmRoute } from '../http/route.ts';
import { listCampaigns, listCampaignsOfStructure, loadCampaignInShort } from './campaigns.queries.ts';
import { createCampaign } from './create-campaign.ts';
import { editCampaign } from './edit-campaign.ts';
import { excuseCable } from './excuse-cable.ts';
import { loadCampaignDetail } from './load-campaign-detail.ts';

const inStructure = z.object({ structureId: id });
const ofCampaign = z.object({ campaignId: id });

export const campaignRoutes = [
  firmRoute({
    method: 'get',
    path: '/campaigns',
    access: 'campaign.read',
    summary: 'The firm’s campaigns, the latest first',
    reply: campaignList,
    handle: ({ deps, who }) => withFirm(deps.db, who, async (tx) => ({ items: await listCampaigns(tx) })),
  }),
  firmRoute({
    method: 'get',
    path: '/structures/:structureId/campaigns',
    access: 'campaign.read',
    summary: 'The campaigns of a structure, the latest first',
    params: inStructure,
    reply: campaignList,
    handle: ({ deps, who, params }) =>
      withFirm(deps.db, who, async (tx) => ({ items: await listCampaignsOfStructure(tx, params.structureId) })),
  }),
  firmRoute({
    method: 'post',
    path: '/structures/:structureId/campaigns',
    access: 'campaign.edit',
    summary: 'Opens a campaign on all cables of a structure, or on those named',
    params: inStructure,
    body: createCampaignBody,
    reply: campaign,
    status: 201,
    handle: async ({ deps, who, params, body }) => {
      await createCampaign(deps, who, params.structureId, body);
      return withFirm(deps.db, who, (tx) => loadCampaignInShort(tx, body.id));
    },
  }),
  firmRoute({
    method: 'get',
    path: '/campaigns/:campaignId',
    access: 'campaign.read',
    summary: 'The whole checklist of a campaign, with all that a phone needs to work on it without a signal',
    params: ofCampaign,
    reply: campaignDetail,
    handle: ({ deps, who, params }) => withFirm(deps.db, who, async (tx) => (await loadCampaignDetail(tx, params.campaignId, null)).detail),
  }),
  firmRoute({
    method: 'patch',
    path: '/campaigns/:campaignId',
    access: 'campaign.edit',
    summary: 'Changes what is said of a campaign, closes it or opens it again',
    params: ofCampaign,
    body: editCampaignBody,
    reply: campaign,
    handle: async ({ deps, who, params, body }) => {
      await editCampaign(deps, who, params.campaignId, body);
      return withFirm(deps.db, who, (tx) => loadCampaignInShort(tx, params.campaignId));
    },
  }),
  firmRoute({
    method: 'put',
    path: '/campaigns/:campaignId/cables/:cableId',
    access: 'campaign.edit',
    summary: 'Says why a cable was not measured, or takes that back',
    params: z.object({ campaignId: id, cableId: id }),
    body: editCampaignCable,
    reply: done,
    handle: async ({ deps, who, params, body }) => {
      await excuseCable(deps, who, params, body);
      return { done: true as const };
    },
  }),
];
