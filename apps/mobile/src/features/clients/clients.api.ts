import { type CreateClient, client, clientList, type EditClient } from '@strandnote/api/contract';
import { useMutation, useQuery, useQueryClient } from '@tanstack/react-query';
import { firmPath, get, send } from '../../lib/api-client.ts';

export function useClientsQuery(firmId: string) {
  return useQuery({
    queryKey: ['firm', firmId, 'clients'],
    queryFn: ({ signal }) => get(firmPath(firmId, 'clients'), clientList, signal),
  });
}

export function useCreateClientMutation(firmId: string) {
  const queries = useQueryClient();
  return useMutation({
    mutationFn: (body: CreateClient) => send('POST', firmPath(firmId, 'clients'), body, client),
    onSuccess: () => queries.invalidateQueries({ queryKey: ['firm', firmId] }),
  });
}

export function useEditClientMutation(firmId: string) {
  const queries = useQueryClient();
  return useMutation({
    mutationFn: ({ clientId, ...body }: EditClient & { clientId: string }) =>
      send('PATCH', firmPath(firmId, 'clients', clientId), body, client),
    onSuccess: () => queries.invalidateQueries({ queryKey: ['firm', firmId] }),
  });
}
