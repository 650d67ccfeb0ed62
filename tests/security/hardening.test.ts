import { randomUUID } from 'node:crypto';
import supertest from 'supertest';
import { afterAll, beforeAll, beforeEach, describe, expect, test } from 'vitest';
import { identityPaths } from '../../apps/api/src/access/auth.ts';
import { password, type SignedIn, startTestServer, type TestServer } from '../support/test-server.ts';

const lines: string[] = [];
let server: TestServer;
let admin: SignedIn;
let cookie: string;

beforeAll(async () => {
  server = await startTestServer({ lines });
  admin = await server.join(await server.createFirm(), { name: 'Petra Lund', roles: ['admin'] });
  cookie = await server.signIn(admin.email);
});
afterAll(() => server.stop());
// The library's own counts would stand before what is looked at here; tests of the limits count by themselves.
beforeEach(() => server.superuser.query('delete from identity.rate_limit'));

const changing = identityPaths.filter((path) => !['/get-session', '/list-sessions'].includes(path));

function identity(path: string, headers: Record<string, string> = {}, method: 'get' | 'post' | 'put' | 'delete' = 'post') {
  return supertest(server.app)
    [method](`/api/auth${path}`)
    .set({ Cookie: cookie, ...headers });
}

const sessions = async () =>
  (await server.superuser.query('select id from identity.session where user_id = $1 order by id', [admin.userId])).rows;

describe.each(changing)('better-auth %s', (path) => {
  test.each([
    ['a page of another site', { Origin: 'https://elsewhere.example' }],
    ['a page whose origin is opaque', { Origin: 'null' }],
    ['another site, though it names ours as its origin', { Origin: 'http://127.0.0.1:4310', 'Sec-Fetch-Site': 'cross-site' }],
    ['another site that hides its origin', { 'Sec-Fetch-Site': 'cross-site' }],
    ['a page under a neighbouring name', { 'Sec-Fetch-Site': 'same-site' }],
  ])('refuses %s, and ends no session', async (_, headers) => {
    const before = await sessions();
    const body = { email: admin.email, password, currentPassword: password, newPassword: 'another long password', token: 'none' };
    const reply = await identity(path, headers).send(body);
    expect(reply.body).toMatchObject({ status: 403, code: 'wrong-origin' });
    expect(reply.headers['set-cookie']).toBeUndefined();
    expect(await sessions()).toEqual(before);
  });

  test('changes nothing by the methods that a link or another form can have', async () => {
    const before = await sessions();
    const own = { Origin: server.deps.env.publicUrl };
    for (const method of ['get', 'put', 'delete'] as const) {
      expect([method, (await identity(path, own, method)).status]).toEqual([method, 404]);
    }
    await identity(path, { 'X-HTTP-Method-Override': 'POST' }, 'get');
    expect(await sessions()).toEqual(before);
  });
});

/** Every address that the library would serve, as it says itself. */
function pathsOfTheLibrary(): string[] {
  const endpoints = Object.values(server.deps.auth.api) as { path?: string }[];
  return [...new Set(endpoints.flatMap(({ path }) => path ?? []))];
}

test('serves no address of the library but those that are named', async () => {
  const all = pathsOfTheLibrary();
  expect(all).toEqual(expect.arrayContaining([...identityPaths, '/sign-up/email', '/delete-user', '/change-email']));
  const others = all.filter((path) => !identityPaths.some((served) => served === path));
  expect(others.length).toBeGreaterThan(10);
  for (const path of others) {
    for (const method of ['get', 'post'] as const) {
      const address = path.replaceAll(/:\w+/g, 'x');
      const reply = await identity(address, { Origin: server.deps.env.publicUrl }, method);
      expect([address, method, reply.status, reply.body.code]).toEqual([address, method, 404, 'not-found']);
    }
  }
});

test.each([
  '/api/auth/sign-up/email/',
  '/api/auth//sign-up/email',
  '/api/auth/sign-in/../sign-up/email',
  '/api/auth/sign-in/%2e%2e/sign-up/email',
  '/api/auth/sign-up%2Femail',
  '/API/AUTH/sign-up/email',
  '/api/auth/sign-in/email/',
  '/api/auth/SIGN-IN/email',
  '/api/auth',
])('reaches nothing by writing an address as %s', async (path) => {
  const body = { email: 'nobody@strandnote.example', password, name: 'Nobody' };
  const reply = await supertest(server.app).post(path).set('Origin', server.deps.env.publicUrl).send(body);
  expect(reply.body).toMatchObject({ status: 404, code: 'not-found' });
  const { rows } = await server.superuser.query('select 1 from identity."user" where email = $1', [body.email]);
  expect(rows).toEqual([]);
});

test.each([
  ['half of a JSON', '{"email": '],
  ['a list', '[]'],
  ['a number', '7'],
  ['null', 'null'],
  ['objects where texts belong', '{"email": {"$ne": ""}, "password": {"$ne": ""}}'],
  ['a character that cannot be stored', '{"email": "a\\u0000@strandnote.example", "password": "x"}'],
])('answers %s at the sign-in as the fault of the request, without a stack', async (_, body) => {
  const reply = await identity('/sign-in/email', { Origin: server.deps.env.publicUrl, 'Content-Type': 'application/json' }).send(body);
  expect([reply.status, reply.text]).toEqual([expect.toSatisfy((status) => status >= 400 && status < 500), expect.any(String)]);
  expect(reply.text).not.toMatch(/\.[jt]s:\d|node_modules|\bat .+\(|select |insert /i);
});

test('gives the session in one cookie that scripts cannot read, for the whole site, and takes it back when signing out', async () => {
  const signedIn = await identity('/sign-in/email', { Origin: server.deps.env.publicUrl }).send({ email: admin.email, password });
  const cookies = [signedIn.headers['set-cookie']].flat().map(String);
  const session = cookies.filter((one) => /session_token=/.test(one));
  expect(session).toHaveLength(1);
  for (const one of cookies) expect(one).toMatch(/; HttpOnly(;|$)/i);
  for (const one of cookies) expect(one).toMatch(/; SameSite=Lax(;|$)/i);
  for (const one of cookies) expect(one).not.toMatch(/; Domain=/i);
  const mine = session[0]!.split(';')[0]!;
  const signedOut = await identity('/sign-out', { Origin: server.deps.env.publicUrl, Cookie: mine }).send({});
  expect(String(signedOut.headers['set-cookie'])).toMatch(/session_token=;.*Max-Age=0/i);
  const after = await supertest(server.app).get('/api/v1/me').set('Cookie', mine);
  expect(after.body).toMatchObject({ status: 401, code: 'signed-out' });
});

test('takes no session that was signed with another key, nor one that was altered', async () => {
  const [name, value] = cookie.split('=') as [string, string];
  const [token] = decodeURIComponent(value).split('.') as [string];
  for (const forged of [token, `${token}.`, `${token}.${'A'.repeat(43)}=`, `${token}x.${decodeURIComponent(value).split('.')[1]}`]) {
    const reply = await supertest(server.app)
      .get('/api/v1/me')
      .set('Cookie', `${name}=${encodeURIComponent(forged)}`);
    expect([forged, reply.status]).toEqual([forged, 401]);
  }
  expect((await supertest(server.app).get('/api/v1/me').set('Cookie', cookie)).status).toBe(200);
});

test('refuses the eleventh wrong attempt in a minute at an account, and then the right password too', async () => {
  const attempt = (typed: string) =>
    identity('/sign-in/email', { Origin: server.deps.env.publicUrl }).send({ email: admin.email, password: typed });
  for (let count = 1; count <= 10; count++) expect([count, (await attempt(`wrong ${count}`)).status]).toEqual([count, 401]);
  expect((await attempt('wrong 11')).status).toBe(429);
  const right = await attempt(password);
  expect([right.status, right.headers['set-cookie']]).toEqual([429, undefined]);
});

/** Invites, and gives the token that went out by mail. */
async function invite(): Promise<string> {
  const email = `${randomUUID()}@strandnote.example`;
  await admin.post('/invitations', { id: randomUUID(), name: 'Nia Sol', email, roles: ['engineer'], clientId: null });
  await server.runJobs();
  return /\/invitation\/(\S+)/.exec(server.mail.find(({ to }) => to.includes(email))!.text)![1]!;
}

test('keeps token and password of an accepted invitation out of the log, whether it works, fails or is refused', async () => {
  const secret = 'a long new password of Nia';
  const token = await invite();
  const at = (path: string, body: object = { password: secret }) => server.anonymous('post', path, body);
  expect((await at(`/invitations/${token}/acceptance`, { password: secret, surprise: 1 })).status).toBe(400);
  await server.superuser.query('alter table identity.account add constraint refuse_for_now check (password is null) not valid');
  expect((await at(`/invitations/${token}/acceptance`)).status).toBe(500);
  await server.superuser.query('alter table identity.account drop constraint refuse_for_now');
  expect((await at(`/invitations/${token}/acceptance`)).status).toBe(200);
  expect((await at(`/invitations/${token}/acceptance`)).status).toBe(410);
  // Express takes an address in capitals for the same one.
  const second = await invite();
  expect((await at(`/INVITATIONS/${second}/acceptance`)).status).toBe(200);
  const { rows } = await server.superuser.query('select password from identity.account where password is not null');
  const logged = lines.join('\n');
  expect(logged).toContain('request failed');
  const secrets = [secret, token, second, ...rows.map((row) => row.password)];
  expect(secrets.filter((hidden) => logged.includes(hidden))).toEqual([]);
});
