import { useMemo } from 'react';
import { useFirm, useMeQuery } from '../../lib/session.tsx';
import { useOutbox } from '../../lib/use-outbox.ts';
import { useCampaignQuery } from '../campaigns/campaigns.api.ts';
import { overlaySurvey } from './survey-overlay.ts';

/** A campaign's checklist with what this person entered on this device and is not on the server yet. */
export function useSurvey(campaignId: string) {
  const firm = useFirm();
  const me = useMeQuery();
  const query = useCampaignQuery(firm.firmId, campaignId);
  const { entries } = useOutbox();
  const userId = me.data?.userId;
  const name = me.data?.name ?? '';
  const survey = useMemo(() => {
    const own = entries.filter((entry) => entry.userId === userId);
    return query.data && overlaySurvey(query.data, own, name);
  }, [query.data, entries, userId, name]);
  return { query, survey };
}
