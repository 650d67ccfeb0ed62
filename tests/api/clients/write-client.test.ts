import { randomUUID } from 'node:crypto';
import { afterAll, beforeAll, expect, test } from 'vitest';
import { type SignedIn, startTestServer, type TestServer } from '../../support/test-server.ts';
import { ok } from '../surveyed-bridge.ts';

let server: TestServer;
let engineer: SignedIn;
let elsewhere: SignedIn;

beforeAll(async () => {
  server = await startTestServer();
  engineer = await server.join(await server.createFirm(), { name: 'Ines Falk', roles: ['engineer'] });
  elsewhere = await server.join(await server.createFirm('Second firm'), { name: 'Ada Holm', roles: ['engineer'] });
});
afterAll(() => server.stop());

const body = (over: object = {}) => ({ id: randomUUID(), name: 'Harbour Board', contactName: '', contactEmail: '', address: '', ...over });
const eventsOf = async (id: string) =>
  (await server.superuser.query('select act, details from audit_events where subject_id = $1 order by sequence', [id])).rows;

test('a client sent ten times at once is made once', async () => {
  const sent = body();
  const replies = await Promise.all(Array.from({ length: 10 }, () => engineer.post('/clients', sent)));
  expect(new Set(replies.map(({ status }) => status))).toEqual(new Set([201]));
  expect(new Set(replies.map(({ text }) => text)).size).toBe(1);
  expect(await eventsOf(sent.id)).toHaveLength(1);
});

test('of two different clients under one identifier at once, one is made and the other refused', async () => {
  const id = randomUUID();
  const replies = await Promise.all(['Harbour Board', 'County Roads'].map((name) => engineer.post('/clients', body({ id, name }))));
  expect(replies.map(({ status }) => status).sort()).toEqual([201, 409]);
});

test('an identifier of another firm is free in this one', async () => {
  const sent = body();
  await ok(elsewhere.post('/clients', { ...sent, name: 'County Roads' }));
  expect((await ok(engineer.post('/clients', sent))).body.name).toBe('Harbour Board');
  expect((await ok(elsewhere.get('/clients'))).body.items).toMatchObject([{ name: 'County Roads' }]);
});

test('a change is written down as what was and what is, once', async () => {
  const sent = body();
  await ok(engineer.post('/clients', sent));
  await ok(engineer.patch(`/clients/${sent.id}`, { address: 'Quay', name: 'Harbour Board' }));
  await ok(engineer.patch(`/clients/${sent.id}`, { address: 'Quay' }));
  expect(await eventsOf(sent.id)).toEqual([
    { act: 'client.created', details: { name: 'Harbour Board' } },
    { act: 'client.changed', details: { from: { address: '' }, to: { address: 'Quay' } } },
  ]);
});

test('an edit leaves what it does not name as it was', async () => {
  const sent = body({ contactName: 'Tove Lind', address: 'Quay' });
  await ok(engineer.post('/clients', sent));
  expect((await ok(engineer.patch(`/clients/${sent.id}`, { name: 'Port Board' }))).body).toEqual({ ...sent, name: 'Port Board' });
  expect((await engineer.patch(`/clients/${randomUUID()}`, { name: 'Port Board' })).status).toBe(404);
});
