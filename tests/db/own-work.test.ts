import { randomUUID } from 'node:crypto';
import { type Actor, schema, withFirm } from '@strandnote/db';
import { afterAll, beforeAll, beforeEach, expect, test } from 'vitest';
import { eq, sql } from '../support/drizzle.ts';
import {
  actorIn,
  addBridge,
  addEstimate,
  addFirm,
  addSurvey,
  type Bridge,
  type Firm,
  type OpenDatabase,
  openTestDatabase,
  peakValues,
  type Survey,
} from '../support/fixtures.ts';
import { addDraft, addRevision, approve, type Draft, issue, sign, sourcesOf, submit, tick } from '../support/report-fixtures.ts';
import { refused } from './sql-state.ts';

let database: OpenDatabase;
let firm: Firm;
let bridge: Bridge;
let survey: Survey;
let draft: Draft;
/** Somebody who may do everything, as in small firms. */
let both: Actor;

beforeAll(async () => {
  database = await openTestDatabase();
});
afterAll(() => database.close());
beforeEach(async () => {
  firm = await addFirm(database, 'Ashdown');
  both = actorIn(firm.firmId, 'Both', ['engineer', 'checker']);
  bridge = await addBridge(database.app, firm.engineer);
  survey = await addSurvey(database.app, firm.engineer, bridge);
  draft = await addDraft(database.app, firm.engineer, firm, bridge, survey);
});

const submitDraft = (actor = firm.engineer) => submit(database.app, actor, draft, sourcesOf(bridge, survey, draft.revisionId));
const as = <Result>(actor: Actor, statement: Parameters<typeof withFirm<Result>>[2]) => withFirm(database.app, actor, statement);

async function expectRefusedToCheck(person: Actor): Promise<void> {
  const submitted = await submitDraft();
  const { revisionId } = draft;
  await refused(
    as(person, (tx) => tick(tx, person, submitted.submissionId, bridge.cableId)),
    'SN001',
  );
  await refused(
    as(person, (tx) => sign(tx, person, { revisionId, ...submitted, meaning: 'checked and approved' })),
    'SN001',
    /someone else must check it/,
  );
  expect(await approve(database.app, firm.checker, draft, submitted)).toBe(true);
}

test('lets somebody who had no part in it tick and approve', async () => {
  expect(await approve(database.app, both, draft, await submitDraft())).toBe(true);
});

test('refuses ticks and approvals of the author', async () => {
  await expectRefusedToCheck(firm.engineer);
});

test('refuses whoever submitted it, though another wrote it', async () => {
  const submitted = await submitDraft(both);
  await refused(
    as(both, (tx) => tick(tx, both, submitted.submissionId, bridge.cableId)),
    'SN001',
  );
});

test.each<[string, (actor: Actor) => Promise<unknown>]>([
  ['a section', (actor) => as(actor, (tx) => tx.execute(sql`update sections set steel_mass = 25 where id = ${bridge.sectionId}`))],
  ['a cable', (actor) => as(actor, (tx) => tx.execute(sql`update cables set notes = 'x' where id = ${bridge.cableId}`))],
  ['a span', (actor) => as(actor, (tx) => tx.execute(sql`update spans set inclination = 0.4 where id = ${bridge.spanId}`))],
  ['the campaign', (actor) => as(actor, (tx) => tx.execute(sql`update campaigns set weather = 'x' where id = ${survey.campaignId}`))],
  ['a measurement', (actor) => as(actor, (tx) => tx.execute(sql`update measurements set note = 'x' where id = ${survey.measurementId}`))],
  ['a peak', (actor) => as(actor, (tx) => tx.execute(sql`update modal_peaks set frequency = 1.5 where id = ${survey.peakId}`))],
  ['the texts', (actor) => as(actor, (tx) => tx.execute(sql`update revisions set texts = '{}' where id = ${draft.revisionId}`))],
])('refuses whoever changed %s that it uses', async (_, change) => {
  await change(both);
  await expectRefusedToCheck(both);
});

test('refuses whoever added a peak, took one away, or saved an estimate that it uses', async () => {
  const { firmId } = firm;
  const added = actorIn(firmId, 'Added', ['engineer']);
  const { measurementId, campaignId, peakId } = survey;
  await as(added, (tx) => tx.insert(schema.modalPeaks).values({ firmId, id: randomUUID(), measurementId, ...peakValues, mode: 2 }));
  await as(both, (tx) => tx.delete(schema.modalPeaks).where(eq(schema.modalPeaks.id, peakId)));
  const saved = actorIn(firmId, 'Saved', ['engineer']);
  const estimateId = randomUUID();
  await as(saved, (tx) => addEstimate(tx, saved, { estimateId, measurementId, spanId: bridge.spanId, campaignId }));
  survey = { ...survey, estimateId };
  const submitted = await submitDraft();
  for (const person of [added, both, saved]) {
    await refused(
      as(person, (tx) => tick(tx, person, submitted.submissionId, bridge.cableId)),
      'SN001',
    );
  }
});

test('does not count what somebody did to rows that it does not use, nor what was done after it was frozen', async () => {
  const other = await addBridge(database.app, both);
  const submitted = await submitDraft();
  await as(both, (tx) => tx.execute(sql`update sections set steel_mass = 25 where id in (${bridge.sectionId}, ${other.sectionId})`));
  expect(await approve(database.app, both, draft, submitted)).toBe(true);
});

test('does not count the moves of a revision, which change no text', async () => {
  await as(both, (tx) => tx.execute(sql`update revisions set deputy_user_id = 'x', changed_at = now() where id = ${draft.revisionId}`));
  expect(await approve(database.app, both, draft, await submitDraft())).toBe(true);
});

test('writes a contribution for every value that is entered or changed, and refuses one by nobody', async () => {
  const { rows } = await database.superuser.query(
    'select entity, user_id, count(*)::int from contributions where firm_id = $1 group by 1, 2 order by 1',
    [firm.firmId],
  );
  const by = (entity: string, count: number) => ({ entity, user_id: firm.engineer.userId, count });
  expect(rows).toEqual([
    by('cable', 1),
    by('campaign', 1),
    by('estimate', 1),
    by('measurement', 2),
    by('revision', 1),
    by('section', 1),
    by('span', 1),
  ]);
  await refused(
    as({ ...firm.engineer, userId: '' }, (tx) => tx.execute(sql`update sections set steel_mass = 25 where id = ${bridge.sectionId}`)),
    'SN005',
  );
});

test('lets nobody sign, tick or submit in the name of another', async () => {
  const submitted = await submitDraft();
  const { revisionId } = draft;
  await refused(
    as(firm.engineer, (tx) => sign(tx, firm.checker, { revisionId, ...submitted, meaning: 'checked and approved' })),
    'SN002',
  );
  await refused(
    as(firm.engineer, (tx) => tick(tx, firm.checker, submitted.submissionId, bridge.cableId)),
    'SN002',
  );
  const next = await addDraft(database.app, firm.engineer, firm, bridge, survey);
  const frozen = { id: randomUUID(), revisionId: next.revisionId, number: 1, content: 'c', submittedBy: firm.engineer.userId };
  await refused(
    as(both, (tx) => tx.insert(schema.submissions).values({ firmId: firm.firmId, ...frozen, contentSha256: 'f'.repeat(64) })),
    'SN002',
  );
});

test('refuses a signature for other content than the submission has', async () => {
  const { submissionId } = await submitDraft();
  const stale = { revisionId: draft.revisionId, submissionId, contentSha256: 'f'.repeat(64), meaning: 'checked and approved' } as const;
  await refused(
    as(firm.checker, (tx) => sign(tx, firm.checker, stale)),
    'SN003',
  );
});

interface Later {
  bridge: Bridge;
  survey: Survey;
  draft: Draft;
}

/** `both` entered the bridge; a first report on it may be issued; a second campaign and its report are the engineer's. */
async function laterReport(first: 'issued' | 'approved' | 'superseded' | 'withdrawn', checker: Actor): Promise<Later> {
  const theirs = await addBridge(database.app, both);
  const firstSurvey = await addSurvey(database.app, firm.engineer, theirs);
  const firstDraft = await addDraft(database.app, firm.engineer, firm, theirs, firstSurvey);
  const submitted = await submit(database.app, firm.engineer, firstDraft, sourcesOf(theirs, firstSurvey, firstDraft.revisionId));
  await approve(database.app, checker, firstDraft, submitted);
  if (first !== 'approved') await issue(database.app, firm.engineer, firstDraft, submitted);
  if (first === 'withdrawn') {
    const set = { state: 'withdrawn', withdrawnAt: new Date(), withdrawnReason: 'Wrong.' } as const;
    await as(firm.engineer, (tx) => tx.update(schema.revisions).set(set).where(eq(schema.revisions.id, firstDraft.revisionId)));
  }
  if (first === 'superseded') {
    const next = await as(firm.engineer, (tx) => addRevision(tx, firm.engineer, { ...firstDraft, letter: 'B' }));
    const set = { state: 'superseded', supersededBy: next.revisionId, supersededAt: new Date() } as const;
    await as(firm.engineer, (tx) => tx.update(schema.revisions).set(set).where(eq(schema.revisions.id, firstDraft.revisionId)));
  }
  const secondSurvey = await addSurvey(database.app, firm.engineer, theirs, 2);
  const secondDraft = await addDraft(database.app, firm.engineer, firm, theirs, secondSurvey);
  return { bridge: theirs, survey: secondSurvey, draft: secondDraft };
}

async function mayTick(person: Actor, later: Later): Promise<boolean> {
  const sources = sourcesOf(later.bridge, later.survey, later.draft.revisionId);
  const { submissionId } = await submit(database.app, firm.engineer, later.draft, sources);
  const ticking = as(person, (tx) => tick(tx, person, submissionId, later.bridge.cableId));
  return ticking.then(
    () => true,
    (error: { cause: { code: string } }) => {
      expect(error.cause.code).toBe('SN001');
      return false;
    },
  );
}

test('no longer counts a value that another person has checked in an issued revision since', async () => {
  expect(await mayTick(both, await laterReport('issued', firm.checker))).toBe(true);
});

test('still counts it while that revision is only approved, or when it was withdrawn', async () => {
  expect(await mayTick(both, await laterReport('approved', firm.checker))).toBe(false);
  expect(await mayTick(both, await laterReport('withdrawn', firm.checker))).toBe(false);
});

test('goes on not counting it when that revision was superseded since', async () => {
  const later = await laterReport('superseded', firm.checker);
  expect(await mayTick(both, later)).toBe(true);
});

test('still counts it when the checker of that revision was the same person, who could not have checked it by the rules', async () => {
  const later = await laterReport('issued', firm.checker);
  await database.superuser.query("set session_replication_role = 'replica'");
  await database.superuser.query("update signatures set user_id = $1 where firm_id = $2 and meaning = 'checked and approved'", [
    both.userId,
    firm.firmId,
  ]);
  await database.superuser.query("set session_replication_role = 'origin'");
  expect(await mayTick(both, later)).toBe(false);
});

test('counts it again once it was changed after that revision was frozen', async () => {
  const later = await laterReport('issued', firm.checker);
  await as(both, (tx) => tx.execute(sql`update sections set steel_mass = 25.1 where id = ${later.bridge.sectionId}`));
  expect(await mayTick(both, later)).toBe(false);
});

test('lets nobody add a source to an earlier submission, which would pass a value off as checked', async () => {
  const { submissionId } = await submitDraft();
  const source = { firmId: firm.firmId, id: randomUUID(), submissionId, entity: 'section', entityId: randomUUID() };
  await refused(
    as(firm.engineer, (tx) => tx.insert(schema.submissionSources).values(source)),
    'SN006',
  );
});
