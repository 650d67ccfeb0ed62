import {
  cableDetail,
  cableList,
  createCable as createCableBody,
  createReference,
  createSection as createSectionBody,
  editCable as editCableBody,
  editSection as editSectionBody,
  id,
  section,
  sectionList,
} from '@strandnote/api/contract';
import { withFirm } from '@strandnote/db';
import { z } from 'zod';
import { firmRoute } from '../http/route.ts';
import { loadStructure } from '../structures/structures.queries.ts';
import { listCablesOfStructure, listSections, loadCable, loadSection } from './cables.queries.ts';
import { createCable, editCable } from './write-cable.ts';
import { addReference, retireReference } from './write-reference.ts';
import { createSection, editSection } from './write-section.ts';

const ofStructure = z.object({ structureId: id });
const ofCable = z.object({ cableId: id });

export const cableRoutes = [
  firmRoute({
    method: 'get',
    path: '/structures/:structureId/sections',
    access: 'structure.read',
    summary: 'Cable sections of a structure',
    params: ofStructure,
    reply: sectionList,
    handle: ({ deps, who, params: { structureId } }) =>
      withFirm(deps.db, who, async (tx) => {
        await loadStructure(tx, structureId);
        return { items: await listSections(tx, structureId) };
      }),
  }),
  firmRoute({
    method: 'post',
    path: '/structures/:structureId/sections',
    access: 'structure.edit',
    summary: 'Adds a cable section',
    params: ofStructure,
    body: createSectionBody,
    reply: section,
    status: 201,
    handle: async ({ deps, who, params: { structureId }, body }) => {
      await createSection(deps, who, structureId, body);
      return withFirm(deps.db, who, (tx) => loadSection(tx, body.id));
    },
  }),
  firmRoute({
    method: 'patch',
    path: '/sections/:sectionId',
    access: 'structure.edit',
    summary: 'Changes a cable section',
    params: z.object({ sectionId: id }),
    body: editSectionBody,
    reply: section,
    handle: async ({ deps, who, params: { sectionId }, body }) => {
      await editSection(deps, who, sectionId, body);
      return withFirm(deps.db, who, (tx) => loadSection(tx, sectionId));
    },
  }),
  firmRoute({
    method: 'get',
    path: '/structures/:structureId/cables',
    access: 'structure.read',
    summary: 'Cables of a structure with spans, sections and reference tensions',
    params: ofStructure,
    reply: cableList,
    handle: ({ deps, who, params: { structureId } }) =>
      withFirm(deps.db, who, async (tx) => {
        await loadStructure(tx, structureId);
        return { items: await listCablesOfStructure(tx, structureId) };
      }),
  }),
  firmRoute({
    method: 'post',
    path: '/structures/:structureId/cables',
    access: 'structure.edit',
    summary: 'Adds a cable with its spans',
    params: ofStructure,
    body: createCableBody,
    reply: cableDetail,
    status: 201,
    handle: async ({ deps, who, params: { structureId }, body }) => {
      await createCable(deps, who, structureId, body);
      return withFirm(deps.db, who, (tx) => loadCable(tx, body.id));
    },
  }),
  firmRoute({
    method: 'get',
    path: '/cables/:cableId',
    access: 'structure.read',
    summary: 'A cable with its tension history',
    params: ofCable,
    reply: cableDetail,
    handle: ({ deps, who, params: { cableId } }) => withFirm(deps.db, who, (tx) => loadCable(tx, cableId)),
  }),
  firmRoute({
    method: 'patch',
    path: '/cables/:cableId',
    access: 'structure.edit',
    summary: 'Changes a cable or its spans',
    params: ofCable,
    body: editCableBody,
    reply: cableDetail,
    handle: async ({ deps, who, params: { cableId }, body }) => {
      await editCable(deps, who, cableId, body);
      return withFirm(deps.db, who, (tx) => loadCable(tx, cableId));
    },
  }),
  firmRoute({
    method: 'post',
    path: '/cables/:cableId/references',
    access: 'structure.edit',
    summary: 'Adds a reference tension',
    params: ofCable,
    body: createReference,
    reply: cableDetail,
    status: 201,
    handle: async ({ deps, who, params: { cableId }, body }) => {
      await addReference(deps, who, cableId, body);
      return withFirm(deps.db, who, (tx) => loadCable(tx, cableId));
    },
  }),
  firmRoute({
    method: 'post',
    path: '/references/:referenceId/retirement',
    access: 'structure.edit',
    summary: 'Retires a reference tension',
    params: z.object({ referenceId: id }),
    reply: cableDetail,
    handle: async ({ deps, who, params: { referenceId } }) => {
      const cableId = await retireReference(deps, who, referenceId);
      return withFirm(deps.db, who, (tx) => loadCable(tx, cableId));
    },
  }),
];
