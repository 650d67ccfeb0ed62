import { randomUUID } from 'node:crypto';
import pg from 'pg';
import { afterAll, beforeAll, expect, test, vi } from 'vitest';
import { type SignedIn, startTestServer, type TestServer } from '../../support/test-server.ts';
import { campaignBody, ok, type SurveyedBridge, surveyBridge, surveyCampaign } from '../surveyed-bridge.ts';

let server: TestServer;
let engineer: SignedIn;
let checker: SignedIn;
let bridge: SurveyedBridge;

beforeAll(async () => {
  server = await startTestServer();
  const firmId = await server.createFirm();
  engineer = await server.join(firmId, { name: 'Ines Falk', roles: ['engineer'] });
  checker = await server.join(firmId, { name: 'Omar Reyes', roles: ['checker'] });
  bridge = await surveyBridge(engineer);
});
afterAll(() => server.stop());

const open = (body: object) => engineer.post(`/structures/${bridge.structureId}/campaigns`, body);

test('numbers the campaigns of a structure one after another, also when two are opened at once', async () => {
  const replies = await Promise.all([open(campaignBody()), open(campaignBody())]);
  expect(replies.map(({ body }) => body.number).sort()).toEqual([2, 3]);
});

test('takes the same campaign sent twice for one, and refuses another under its identifier', async () => {
  const body = campaignBody({ cableIds: [bridge.cables[1]!.id] });
  const first = (await ok(open(body))).body;
  expect(first).toMatchObject({ cableCount: 1, measuredCount: 0, state: 'open', structureName: 'Orrin Bridge' });
  expect((await ok(open(body))).body).toEqual(first);
  expect((await open({ ...body, name: 'Another' })).body).toMatchObject({ status: 409, code: 'conflict' });
});

test('refuses cables of another structure and a last day before the first', async () => {
  expect((await open(campaignBody({ cableIds: [randomUUID()] }))).body.errors[0].field).toBe('cableIds');
  expect((await open(campaignBody({ startsOn: '2026-09-02', endsOn: '2026-09-01' }))).body.errors[0].field).toBe('endsOn');
  expect((await engineer.patch(`/campaigns/${bridge.campaignId}`, { endsOn: '2026-08-01' })).body.errors[0].field).toBe('endsOn');
});

test('gives the whole checklist: cables, spans, section, references, peaks, estimates', async () => {
  const detail = (await ok(checker.get(`/campaigns/${bridge.campaignId}`))).body;
  expect(detail).toMatchObject({ cableCount: 2, measuredCount: 2, structureTimeZone: 'Europe/London' });
  const [entry] = detail.cables;
  expect(entry.cable).toMatchObject({ reference: 'W-01', section: { id: bridge.sectionId } });
  expect(entry.cable.spans).toHaveLength(1);
  expect(entry.cable.references[0]).toMatchObject({ kind: 'design', value: 2.5e6 });
  expect(entry.measurements[0].peaks).toHaveLength(5);
  expect(entry.estimates[0]).toMatchObject({ measurementId: entry.measurements[0].id, stale: false });
  expect(entry.lastSurvey).toEqual([]);
});

test('shows the tension of the last campaign before it', async () => {
  const later = await surveyCampaign(engineer, bridge.structureId, bridge.cables, { name: 'Winter', startsOn: '2026-12-01', endsOn: null });
  const before = (await ok(engineer.get(`/campaigns/${bridge.campaignId}`))).body.cables[0].estimates[0];
  const [entry] = (await ok(engineer.get(`/campaigns/${later.campaignId}`))).body.cables;
  expect(entry.lastSurvey).toEqual([
    {
      spanId: bridge.cables[0]!.spanId,
      tension: before.output.tension,
      campaignName: 'Autumn survey',
      startsOn: '2026-09-01',
      steelTemperature: 17,
    },
  ]);
});

test('asks the database as often for many cables as for few', async () => {
  const one = await surveyCampaign(engineer, bridge.structureId, bridge.cables.slice(0, 1), { cableIds: [bridge.cables[0]!.id] });
  const queries = vi.spyOn(pg.Client.prototype, 'query');
  const asked = async (campaignId: string) => {
    queries.mockClear();
    await ok(engineer.get(`/campaigns/${campaignId}`));
    return queries.mock.calls.length;
  };
  const [few, many] = [await asked(one.campaignId), await asked(bridge.campaignId)];
  queries.mockRestore();
  expect(few).toBeGreaterThan(5);
  expect(many).toBe(few);
});

test('keeps why a cable was not measured, and takes it back', async () => {
  const path = `/campaigns/${bridge.campaignId}/cables/${bridge.cables[0]!.id}`;
  await ok(engineer.put(path, { notMeasuredReason: 'Scaffold in the way' }));
  const shown = async () => (await ok(engineer.get(`/campaigns/${bridge.campaignId}`))).body.cables[0].notMeasuredReason;
  expect(await shown()).toBe('Scaffold in the way');
  await ok(engineer.put(path, { notMeasuredReason: null }));
  expect(await shown()).toBeNull();
  expect((await engineer.put(path, { notMeasuredReason: '  ' })).body.errors[0].field).toBe('notMeasuredReason');
  expect((await engineer.put(`/campaigns/${bridge.campaignId}/cables/${randomUUID()}`, { notMeasuredReason: 'x' })).status).toBe(404);
});

test('takes no change while it is closed, except to be opened again', async () => {
  const path = `/campaigns/${bridge.campaignId}`;
  await ok(engineer.patch(path, { state: 'closed' }));
  expect((await engineer.patch(path, { name: 'Renamed' })).body).toMatchObject({ status: 409, code: 'conflict' });
  expect((await engineer.put(`${path}/cables/${bridge.cables[0]!.id}`, { notMeasuredReason: 'x' })).status).toBe(409);
  expect((await engineer.post(`${path}/estimates`, { measurementIds: null })).status).toBe(409);
  await ok(engineer.patch(path, { state: 'open', name: 'Renamed' }));
  expect((await ok(engineer.get('/campaigns'))).body.items.map(({ name }: { name: string }) => name)).toContain('Renamed');
});

test('does not let a checker edit', async () => {
  expect((await checker.patch(`/campaigns/${bridge.campaignId}`, { name: 'Mine' })).status).toBe(403);
});
