import { randomUUID } from 'node:crypto';
import { afterAll, beforeAll, expect, test } from 'vitest';
import { type SignedIn, startTestServer, type TestServer } from '../../support/test-server.ts';
import { frequencies, measurementBody, ok, type SurveyedBridge, surveyBridge } from '../surveyed-bridge.ts';

let server: TestServer;
let engineer: SignedIn;
let other: SignedIn;
let bridge: SurveyedBridge;

beforeAll(async () => {
  server = await startTestServer();
  const firmId = await server.createFirm();
  engineer = await server.join(firmId, { name: 'Ines Falk', roles: ['engineer'] });
  other = await server.join(firmId, { name: 'Jon Abel', roles: ['engineer'] });
  bridge = await surveyBridge(engineer);
});
afterAll(() => server.stop());

const path = (measurementId: string) => `/campaigns/${bridge.campaignId}/measurements/${measurementId}`;
const eventsOf = async (measurementId: string) =>
  (await server.superuser.query('select act, details from audit_events where subject_id = $1 order by sequence', [measurementId])).rows;

test('stores a measurement with its peaks, and the same request again changes nothing', async () => {
  const id = randomUUID();
  const body = measurementBody(bridge.cables[0]!.spanId, frequencies);
  const stored = (await ok(engineer.put(path(id), body))).body;
  expect(stored).toMatchObject({ id, version: 1, enteredBy: 'Ines Falk', campaignId: bridge.campaignId });
  expect(stored.peaks.map(({ frequency }: { frequency: number }) => frequency)).toEqual(frequencies);
  expect((await ok(engineer.put(path(id), body))).body).toEqual(stored);
  expect(await eventsOf(id)).toHaveLength(1);
});

test('replaces what was seen, and writes down what changed', async () => {
  const id = randomUUID();
  const body = measurementBody(bridge.cables[0]!.spanId, frequencies);
  await ok(engineer.put(path(id), body));
  const [first, ...rest] = body.peaks;
  const changed = {
    ...body,
    version: 1,
    note: 'Gusts',
    peaks: [{ ...first!, used: false, setAsideReason: 'Deck mode' }, ...rest.slice(0, -1)],
  };
  const stored = (await ok(other.put(path(id), changed))).body;
  expect(stored).toMatchObject({ version: 2, note: 'Gusts', enteredBy: 'Jon Abel' });
  expect(stored.peaks).toHaveLength(4);
  const [, { act, details }] = await eventsOf(id);
  expect(act).toBe('measurement.changed');
  expect(details.changes.note).toEqual({ from: '', to: 'Gusts' });
  expect(details.changes[`peak ${first!.id}`]).toMatchObject({ from: { used: true }, to: { used: false, setAsideReason: 'Deck mode' } });
  expect(details.changes[`peak ${rest.at(-1)!.id}`].to).toBeNull();
  expect(Object.keys(details.changes)).toHaveLength(3);
});

test('refuses to overwrite what somebody else has changed, and gives what is stored', async () => {
  const id = randomUUID();
  const body = measurementBody(bridge.cables[0]!.spanId, frequencies);
  await ok(engineer.put(path(id), body));
  await ok(other.put(path(id), { ...body, version: 1, note: 'Theirs' }));
  const refused = await engineer.put(path(id), { ...body, version: 1, note: 'Mine' });
  expect(refused.body).toMatchObject({
    status: 409,
    code: 'changed-elsewhere',
    stored: { id, version: 2, note: 'Theirs', enteredBy: 'Jon Abel' },
  });
});

test('stores one of two changes made at the same moment', async () => {
  const id = randomUUID();
  const body = measurementBody(bridge.cables[0]!.spanId, frequencies);
  await ok(engineer.put(path(id), body));
  const replies = await Promise.all([
    engineer.put(path(id), { ...body, version: 1, note: 'Mine' }),
    other.put(path(id), { ...body, version: 1, note: 'Theirs' }),
  ]);
  expect(replies.map(({ status }) => status).sort()).toEqual([200, 409]);
});

test('creates one measurement of the same request sent twice at the same moment', async () => {
  const id = randomUUID();
  const body = measurementBody(bridge.cables[0]!.spanId, frequencies);
  const replies = await Promise.all([engineer.put(path(id), body), engineer.put(path(id), body)]);
  const [won] = replies.filter(({ status }) => status === 200);
  expect(won!.body.version).toBe(1);
  expect((await ok(engineer.put(path(id), body))).body).toEqual(won!.body);
});

test('says beside the field what is wrong', async () => {
  const body = measurementBody(bridge.cables[0]!.spanId, [1.5, 3.0]);
  const twice = { ...body, peaks: body.peaks.map((peak) => ({ ...peak, mode: 1 })) };
  expect((await engineer.put(path(randomUUID()), twice)).body).toMatchObject({
    status: 400,
    errors: [{ field: 'peaks.1.mode', message: 'Mode 1 is entered twice. Keep one, or set one aside.' }],
  });
  const foreign = measurementBody(randomUUID(), frequencies);
  expect((await engineer.put(path(randomUUID()), foreign)).body.errors[0].field).toBe('spanId');
  const moved = measurementBody(bridge.cables[1]!.spanId, frequencies, { version: 1 });
  expect((await engineer.put(path(bridge.cables[0]!.measurementId), moved)).body.errors[0].field).toBe('spanId');
  expect((await engineer.put(path(randomUUID()), { ...body, colour: 'red' })).body.errors).toEqual([
    { field: 'colour', message: 'This field is not known.' },
  ]);
});

test('takes no change in a closed campaign until it is opened again', async () => {
  await ok(engineer.patch(`/campaigns/${bridge.campaignId}`, { state: 'closed' }));
  const body = measurementBody(bridge.cables[0]!.spanId, frequencies);
  expect((await engineer.put(path(randomUUID()), body)).body.detail).toContain('closed');
  await ok(engineer.patch(`/campaigns/${bridge.campaignId}`, { state: 'open' }));
  await ok(engineer.put(path(randomUUID()), body));
});
