import {
  type CreateStructure,
  cableList,
  campaignList,
  createStructure,
  type EditStructure,
  editStructure,
  structure,
  structureList,
} from '@strandnote/api/contract';
import { useMutation, useQuery, useQueryClient } from '@tanstack/react-query';
import { firmPath, get, send } from '../../lib/api-client.ts';

export function useStructuresQuery(firmId: string) {
  return useQuery({
    queryKey: ['firm', firmId, 'structures'],
    queryFn: ({ signal }) => get(firmPath(firmId, 'structures'), structureList, signal),
  });
}

export function useStructureQuery(firmId: string, structureId: string) {
  return useQuery({
    queryKey: ['firm', firmId, 'structures', structureId],
    queryFn: ({ signal }) => get(firmPath(firmId, 'structures', structureId), structure, signal),
  });
}

export function useCablesQuery(firmId: string, structureId: string) {
  return useQuery({
    queryKey: ['firm', firmId, 'structures', structureId, 'cables'],
    queryFn: ({ signal }) => get(firmPath(firmId, 'structures', structureId, 'cables'), cableList, signal),
  });
}

export function useCampaignsOfStructureQuery(firmId: string, structureId: string) {
  return useQuery({
    queryKey: ['firm', firmId, 'structures', structureId, 'campaigns'],
    queryFn: ({ signal }) => get(firmPath(firmId, 'structures', structureId, 'campaigns'), campaignList, signal),
  });
}

export function useCreateStructureMutation(firmId: string) {
  return useStructureMutation(firmId, (body: CreateStructure) =>
    send('POST', firmPath(firmId, 'structures'), createStructure.parse(body), structure),
  );
}

export function useEditStructureMutation(firmId: string, structureId: string) {
  return useStructureMutation(firmId, (body: EditStructure) =>
    send('PATCH', firmPath(firmId, 'structures', structureId), editStructure.parse(body), structure),
  );
}

function useStructureMutation<Body, Reply>(firmId: string, act: (body: Body) => Promise<Reply>) {
  const client = useQueryClient();
  return useMutation({ mutationFn: act, onSuccess: () => client.invalidateQueries({ queryKey: ['firm', firmId] }) });
}
