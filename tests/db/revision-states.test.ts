import { randomUUID } from 'node:crypto';
import { setTimeout } from 'node:timers/promises';
import { schema } from '@strandnote/db';
import { afterAll, beforeAll, beforeEach, expect, test } from 'vitest';
import { and, eq } from '../support/drizzle.ts';
import { type OpenDatabase, openTestDatabase } from '../support/fixtures.ts';
import { sign, storeText, tick } from '../support/report-fixtures.ts';
import { LifeOfARevision } from './life-of-a-revision.ts';
import { refused, uniqueViolation } from './sql-state.ts';

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

/** Every move that there is, as it is made. */
const moves: Record<string, () => Promise<unknown>> = {
  'draft > in check': () => life.submit(),
  'in check > draft': () => life.set({ state: 'draft' }),
  'in check > returned': () => life.set({ state: 'returned', returnedReason: 'No.' }),
  'in check > approved': () => life.approve(),
  'returned > draft': () => life.set({ state: 'draft' }),
  'returned > in check': () => life.submit(),
  'approved > returned': () => life.set({ state: 'returned', approvedSubmissionId: null, approvedAt: null, unsignedFileId: null }),
  'approved > issued': () => life.issue(),
  'issued > superseded': () => life.supersede(),
  'issued > withdrawn': () => life.withdraw(),
  'superseded > withdrawn': () => life.withdraw(),
};
const states = schema.revisionStates;
const pairs = states.flatMap((from) => states.filter((to) => to !== from).map((to) => [from, to] as const));

test.each(pairs)('goes from %s to %s only where there is such a move', async (from, to) => {
  life = await life.another(from);
  const move = moves[`${from} > ${to}`];
  if (move) await move();
  else await refused(life.set({ state: to }), 'SN006', /does not go from/);
  const { rows } = await database.superuser.query('select state from revisions where id = $1', [life.draft.revisionId]);
  expect(rows[0].state).toBe(move ? to : from);
});

test('begins as an empty draft, and in no other state', async () => {
  const { firmId, userId } = life.firm.engineer;
  const texts = { scope: '', conditions: '', deviations: '', conclusion: '' };
  const insert = (given: object) =>
    life.as(life.firm.engineer, (tx) =>
      tx.insert(revisions).values({
        ...{
          firmId,
          id: randomUUID(),
          reportId: life.draft.reportId,
          letter: 'Z',
          authorUserId: userId,
          texts,
          verificationCode: randomUUID(),
        },
        ...given,
      }),
    );
  for (const state of states.filter((other) => other !== 'draft')) await refused(insert({ state }), 'SN006', /begins as a draft/);
  await refused(insert({ issuedAt: new Date() }), 'SN006');
  await refused(insert({}), uniqueViolation);
});

/** Waits until some transaction waits for a lock, a second at most: without the lock there would be nothing to wait for. */
async function somebodyWaits(): Promise<void> {
  for (let look = 0; look < 50; look++) {
    const { rows } = await database.superuser.query(
      'select 1 from pg_locks l join pg_stat_activity a using (pid) where not l.granted and a.datname = current_database()',
    );
    if (rows.length > 0) return;
    await setTimeout(20);
  }
}

test('lets nobody sign for an approval while another is being given', async () => {
  const submitted = await life.submit();
  const { checker } = life.firm;
  const second = { ...checker, userId: randomUUID(), name: 'Second checker' };
  const signed = { revisionId: life.draft.revisionId, ...submitted, meaning: 'checked and approved' } as const;
  const approval = { state: 'approved', approvedSubmissionId: submitted.submissionId } as const;
  let late: Promise<unknown> = Promise.resolve();
  await life.as(checker, async (tx) => {
    await tick(tx, checker, submitted.submissionId, life.bridge.cableId);
    await sign(tx, checker, signed);
    late = refused(
      life.as(second, (other) => sign(other, second, signed)),
      'SN006',
      /while the revision is approved/,
    );
    await somebodyWaits();
    await tx.update(revisions).set(approval).where(eq(revisions.id, life.draft.revisionId));
  });
  await late;
});

test('lets one of two conditional updates at the same moment find its row', async () => {
  await life.submit();
  const move = (state: 'draft' | 'returned') =>
    life.as(life.firm.engineer, (tx) =>
      tx
        .update(revisions)
        .set({ state })
        .where(and(eq(revisions.id, life.draft.revisionId), eq(revisions.state, 'in check')))
        .returning({ id: revisions.id }),
    );
  const found = await Promise.all([move('draft'), move('returned'), move('draft'), move('returned')]);
  expect(found.map(({ length }) => length).sort()).toEqual([0, 0, 0, 1]);
});

test('goes into check only with a submission that its preparer signed', async () => {
  await refused(life.set({ state: 'in check' }), 'SN006', /preparer signed/);
});

test('is approved only with the signature of a checker, all ticks, no open remark, and for its last submission', async () => {
  const first = await life.submit();
  await life.set({ state: 'returned', returnedReason: 'Again.' });
  const submitted = await life.submit();
  const { revisionId } = life.draft;
  const { checker } = life.firm;
  const approval = { state: 'approved', approvedSubmissionId: submitted.submissionId } as const;
  await refused(life.set(approval, checker), 'SN006', /signature of its checker/);
  await refused(
    life.as(checker, (tx) => sign(tx, checker, { revisionId, ...first, meaning: 'checked and approved' })),
    'SN006',
    /earlier submission/,
  );
  await life.as(checker, (tx) => sign(tx, checker, { revisionId, ...submitted, meaning: 'checked and approved' }));
  await refused(life.set(approval, checker), 'SN006', /not ticked/);
  await life.as(checker, (tx) => tick(tx, checker, submitted.submissionId, life.bridge.cableId));
  const remarkId = await life.remark(submitted.submissionId);
  await refused(life.set(approval, checker), 'SN006', /remark is open/);
  await life.as(checker, (tx) => tx.update(schema.checkComments).set({ state: 'closed' }).where(eq(schema.checkComments.id, remarkId)));
  await refused(life.set({ ...approval, approvedSubmissionId: first.submissionId }, checker), 'SN006', /signature of its checker/);
  expect(await life.set(approval, checker)).toEqual([{ state: 'approved' }]);
});

test('is issued only with what was rendered and signed, to the client of its report', async () => {
  life = await life.another('approved');
  const { engineer, firmId, clientId } = life.firm;
  const stranger = randomUUID();
  await database.superuser.query("insert into clients (firm_id, id, name) values ($1, $2, 'Other')", [firmId, stranger]);
  const unsignedFileId = await life.as(engineer, (tx) => storeText(tx, engineer, 'report-unsigned', 'unsigned'));
  const signedFileId = await life.as(engineer, (tx) => storeText(tx, engineer, 'report-signed', 'signed'));
  const issuing = { state: 'issued', issuedAt: new Date(), unsignedFileId, signedFileId, addressedClientId: clientId } as const;
  await refused(life.set(issuing), 'SN006', /only with its signed file/);
  await life.as(engineer, async (tx) =>
    sign(tx, engineer, { revisionId: life.draft.revisionId, ...(await life.latest()), meaning: 'issued' }),
  );
  const without: Partial<typeof issuing>[] = [
    { ...issuing, signedFileId: undefined },
    { ...issuing, unsignedFileId: undefined },
    { ...issuing, issuedAt: undefined },
  ];
  for (const lacking of without) await refused(life.set(lacking), 'SN006', /only with its signed file/);
  await refused(life.set({ ...issuing, signedFileId: unsignedFileId }), 'SN006', /only with its signed file/);
  await refused(life.set({ ...issuing, addressedClientId: stranger }), 'SN006', /to the client of its report/);
  expect(await life.set(issuing)).toEqual([{ state: 'issued' }]);
});

test('keeps what was approved until it is issued or returned', async () => {
  life = await life.another('approved');
  const { engineer } = life.firm;
  const [first, second] = await life.as(engineer, async (tx) => [
    await storeText(tx, engineer, 'report-unsigned', 'first'),
    await storeText(tx, engineer, 'report-unsigned', 'second'),
  ]);
  await life.set({ unsignedFileId: first! });
  await refused(life.set({ unsignedFileId: second! }), 'SN006', /keeps what was approved/);
  await refused(life.set({ approvedSubmissionId: null }), 'SN006', /keeps what was approved/);
});
