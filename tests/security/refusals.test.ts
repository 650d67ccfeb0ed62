import { randomUUID } from 'node:crypto';
import type { Role } from '@strandnote/api/contract';
import supertest from 'supertest';
import { afterAll, beforeAll, expect, test, vi } from 'vitest';
import { AppError } from '../../apps/api/src/http/errors.ts';
import { parse } from '../../apps/api/src/http/parse.ts';
import { routes } from '../../apps/api/src/routes.ts';
import { type SignedIn, startTestServer, type TestServer } from '../support/test-server.ts';
import { expectedAccess, type Ids } from './expected-access.ts';

let server: TestServer;
let person: SignedIn;

beforeAll(async () => {
  server = await startTestServer();
  person = await server.join(await server.createFirm(), { name: 'Ines Falk', roles: ['admin', 'engineer', 'checker'] });
});
afterAll(() => server.stop());

// Any identifiers do: only the shape of the bodies is looked at.
const anyIds = new Proxy({} as Ids, { get: () => randomUUID() });
const withBody = routes.filter(({ body }) => body !== undefined);

test.each(withBody.map((route) => [`${route.method} ${route.path}`, route] as const))(
  '%s refuses a field that it does not know',
  (_, route) => {
    const expected = expectedAccess[`${route.method} ${route.path.replace(/^\/firms\/:firmId/, 'F')}`]!;
    const role: Role = typeof expected.who === 'string' ? 'admin' : expected.who[0]!;
    const body = expected.body?.(anyIds, role) ?? {};
    expect(() => parse(route.body!, body)).not.toThrow();
    const problem = catchProblem(() => parse(route.body!, { ...body, surprise: 1 }));
    expect(problem.errors).toContainEqual({ field: 'surprise', message: 'This field is not known.' });
  },
);

function catchProblem(work: () => unknown): AppError {
  try {
    work();
  } catch (error) {
    if (error instanceof AppError) return error;
    throw error;
  }
  throw new Error('Nothing was refused.');
}

test('refuses what nobody asked for after the question mark, and a body where none is taken', async () => {
  expect((await person.get('/structures?firm=another')).body.errors).toEqual([{ field: 'firm', message: 'This field is not known.' }]);
  expect((await person.get('/audit?before=zero')).body.errors[0].field).toBe('before');
  const reply = await person.delete(`/invitations/${randomUUID()}`, { force: true });
  expect(reply.body.errors).toEqual([{ field: 'force', message: 'This field is not known.' }]);
});

test('says beside the field that a text has a character which cannot be stored', async () => {
  const body = { id: randomUUID(), name: 'Harbour\0Board', contactName: '', contactEmail: '', address: '\ud800' };
  const reply = await person.post('/clients', body);
  expect(reply.body).toMatchObject({ status: 400, code: 'invalid-input' });
  expect(reply.body.errors.map(({ field }: { field: string }) => field)).toEqual(['name', 'address']);
});

test('names the field inside what was sent', async () => {
  const letterhead = { addressLines: ['1 Quay Street', ''], phone: '', email: '', registration: '', motto: 'x' };
  const reply = await person.patch('', { letterhead });
  expect(reply.body.errors.map(({ field }: { field: string }) => field).sort()).toEqual(['letterhead.addressLines.1', 'letterhead.motto']);
});

function send(body: string, type = 'application/json') {
  return supertest(server.app).post('/api/v1/invitations/some-token-of-a-link/acceptance').set('Content-Type', type).send(body);
}

test('answers what is not JSON, too large, or of an odd encoding with a problem, not with a failure', async () => {
  expect((await send('{"password": ')).body).toMatchObject({
    status: 400,
    code: 'invalid-input',
    detail: 'The request is not valid JSON.',
  });
  expect((await send(JSON.stringify({ password: 'x'.repeat(2_200_000) }))).body).toMatchObject({ status: 413, code: 'too-large' });
  expect((await send('{}', 'application/json; charset=x-klingon')).body).toMatchObject({ status: 400, code: 'invalid-input' });
  expect((await send('password=x', 'application/x-www-form-urlencoded')).body).toMatchObject({ status: 400, code: 'invalid-input' });
  expect((await supertest(server.app).get('/api/v1/verification/%E0%A4%A')).body).toMatchObject({ status: 400, code: 'invalid-input' });
});

test('answers every refusal as Problem Details, and an address that does not exist too', async () => {
  const replies = [await person.get(`/structures/${randomUUID()}`), await server.anonymous('get', '/nowhere')];
  for (const reply of replies) {
    expect(reply.headers['content-type']).toMatch(/^application\/problem\+json/);
    expect(reply.body).toEqual({ type: 'about:blank', title: 'Not found', status: 404, code: 'not-found', detail: expect.any(String) });
  }
});

test('shows neither the stack nor the words of an error that it did not foresee', async () => {
  const failing = vi.spyOn(server.deps.db, 'execute').mockRejectedValueOnce(new Error('connection to 10.0.0.7 refused'));
  const reply = await person.get('/structures');
  failing.mockRestore();
  expect(reply.status).toBe(500);
  expect(reply.headers['content-type']).toMatch(/^application\/problem\+json/);
  expect(reply.body).toMatchObject({ code: 'internal' });
  expect(reply.text).not.toMatch(/10\.0\.0\.7|\.ts:|\bat /);
});
