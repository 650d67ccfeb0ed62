import { afterAll, beforeAll, expect, test } from 'vitest';
import { type SignedIn, startTestServer, type TestServer } from '../../support/test-server.ts';
import { approve, draftReport, submit, tickAll } from '../reports/report-acts.ts';
import { measurementBody, ok, type SurveyedBridge, surveyBridge, surveyCampaign } from '../surveyed-bridge.ts';

let server: TestServer;
let engineer: SignedIn;
let checker: SignedIn;
let other: SignedIn;
let bridge: SurveyedBridge;
let clientId: string;

beforeAll(async () => {
  server = await startTestServer();
  const firmId = await server.createFirm();
  clientId = await server.createClient(firmId);
  engineer = await server.join(firmId, { name: 'Ines Falk', roles: ['engineer'] });
  other = await server.join(firmId, { name: 'Jon Abel', roles: ['engineer'] });
  checker = await server.join(firmId, { name: 'Omar Reyes', roles: ['checker'] });
  bridge = await surveyBridge(engineer);
});
afterAll(() => server.stop());

const desk = async (person: SignedIn) => (await ok(person.get('/desk'))).body;
const ids = (list: { id: string }[]) => list.map(({ id }) => id);

test('follows a revision from the author to the checker and back', async () => {
  const { revisionId } = await draftReport(engineer, bridge.campaignId, clientId);
  expect(ids((await desk(engineer)).drafts)).toEqual([revisionId]);
  expect((await desk(other)).drafts).toEqual([]);
  await ok(submit(engineer, revisionId));
  await ok(checker.put(`/revisions/${revisionId}/ticks/${bridge.cables[0]!.id}`, {}));
  expect((await desk(checker)).toCheck).toMatchObject([{ id: revisionId, cableCount: 2, tickedCount: 1, openComments: 0 }]);
  expect((await desk(engineer)).toCheck).toEqual([]);
  await ok(checker.post(`/revisions/${revisionId}/return`, { reason: 'Not yet.' }));
  expect(ids((await desk(engineer)).returned)).toEqual([revisionId]);
  expect((await desk(checker)).toCheck).toEqual([]);
  await ok(submit(engineer, revisionId));
  await tickAll(checker, revisionId);
  await ok(approve(checker, revisionId));
  expect(ids((await desk(engineer)).toIssue)).toEqual([revisionId]);
  expect((await desk(other)).toIssue).toEqual([]);
});

test('shows campaigns in progress with how far they have come', async () => {
  await ok(engineer.put(`/campaigns/${bridge.campaignId}/cables/${bridge.cables[1]!.id}`, { notMeasuredReason: 'Nest' }));
  expect((await desk(engineer)).campaigns).toMatchObject([{ id: bridge.campaignId, cableCount: 2, measuredCount: 2, notMeasuredCount: 1 }]);
  await ok(engineer.patch(`/campaigns/${bridge.campaignId}`, { state: 'closed' }));
  expect((await desk(engineer)).campaigns).toEqual([]);
});

test('names cables whose intervals of the last two campaigns do not meet', async () => {
  expect((await desk(engineer)).moved).toEqual([]);
  const later = await surveyCampaign(engineer, bridge.structureId, bridge.cables, { startsOn: '2027-03-01', endsOn: null });
  expect((await desk(engineer)).moved).toEqual([]);
  const { spanId, measurementId } = later.cables[0]!;
  const raised = measurementBody(spanId, [1.8, 3.6, 5.41, 7.22, 9.04], { version: 1 });
  await ok(engineer.put(`/campaigns/${later.campaignId}/measurements/${measurementId}`, raised));
  await ok(engineer.post(`/campaigns/${later.campaignId}/estimates`, { measurementIds: null }));
  const { moved } = await desk(checker);
  expect(moved).toMatchObject([
    {
      cableId: later.cables[0]!.id,
      reference: 'W-01',
      structureName: 'Orrin Bridge',
      before: { startsOn: '2026-09-01', steelTemperature: 17 },
      after: { startsOn: '2027-03-01' },
    },
  ]);
  expect(moved[0].after.interval95[0]).toBeGreaterThan(moved[0].before.interval95[1]);
});
