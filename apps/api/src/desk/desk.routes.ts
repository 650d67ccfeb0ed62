import { desk } from '@strandnote/api/contract';
import { withFirm } from '@strandnote/db';
import { firmRoute } from '../http/route.ts';
import { loadDesk } from './desk.queries.ts';

export const deskRoutes = [
  firmRoute({
    method: 'get',
    path: '/desk',
    access: 'desk.read',
    summary: 'What waits for this member',
    reply: desk,
    handle: ({ deps, who }) => withFirm(deps.db, who, (tx) => loadDesk(tx, who)),
  }),
];
