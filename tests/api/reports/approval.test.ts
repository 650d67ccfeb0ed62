import { randomUUID } from 'node:crypto';
import { afterAll, beforeAll, beforeEach, expect, test } from 'vitest';
import { type SignedIn, startTestServer, type TestServer } from '../../support/test-server.ts';
import { frequencies, measurementBody, ok, type SurveyedBridge, surveyBridge } from '../surveyed-bridge.ts';
import { approve, draftReport, issue, submit, tickAll } from './report-acts.ts';

let server: TestServer;
let clientId: string;
let engineer: SignedIn;
let other: SignedIn;
let checker: SignedIn;
let secondChecker: SignedIn;
let bridge: SurveyedBridge;
let revisionId: string;

beforeAll(async () => {
  server = await startTestServer();
  const firmId = await server.createFirm();
  clientId = await server.createClient(firmId);
  engineer = await server.join(firmId, { name: 'Ines Falk', roles: ['engineer'] });
  other = await server.join(firmId, { name: 'Jon Abel', roles: ['engineer'] });
  checker = await server.join(firmId, { name: 'Omar Reyes', roles: ['checker'] });
  secondChecker = await server.join(firmId, { name: 'Ulla Berg', roles: ['checker'] });
  bridge = await surveyBridge(engineer);
});
afterAll(() => server.stop());
beforeEach(async () => {
  revisionId = (await draftReport(engineer, bridge.campaignId, clientId)).revisionId;
});

test('is given once when two checkers approve at the same moment', async () => {
  await ok(submit(engineer, revisionId));
  await tickAll(checker, revisionId);
  const replies = await Promise.all([approve(checker, revisionId), approve(secondChecker, revisionId)]);
  expect(replies.map(({ status }) => status).sort()).toEqual([200, 409]);
  const { signatures } = (await ok(engineer.get(`/revisions/${revisionId}`))).body;
  expect(signatures.filter(({ meaning }: { meaning: string }) => meaning === 'checked and approved')).toHaveLength(1);
});

test('is refused while a cable is not ticked', async () => {
  await ok(submit(engineer, revisionId));
  await ok(checker.put(`/revisions/${revisionId}/ticks/${bridge.cables[0]!.id}`, {}));
  expect((await approve(checker, revisionId)).body).toMatchObject({ status: 409, detail: '1 cable to look at.' });
  await ok(checker.put(`/revisions/${revisionId}/ticks/${bridge.cables[1]!.id}`, {}));
  await ok(checker.delete(`/revisions/${revisionId}/ticks/${bridge.cables[1]!.id}`));
  expect((await approve(checker, revisionId)).status).toBe(409);
});

test('is refused for a hash that is not the one in check', async () => {
  await ok(submit(engineer, revisionId));
  await tickAll(checker, revisionId);
  const refused = await approve(checker, revisionId, { contentSha256: 'a'.repeat(64) });
  expect(refused.body).toMatchObject({ status: 409, code: 'stale-content' });
});

test('is refused with a wrong password, beside the field, and nothing is signed', async () => {
  await ok(submit(engineer, revisionId));
  await tickAll(checker, revisionId);
  const refused = await approve(checker, revisionId, { password: 'not the password' });
  expect(refused.body).toMatchObject({ code: 'wrong-password', errors: [{ field: 'password' }] });
  const { state, signatures } = (await ok(engineer.get(`/revisions/${revisionId}`))).body;
  expect(state).toBe('in check');
  expect(signatures).toHaveLength(1);
});

test('cannot be given by an engineer, nor for a draft', async () => {
  expect((await approve(checker, revisionId)).body).toMatchObject({
    status: 409,
    detail: 'The revision is a draft, so there is nothing to check.',
  });
  await ok(submit(engineer, revisionId));
  expect((await approve(other, revisionId)).status).toBe(403);
});

test('may be taken back with a reason before the report is issued; its PDF is then made anew', async () => {
  await ok(submit(engineer, revisionId));
  await tickAll(checker, revisionId);
  await ok(approve(checker, revisionId));
  const returned = (await ok(checker.post(`/revisions/${revisionId}/return`, { reason: 'One more look.' }))).body;
  expect(returned).toMatchObject({ state: 'returned', returnedReason: 'One more look.', pdfReady: false });
  // The job that was put into the queue at approval comes too late and leaves no file.
  await server.runJobs();
  expect((await ok(engineer.get(`/revisions/${revisionId}`))).body.pdfReady).toBe(false);
  expect((await issue(engineer, revisionId)).status).toBe(409);
});

test('freezes the content: what changes afterwards in the tables changes nothing of it', async () => {
  const before = (await ok(submit(engineer, revisionId))).body;
  const { spanId, measurementId } = bridge.cables[0]!;
  await ok(
    engineer.put(
      `/campaigns/${bridge.campaignId}/measurements/${measurementId}`,
      measurementBody(spanId, [1.6, 3.2, 4.8, 6.4, 8.0], { version: 1 }),
    ),
  );
  await ok(engineer.post(`/campaigns/${bridge.campaignId}/estimates`, { measurementIds: null }));
  const after = (await ok(checker.get(`/revisions/${revisionId}`))).body;
  expect(after.content).toEqual(before.content);
  expect(after.contentSha256).toBe(before.contentSha256);
  const texts = { scope: 'x', conditions: 'x', deviations: 'x', conclusion: 'x' };
  const edit = await engineer.patch(`/revisions/${revisionId}`, { texts, deputyUserId: null, textVersion: 2 });
  expect(edit.body).toMatchObject({ status: 409, code: 'conflict' });
  await ok(
    engineer.put(`/campaigns/${bridge.campaignId}/measurements/${measurementId}`, measurementBody(spanId, frequencies, { version: 2 })),
  );
  await ok(engineer.post(`/campaigns/${bridge.campaignId}/estimates`, { measurementIds: null }));
});

test('is followed by an issue by the author or the deputy, and by nobody else', async () => {
  const { texts } = (await ok(engineer.get(`/revisions/${revisionId}`))).body;
  await ok(engineer.patch(`/revisions/${revisionId}`, { texts, deputyUserId: other.userId, textVersion: 2 }));
  await ok(submit(engineer, revisionId));
  await tickAll(checker, revisionId);
  await ok(approve(checker, revisionId));
  await server.runJobs();
  expect((await issue(engineer, revisionId, 'not the password')).body.code).toBe('wrong-password');
  expect((await issue(checker, revisionId)).status).toBe(403);
  expect((await ok(issue(other, revisionId))).body.state).toBe('issued');
});

test('is not followed by an issue by an engineer who is neither', async () => {
  await ok(submit(engineer, revisionId));
  await tickAll(checker, revisionId);
  await ok(approve(checker, revisionId));
  await server.runJobs();
  expect((await issue(other, revisionId)).body).toMatchObject({ status: 403, code: 'forbidden' });
});

test('refuses a deputy who is no engineer, and texts that somebody else has saved meanwhile', async () => {
  const { texts } = (await ok(engineer.get(`/revisions/${revisionId}`))).body;
  const asDeputy = await engineer.patch(`/revisions/${revisionId}`, { texts, deputyUserId: checker.userId, textVersion: 2 });
  expect(asDeputy.body.errors[0].field).toBe('deputyUserId');
  const stale = await other.patch(`/revisions/${revisionId}`, { texts: { ...texts, scope: 'Mine.' }, deputyUserId: null, textVersion: 1 });
  expect(stale.body).toMatchObject({ status: 409, code: 'changed-elsewhere', textVersion: 2, texts });
});

test('takes the same submission or remark sent twice for one', async () => {
  const { contentSha256 } = (await ok(engineer.get(`/revisions/${revisionId}`))).body;
  const submission = { submissionId: randomUUID(), name: 'Ines Falk', contentSha256 };
  await ok(engineer.post(`/revisions/${revisionId}/submissions`, submission));
  const again = (await ok(engineer.post(`/revisions/${revisionId}/submissions`, submission))).body;
  expect(again).toMatchObject({ submissionNumber: 1, state: 'in check' });
  const remark = { id: randomUUID(), cableId: null, field: 'scope', text: 'Name the stays.' };
  await ok(checker.post(`/revisions/${revisionId}/comments`, remark));
  await ok(checker.post(`/revisions/${revisionId}/comments`, remark));
  expect((await ok(checker.get(`/revisions/${revisionId}`))).body.comments).toHaveLength(1);
  expect((await checker.post(`/revisions/${revisionId}/comments`, { ...remark, text: 'Other.' })).status).toBe(409);
});

test('is not reached by a submission of content that has changed since it was seen, or that is not complete', async () => {
  const refused = await engineer.post(`/revisions/${revisionId}/submissions`, {
    submissionId: randomUUID(),
    name: 'Ines Falk',
    contentSha256: 'b'.repeat(64),
  });
  expect(refused.body).toMatchObject({ status: 409, code: 'stale-content' });
  const empty = { scope: '', conditions: '', deviations: '', conclusion: '' };
  await ok(engineer.patch(`/revisions/${revisionId}`, { texts: empty, deputyUserId: null, textVersion: 2 }));
  const blocked = await submit(engineer, revisionId);
  expect(blocked.body).toMatchObject({ status: 409, code: 'blocked' });
  expect(blocked.body.errors).toHaveLength(4);
  expect((await submit(other, revisionId)).status).toBe(403);
});
