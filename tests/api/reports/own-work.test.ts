import { randomUUID } from 'node:crypto';
import { afterAll, beforeAll, expect, test } from 'vitest';
import { type SignedIn, startTestServer, type TestServer } from '../../support/test-server.ts';
import { frequencies, measurementBody, ok, type SurveyedBridge, surveyBridge, surveyCampaign } from '../surveyed-bridge.ts';
import { approve, approveDraft, draftReport, issue, submit, tickAll } from './report-acts.ts';

let server: TestServer;
let firmId: string;
let clientId: string;
let engineer: SignedIn;
let checker: SignedIn;
/** Engineer and checker in one person, as small firms have them. */
let both: SignedIn;
let bridge: SurveyedBridge;

beforeAll(async () => {
  server = await startTestServer();
  firmId = await server.createFirm();
  clientId = await server.createClient(firmId);
  engineer = await server.join(firmId, { name: 'Ines Falk', roles: ['engineer'] });
  checker = await server.join(firmId, { name: 'Omar Reyes', roles: ['checker'] });
  both = await server.join(firmId, { name: 'Ada Brandt', roles: ['engineer', 'checker'] });
  bridge = await surveyBridge(engineer);
});
afterAll(() => server.stop());

const ownWork = { status: 403, code: 'own-work', detail: 'You prepared part of this revision, so someone else must check it.' };

async function expectOwnWork(person: SignedIn, revisionId: string): Promise<void> {
  const revision = (await ok(person.get(`/revisions/${revisionId}`))).body;
  for (const act of ['tick', 'remark', 'return', 'approve']) expect(revision.may[act]).toBe(ownWork.detail);
  const cableId = revision.content.cables[0].id;
  expect((await person.put(`/revisions/${revisionId}/ticks/${cableId}`, {})).body).toMatchObject(ownWork);
  const remark = { id: randomUUID(), cableId: null, field: '', text: 'Well done.' };
  expect((await person.post(`/revisions/${revisionId}/comments`, remark)).body).toMatchObject(ownWork);
  expect((await person.post(`/revisions/${revisionId}/return`, { reason: 'Not yet.' })).body).toMatchObject(ownWork);
  expect((await approve(person, revisionId)).body).toMatchObject(ownWork);
}

test('does not let the author check their own work, whatever their roles', async () => {
  const own = await surveyCampaign(both, bridge.structureId, bridge.cables);
  const { revisionId } = await draftReport(both, own.campaignId, clientId);
  await ok(submit(both, revisionId));
  await expectOwnWork(both, revisionId);
});

test('does not let somebody check who changed one peak of the campaign', async () => {
  const campaign = await surveyCampaign(engineer, bridge.structureId, bridge.cables);
  const { spanId, measurementId } = campaign.cables[0]!;
  const changed = measurementBody(spanId, [1.506, ...frequencies.slice(1)], { version: 1 });
  await ok(both.put(`/campaigns/${campaign.campaignId}/measurements/${measurementId}`, changed));
  await ok(engineer.post(`/campaigns/${campaign.campaignId}/estimates`, { measurementIds: null }));
  const { revisionId } = await draftReport(engineer, campaign.campaignId, clientId);
  await ok(submit(engineer, revisionId));
  await expectOwnWork(both, revisionId);
});

test('does not let somebody check who saved an estimate of the campaign', async () => {
  const campaign = await surveyCampaign(engineer, bridge.structureId, bridge.cables);
  const { spanId, measurementId } = campaign.cables[0]!;
  const changed = measurementBody(spanId, [1.506, ...frequencies.slice(1)], { version: 1 });
  await ok(engineer.put(`/campaigns/${campaign.campaignId}/measurements/${measurementId}`, changed));
  await ok(both.post(`/campaigns/${campaign.campaignId}/estimates`, { measurementIds: [measurementId] }));
  const { revisionId } = await draftReport(engineer, campaign.campaignId, clientId);
  await ok(submit(engineer, revisionId));
  await expectOwnWork(both, revisionId);
});

test('does not let somebody check who wrote in its texts', async () => {
  const campaign = await surveyCampaign(engineer, bridge.structureId, bridge.cables);
  const { revisionId } = await draftReport(engineer, campaign.campaignId, clientId);
  const { texts } = (await ok(both.get(`/revisions/${revisionId}`))).body;
  const written = { texts: { ...texts, conclusion: 'All within.' }, deputyUserId: null, textVersion: 2 };
  await ok(both.patch(`/revisions/${revisionId}`, written));
  await ok(submit(engineer, revisionId));
  await expectOwnWork(both, revisionId);
});

test('is kept by the database too, when the server forgets it', async () => {
  const campaign = await surveyCampaign(both, bridge.structureId, bridge.cables);
  const { revisionId } = await draftReport(both, campaign.campaignId, clientId);
  await ok(submit(both, revisionId));
  const { rows } = await server.superuser.query('select id, content_sha256 from submissions where revision_id = $1', [revisionId]);
  await server.superuser.query('begin');
  await server.superuser.query("select set_config('strandnote.firm_id', $1, true), set_config('strandnote.user_id', $2, true)", [
    firmId,
    both.userId,
  ]);
  const signing = server.superuser.query(
    `insert into signatures (firm_id, id, submission_id, revision_id, meaning, user_id, name, statement, content_sha256)
     values ($1, $2, $3, $4, 'checked and approved', $5, 'Ada Brandt', 'Checked.', $6)`,
    [firmId, randomUUID(), rows[0].id, revisionId, both.userId, rows[0].content_sha256],
  );
  await expect(signing).rejects.toMatchObject({ code: 'SN001' });
  await server.superuser.query('rollback');
});

test('lets somebody check a later campaign whose inputs of theirs were checked by another in an issued revision', async () => {
  // Both entered the section, the cables and the references of a bridge of their own; the first survey is the engineer's.
  const theirs = await surveyBridge(both);
  const first = await draftReport(both, theirs.campaignId, clientId);
  const second = await surveyCampaign(engineer, theirs.structureId, theirs.cables, { startsOn: '2026-10-01', endsOn: null });
  const later = await draftReport(engineer, second.campaignId, clientId);

  await ok(submit(engineer, later.revisionId));
  await expectOwnWork(both, later.revisionId);
  await ok(engineer.post(`/revisions/${later.revisionId}/recall`, {}));

  await approveDraft({ engineer: both, checker, runJobs: server.runJobs }, first.revisionId);
  await ok(issue(both, first.revisionId));
  await ok(submit(engineer, later.revisionId));
  const revision = (await ok(both.get(`/revisions/${later.revisionId}`))).body;
  expect(revision.may.tick).toBeNull();
  await tickAll(both, later.revisionId);
  expect((await ok(approve(both, later.revisionId))).body.state).toBe('approved');
});

test('asks nobody to check their own work', async () => {
  const campaign = await surveyCampaign(both, bridge.structureId, bridge.cables);
  const { revisionId } = await draftReport(both, campaign.campaignId, clientId);
  await server.runJobs();
  server.mail.length = 0;
  await ok(submit(both, revisionId));
  await server.runJobs();
  expect(server.mail.flatMap(({ to }) => to)).toEqual([checker.email]);
  const waiting = async (person: SignedIn) => (await ok(person.get('/desk'))).body.toCheck.map(({ id }: { id: string }) => id);
  expect(await waiting(checker)).toContain(revisionId);
  expect(await waiting(both)).not.toContain(revisionId);
});
