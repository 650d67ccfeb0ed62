import { createStructure as createBody, editStructure as editBody, id, structure, structureList } from '@strandnote/api/contract';
import { withFirm } from '@strandnote/db';
import { z } from 'zod';
import { firmRoute } from '../http/route.ts';
import { listStructures, loadStructure } from './structures.queries.ts';
import { createStructure, editStructure } from './write-structure.ts';

const params = z.object({ structureId: id });

export const structureRoutes = [
  firmRoute({
    method: 'get',
    path: '/structures',
    access: 'structure.read',
    summary: 'Structures of the firm',
    reply: structureList,
    handle: ({ deps, who }) => withFirm(deps.db, who, async (tx) => ({ items: await listStructures(tx) })),
  }),
  firmRoute({
    method: 'post',
    path: '/structures',
    access: 'structure.edit',
    summary: 'Adds a structure',
    body: createBody,
    reply: structure,
    status: 201,
    handle: async ({ deps, who, body }) => {
      await createStructure(deps, who, body);
      return withFirm(deps.db, who, (tx) => loadStructure(tx, body.id));
    },
  }),
  firmRoute({
    method: 'get',
    path: '/structures/:structureId',
    access: 'structure.read',
    summary: 'One structure',
    params,
    reply: structure,
    handle: ({ deps, who, params: { structureId } }) => withFirm(deps.db, who, (tx) => loadStructure(tx, structureId)),
  }),
  firmRoute({
    method: 'patch',
    path: '/structures/:structureId',
    access: 'structure.edit',
    summary: 'Changes a structure',
    params,
    body: editBody,
    reply: structure,
    handle: async ({ deps, who, params: { structureId }, body }) => {
      await editStructure(deps, who, structureId, body);
      return withFirm(deps.db, who, (tx) => loadStructure(tx, structureId));
    },
  }),
];
