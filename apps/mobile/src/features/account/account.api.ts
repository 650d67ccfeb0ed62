import {
  type AcceptInvitation,
  demonstration,
  done,
  type EditMe,
  invitationByToken,
  type Me,
  me as meSchema,
} from '@strandnote/api/contract';
import { useMutation, useQuery } from '@tanstack/react-query';
import { z } from 'zod';
import { firmPath, get, send } from '../../lib/api-client.ts';
import { listSessions, requestPasswordReset, resetPassword, revokeSession, revokeSessions, signIn, signOut } from '../../lib/identity.ts';
import { forgetEverything, meKey, queryClient } from '../../lib/query-client.ts';

const sessionsKey = ['sessions'] as const;
const lastPersonKey = 'strandnote.person';

export function useSignInMutation() {
  return useMutation({
    mutationFn: async ({ email, password }: { email: string; password: string }): Promise<Me> => {
      await signIn(email.trim(), password);
      return enter();
    },
  });
}

/** Reads who has come in. What another person left in the cache of this device is forgotten first. */
async function enter(): Promise<Me> {
  const me = await get('/me', meSchema);
  if (localStorage.getItem(lastPersonKey) !== me.userId) await forgetEverything();
  localStorage.setItem(lastPersonKey, me.userId);
  queryClient.setQueryData(meKey, me);
  return me;
}

export function useSignOutMutation() {
  return useMutation({ mutationFn: signOut, onSuccess: leave });
}

export function useSignOutEverywhereMutation() {
  return useMutation({ mutationFn: revokeSessions, onSuccess: leave });
}

async function leave(): Promise<void> {
  await forgetEverything();
  localStorage.removeItem(lastPersonKey);
  queryClient.setQueryData(meKey, null);
}

export function useForgotPasswordMutation() {
  return useMutation({ mutationFn: ({ email }: { email: string }) => requestPasswordReset(email.trim()) });
}

export function useResetPasswordMutation() {
  return useMutation({ mutationFn: ({ token, password }: { token: string; password: string }) => resetPassword(token, password) });
}

export function useInvitationQuery(token: string) {
  return useQuery({
    queryKey: ['invitation', token],
    queryFn: ({ signal }) => get(`/invitations/${encodeURIComponent(token)}`, invitationByToken, signal),
    retry: false,
  });
}

export function useAcceptInvitationMutation(token: string) {
  return useMutation({
    mutationFn: async ({ email, ...body }: AcceptInvitation & { email: string }): Promise<Me> => {
      await send('POST', `/invitations/${encodeURIComponent(token)}/acceptance`, body, done);
      await signIn(email, body.password);
      return enter();
    },
  });
}

export function useSessionsQuery() {
  return useQuery({ queryKey: sessionsKey, queryFn: listSessions });
}

export function useRevokeSessionMutation() {
  return useMutation({ mutationFn: revokeSession, onSuccess: () => queryClient.invalidateQueries({ queryKey: sessionsKey }) });
}

export function useEditMeMutation(firmId: string) {
  return useMutation({
    mutationFn: (body: EditMe) => send('PATCH', firmPath(firmId, 'members', 'me'), body, z.unknown()),
    onSuccess: () => queryClient.invalidateQueries({ queryKey: meKey }),
  });
}

/** Whether this installation is a demonstration. Not knowing is no reason to show a problem. */
export function useDemonstrationQuery() {
  return useQuery({
    queryKey: ['demonstration'],
    queryFn: ({ signal }) => get('/demonstration', demonstration, signal),
    staleTime: Infinity,
  });
}
