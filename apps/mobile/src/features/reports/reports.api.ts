import {
  type ApproveRevision,
  type CreateComment,
  type CreateReport,
  checkComment,
  createReport,
  done,
  type EditComment,
  type EditRevision,
  type Revision,
  report,
  reportList,
  revision,
  type SubmitRevision,
} from '@strandnote/api/contract';
import { useMutation, useQuery, useQueryClient } from '@tanstack/react-query';
import { firmPath, get, send } from '../../lib/api-client.ts';

export const revisionKey = (firmId: string, revisionId: string) => ['firm', firmId, 'revision', revisionId] as const;

/** A revision as it stands now: a signature names the content that was looked at, so that a kept copy is shown only offline. */
export function useRevisionQuery(firmId: string, revisionId: string) {
  const query = useQuery({
    queryKey: revisionKey(firmId, revisionId),
    queryFn: ({ signal }) => get(firmPath(firmId, 'revisions', revisionId), revision, signal),
    staleTime: 0,
    // The PDF of an approved revision is rendered in the background.
    refetchInterval: ({ state }) => (state.data?.state === 'approved' && !state.data.pdfReady ? 1500 : false),
  });
  return { ...query, isOutdated: query.isFetching && !query.isFetchedAfterMount };
}

export function useReportsQuery(firmId: string) {
  return useQuery({
    queryKey: ['firm', firmId, 'reports'],
    queryFn: ({ signal }) => get(firmPath(firmId, 'reports'), reportList, signal),
  });
}

export function useCreateReportMutation(firmId: string, campaignId: string) {
  return useFirmMutation(firmId, (body: CreateReport) =>
    send('POST', firmPath(firmId, 'campaigns', campaignId, 'reports'), createReport.parse(body), report),
  );
}

export function useNextRevisionMutation(firmId: string, reportId: string) {
  return useFirmMutation(firmId, (body: { id: string }) =>
    send('POST', firmPath(firmId, 'reports', reportId, 'revisions'), body, revision),
  );
}

/** Acts that answer with the whole revision as it stands afterwards. */
function useRevisionAct<Body>(firmId: string, revisionId: string, method: 'POST' | 'PATCH', ...path: string[]) {
  return useRevisionMutation(firmId, revisionId, (body: Body) =>
    send(method, firmPath(firmId, 'revisions', revisionId, ...path), body, revision),
  );
}

export const useEditRevisionMutation = (firmId: string, revisionId: string) => useRevisionAct<EditRevision>(firmId, revisionId, 'PATCH');
export const useSubmitMutation = (firmId: string, revisionId: string) =>
  useRevisionAct<SubmitRevision>(firmId, revisionId, 'POST', 'submissions');
export const useRecallMutation = (firmId: string, revisionId: string) =>
  useRevisionAct<Record<string, never>>(firmId, revisionId, 'POST', 'recall');
export const useReturnMutation = (firmId: string, revisionId: string) =>
  useRevisionAct<{ reason: string }>(firmId, revisionId, 'POST', 'return');
export const useApproveMutation = (firmId: string, revisionId: string) =>
  useRevisionAct<ApproveRevision>(firmId, revisionId, 'POST', 'approval');
export const useIssueMutation = (firmId: string, revisionId: string) =>
  useRevisionAct<{ password: string }>(firmId, revisionId, 'POST', 'issue');
export const useWithdrawMutation = (firmId: string, revisionId: string) =>
  useRevisionAct<{ reason: string }>(firmId, revisionId, 'POST', 'withdrawal');

export function useCommentMutation(firmId: string, revisionId: string) {
  return useFirmMutation(firmId, (body: CreateComment) =>
    send('POST', firmPath(firmId, 'revisions', revisionId, 'comments'), body, checkComment),
  );
}

export function useEditCommentMutation(firmId: string, revisionId: string) {
  return useFirmMutation(firmId, ({ commentId, ...body }: EditComment & { commentId: string }) =>
    send('PATCH', firmPath(firmId, 'revisions', revisionId, 'comments', commentId), body, checkComment),
  );
}

/** Ticks a cable as looked at, or takes the tick back. */
export function useTickMutation(firmId: string, revisionId: string) {
  return useFirmMutation(firmId, ({ cableId, ticked }: { cableId: string; ticked: boolean }) =>
    send(ticked ? 'PUT' : 'DELETE', firmPath(firmId, 'revisions', revisionId, 'ticks', cableId), ticked ? {} : undefined, done),
  );
}

function useRevisionMutation<Body>(firmId: string, revisionId: string, act: (body: Body) => Promise<Revision>) {
  const client = useQueryClient();
  return useMutation({
    mutationFn: act,
    onSuccess: (after) => {
      client.setQueryData(revisionKey(firmId, revisionId), after);
      return client.invalidateQueries({ queryKey: ['firm', firmId] });
    },
  });
}

/** What others see of the firm may change with any of these acts: everything shown is asked for again. */
function useFirmMutation<Body, Reply>(firmId: string, act: (body: Body) => Promise<Reply>) {
  const client = useQueryClient();
  return useMutation({ mutationFn: act, onSuccess: () => client.invalidateQueries({ queryKey: ['firm', firmId] }) });
}
