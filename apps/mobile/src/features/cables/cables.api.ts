import {
  type CreateCable,
  type CreateReference,
  type CreateSection,
  cableDetail,
  createCable,
  createReference,
  createSection,
  type EditCable,
  type EditSection,
  editCable,
  editSection,
  section,
  sectionList,
} from '@strandnote/api/contract';
import { useMutation, useQuery, useQueryClient } from '@tanstack/react-query';
import { firmPath, get, send } from '../../lib/api-client.ts';

export function useCableQuery(firmId: string, cableId: string | null) {
  return useQuery({
    queryKey: ['firm', firmId, 'cable', cableId],
    queryFn: ({ signal }) => get(firmPath(firmId, 'cables', cableId ?? ''), cableDetail, signal),
    enabled: cableId !== null,
  });
}

export function useSectionsQuery(firmId: string, structureId: string) {
  return useQuery({
    queryKey: ['firm', firmId, 'structures', structureId, 'sections'],
    queryFn: ({ signal }) => get(firmPath(firmId, 'structures', structureId, 'sections'), sectionList, signal),
  });
}

export function useCreateSectionMutation(firmId: string, structureId: string) {
  return useCableMutation(firmId, (body: CreateSection) =>
    send('POST', firmPath(firmId, 'structures', structureId, 'sections'), createSection.parse(body), section),
  );
}

export function useEditSectionMutation(firmId: string) {
  return useCableMutation(firmId, ({ sectionId, ...body }: EditSection & { sectionId: string }) =>
    send('PATCH', firmPath(firmId, 'sections', sectionId), editSection.parse(body), section),
  );
}

export function useCreateCableMutation(firmId: string, structureId: string) {
  return useCableMutation(firmId, (body: CreateCable) =>
    send('POST', firmPath(firmId, 'structures', structureId, 'cables'), createCable.parse(body), cableDetail),
  );
}

export function useEditCableMutation(firmId: string, cableId: string) {
  return useCableMutation(firmId, (body: EditCable) =>
    send('PATCH', firmPath(firmId, 'cables', cableId), editCable.parse(body), cableDetail),
  );
}

export function useAddReferenceMutation(firmId: string, cableId: string) {
  return useCableMutation(firmId, (body: CreateReference) =>
    send('POST', firmPath(firmId, 'cables', cableId, 'references'), createReference.parse(body), cableDetail),
  );
}

export function useRetireReferenceMutation(firmId: string) {
  return useCableMutation(firmId, (referenceId: string) =>
    send('POST', firmPath(firmId, 'references', referenceId, 'retirement'), {}, cableDetail),
  );
}

function useCableMutation<Body, Reply>(firmId: string, act: (body: Body) => Promise<Reply>) {
  const client = useQueryClient();
  return useMutation({ mutationFn: act, onSuccess: () => client.invalidateQueries({ queryKey: ['firm', firmId] }) });
}
