import {
  type AuditEvent,
  auditList,
  auditVerification,
  done,
  type EditFirm,
  type EditMember,
  firm,
  type Invite,
  invitationList,
  memberList,
} from '@strandnote/api/contract';
import { useInfiniteQuery, useMutation, useQuery } from '@tanstack/react-query';
import { firmPath, get, send } from '../../lib/api-client.ts';
import { meKey, queryClient } from '../../lib/query-client.ts';

/** Events in one reply of the audit trail; a shorter reply is the last one. */
const auditPageLength = 200;

/** Name, time zone and roles also stand in what is known of the person signed in. */
async function refreshFirm(firmId: string): Promise<void> {
  await Promise.all([queryClient.invalidateQueries({ queryKey: ['firm', firmId] }), queryClient.invalidateQueries({ queryKey: meKey })]);
}

export function useFirmQuery(firmId: string) {
  return useQuery({
    queryKey: ['firm', firmId, 'firm'],
    queryFn: ({ signal }) => get(firmPath(firmId), firm, signal),
  });
}

export function useEditFirmMutation(firmId: string) {
  return useMutation({
    mutationFn: (body: EditFirm) => send('PATCH', firmPath(firmId), body, firm),
    onSuccess: () => refreshFirm(firmId),
  });
}

export function useMembersQuery(firmId: string) {
  return useQuery({
    queryKey: ['firm', firmId, 'members'],
    queryFn: ({ signal }) => get(firmPath(firmId, 'members'), memberList, signal),
  });
}

export function useEditMemberMutation(firmId: string) {
  return useMutation({
    mutationFn: ({ memberId, ...body }: EditMember & { memberId: string }) =>
      send('PATCH', firmPath(firmId, 'members', memberId), body, memberList),
    onSuccess: () => refreshFirm(firmId),
  });
}

export function useInvitationsQuery(firmId: string) {
  return useQuery({
    queryKey: ['firm', firmId, 'invitations'],
    queryFn: ({ signal }) => get(firmPath(firmId, 'invitations'), invitationList, signal),
  });
}

export function useInviteMutation(firmId: string) {
  return useMutation({
    mutationFn: (body: Invite) => send('POST', firmPath(firmId, 'invitations'), body, invitationList),
    onSuccess: () => refreshFirm(firmId),
  });
}

export function useRevokeInvitationMutation(firmId: string) {
  return useMutation({
    mutationFn: (invitationId: string) => send('DELETE', firmPath(firmId, 'invitations', invitationId), undefined, done),
    onSuccess: () => refreshFirm(firmId),
  });
}

/** The trail backwards from its newest event; `fetchNextPage` reads what was before. */
export function useAuditQuery(firmId: string) {
  return useInfiniteQuery({
    queryKey: ['firm', firmId, 'audit'],
    queryFn: ({ pageParam, signal }) =>
      get(`${firmPath(firmId, 'audit')}${pageParam === null ? '' : `?before=${pageParam}`}`, auditList, signal),
    initialPageParam: null as number | null,
    getNextPageParam: ({ items }: { items: AuditEvent[] }) =>
      items.length < auditPageLength ? undefined : (items.at(-1)?.sequence ?? undefined),
  });
}

/** Has the server recompute the whole chain; asked for, never kept. */
export function useVerifyAuditMutation(firmId: string) {
  return useMutation({ mutationFn: () => get(firmPath(firmId, 'audit', 'verification'), auditVerification) });
}
