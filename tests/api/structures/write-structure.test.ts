import { randomUUID } from 'node:crypto';
import { afterAll, beforeAll, expect, test } from 'vitest';
import { type SignedIn, startTestServer, type TestServer } from '../../support/test-server.ts';
import { ok, surveyBridge } from '../surveyed-bridge.ts';

let server: TestServer;
let firmId: string;
let engineer: SignedIn;

beforeAll(async () => {
  server = await startTestServer();
  firmId = await server.createFirm();
  engineer = await server.join(firmId, { name: 'Ines Falk', roles: ['engineer'] });
});
afterAll(() => server.stop());

const body = (over: object = {}) => ({
  id: randomUUID(),
  name: 'Orrin Bridge',
  reference: 'OC-1',
  kind: 'arch',
  ownerName: 'County',
  clientId: null,
  place: 'Orrinvale',
  timeZone: 'Europe/London',
  elevation: { deck: [{ x: 0, z: 0 }], supports: [] },
  notes: '',
  ...over,
});

test('gives back what was sent, with the number of its cables', async () => {
  const sent = body();
  const made = (await ok(engineer.post('/structures', sent))).body;
  expect(made).toEqual({ ...sent, cableCount: 0 });
  expect((await ok(engineer.post('/structures', sent))).body).toEqual(made);
  const { structureId } = await surveyBridge(engineer);
  expect((await ok(engineer.get(`/structures/${structureId}`))).body.cableCount).toBe(2);
  expect((await ok(engineer.get('/structures'))).body.items).toHaveLength(2);
});

test('refuses a client that is not of the firm, a zone that does not exist and a kind that it does not know', async () => {
  const foreign = await server.createClient(await server.createFirm('Second firm'));
  expect((await engineer.post('/structures', body({ clientId: foreign }))).body.errors[0].field).toBe('clientId');
  expect((await engineer.post('/structures', body({ timeZone: 'Nowhere' }))).body.errors[0].field).toBe('timeZone');
  expect((await engineer.post('/structures', body({ kind: 'tunnel' }))).body.errors[0].field).toBe('kind');
  expect((await engineer.post('/structures', body({ id: 'one' }))).body.errors[0].field).toBe('id');
});

test('an edit takes the client away only when it says so', async () => {
  const clientId = await server.createClient(firmId);
  const sent = body({ clientId });
  await ok(engineer.post('/structures', sent));
  expect((await ok(engineer.patch(`/structures/${sent.id}`, { notes: 'Painted' }))).body.clientId).toBe(clientId);
  expect((await ok(engineer.patch(`/structures/${sent.id}`, { clientId: null }))).body.clientId).toBeNull();
});
