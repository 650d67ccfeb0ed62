import { afterAll, beforeAll, expect, test } from 'vitest';
import { type SignedIn, startTestServer, type TestServer } from '../../support/test-server.ts';
import { approveDraft, draftReport, issue } from '../reports/report-acts.ts';
import { ok, surveyBridge } from '../surveyed-bridge.ts';
import { readCsv } from './read-csv.ts';

let server: TestServer;
let client: SignedIn;
let revisionId: string;

beforeAll(async () => {
  server = await startTestServer();
  const firmId = await server.createFirm();
  const clientId = await server.createClient(firmId);
  const engineer = await server.join(firmId, { name: 'Ines Falk', roles: ['engineer'] });
  const checker = await server.join(firmId, { name: 'Omar Reyes', roles: ['checker'] });
  client = await server.join(firmId, { name: 'Tove Lind', roles: ['client'], clientId });
  const bridge = await surveyBridge(engineer);
  ({ revisionId } = await draftReport(engineer, bridge.campaignId, clientId));
  await approveDraft({ engineer, checker, runJobs: server.runJobs }, revisionId);
  await ok(issue(engineer, revisionId));
});
afterAll(() => server.stop());

test('gives the client a table that equals the content', async () => {
  const { content } = (await ok(client.get(`/issued/${revisionId}`))).body;
  const csv = await client.get(`/issued/${revisionId}/results.csv`);
  expect(csv.headers['content-type']).toBe('text/csv; charset=utf-8');
  const rows = readCsv(csv.text);
  expect(rows.map(({ cable }) => cable)).toEqual(content.cables.map(({ reference }: { reference: string }) => reference));
  for (const [index, cable] of content.cables.entries()) {
    const { output } = cable.spans[0].estimate;
    expect(Number(rows[index]!.tension_N)).toBe(output.tension);
    expect(Number(rows[index]!.tension_95_low_N)).toBe(output.interval95[0]);
    expect(Number(rows[index]!.tension_95_high_N)).toBe(output.interval95[1]);
    expect(rows[index]!.zone).toBe(cable.spans[0].decision.zone);
  }
});

test('gives the signatures of the submission that was issued', async () => {
  const { signatures, contentSha256 } = (await ok(client.get(`/issued/${revisionId}`))).body;
  expect(signatures.map(({ meaning, name }: { meaning: string; name: string }) => [meaning, name])).toEqual([
    ['prepared', 'Ines Falk'],
    ['checked and approved', 'Omar Reyes'],
    ['issued', 'Ines Falk'],
  ]);
  for (const signature of signatures) expect(signature.contentSha256).toBe(contentSha256);
});

test('is not found by its number, as a draft, or in another firm', async () => {
  expect((await client.get('/issued/not-an-id')).status).toBe(400);
  const other = await server.createFirm('Brandt Survey');
  const stranger = await server.join(other, { name: 'Lea Moor', roles: ['engineer'] });
  expect((await stranger.get(`/issued/${revisionId}`)).status).toBe(404);
  expect((await ok(stranger.get('/issued'))).body.items).toEqual([]);
});
