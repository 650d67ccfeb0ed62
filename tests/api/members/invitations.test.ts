import { randomUUID } from 'node:crypto';
import { afterAll, beforeAll, expect, test } from 'vitest';
import { type Reply, type SignedIn, startTestServer, type TestServer } from '../../support/test-server.ts';
import { ok } from '../surveyed-bridge.ts';

let server: TestServer;
let firmId: string;
let admin: SignedIn;

beforeAll(async () => {
  server = await startTestServer();
  firmId = await server.createFirm('Falk and Reyes');
  admin = await server.join(firmId, { name: 'Petra Lund', roles: ['admin'] });
});
afterAll(() => server.stop());

const invitation = (over: object = {}) => ({
  id: randomUUID(),
  name: 'Nia Sol',
  email: `${randomUUID()}@strandnote.example`,
  roles: ['engineer'],
  clientId: null,
  ...over,
});

/** Invites, and gives the token that went out by mail. */
async function invite(body: { email: string }): Promise<string> {
  await ok(admin.post('/invitations', body));
  await server.runJobs();
  const mail = server.mail.find(({ to }) => to.includes(body.email))!;
  return /\/invitation\/(\S+)/.exec(mail.text)![1]!;
}
const accept = (token: string, password: string): Promise<Reply> =>
  server.anonymous('post', `/invitations/${token}/acceptance`, { password });

test('an invited person makes their account and is a member with the roles of the invitation', async () => {
  const body = invitation({ roles: ['engineer', 'checker'] });
  const token = await invite(body);
  expect((await server.anonymous('get', `/invitations/${token}`)).body).toEqual({
    firmName: 'Falk and Reyes',
    name: 'Nia Sol',
    email: body.email,
    roles: ['engineer', 'checker'],
    hasAccount: false,
  });
  await ok(accept(token, 'a long new password'));
  const members = (await ok(admin.get('/members'))).body.items;
  expect(members).toContainEqual(expect.objectContaining({ email: body.email, roles: ['engineer', 'checker'], active: true }));
  const { rows } = await server.superuser.query("select actor_name, details from audit_events where act = 'member.joined'");
  expect(rows).toEqual([{ actor_name: 'Nia Sol', details: { email: body.email, roles: ['engineer', 'checker'] } }]);
});

test('an invitation is used once', async () => {
  const token = await invite(invitation());
  await ok(accept(token, 'a long new password'));
  expect((await accept(token, 'a long new password')).body).toMatchObject({ status: 410, code: 'gone' });
  expect((await server.anonymous('get', `/invitations/${token}`)).status).toBe(410);
});

test('of two acceptances at once, one makes the member', async () => {
  const body = invitation();
  const token = await invite(body);
  const replies = await Promise.all([accept(token, 'a long new password'), accept(token, 'a long new password')]);
  expect(replies.filter(({ status }) => status === 200)).toHaveLength(1);
  expect(replies.find(({ status }) => status !== 200)!.body).toMatchObject({ status: 410, code: 'gone' });
  const { rows } = await server.superuser.query('select 1 from members where email = $1', [body.email]);
  expect(rows).toHaveLength(1);
});

test('a person who has an account proves it with its password', async () => {
  const secondFirm = await server.createFirm('Second firm');
  const otherAdmin = await server.join(secondFirm, { name: 'Ada Holm', roles: ['admin'] });
  const body = invitation({ email: otherAdmin.email, name: 'Ada Holm' });
  const token = await invite(body);
  expect((await server.anonymous('get', `/invitations/${token}`)).body.hasAccount).toBe(true);
  expect((await accept(token, 'not the password there')).body.errors[0].field).toBe('password');
  await ok(accept(token, otherAdmin.password));
  expect((await otherAdmin.elsewhere(firmId).get('/structures')).status).toBe(200);
});

test('an account that was left without a password gets the one of the invitation', async () => {
  const body = invitation();
  const token = await invite(body);
  await server.superuser.query(`insert into identity."user" (id, name, email) values ($1, 'Nia Sol', $2)`, [randomUUID(), body.email]);
  await ok(accept(token, 'a long new password'));
  expect(await server.signIn(body.email, 'a long new password')).toMatch(/session_token=/);
});

test('an invitation that was revoked or is too old is gone, and its link says nothing', async () => {
  const revoked = invitation();
  const token = await invite(revoked);
  await ok(admin.delete(`/invitations/${revoked.id}`));
  await ok(admin.delete(`/invitations/${revoked.id}`));
  expect((await accept(token, 'a long new password')).status).toBe(410);

  const old = invitation();
  const oldToken = await invite(old);
  server.now.at = new Date(server.now.at.getTime() + 15 * 24 * 60 * 60 * 1000);
  expect((await accept(oldToken, 'a long new password')).status).toBe(410);
  const states = (await ok(admin.get('/invitations'))).body.items;
  const stateOf = (id: string) => states.find((item: { id: string }) => item.id === id).state;
  expect([stateOf(revoked.id), stateOf(old.id)]).toEqual(['revoked', 'expired']);
});

test('the database keeps the hash of a token, not the token', async () => {
  const body = invitation();
  const token = await invite(body);
  const { rows } = await server.superuser.query('select i::text as row from invitations i where id = $1', [body.id]);
  expect(rows[0].row).not.toContain(token);
});

test('the same invitation sent twice sends one message, and another body under its identifier is refused', async () => {
  const body = invitation();
  await ok(admin.post('/invitations', body));
  await ok(admin.post('/invitations', body));
  await server.runJobs();
  expect(server.mail.filter(({ to }) => to.includes(body.email))).toHaveLength(1);
  expect((await admin.post('/invitations', { ...body, roles: ['admin'] })).body).toMatchObject({ status: 409, code: 'conflict' });
});

test('refuses to invite a member again, to a client of another firm, or as client and engineer at once', async () => {
  expect((await admin.post('/invitations', invitation({ email: admin.email }))).body.errors[0].field).toBe('email');
  const foreign = await server.createClient(await server.createFirm('Third firm'));
  expect((await admin.post('/invitations', invitation({ roles: ['client'], clientId: foreign }))).body.errors[0].field).toBe('clientId');
  const own = await server.createClient(firmId);
  const both = await admin.post('/invitations', invitation({ roles: ['client', 'engineer'], clientId: own }));
  expect(both.body.errors[0]).toMatchObject({ field: 'roles' });
});
