import { createHash } from 'node:crypto';
import { schema, verifyAuditChain, withFirm } from '@strandnote/db';
import { afterAll, beforeAll, beforeEach, expect, test } from 'vitest';
import { addFirm, type Firm, type OpenDatabase, openTestDatabase } from '../support/fixtures.ts';

let database: OpenDatabase;
let firm: Firm;

beforeAll(async () => {
  database = await openTestDatabase();
});
beforeEach(async () => {
  firm = await addFirm(database, 'Ashdown');
});
afterAll(() => database.close());

function record(act: string, details: Record<string, unknown> = {}) {
  const { firmId, engineer } = firm;
  const event = { firmId, at: new Date('2026-09-14T08:00:00.123Z'), actorUserId: engineer.userId, actorName: engineer.name, act };
  return withFirm(database.app, engineer, async (tx) => {
    const [row] = await tx
      .insert(schema.auditEvents)
      .values({ ...event, subjectKind: 'firm', subjectId: firmId, details })
      .returning();
    return row!;
  });
}

const verify = () => withFirm(database.app, firm.engineer, (tx) => verifyAuditChain(tx, firm.firmId));

/** Changes what can only be changed by an operator who turns the guards off first. */
async function tamper(statement: string, values: unknown[] = []): Promise<void> {
  await database.superuser.query("set session_replication_role = 'replica'");
  await database.superuser.query(statement, values);
  await database.superuser.query("set session_replication_role = 'origin'");
}

test('is stamped by the database, whatever the application gives', async () => {
  const { firmId, engineer } = firm;
  const [row] = await withFirm(database.app, engineer, (tx) =>
    tx
      .insert(schema.auditEvents)
      .values({
        ...{
          firmId,
          at: new Date(),
          actorUserId: engineer.userId,
          actorName: 'E',
          act: 'a',
          subjectKind: 'firm',
          subjectId: 'f',
          details: {},
        },
        ...{ sequence: 77, previousHash: 'mine', hash: 'mine' },
      })
      .returning(),
  );
  expect(row).toMatchObject({ sequence: 1, previousHash: '0'.repeat(64), hash: expect.stringMatching(/^[0-9a-f]{64}$/) });
});

test('can be recomputed by anybody from the documented text', async () => {
  await record('first');
  const row = await record('second', { b: 1.5, a: ['ü', null, { z: true }] });
  // PostgreSQL prints jsonb with its keys sorted by length and then by bytes, and a space after each colon and comma.
  const details = '{"a": ["ü", null, {"z": true}], "b": 1.5}';
  const { firmId, sequence, actorUserId, actorName, subjectId, previousHash } = row;
  const names = `"${actorUserId}", "${actorName}", "second", "firm", "${subjectId}"`;
  const text = `["${firmId}", ${sequence}, 1789372800.123000, ${names}, ${details}, "${previousHash}"]`;
  expect(row.hash).toBe(createHash('sha256').update(text, 'utf8').digest('hex'));
});

test('has no gap and one order under twenty writers at once, some of whom give up', async () => {
  const writers = Array.from({ length: 20 }, async (_, writer) => {
    for (let turn = 0; turn < 5; turn++) {
      const writing = withFirm(database.app, firm.engineer, async (tx) => {
        const { firmId, engineer } = firm;
        const event = { firmId, at: new Date(), actorUserId: engineer.userId, actorName: 'E', act: `${writer}-${turn}` };
        await tx.insert(schema.auditEvents).values({ ...event, subjectKind: 'firm', subjectId: firmId, details: {} });
        if (turn === 2) throw new Error('gives up');
      });
      await writing.catch((error: Error) => expect(error.message).toBe('gives up'));
    }
  });
  await Promise.all(writers);
  const { rows } = await database.superuser.query('select sequence from audit_events where firm_id = $1 order by sequence', [firm.firmId]);
  expect(rows.map(({ sequence }) => Number(sequence))).toEqual(Array.from({ length: 80 }, (_, index) => index + 1));
  expect(await verify()).toMatchObject({ events: 80, faults: [] });
});

test('is one chain per firm', async () => {
  await record('first');
  const first = firm;
  firm = await addFirm(database, 'Birch');
  expect((await record('first')).sequence).toBe(1);
  expect((await withFirm(database.app, first.engineer, (tx) => verifyAuditChain(tx, firm.firmId))).events).toBe(0);
});

test('is intact when nothing was done to it, and names its head', async () => {
  await record('first');
  const { hash } = await record('second');
  expect(await verify()).toEqual({ events: 2, head: hash, faults: [] });
});

test.each([
  ['details = \'{"x": 1}\'', 'changed'],
  ["actor_name = 'Somebody else'", 'changed'],
  ["at = at + interval '1 microsecond'", 'changed'],
  ["hash = repeat('f', 64)", 'changed'],
])('names an event in which %s was written later', async (change) => {
  for (const act of ['first', 'second', 'third']) await record(act);
  await tamper(`update audit_events set ${change} where firm_id = $1 and sequence = 2`, [firm.firmId]);
  const { faults } = await verify();
  expect(faults[0]).toEqual({ sequence: 2, message: 'Event 2 was changed after it was written.' });
});

test('names an event that was changed and hashed anew by the one that follows it', async () => {
  for (const act of ['first', 'second', 'third']) await record(act);
  await tamper("update audit_events set act = 'other' where firm_id = $1 and sequence = 2", [firm.firmId]);
  await tamper('update audit_events e set hash = audit_hash(e) where firm_id = $1 and sequence = 2', [firm.firmId]);
  expect((await verify()).faults).toEqual([{ sequence: 3, message: 'Event 3 does not follow event 2.' }]);
});

test('names events that are missing in the middle', async () => {
  for (const act of ['first', 'second', 'third', 'fourth']) await record(act);
  await tamper('delete from audit_events where firm_id = $1 and sequence in (2, 3)', [firm.firmId]);
  expect((await verify()).faults).toContainEqual({ sequence: 4, message: 'Events 2 to 3 are missing.' });
});

test('names a tail that was cut off, and a head that is gone', async () => {
  for (const act of ['first', 'second']) await record(act);
  await tamper('delete from audit_events where firm_id = $1 and sequence = 2', [firm.firmId]);
  expect((await verify()).faults).toEqual([{ sequence: 2, message: 'The head names event 2, which is not the last one.' }]);
  await tamper('delete from audit_heads where firm_id = $1', [firm.firmId]);
  expect((await verify()).faults).toEqual([{ sequence: 1, message: 'The head of the chain is missing; the last event is 1.' }]);
});
