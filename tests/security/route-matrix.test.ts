import { randomUUID } from 'node:crypto';
import type { Role } from '@strandnote/api/contract';
import { afterAll, beforeAll, describe, expect, test } from 'vitest';
import { routes } from '../../apps/api/src/routes.ts';
import { approveDraft, draftReport, issue, submit } from '../api/reports/report-acts.ts';
import { ok, surveyBridge } from '../api/surveyed-bridge.ts';
import { type Reply, type SignedIn, startTestServer, type TestServer } from '../support/test-server.ts';
import { expectedAccess, type Ids } from './expected-access.ts';

const roles: Role[] = ['admin', 'engineer', 'checker', 'client'];
type Method = 'get' | 'post' | 'put' | 'patch' | 'delete';
interface Firm {
  id: string;
  people: Record<Role, SignedIn>;
  ids: Ids;
}

let server: TestServer;
let own: Firm;
let other: Firm;
/** Holds every role of staff in the own firm: nothing but the firm stands between them and the other one. */
let allRoles: SignedIn;

beforeAll(async () => {
  server = await startTestServer();
  own = await makeFirm();
  other = await makeFirm();
  allRoles = await server.join(own.id, { name: 'Nia Sol', roles: ['admin', 'engineer', 'checker'] });
});
afterAll(() => server.stop());

/** A firm with a person of each role and one of everything that a route can name; its report is issued to its client. */
async function makeFirm(): Promise<Firm> {
  const id = await server.createFirm();
  const clientId = await server.createClient(id);
  const people = {} as Record<Role, SignedIn>;
  for (const role of roles) {
    people[role] = await server.join(id, { name: `The ${role}`, roles: [role], ...(role === 'client' ? { clientId } : {}) });
  }
  const { admin, engineer, checker } = people;
  const bridge = await surveyBridge(engineer);
  const { reportId, revisionId } = await draftReport(engineer, bridge.campaignId, clientId);
  await ok(submit(engineer, revisionId));
  const commentId = randomUUID();
  await ok(checker.post(`/revisions/${revisionId}/comments`, { id: commentId, cableId: null, field: '', text: 'A remark.' }));
  await ok(checker.patch(`/revisions/${revisionId}/comments/${commentId}`, { state: 'closed' }));
  await ok(engineer.post(`/revisions/${revisionId}/recall`, {}));
  await approveDraft({ engineer, checker, runJobs: server.runJobs }, revisionId);
  await ok(issue(engineer, revisionId));
  const invitationId = randomUUID();
  const invited = { id: invitationId, name: 'Ole Dahl', email: `${invitationId}@strandnote.example`, roles: ['checker'], clientId: null };
  await ok(admin.post('/invitations', invited));
  const [cable] = bridge.cables;
  const detail = (await ok(engineer.get(`/cables/${cable!.id}`))).body;
  const member = (await ok(admin.get('/members'))).body.items.find(({ userId }: { userId: string }) => userId === engineer.userId);
  const { structureId, sectionId, campaignId } = bridge;
  const ids = { structureId, sectionId, campaignId, reportId, revisionId, commentId, clientId, invitationId };
  return {
    id,
    people,
    ids: {
      ...ids,
      cableId: cable!.id,
      spanId: cable!.spanId,
      measurementId: cable!.measurementId,
      referenceId: detail.references[0].id,
      memberId: member.id,
    },
  };
}

function keyOf({ method, path }: { method: string; path: string }): string {
  return `${method} ${path.replace(/^\/firms\/:firmId/, 'F')}`;
}

/** The path of a route below the firm, or below /api/v1 for those of no firm, with these identifiers. */
function pathOf(path: string, ids: Ids): string {
  return path
    .replace(/^\/firms\/:firmId/, '')
    .replace(':code', '0000-0000-0000-0000')
    .replace(':token', 'no-such-token')
    .replace(/:(\w+)/g, (_, name: string) => ids[name as keyof Ids]);
}

function refusedByRole({ status, body }: Reply): boolean {
  return status === 403 && body.code === 'forbidden' && /^This takes the role/.test(body.detail);
}

test('the table of expected access names every route, and no route that is gone', () => {
  expect(Object.keys(expectedAccess).sort()).toEqual(routes.map(keyOf).sort());
});

describe.each(routes.map((route) => [keyOf(route), route] as const))('%s', (key, route) => {
  const method = route.method as Method;
  const expected = expectedAccess[key]!;
  const bodyIn = (firm: Firm, role?: Role) => expected.body?.(firm.ids, role);
  const inFirm = route.path.startsWith('/firms/:firmId');

  test('anonymous', async () => {
    const path = inFirm ? `/firms/${own.id}${pathOf(route.path, own.ids)}` : pathOf(route.path, own.ids);
    const reply = await server.anonymous(method, path, bodyIn(own));
    if (expected.who === 'public') expect([401, 403]).not.toContain(reply.status);
    else expect(reply.body).toMatchObject({ status: 401, code: 'signed-out' });
  });
  if (!inFirm) return;

  test.each(roles)('%s of the own firm', async (role) => {
    const reply = await own.people[role][method](pathOf(route.path, own.ids), bodyIn(own, role));
    if (!expected.who.includes(role as never)) {
      expect(refusedByRole(reply)).toBe(true);
      return;
    }
    expect(refusedByRole(reply)).toBe(false);
    if (method === 'get') expect(reply.status).toBe(200);
    else expect([200, 201, 400, 403, 409]).toContain(reply.status);
  });

  test.each(roles)('%s of another firm', async (role) => {
    const reply = await other.people[role].elsewhere(own.id)[method](pathOf(route.path, own.ids), bodyIn(own));
    expect(reply.body).toMatchObject({ status: 404, code: 'not-found' });
  });

  const named = [...route.path.matchAll(/:(\w+Id)\b/g)].map(([, name]) => name).filter((name) => name !== 'firmId');
  if (named.length === 0) return;
  test('what belongs to another firm, named in the own one, is not found', async () => {
    const reply = await allRoles[method](pathOf(route.path, other.ids), bodyIn(other));
    expect(reply.body).toMatchObject({ status: 404, code: 'not-found' });
  });
});
