import { randomUUID } from 'node:crypto';
import type { Role } from '@strandnote/api/contract';
import { cableBody, campaignBody, frequencies, measurementBody, sectionBody } from '../api/surveyed-bridge.ts';
import { password } from '../support/test-server.ts';

/** Identifiers of things in one firm, by the name of the parameter that takes them. */
export type Ids = Record<
  | 'structureId'
  | 'sectionId'
  | 'cableId'
  | 'spanId'
  | 'referenceId'
  | 'campaignId'
  | 'measurementId'
  | 'reportId'
  | 'revisionId'
  | 'commentId'
  | 'clientId'
  | 'memberId'
  | 'invitationId',
  string
>;

export interface Expected {
  /** Who may come: anyone, anyone who is signed in, or these roles in their own firm. */
  who: 'public' | 'signed-in' | readonly Role[];
  /** A body that is valid in the firm of these identifiers, as a person of this role would send it. */
  body?: (ids: Ids, role?: Role) => object;
}

const everyone: Role[] = ['admin', 'engineer', 'checker', 'client'];
const staff: Role[] = ['admin', 'engineer', 'checker'];
const administrators: Role[] = ['admin'];
const registrars: Role[] = ['admin', 'engineer'];
const engineers: Role[] = ['engineer'];
const checkers: Role[] = ['checker'];

const structureBody = () => ({
  id: randomUUID(),
  name: 'Second bridge',
  reference: '',
  kind: 'arch',
  ownerName: '',
  clientId: null,
  place: '',
  timeZone: 'UTC',
  elevation: null,
  notes: '',
});
const invitationBody = () => ({ id: randomUUID(), name: 'Nia Sol', email: 'nia@strandnote.example', roles: ['engineer'], clientId: null });
const clientBody = () => ({ id: randomUUID(), name: 'Harbour Board', contactName: '', contactEmail: '', address: '' });
const referenceBody = () => ({
  id: randomUUID(),
  kind: 'lift-off',
  stage: 'In service',
  place: 'mean-chord',
  value: 2e6,
  relativeUncertainty: null,
  source: 'Jack',
  dated: null,
});
const textsBody = () => ({ texts: { scope: 'x', conditions: 'x', deviations: 'x', conclusion: 'x' }, deputyUserId: null, textVersion: 99 });
const approvalBody = () => ({
  password,
  name: 'Nia Sol',
  licenceNumber: '1',
  jurisdiction: 'x',
  contentSha256: 'a'.repeat(64),
  meaningUnderstood: true,
});
const reason = () => ({ reason: 'A reason.' });
const nothing = () => ({});

/**
 * Who may reach each route, written down a second time and by hand: a route that is missing here, or that lets in another
 * role than this table, fails the matrix. F stands for /firms/:firmId.
 */
export const expectedAccess: Record<string, Expected> = {
  'get /health': { who: 'public' },
  'get /openapi.json': { who: 'public' },
  'get /docs': { who: 'public' },
  'get /demonstration': { who: 'public' },
  'get /demonstration/mail': { who: 'public' },
  'get /verification/:code': { who: 'public' },
  'get /invitations/:token': { who: 'public' },
  'post /invitations/:token/acceptance': { who: 'public', body: () => ({ password: 'twelve letters at least' }) },
  'get /me': { who: 'signed-in' },

  'get F': { who: everyone },
  'patch F': { who: administrators, body: () => ({ timeZone: 'UTC' }) },
  'get F/members': { who: staff },
  'patch F/members/me': { who: everyone, body: () => ({ units: 'si' }) },
  'patch F/members/:memberId': { who: administrators, body: () => ({ roles: ['engineer'], clientId: null, active: true }) },
  'get F/invitations': { who: administrators },
  'post F/invitations': { who: administrators, body: invitationBody },
  'delete F/invitations/:invitationId': { who: administrators },
  'get F/clients': { who: staff },
  'post F/clients': { who: registrars, body: clientBody },
  'patch F/clients/:clientId': { who: registrars, body: () => ({ address: 'Quay' }) },
  'get F/audit': { who: staff },
  'get F/audit/verification': { who: administrators },
  'get F/desk': { who: staff },

  'get F/structures': { who: staff },
  'post F/structures': { who: registrars, body: structureBody },
  'get F/structures/:structureId': { who: staff },
  'patch F/structures/:structureId': { who: registrars, body: () => ({ notes: 'x' }) },
  'get F/structures/:structureId/sections': { who: staff },
  'post F/structures/:structureId/sections': { who: registrars, body: sectionBody },
  'patch F/sections/:sectionId': { who: registrars, body: () => ({ name: '31 strands, waxed' }) },
  'get F/structures/:structureId/cables': { who: staff },
  'post F/structures/:structureId/cables': { who: registrars, body: ({ sectionId }) => cableBody(sectionId, 9) },
  'get F/cables/:cableId': { who: staff },
  'patch F/cables/:cableId': { who: registrars, body: () => ({ notes: 'x' }) },
  'post F/cables/:cableId/references': { who: registrars, body: referenceBody },
  'post F/references/:referenceId/retirement': { who: registrars, body: nothing },

  'get F/campaigns': { who: staff },
  'get F/structures/:structureId/campaigns': { who: staff },
  'post F/structures/:structureId/campaigns': { who: engineers, body: () => campaignBody() },
  'get F/campaigns/:campaignId': { who: staff },
  'patch F/campaigns/:campaignId': { who: engineers, body: () => ({ weather: 'Fog' }) },
  'put F/campaigns/:campaignId/cables/:cableId': { who: engineers, body: () => ({ notMeasuredReason: null }) },
  'put F/campaigns/:campaignId/measurements/:measurementId': {
    who: engineers,
    body: ({ spanId }) => measurementBody(spanId, frequencies, { version: 1 }),
  },
  'post F/campaigns/:campaignId/estimates': { who: engineers, body: () => ({ measurementIds: null }) },

  'get F/reports': { who: staff },
  'post F/campaigns/:campaignId/reports': {
    who: engineers,
    body: ({ clientId }) => ({ id: randomUUID(), revisionId: randomUUID(), title: 'Another', clientId, cableIds: null }),
  },
  'get F/reports/:reportId': { who: staff },
  'post F/reports/:reportId/revisions': { who: engineers, body: () => ({ id: randomUUID() }) },
  'get F/revisions/:revisionId': { who: staff },
  'patch F/revisions/:revisionId': { who: engineers, body: textsBody },
  'get F/revisions/:revisionId/preview.pdf': { who: staff },
  'post F/revisions/:revisionId/submissions': {
    who: engineers,
    body: () => ({ submissionId: randomUUID(), name: 'Nia Sol', contentSha256: 'a'.repeat(64) }),
  },
  'post F/revisions/:revisionId/recall': { who: engineers, body: nothing },
  'put F/revisions/:revisionId/ticks/:cableId': { who: checkers, body: nothing },
  'delete F/revisions/:revisionId/ticks/:cableId': { who: checkers },
  'post F/revisions/:revisionId/comments': {
    who: checkers,
    body: () => ({ id: randomUUID(), cableId: null, field: '', text: 'A remark.' }),
  },
  'patch F/revisions/:revisionId/comments/:commentId': {
    who: ['engineer', 'checker'],
    body: (_ids, role) => (role === 'engineer' ? { answer: 'An answer.' } : { state: 'closed' }),
  },
  'post F/revisions/:revisionId/return': { who: checkers, body: reason },
  'post F/revisions/:revisionId/approval': { who: checkers, body: approvalBody },
  'post F/revisions/:revisionId/issue': { who: engineers, body: () => ({ password }) },
  'post F/revisions/:revisionId/withdrawal': { who: engineers, body: reason },

  'get F/issued': { who: everyone },
  'get F/issued/:revisionId': { who: everyone },
  'get F/issued/:revisionId/report.pdf': { who: everyone },
  'get F/issued/:revisionId/results.csv': { who: everyone },
  'get F/issued/:revisionId/content.json': { who: everyone },
};
