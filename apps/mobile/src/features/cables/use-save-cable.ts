import type { Cable } from '@strandnote/api/contract';
import { cableDetail } from '@strandnote/api/contract';
import { useRef } from 'react';
import { firmPath, send } from '../../lib/api-client.ts';
import { ApiProblem } from '../../lib/api-problem.ts';
import { useFirm } from '../../lib/session.tsx';
import { type CableValues, sectionBody, spanBody } from './cable-values.ts';
import { useCreateCableMutation, useCreateSectionMutation, useEditCableMutation } from './cables.api.ts';

/**
 * Saves a new section first where one is described, then the cable, then its design tension. Ids are made once, so that a save that
 * failed half-way can be tried again and makes nothing twice.
 *
 * @returns the id of the cable
 */
export function useSaveCable(structureId: string, stored: Cable | null, position: number) {
  const firm = useFirm();
  const ids = useRef({ cable: stored?.id ?? crypto.randomUUID(), section: crypto.randomUUID(), reference: crypto.randomUUID() });
  const createSection = useCreateSectionMutation(firm.firmId, structureId);
  const createCable = useCreateCableMutation(firm.firmId, structureId);
  const editCable = useEditCableMutation(firm.firmId, ids.current.cable);
  return async (values: CableValues): Promise<string> => {
    const { cable: cableId, section: newSectionId, reference: referenceId } = ids.current;
    const sectionId = values.section.sectionId ?? newSectionId;
    if (values.section.sectionId === null)
      await createSection.mutateAsync({ ...sectionBody(values.section), id: newSectionId }).catch(underField('section'));
    const body = {
      sectionId,
      reference: values.reference,
      ownerReference: values.ownerReference,
      paintedMark: values.paintedMark,
      kind: values.kind!,
      position,
      lowerAnchor: stored?.lowerAnchor ?? null,
      upperAnchor: stored?.upperAnchor ?? null,
      notes: stored?.notes ?? '',
      spans: values.spans.map(spanBody),
    };
    if (stored) await editCable.mutateAsync(body);
    else await createCable.mutateAsync({ ...body, id: cableId });
    if (!stored && values.designTension.si !== null) {
      const reference = {
        id: referenceId,
        kind: 'design',
        stage: values.designStage.trim() || 'In service, permanent load',
        place: 'mean-chord',
        value: values.designTension.si,
        relativeUncertainty: null,
        source: values.designSource.trim() || 'not stated',
        dated: null,
      };
      await send('POST', firmPath(firm.firmId, 'cables', cableId, 'references'), reference, cableDetail);
    }
    return cableId;
  };
}

/** A refusal of the section's fields names them as they hang in this form. */
function underField(prefix: string) {
  return (error: unknown): never => {
    if (!(error instanceof ApiProblem)) throw error;
    const errors = error.fieldErrors.map(({ field, message }) => ({ field: `${prefix}.${field}`, message }));
    throw new ApiProblem(error.kind, error.status, error.code, error.message, errors);
  };
}
