import supertest from 'supertest';
import { afterAll, beforeAll, expect, test } from 'vitest';
import { password, type SignedIn, startTestServer, type TestServer } from '../../support/test-server.ts';

let server: TestServer;
let firms: string[];
let person: SignedIn;

beforeAll(async () => {
  server = await startTestServer();
  firms = [await server.createFirm('Falk and Reyes'), await server.createFirm('Second firm')];
  person = await server.join(firms[0]!, { name: 'Ines Falk', roles: ['engineer'] });
  await server.superuser.query(
    `insert into members (firm_id, id, user_id, name, email, roles) values ($1, gen_random_uuid(), $2, 'Ines Falk', $3, '{checker}')`,
    [firms[1], person.userId, person.email],
  );
});
afterAll(() => server.stop());

function identity(method: 'get' | 'post', path: string, { cookie, body }: { cookie?: string; body?: object } = {}) {
  const request = supertest(server.app)[method](`/api/auth${path}`).set('Origin', server.deps.env.publicUrl);
  if (cookie !== undefined) request.set('Cookie', cookie);
  return body === undefined ? request : request.send(body);
}

async function eventsOf(firmId: string): Promise<string[]> {
  const { rows } = await server.superuser.query('select act from audit_events where firm_id = $1 order by sequence', [firmId]);
  return rows.map(({ act }) => act);
}

test('signs in with a cookie that scripts cannot read and other sites cannot send', async () => {
  const reply = await identity('post', '/sign-in/email', { body: { email: person.email, password } });
  const cookie = String(reply.headers['set-cookie']);
  expect(cookie).toMatch(/HttpOnly/i);
  expect(cookie).toMatch(/SameSite=Lax/i);
  expect(cookie).not.toMatch(/;\s*Secure/i);
});

test('does not tell a wrong password from an address that has no account', async () => {
  const wrong = await identity('post', '/sign-in/email', { body: { email: person.email, password: 'not the password' } });
  const unknown = await identity('post', '/sign-in/email', { body: { email: 'nobody@strandnote.example', password } });
  expect(wrong.status).toBe(401);
  expect([unknown.status, unknown.body]).toEqual([wrong.status, wrong.body]);
});

test('writes signing in and out down in every firm of the person', async () => {
  const before = { first: (await eventsOf(firms[0]!)).length, second: (await eventsOf(firms[1]!)).length };
  const cookie = await server.signIn(person.email);
  expect((await identity('post', '/sign-out', { cookie, body: {} })).status).toBe(200);
  const acts = ['session.started', 'session.ended'];
  expect((await eventsOf(firms[0]!)).slice(before.first)).toEqual(acts);
  expect((await eventsOf(firms[1]!)).slice(before.second)).toEqual(acts);
  expect((await identity('get', '/get-session', { cookie })).body).toBeNull();
});

test('lets nobody sign in when that cannot be written down', async () => {
  await server.superuser.query('alter table audit_events add constraint refuse_for_now check (sequence < 0) not valid');
  const reply = await identity('post', '/sign-in/email', { body: { email: person.email, password } });
  await server.superuser.query('alter table audit_events drop constraint refuse_for_now');
  expect(reply.status).toBe(500);
  expect(reply.headers['set-cookie']).toBeUndefined();
});

test('has no way to sign up, to change the address or to reach anything else of the library', async () => {
  const cookie = await server.signIn(person.email);
  for (const path of ['/sign-up/email', '/change-email', '/update-user', '/delete-user', '/verify-password', '/sign-in/social']) {
    const reply = await identity('post', path, { cookie, body: { email: 'x@strandnote.example', password, name: 'X' } });
    expect([path, reply.status, reply.body.code]).toEqual([path, 404, 'not-found']);
  }
  expect((await identity('get', '/reset-password/some-token?callbackURL=/')).status).toBe(404);
  expect((await identity('get', '/ok')).status).toBe(404);
});

test('ends the other sessions when the password is changed, and writes it down', async () => {
  const [here, elsewhere] = [await server.signIn(person.email), await server.signIn(person.email)];
  const short = await identity('post', '/change-password', { cookie: here, body: { currentPassword: password, newPassword: 'short' } });
  expect(short.status).toBe(400);
  const body = { currentPassword: password, newPassword: 'another long password', revokeOtherSessions: true };
  expect((await identity('post', '/change-password', { cookie: here, body })).status).toBe(200);
  expect((await identity('get', '/get-session', { cookie: elsewhere })).body).toBeNull();
  expect((await eventsOf(firms[0]!)).filter((act) => act === 'password.changed')).toHaveLength(1);
});

test('sends a new password by mail once, ends all sessions and says nothing about unknown addresses', async () => {
  server.mail.length = 0;
  const known = await identity('post', '/request-password-reset', { body: { email: person.email } });
  const unknown = await identity('post', '/request-password-reset', { body: { email: 'nobody@strandnote.example' } });
  expect([unknown.status, unknown.body]).toEqual([known.status, known.body]);
  await server.runJobs();
  expect(server.mail.map(({ to }) => to)).toEqual([[person.email]]);
  const token = /reset-password\?token=(\S+)/.exec(server.mail[0]!.text)![1]!;

  const body = { token, newPassword: password };
  expect((await identity('post', '/reset-password', { body })).status).toBe(200);
  expect((await identity('post', '/reset-password', { body: { ...body, newPassword: 'tried a second time' } })).status).toBe(400);
  const last = (await eventsOf(firms[1]!)).slice(-2);
  expect(last.sort()).toEqual(['password.reset', 'session.ended']);
  expect((await person.get('/structures')).body).toMatchObject({ status: 401, code: 'signed-out' });
});

test('checks the origin by itself, also under test', async () => {
  const signIn = (origin: string) =>
    server.deps.auth.handler(
      new Request(`${server.deps.env.publicUrl}/api/auth/sign-in/email`, {
        method: 'POST',
        headers: { 'content-type': 'application/json', origin, 'x-strandnote-client': '203.0.113.7' },
        body: JSON.stringify({ email: person.email, password }),
      }),
    );
  expect((await signIn('https://elsewhere.example')).status).toBe(403);
  expect((await signIn(server.deps.env.publicUrl)).status).toBe(200);
});
