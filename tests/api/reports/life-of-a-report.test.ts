import { createHash, randomUUID } from 'node:crypto';
import { readFileSync } from 'node:fs';
import { afterAll, beforeAll, expect, test } from 'vitest';
import { type SignedIn, startTestServer, type TestServer } from '../../support/test-server.ts';
import { ok, type SurveyedBridge, surveyBridge } from '../surveyed-bridge.ts';
import { approve, approveDraft, draftReport, issue, submit, tickAll } from './report-acts.ts';

let server: TestServer;
let engineer: SignedIn;
let checker: SignedIn;
let client: SignedIn;
let stranger: SignedIn;
let clientId: string;
let bridge: SurveyedBridge;

beforeAll(async () => {
  server = await startTestServer();
  const firmId = await server.createFirm();
  clientId = await server.createClient(firmId);
  const otherClient = await server.createClient(firmId, 'Harbour Board');
  engineer = await server.join(firmId, { name: 'Ines Falk', roles: ['engineer'] });
  checker = await server.join(firmId, { name: 'Omar Reyes', roles: ['checker'] });
  client = await server.join(firmId, { name: 'Tove Lind', roles: ['client'], clientId });
  stranger = await server.join(firmId, { name: 'Pia Holm', roles: ['client'], clientId: otherClient });
  bridge = await surveyBridge(engineer);
});
afterAll(() => server.stop());

const stateOf = async (revisionId: string) => (await ok(engineer.get(`/revisions/${revisionId}`))).body.state;

test('goes from draft through a return to an issued report, and is superseded by its next revision', async () => {
  const { reportId, revisionId } = await draftReport(engineer, bridge.campaignId, clientId);
  const draft = (await ok(engineer.get(`/revisions/${revisionId}`))).body;
  expect(draft).toMatchObject({ letter: 'A', state: 'draft', reportNumber: 'SN-0001', blockers: [] });
  expect(draft.content.cables.map((cable: { reference: string }) => cable.reference)).toEqual(['W-01', 'W-02']);

  const submitted = (await ok(submit(engineer, revisionId))).body;
  expect(submitted).toMatchObject({ state: 'in check', submissionNumber: 1, contentSha256: draft.contentSha256 });
  expect(submitted.signatures[0]).toMatchObject({ meaning: 'prepared', name: 'Ines Falk', contentSha256: draft.contentSha256 });
  await server.runJobs();
  expect(server.mail.at(-1)).toMatchObject({ to: [checker.email] });
  expect(server.mail.at(-1)!.text).toContain(`checking/${revisionId}`);

  await tickAll(checker, revisionId);
  const remark = randomUUID();
  const cableId = bridge.cables[0]!.id;
  await ok(checker.post(`/revisions/${revisionId}/comments`, { id: remark, cableId, field: '', text: 'Is mode 4 not mode 5?' }));
  await ok(checker.post(`/revisions/${revisionId}/return`, { reason: 'Look at the modes of W-01.' }));
  await server.runJobs();
  expect(server.mail.at(-1)).toMatchObject({ to: [engineer.email] });
  expect(server.mail.at(-1)!.text).toContain('Look at the modes of W-01.');

  const answered = await ok(
    engineer.patch(`/revisions/${revisionId}/comments/${remark}`, { answer: 'It is mode 4; the string fit shows it.' }),
  );
  expect(answered.body).toMatchObject({ answer: 'It is mode 4; the string fit shows it.', answeredBy: 'Ines Falk', state: 'open' });
  const again = (await ok(submit(engineer, revisionId))).body;
  expect(again).toMatchObject({ state: 'in check', submissionNumber: 2, ticks: [] });

  await tickAll(checker, revisionId);
  expect((await approve(checker, revisionId)).body).toMatchObject({ status: 409, detail: '1 remark open.' });
  await ok(checker.patch(`/revisions/${revisionId}/comments/${remark}`, { state: 'closed' }));
  const approved = (await ok(approve(checker, revisionId))).body;
  expect(approved).toMatchObject({ state: 'approved', pdfReady: false });
  expect((await issue(engineer, revisionId)).body.detail).toContain('rendered');
  await server.runJobs();
  expect((await ok(engineer.get(`/revisions/${revisionId}`))).body.pdfReady).toBe(true);

  const issued = (await ok(issue(engineer, revisionId))).body;
  expect(issued.state).toBe('issued');
  expect(issued.signatures.map((signature: { meaning: string }) => signature.meaning)).toEqual([
    'prepared',
    'prepared',
    'checked and approved',
    'issued',
  ]);
  await server.runJobs();
  expect(server.mail.at(-1)).toMatchObject({ to: [client.email] });

  const next = randomUUID();
  const second = (await ok(engineer.post(`/reports/${reportId}/revisions`, { id: next }))).body;
  expect(second).toMatchObject({ letter: 'B', state: 'draft', texts: draft.texts });
  await approveDraft({ engineer, checker, runJobs: server.runJobs }, next);
  await ok(issue(engineer, next));
  expect(await stateOf(revisionId)).toBe('superseded');
  const list = (await ok(client.get('/issued'))).body.items;
  expect(list.map((report: { letter: string; state: string }) => [report.letter, report.state])).toEqual([
    ['B', 'issued'],
    ['A', 'superseded'],
  ]);
  expect(list[1].supersededByLetter).toBe('B');

  await ok(engineer.post(`/revisions/${next}/withdrawal`, { reason: 'The mass of the sheath was wrong.' }));
  const verified = (await server.anonymous('get', `/verification/${list[0].verificationCode}`)).body;
  expect(verified).toMatchObject({ state: 'withdrawn', reportNumber: 'SN-0001', letter: 'B', sha256: list[0].sha256 });
});

test('signs the very bytes that were rendered at approval', async () => {
  const { rows } = await server.superuser.query(
    `select (select string_agg(data, '' order by index) from file_chunks c where c.file_id = r.unsigned_file_id) as unsigned,
       (select string_agg(data, '' order by index) from file_chunks c where c.file_id = r.signed_file_id) as signed
     from revisions r where r.letter = 'A' and r.signed_file_id is not null`,
  );
  const { unsigned, signed } = rows[0] as { unsigned: Buffer; signed: Buffer };
  // A line break after the last mark of the file is all that may go.
  expect(unsigned.subarray(signed.length).toString('latin1').trim()).toBe('');
  expect(signed.subarray(-5).toString('latin1')).toBe('%%EOF');
  const differing = [...signed.keys()].filter((place) => signed[place] !== unsigned[place]);
  const { index } = /\/ByteRange/.exec(signed.toString('latin1'))!;
  const end = signed.indexOf('endobj', index);
  expect(differing.length).toBeGreaterThan(1000);
  // Nothing but the signature's own object: its byte range, its time and itself.
  expect(differing[0]).toBeGreaterThan(signed.lastIndexOf('endobj', index));
  expect(differing.at(-1)).toBeLessThan(end);
});

test('shows the PDF of a draft as it would look, and keeps nothing of it', async () => {
  const { revisionId } = await draftReport(engineer, bridge.campaignId, clientId);
  const filesBefore = (await server.superuser.query('select count(*) from files')).rows[0].count;
  const preview = await ok(checker.get(`/revisions/${revisionId}/preview.pdf`));
  expect(preview.headers['content-type']).toBe('application/pdf');
  expect(preview.bytes.subarray(0, 5).toString('latin1')).toBe('%PDF-');
  expect((await server.superuser.query('select count(*) from files')).rows[0].count).toBe(filesBefore);
});

test('renders the PDF of an approval once, however often the job runs', async () => {
  const { revisionId } = await draftReport(engineer, bridge.campaignId, clientId);
  await approveDraft({ engineer, checker, runJobs: server.runJobs }, revisionId);
  const { rows } = await server.superuser.query('select firm_id, unsigned_file_id, approved_submission_id from revisions where id = $1', [
    revisionId,
  ]);
  const { firm_id: firmId, unsigned_file_id: file, approved_submission_id: submissionId } = rows[0];
  const again = JSON.stringify({ firmId, userId: checker.userId, revisionId, submissionId });
  await server.superuser.query("select graphile_worker.add_job('render-report', $1::json)", [again]);
  await server.runJobs();
  const after = await server.superuser.query('select unsigned_file_id from revisions where id = $1', [revisionId]);
  expect(after.rows[0].unsigned_file_id).toBe(file);
  const rendered = await server.superuser.query("select 1 from audit_events where act = 'revision.rendered' and subject_id = $1", [
    revisionId,
  ]);
  expect(rendered.rowCount).toBe(1);
});

test('recalls a revision that is in check, and keeps what was submitted', async () => {
  const { revisionId } = await draftReport(engineer, bridge.campaignId, clientId);
  await ok(submit(engineer, revisionId));
  expect((await ok(engineer.post(`/revisions/${revisionId}/recall`, {}))).body).toMatchObject({ state: 'draft', submissionNumber: 1 });
  expect((await engineer.post(`/revisions/${revisionId}/recall`, {})).status).toBe(409);
});

test('shows a client what was addressed to them and nothing else', async () => {
  const [report] = (await ok(client.get('/issued'))).body.items;
  expect((await ok(stranger.get('/issued'))).body.items).toEqual([]);
  for (const path of ['', '/report.pdf', '/results.csv', '/content.json']) {
    expect((await stranger.get(`/issued/${report.revisionId}${path}`)).status).toBe(404);
    expect((await client.get(`/issued/${report.revisionId}${path}`)).status).toBe(200);
  }
  for (const path of ['/campaigns', '/reports', `/revisions/${report.revisionId}`, `/campaigns/${bridge.campaignId}`, '/desk']) {
    expect((await client.get(path)).status).toBe(403);
  }
});

test('writes down each download, and gives the very bytes and the very text that were signed for', async () => {
  const [report] = (await ok(client.get('/issued'))).body.items;
  const pdf = await client.get(`/issued/${report.revisionId}/report.pdf`);
  expect(createHash('sha256').update(pdf.bytes).digest('hex')).toBe(report.sha256);
  expect(pdf.headers['content-disposition']).toContain('SN-0001-B.pdf');
  const content = await client.get(`/issued/${report.revisionId}/content.json`);
  const detail = (await ok(client.get(`/issued/${report.revisionId}`))).body;
  expect(createHash('sha256').update(content.bytes).digest('hex')).toBe(detail.contentSha256);
  const { rows } = await server.superuser.query(
    "select act from audit_events where subject_id = $1 and actor_name = 'Tove Lind' order by sequence desc limit 2",
    [report.revisionId],
  );
  expect(rows.map(({ act }) => act)).toEqual(['content.downloaded', 'report.downloaded']);
});

test('appends the head of the audit chain to the anchor file when staff sign in and when a report is issued', async () => {
  const anchors = readFileSync(server.anchorFile, 'utf8')
    .trim()
    .split('\n')
    .map((line) => JSON.parse(line));
  const { rows } = await server.superuser.query(
    `select sequence, hash from audit_events e join members m on m.user_id = e.actor_user_id
     where act = 'revision.issued' or (act = 'session.started' and m.client_id is null) order by sequence`,
  );
  expect(anchors.map(({ sequence, hash }) => ({ sequence, hash }))).toEqual(
    rows.map(({ sequence, hash }) => ({ sequence: Number(sequence), hash })),
  );
});
