import { editFirm as editFirmBody, firm } from '@strandnote/api/contract';
import { type Actor, schema, withFirm } from '@strandnote/db';
import type { AppDeps } from '../deps.ts';
import { firmRoute } from '../http/route.ts';
import { editFirm } from './edit-firm.ts';
import { toFirm } from './to-firm.ts';

async function loadFirm(deps: AppDeps, actor: Actor) {
  const [row] = await withFirm(deps.db, actor, (tx) => tx.select().from(schema.firms));
  return toFirm(row!);
}

export const firmRoutes = [
  firmRoute({
    method: 'get',
    path: '',
    access: 'firm.read',
    summary: 'The firm: name, letterhead, time zone',
    reply: firm,
    handle: ({ deps, who }) => loadFirm(deps, who),
  }),
  firmRoute({
    method: 'patch',
    path: '',
    access: 'firm.edit',
    summary: 'Changes name, letterhead, time zone or the prefix of report numbers',
    body: editFirmBody,
    reply: firm,
    handle: async ({ deps, who, body }) => {
      await editFirm(deps, who, body);
      return loadFirm(deps, who);
    },
  }),
];
