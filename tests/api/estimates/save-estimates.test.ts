import { randomUUID } from 'node:crypto';
import { estimateTension } from '@strandnote/core';
import { afterAll, beforeAll, expect, test } from 'vitest';
import { type SignedIn, startTestServer, type TestServer } from '../../support/test-server.ts';
import { frequencies, measurementBody, ok, type SurveyedBridge, surveyBridge } from '../surveyed-bridge.ts';

let server: TestServer;
let engineer: SignedIn;
let bridge: SurveyedBridge;

beforeAll(async () => {
  server = await startTestServer();
  const firmId = await server.createFirm();
  engineer = await server.join(firmId, { name: 'Ines Falk', roles: ['engineer'] });
  bridge = await surveyBridge(engineer);
});
afterAll(() => server.stop());

const save = async (measurementIds: string[] | null = null) =>
  (await ok(engineer.post(`/campaigns/${bridge.campaignId}/estimates`, { measurementIds }))).body;
const countOf = async (measurementId: string) =>
  Number((await server.superuser.query('select count(*) from estimates where measurement_id = $1', [measurementId])).rows[0].count);
const put = (measurementId: string, body: object) => engineer.put(`/campaigns/${bridge.campaignId}/measurements/${measurementId}`, body);
const stale = async () =>
  (await ok(engineer.get(`/campaigns/${bridge.campaignId}`))).body.cables.flatMap(({ estimates }: { estimates: { stale: boolean }[] }) =>
    estimates.map((estimate) => estimate.stale),
  );

test('keeps what the core computes of the stored input, with all that it was computed from', async () => {
  const [estimate] = (await save()).items;
  expect(estimate).toMatchObject({ createdBy: 'Ines Falk', stale: false, measurementId: bridge.cables[0]!.measurementId });
  expect(estimate.input.cable.length).toBeCloseTo(78.5, 12);
  expect(estimate.input.cable.massPerLength).toBe(45);
  expect(estimateTension(estimate.input.cable, estimate.input.peaks, estimate.input.options)).toEqual(estimate.output);
});

test('does not repeat an estimate whose inputs and engine are unchanged', async () => {
  const { measurementId } = bridge.cables[0]!;
  const [before] = (await save([measurementId])).items;
  expect((await save([measurementId])).items).toEqual([before]);
  expect(await countOf(measurementId)).toBe(1);
  // A note is no input of the fit.
  const [first] = (await ok(engineer.get(`/campaigns/${bridge.campaignId}`))).body.cables;
  const { id: _id, campaignId: _campaign, enteredBy: _by, ...stored } = first.measurements[0];
  await ok(put(measurementId, { ...stored, note: 'Gusts' }));
  expect((await save([measurementId])).items).toEqual([before]);
});

test('stores one estimate when two people save at the same moment', async () => {
  const measurementId = randomUUID();
  await ok(put(measurementId, measurementBody(bridge.cables[0]!.spanId, frequencies, { visitedAt: '2026-09-02T09:00:00.000Z' })));
  await Promise.all([save([measurementId]), save([measurementId])]);
  expect(await countOf(measurementId)).toBe(1);
});

test('tells that an estimate is stale when a peak, or the section of the cable, has changed', async () => {
  expect(await stale()).not.toContain(true);
  const measurementId = bridge.cables[1]!.measurementId;
  await ok(put(measurementId, measurementBody(bridge.cables[1]!.spanId, [1.51, ...frequencies.slice(1)], { version: 1 })));
  expect((await stale()).filter(Boolean)).toHaveLength(1);
  await save();
  expect(await stale()).not.toContain(true);
  expect(await countOf(measurementId)).toBe(2);
  await ok(engineer.patch(`/sections/${bridge.sectionId}`, { sheathMass: 6 }));
  expect(await stale()).not.toContain(false);
});

test('says which measurement cannot be estimated, at which peak, and estimates the others', async () => {
  const bad = randomUUID();
  const falling = measurementBody(bridge.cables[0]!.spanId, [9.9, 1.505, 1.4], { visitedAt: '2026-09-03T09:00:00.000Z' });
  falling.peaks[0] = { ...falling.peaks[0]!, used: false, setAsideReason: 'Deck mode' };
  await ok(put(bad, falling));
  const tied = randomUUID();
  await ok(put(tied, measurementBody(bridge.cables[0]!.spanId, frequencies, { crossTied: true, visitedAt: '2026-09-04T09:00:00.000Z' })));
  const { items, refused } = await save([bad, tied, bridge.cables[1]!.measurementId]);
  expect(items.map(({ measurementId }: { measurementId: string }) => measurementId)).toEqual([bridge.cables[1]!.measurementId]);
  // The third peak of the form is the second that was used.
  expect(refused).toMatchObject([
    { measurementId: bad, code: 'frequencies-not-increasing', field: 'peaks[2].frequency' },
    { measurementId: tied, code: 'cross-tied', field: 'crossTied' },
  ]);
});

test('refuses measurements of another campaign', async () => {
  const reply = await engineer.post(`/campaigns/${bridge.campaignId}/estimates`, { measurementIds: [randomUUID()] });
  expect(reply.body.errors[0].field).toBe('measurementIds');
});

test('keeps estimates as they are: not even the owner of the tables changes one', async () => {
  await expect(server.superuser.query("update estimates set engine_version = '0'")).rejects.toMatchObject({ code: 'SN004' });
  await expect(server.superuser.query('delete from estimates')).rejects.toMatchObject({ code: 'SN004' });
});
