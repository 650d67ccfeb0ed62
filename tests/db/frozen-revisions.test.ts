import { randomUUID } from 'node:crypto';
import { schema } from '@strandnote/db';
import { afterAll, beforeAll, beforeEach, expect, test } from 'vitest';
import { eq } from '../support/drizzle.ts';
import { addBridge, type OpenDatabase, openTestDatabase, sha256 } from '../support/fixtures.ts';
import { tick } from '../support/report-fixtures.ts';
import { LifeOfARevision } from './life-of-a-revision.ts';
import { checkViolation, insufficientPrivilege, refused, uniqueViolation } from './sql-state.ts';

const { revisions } = schema;

let database: OpenDatabase;
let life: LifeOfARevision;

beforeAll(async () => {
  database = await openTestDatabase();
});
afterAll(() => database.close());
beforeEach(async () => {
  life = await LifeOfARevision.inFirm(database);
});

test.each(['in check', 'approved', 'issued', 'superseded', 'withdrawn'] as const)(
  'keeps its texts and cables while it is %s',
  async (state) => {
    life = await life.another(state);
    await refused(life.set({ texts: { scope: 'x', conditions: '', deviations: '', conclusion: '' } }), 'SN006', /texts .* frozen/);
    const { engineer, firmId } = life.firm;
    await refused(
      life.as(engineer, (tx) => tx.delete(schema.revisionCables).where(eq(schema.revisionCables.revisionId, life.draft.revisionId))),
      'SN006',
    );
    const covered = { firmId, id: randomUUID(), revisionId: life.draft.revisionId, cableId: life.bridge.cableId };
    await refused(
      life.as(engineer, (tx) => tx.insert(schema.revisionCables).values(covered)),
      'SN006',
    );
  },
);

test('is never changed after the issue but by superseding and withdrawing, each written once', async () => {
  life = await life.another('issued');
  const others: Partial<typeof revisions.$inferInsert>[] = [
    { signedFileId: null },
    { unsignedFileId: null },
    { approvedSubmissionId: null },
    { addressedClientId: null },
    { issuedAt: new Date(0) },
    { deputyUserId: 'x' },
    { returnedReason: 'x' },
  ];
  for (const change of others) await refused(life.set(change), 'SN006', /never changed/);
  await life.supersede();
  await refused(life.set({ supersededAt: new Date(0) }), 'SN006', /written once/);
  await life.withdraw();
  await refused(life.set({ withdrawnReason: 'Other.' }), 'SN006', /written once/);
});

test('is superseded by another revision of its report, and withdrawn with a reason', async () => {
  life = await life.another('issued');
  const elsewhere = (await life.another()).draft;
  for (const supersededBy of [elsewhere.revisionId, life.draft.revisionId, null]) {
    await refused(life.set({ state: 'superseded', supersededBy, supersededAt: new Date() }), 'SN006', /another revision of its report/);
  }
  await refused(life.set({ state: 'withdrawn', withdrawnAt: new Date(), withdrawnReason: '' }), 'SN006', /reason/);
});

test('keeps its number, author, code and report in every state', async () => {
  const other = (await life.another()).draft;
  for (const change of [{ letter: 'C' }, { authorUserId: 'x' }, { verificationCode: 'x' }, { reportId: other.reportId }]) {
    await refused(life.set(change), 'SN006', /What names a revision/);
  }
});

test('has one open revision and one issued one to a report', async () => {
  await refused(life.next(), uniqueViolation);
  life = await life.another('issued');
  const { database: db, firm, bridge, survey } = life;
  const next = new LifeOfARevision(db, firm, bridge, survey, await life.next());
  await next.submit();
  await next.approve();
  await refused(next.issue(), uniqueViolation);
});

test('is ticked and unticked while its last submission is in check, and only for cables that it covers', async () => {
  const { checker } = life.firm;
  const first = await life.submit();
  const other = await addBridge(database.app, life.firm.engineer);
  await refused(
    life.as(checker, (tx) => tick(tx, checker, first.submissionId, other.cableId)),
    'SN006',
    /does not cover/,
  );
  await life.set({ state: 'returned', returnedReason: 'Again.' });
  await refused(
    life.as(checker, (tx) => tick(tx, checker, first.submissionId, life.bridge.cableId)),
    'SN006',
    /in check/,
  );
  const submitted = await life.submit();
  await life.as(checker, (tx) => tick(tx, checker, submitted.submissionId, life.bridge.cableId));
  const untick = () =>
    life.as(checker, (tx) => tx.delete(schema.cableChecks).where(eq(schema.cableChecks.submissionId, submitted.submissionId)).returning());
  expect(await untick()).toHaveLength(1);
  await life.approve();
  await refused(untick(), 'SN006');
});

test('keeps a remark as it was said', async () => {
  const submitted = await life.submit();
  const remarkId = await life.remark(submitted.submissionId);
  const { checker } = life.firm;
  for (const change of [{ text: 'x' }, { authorUserId: 'x' }, { cableId: life.bridge.cableId }, { field: 'x' }]) {
    await refused(
      life.as(checker, (tx) => tx.update(schema.checkComments).set(change).where(eq(schema.checkComments.id, remarkId))),
      insufficientPrivilege,
    );
  }
});

test('is submitted only while it is written, with the hash of its content', async () => {
  const { firmId, engineer } = life.firm;
  const frozen = (contentSha256: string) => ({
    firmId,
    id: randomUUID(),
    revisionId: life.draft.revisionId,
    number: 9,
    content: 'c',
    contentSha256,
  });
  const insert = (contentSha256: string) =>
    life.as(engineer, (tx) => tx.insert(schema.submissions).values({ ...frozen(contentSha256), submittedBy: engineer.userId }));
  await refused(insert('f'.repeat(64)), checkViolation);
  await life.submit();
  await refused(insert(sha256('c')), 'SN006', /not submitted while it is in check/);
});

test('is frozen by the clock of the database, whatever time the application gives', async () => {
  const { firmId, engineer } = life.firm;
  const id = randomUUID();
  const backdated = { revisionId: life.draft.revisionId, number: 1, content: 'c', contentSha256: sha256('c'), frozenAt: new Date(0) };
  await life.as(engineer, (tx) => tx.insert(schema.submissions).values({ firmId, id, ...backdated, submittedBy: engineer.userId }));
  const { rows } = await database.superuser.query("select frozen_at > now() - interval '1 minute' as now from submissions where id = $1", [
    id,
  ]);
  expect(rows[0].now).toBe(true);
});
