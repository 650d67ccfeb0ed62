import { afterAll, beforeAll, expect, test } from 'vitest';
import { startTestServer, type TestServer } from '../../support/test-server.ts';
import { approveDraft, draftReport, issue } from '../reports/report-acts.ts';
import { ok, surveyBridge } from '../surveyed-bridge.ts';

let server: TestServer;
let issued: { code: string; sha256: string };
let draftCode: string;

beforeAll(async () => {
  server = await startTestServer();
  const firmId = await server.createFirm();
  const clientId = await server.createClient(firmId);
  const engineer = await server.join(firmId, { name: 'Ines Falk', roles: ['engineer'] });
  const checker = await server.join(firmId, { name: 'Omar Reyes', roles: ['checker'] });
  const bridge = await surveyBridge(engineer);
  const { revisionId } = await draftReport(engineer, bridge.campaignId, clientId);
  await approveDraft({ engineer, checker, runJobs: server.runJobs }, revisionId);
  await ok(issue(engineer, revisionId));
  const [report] = (await ok(engineer.get('/issued'))).body.items;
  issued = { code: report.verificationCode, sha256: report.sha256 };
  const draft = await draftReport(engineer, bridge.campaignId, clientId);
  draftCode = (await ok(engineer.get(`/revisions/${draft.revisionId}`))).body.verificationCode;
});
afterAll(() => server.stop());

const verify = (key: string) => server.anonymous('get', `/verification/${encodeURIComponent(key)}`);

test('tells anyone who holds the code that the report is genuine and current', async () => {
  expect((await verify(issued.code)).body).toEqual({
    code: issued.code,
    reportNumber: 'SN-0001',
    letter: 'A',
    firmName: 'Falk and Reyes',
    structureName: 'Orrin Bridge',
    state: 'issued',
    issuedAt: expect.any(String),
    supersededByLetter: null,
    supersededAt: null,
    withdrawnAt: null,
    sha256: issued.sha256,
    demonstration: false,
  });
});

test('reads the code however it was typed, and the hash of the file instead', async () => {
  expect((await verify(issued.code.toLowerCase().replace(/-/g, ' '))).body.code).toBe(issued.code);
  expect((await verify(issued.sha256.toUpperCase())).body.code).toBe(issued.code);
});

test('tells nothing of a draft, nor whether a code is near', async () => {
  const unknown = await verify('0000-0000-0000-0000');
  expect(unknown.status).toBe(404);
  expect((await verify(draftCode)).body).toEqual(unknown.body);
  expect((await verify('what is this')).body).toEqual(unknown.body);
});

test('does not let anybody try codes', async () => {
  const replies = await Promise.all(Array.from({ length: 40 }, () => verify('1111-1111-1111-1111')));
  expect(replies.filter(({ status }) => status === 429).length).toBeGreaterThan(0);
});
