import { id, savedEstimates, saveEstimates as saveEstimatesBody } from '@strandnote/api/contract';
import { z } from 'zod';
import { firmRoute } from '../http/route.ts';
import { saveEstimates } from './save-estimates.ts';

export const estimateRoutes = [
  firmRoute({
    method: 'post',
    path: '/campaigns/:campaignId/estimates',
    access: 'campaign.edit',
    summary: 'Computes and keeps an estimate of each measurement named, or of all whose inputs have changed',
    params: z.object({ campaignId: id }),
    body: saveEstimatesBody,
    reply: savedEstimates,
    handle: ({ deps, who, params, body }) => saveEstimates(deps, who, params.campaignId, body),
  }),
];
