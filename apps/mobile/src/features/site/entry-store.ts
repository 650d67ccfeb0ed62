import type { CampaignDetail, PutMeasurement } from '@strandnote/api/contract';
import { del, get, keys, set } from 'idb-keyval';
import { useCallback, useEffect, useRef, useState } from 'react';
import { firmPath } from '../../lib/api-client.ts';
import { queueEntry } from '../../lib/outbox.ts';
import { queryClient } from '../../lib/query-client.ts';
import { useMeQuery } from '../../lib/session.tsx';
import { campaignKey } from '../campaigns/campaigns.api.ts';
import { type EntryAction, type EntryDraft, reduceDraft } from './entry-draft.ts';
import { measurementOf } from './measurement-body.ts';
import { withMeasurement, withReason } from './survey-overlay.ts';

/** Raised with the shape of a draft: one that an older version of the app kept is not read. */
const draftsOf = (userId: string, campaignId: string) => `strandnote.draft.1 ${userId} ${campaignId} `;

/** Whose draft of which visit it is; a visit that is not saved yet is the new one of its span. */
export interface DraftPlace {
  userId: string;
  campaignId: string;
  spanId: string;
  measurementId: string | null;
}

function draftKey({ userId, campaignId, spanId, measurementId }: DraftPlace): string {
  return `${draftsOf(userId, campaignId)}${spanId} ${measurementId ?? 'new'}`;
}

/**
 * A measurement that is being typed: begun afresh or found on the device, and kept there with every change until it is saved.
 * Mount it anew for another place (a `key`).
 */
export function useEntryDraft(place: DraftPlace, begin: () => EntryDraft, restore: (kept: EntryDraft) => EntryDraft, version: number) {
  const storageKey = draftKey(place);
  const [draft, setDraft] = useState<EntryDraft | null>(null);
  const [typed, setTyped] = useState(false);
  const current = useRef<EntryDraft | null>(null);
  // biome-ignore lint/correctness/useExhaustiveDependencies: begin and restore speak of the same place as the key
  useEffect(() => {
    let mounted = true;
    const open = (kept: EntryDraft | undefined) => {
      if (!mounted) return;
      current.current = kept ? restore(kept) : begin();
      setTyped(kept !== undefined);
      setDraft(current.current);
    };
    // Without storage (a private window) the draft lives as long as the page.
    get<EntryDraft>(storageKey).then(open, () => open(undefined));
    return () => {
      mounted = false;
    };
  }, [storageKey]);
  const dispatch = useCallback(
    (action: EntryAction) => {
      if (!current.current) return;
      current.current = reduceDraft(current.current, action);
      setDraft(current.current);
      setTyped(true);
      set(storageKey, current.current).catch((error: unknown) => console.error(error));
    },
    [storageKey],
  );
  const forget = useCallback(() => del(storageKey), [storageKey]);
  const replace = useCallback((next: EntryDraft) => {
    current.current = next;
    setDraft(next);
    setTyped(false);
  }, []);
  // A newer version came from the server before anything was typed: typing begins from that.
  // biome-ignore lint/correctness/useExhaustiveDependencies: only the version is what this answers to
  useEffect(() => {
    if (current.current && !typed && version > current.current.version) replace(begin());
  }, [version]);
  return { draft, dispatch, typed, forget, replace };
}

/** What this person typed in a campaign and has not saved: span and visit of each draft. */
export function useDrafts(campaignId: string): readonly { spanId: string; visit: string }[] {
  const userId = useMeQuery().data?.userId;
  const [drafts, setDrafts] = useState<{ spanId: string; visit: string }[]>([]);
  useEffect(() => {
    if (userId === undefined) return;
    const prefix = draftsOf(userId, campaignId);
    const placeOf = (key: string) => {
      const [spanId = '', visit = ''] = key.slice(prefix.length).split(' ');
      return { spanId, visit };
    };
    keys<string>().then(
      (found) => setDrafts(found.filter((key) => key.startsWith(prefix)).map(placeOf)),
      (error: unknown) => console.error(error),
    );
  }, [userId, campaignId]);
  return drafts;
}

/** Visits to a span that were typed and not saved: their measurements, or `new`. */
export function useDraftedVisits(campaignId: string, spanId: string): string[] {
  return useDrafts(campaignId)
    .filter((draft) => draft.spanId === spanId)
    .map(({ visit }) => visit);
}

export const measurementKey = (measurementId: string) => `measurement:${measurementId}`;

interface Sender {
  firmId: string;
  userId: string;
  name: string;
}

interface Entered {
  campaignId: string;
  measurementId: string;
  cableName: string;
  body: PutMeasurement;
}

/** Puts a measurement on its way; resolves once it is safe on this device. */
export async function saveMeasurement({ firmId, userId, name }: Sender, { campaignId, measurementId, cableName, body }: Entered) {
  await queueEntry({
    userId,
    key: measurementKey(measurementId),
    method: 'PUT',
    path: firmPath(firmId, 'campaigns', campaignId, 'measurements', measurementId),
    body,
    subject: `Modal peaks of ${cableName}`,
    refreshes: [campaignKey(firmId, campaignId), ['firm', firmId, 'campaigns'], ['firm', firmId, 'desk']],
  });
  const entered = measurementOf(body, { id: measurementId, campaignId, enteredBy: name });
  changeCached(firmId, campaignId, (detail) => withMeasurement(detail, entered));
}

/** Says why a cable is not measured, or takes that back, in the same way. */
export async function saveReason(
  { firmId, userId }: Omit<Sender, 'name'>,
  { campaignId, cableId, cableName, reason }: { campaignId: string; cableId: string; cableName: string; reason: string | null },
) {
  await queueEntry({
    userId,
    key: `not-measured:${campaignId}:${cableId}`,
    method: 'PUT',
    path: firmPath(firmId, 'campaigns', campaignId, 'cables', cableId),
    body: { notMeasuredReason: reason },
    subject: `${cableName}, not measured`,
    refreshes: [campaignKey(firmId, campaignId), ['firm', firmId, 'campaigns'], ['firm', firmId, 'desk']],
  });
  changeCached(firmId, campaignId, (detail) => withReason(detail, cableId, reason));
}

/** Between its arrival at the server and the next reply, an entry is no longer in the outbox: the cache carries it meanwhile. */
function changeCached(firmId: string, campaignId: string, change: (detail: CampaignDetail) => CampaignDetail): void {
  queryClient.setQueryData<CampaignDetail>(campaignKey(firmId, campaignId), (detail) => detail && change(detail));
}
