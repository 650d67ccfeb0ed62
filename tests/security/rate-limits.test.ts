import supertest from 'supertest';
import { afterAll, beforeAll, expect, test } from 'vitest';
import { routes } from '../../apps/api/src/routes.ts';
import { password, startTestServer, type TestServer } from '../support/test-server.ts';

let server: TestServer;
beforeAll(async () => {
  server = await startTestServer();
});
afterAll(() => server.stop());

async function statuses(count: number, call: () => PromiseLike<{ status: number }>): Promise<number[]> {
  const found: number[] = [];
  for (let attempt = 0; attempt < count; attempt++) found.push((await call()).status);
  return found;
}

const signIn = (headers: Record<string, string> = {}) =>
  supertest(server.app)
    .post('/api/auth/sign-in/email')
    .set('Origin', server.deps.env.publicUrl)
    .set(headers)
    .send({ email: 'nobody@strandnote.example', password });

test('ten attempts a minute to sign in, whatever address the caller claims to come from', async () => {
  const found = await statuses(10, () => signIn());
  expect(new Set(found)).toEqual(new Set([401]));
  expect((await signIn()).status).toBe(429);
  expect((await signIn({ 'x-strandnote-client': '198.51.100.9' })).status).toBe(429);
});

test('five requests a minute for a new password', async () => {
  const ask = () =>
    supertest(server.app)
      .post('/api/auth/request-password-reset')
      .set('Origin', server.deps.env.publicUrl)
      .send({ email: 'nobody@strandnote.example' });
  expect((await statuses(6, ask)).slice(-2)).toEqual([200, 429]);
});

test.each([
  ['get', '/verification/0000-0000-0000-0000', 30],
  ['get', '/invitations/a-token-that-is-none', 30],
  ['post', '/invitations/a-token-that-is-none/acceptance', 10],
] as const)('%s %s takes %i calls a minute', async (method, path, limit) => {
  const call = () => server.anonymous(method, path, method === 'post' ? { password: 'a long new password' } : undefined);
  const found = await statuses(limit, call);
  expect(found).not.toContain(429);
  expect((await call()).body).toMatchObject({ status: 429, code: 'too-many-requests' });
});

test('every public route that looks something up by a secret, and every one that takes a password, is limited', () => {
  const secret = routes.filter(({ access, path }) => access === 'public' && path.includes('/:'));
  const signing = routes.filter(({ path }) => /\/(approval|issue)$/.test(path));
  expect(secret.length + signing.length).toBeGreaterThanOrEqual(5);
  expect([...secret, ...signing].filter(({ perMinute }) => perMinute === undefined).map(({ path }) => path)).toEqual([]);
});
