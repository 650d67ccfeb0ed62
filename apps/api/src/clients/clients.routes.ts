import { client, clientList, createClient as createClientBody, editClient as editClientBody, id } from '@strandnote/api/contract';
import { type Actor, schema, withFirm } from '@strandnote/db';
import { asc, eq } from 'drizzle-orm';
import { z } from 'zod';
import type { AppDeps } from '../deps.ts';
import { firmRoute } from '../http/route.ts';
import { createClient, editClient } from './write-client.ts';

const { clients } = schema;

function toClient({ id, name, contactName, contactEmail, address }: typeof clients.$inferSelect) {
  return { id, name, contactName, contactEmail, address };
}

async function loadClient(deps: AppDeps, actor: Actor, clientId: string) {
  const [row] = await withFirm(deps.db, actor, (tx) => tx.select().from(clients).where(eq(clients.id, clientId)));
  return toClient(row!);
}

export const clientRoutes = [
  firmRoute({
    method: 'get',
    path: '/clients',
    access: 'client.read',
    summary: 'Clients of the firm',
    reply: clientList,
    handle: ({ deps, who }) =>
      withFirm(deps.db, who, async (tx) => ({ items: (await tx.select().from(clients).orderBy(asc(clients.name))).map(toClient) })),
  }),
  firmRoute({
    method: 'post',
    path: '/clients',
    access: 'client.edit',
    summary: 'Adds a client',
    body: createClientBody,
    reply: client,
    status: 201,
    handle: async ({ deps, who, body }) => {
      await createClient(deps, who, body);
      return loadClient(deps, who, body.id);
    },
  }),
  firmRoute({
    method: 'patch',
    path: '/clients/:clientId',
    access: 'client.edit',
    summary: 'Changes a client',
    params: z.object({ clientId: id }),
    body: editClientBody,
    reply: client,
    handle: async ({ deps, who, params, body }) => {
      await editClient(deps, who, params.clientId, body);
      return loadClient(deps, who, params.clientId);
    },
  }),
];
