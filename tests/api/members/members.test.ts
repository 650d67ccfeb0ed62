import { randomUUID } from 'node:crypto';
import { afterAll, beforeAll, expect, test } from 'vitest';
import { type SignedIn, startTestServer, type TestServer } from '../../support/test-server.ts';
import { ok } from '../surveyed-bridge.ts';

let server: TestServer;
let firmId: string;
let clientId: string;
let admin: SignedIn;
let engineer: SignedIn;
let client: SignedIn;

beforeAll(async () => {
  server = await startTestServer();
  firmId = await server.createFirm();
  clientId = await server.createClient(firmId);
  admin = await server.join(firmId, { name: 'Petra Lund', roles: ['admin'] });
  engineer = await server.join(firmId, { name: 'Ines Falk', roles: ['engineer'] });
  client = await server.join(firmId, { name: 'Tove Lind', roles: ['client'], clientId });
});
afterAll(() => server.stop());

async function memberIdOf({ userId }: SignedIn): Promise<string> {
  const { items } = (await ok(admin.get('/members'))).body;
  return items.find((member: { userId: string }) => member.userId === userId).id;
}

test('a change of roles counts at once and is written down with what was before', async () => {
  const id = await memberIdOf(engineer);
  await ok(admin.patch(`/members/${id}`, { roles: ['checker'], clientId: null, active: true }));
  expect((await engineer.post('/structures', { id: randomUUID() })).body.code).toBe('forbidden');
  const { rows } = await server.superuser.query(
    "select details from audit_events where act = 'member.changed' and subject_id = $1 order by sequence desc limit 1",
    [id],
  );
  expect(rows[0].details).toEqual({ from: { roles: ['engineer'] }, to: { roles: ['checker'] } });
  await ok(admin.patch(`/members/${id}`, { roles: ['engineer'], clientId: null, active: true }));
});

test('somebody who has left is out at once', async () => {
  const id = await memberIdOf(engineer);
  await ok(admin.patch(`/members/${id}`, { roles: ['engineer'], clientId: null, active: false }));
  expect((await engineer.get('/structures')).status).toBe(404);
  await ok(admin.patch(`/members/${id}`, { roles: ['engineer'], clientId: null, active: true }));
  expect((await engineer.get('/structures')).status).toBe(200);
});

test('a firm always keeps an administrator, also when two remove each other at once', async () => {
  const alone = await admin.patch(`/members/${await memberIdOf(admin)}`, { roles: ['engineer'], clientId: null, active: true });
  expect(alone.body.errors[0].field).toBe('roles');
  const second = await server.join(firmId, { name: 'Ada Holm', roles: ['admin'] });
  const [one, two] = [await memberIdOf(admin), await memberIdOf(second)];
  const leave = { roles: ['checker'], clientId: null, active: true };
  const replies = await Promise.all([admin.patch(`/members/${two}`, leave), second.patch(`/members/${one}`, leave)]);
  expect(replies.filter(({ status }) => status === 200)).toHaveLength(1);
  const { rows } = await server.superuser.query("select user_id from members where firm_id = $1 and 'admin' = any(roles)", [firmId]);
  expect(rows).toHaveLength(1);
  if (rows[0].user_id === second.userId) await ok(second.patch(`/members/${one}`, { roles: ['admin'], clientId: null, active: true }));
});

test('everybody sets their own units and licence, and nothing else of themselves', async () => {
  await ok(client.patch('/members/me', { units: 'us' }));
  const { rows } = await server.superuser.query('select units, roles from members where user_id = $1', [client.userId]);
  expect(rows[0]).toEqual({ units: 'us', roles: ['client'] });
  expect((await client.patch('/members/me', { roles: ['admin'] })).body.errors).toEqual([
    { field: 'roles', message: 'This field is not known.' },
  ]);
});

test('a new account takes a password of at least twelve characters', async () => {
  const reply = await server.anonymous('post', '/invitations/a-token-of-some-length/acceptance', { password: 'eleven char' });
  expect(reply.body.errors).toEqual([{ field: 'password', message: 'A password has at least 12 characters.' }]);
});
