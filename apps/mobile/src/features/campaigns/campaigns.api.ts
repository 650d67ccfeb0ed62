import {
  type CreateCampaign,
  campaign,
  campaignDetail,
  campaignList,
  createCampaign,
  type EditCampaign,
  editCampaign,
  savedEstimates,
} from '@strandnote/api/contract';
import { useMutation, useQuery, useQueryClient } from '@tanstack/react-query';
import { firmPath, get, send } from '../../lib/api-client.ts';

export const campaignKey = (firmId: string, campaignId: string) => ['firm', firmId, 'campaign', campaignId] as const;

export function useCampaignsQuery(firmId: string) {
  return useQuery({
    queryKey: ['firm', firmId, 'campaigns'],
    queryFn: ({ signal }) => get(firmPath(firmId, 'campaigns'), campaignList, signal),
  });
}

/** The whole checklist of a campaign, as the server holds it; `useSurvey` adds what is still on this device. */
export function useCampaignQuery(firmId: string, campaignId: string) {
  return useQuery({
    queryKey: campaignKey(firmId, campaignId),
    queryFn: ({ signal }) => get(firmPath(firmId, 'campaigns', campaignId), campaignDetail, signal),
  });
}

export function useCreateCampaignMutation(firmId: string) {
  return useFirmMutation(firmId, ({ structureId, ...body }: CreateCampaign & { structureId: string }) =>
    send('POST', firmPath(firmId, 'structures', structureId, 'campaigns'), createCampaign.parse(body), campaign),
  );
}

export function useEditCampaignMutation(firmId: string, campaignId: string) {
  return useFirmMutation(firmId, (body: EditCampaign) =>
    send('PATCH', firmPath(firmId, 'campaigns', campaignId), editCampaign.parse(body), campaign),
  );
}

/** Computes and keeps estimates on the server: of the measurements named, or of all whose inputs have changed. */
export function useSaveEstimatesMutation(firmId: string, campaignId: string) {
  return useFirmMutation(firmId, (measurementIds: string[] | null) =>
    send('POST', firmPath(firmId, 'campaigns', campaignId, 'estimates'), { measurementIds }, savedEstimates),
  );
}

/** Desk, checklist and history of a cable may all change with a campaign: everything shown is asked for again. */
function useFirmMutation<Body, Reply>(firmId: string, act: (body: Body) => Promise<Reply>) {
  const client = useQueryClient();
  return useMutation({ mutationFn: act, onSuccess: () => client.invalidateQueries({ queryKey: ['firm', firmId] }) });
}
