import { me } from '@strandnote/api/contract';
import { membershipsOf } from '../access/require-member.ts';
import { personRoute } from '../http/route.ts';

export const meRoutes = [
  personRoute({
    method: 'get',
    path: '/me',
    summary: 'The person signed in, with the firms that they belong to',
    reply: me,
    handle: async ({ deps, who }) => ({
      ...who,
      firms: (await membershipsOf(deps.db, who.userId)).map((row) => ({
        firmId: row.firm_id,
        firmName: row.firm_name,
        timeZone: row.time_zone,
        demonstration: row.demonstration,
        memberId: row.member_id,
        roles: row.roles,
        clientId: row.client_id,
        clientName: row.client_name,
        units: row.units,
        licenceNumber: row.licence_number,
        licenceJurisdiction: row.licence_jurisdiction,
      })),
    }),
  }),
];
