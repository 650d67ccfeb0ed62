import supertest from 'supertest';
import { afterAll, beforeAll, describe, expect, test } from 'vitest';
import { ownOrigins } from '../../apps/api/src/http/own-origin.ts';
import { routes } from '../../apps/api/src/routes.ts';
import { password, type SignedIn, startTestServer, type TestServer } from '../support/test-server.ts';

let server: TestServer;
let firmId: string;
let cookie: string;
let person: SignedIn;

beforeAll(async () => {
  server = await startTestServer();
  firmId = await server.createFirm();
  person = await server.join(firmId, { name: 'Ines Falk', roles: ['admin', 'engineer', 'checker'] });
  cookie = await server.signIn(person.email);
});
afterAll(() => server.stop());

const changing = routes.filter(({ method }) => method !== 'get').map((route) => [`${route.method} ${route.path}`, route] as const);

describe.each(changing)('%s', (_, { method, path }) => {
  const send = () =>
    supertest(server.app)
      [method](`/api/v1${path.replace(':firmId', firmId)}`)
      .set('Cookie', cookie);

  test('refuses a request from a page of another site', async () => {
    expect((await send().set('Origin', 'https://elsewhere.example').send({})).body).toMatchObject({ status: 403, code: 'wrong-origin' });
  });
  test('refuses a form of another site that hides its origin', async () => {
    const reply = await send().set('Sec-Fetch-Site', 'cross-site').send({});
    expect(reply.body).toMatchObject({ status: 403, code: 'wrong-origin' });
  });
});

test('refuses to sign in or out for a page of another site', async () => {
  for (const path of ['sign-in/email', 'sign-out', 'revoke-sessions', 'change-password', 'request-password-reset']) {
    const reply = await supertest(server.app)
      .post(`/api/auth/${path}`)
      .set('Cookie', cookie)
      .set('Origin', 'https://elsewhere.example')
      .send({ email: person.email, password });
    expect([path, reply.status]).toEqual([path, 403]);
  }
  expect((await person.get('/structures')).status).toBe(200);
});

test('takes another site of the same family, the opaque origin and a look-alike port for foreign', async () => {
  const { publicUrl } = server.deps.env;
  for (const origin of ['null', `${publicUrl}0`, publicUrl.replace('http:', 'https:'), 'http://sub.127.0.0.1:4310']) {
    const reply = await supertest(server.app).patch(`/api/v1/firms/${firmId}`).set('Cookie', cookie).set('Origin', origin).send({});
    expect([origin, reply.body.code]).toEqual([origin, 'wrong-origin']);
  }
});

test('knows loopback by all its names, a public address by its own alone', () => {
  expect(ownOrigins('http://127.0.0.1:4310')).toEqual(['http://127.0.0.1:4310', 'http://localhost:4310', 'http://[::1]:4310']);
  expect(ownOrigins('https://tensions.firm.example/app')).toEqual(['https://tensions.firm.example']);
});
