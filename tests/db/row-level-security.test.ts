import { randomUUID } from 'node:crypto';
import { type Actor, schema, withFirm } from '@strandnote/db';
import { afterAll, beforeAll, expect, test } from 'vitest';
import { sql } from '../support/drizzle.ts';
import { addFirm, type Firm, type OpenDatabase, openTestDatabase, sectionValues } from '../support/fixtures.ts';
import { addIssuedReport, type IssuedReport } from '../support/report-fixtures.ts';
import { insufficientPrivilege, refused } from './sql-state.ts';

let database: OpenDatabase;
let mine: Firm;
let theirs: Firm;
let report: IssuedReport;
let tables: string[];

beforeAll(async () => {
  database = await openTestDatabase();
  mine = await addFirm(database, 'Ashdown');
  theirs = await addFirm(database, 'Birch');
  report = await addIssuedReport(database.app, theirs);
  await fillTheRest(theirs, report);
  const { rows } = await database.superuser.query("select tablename from pg_tables where schemaname = 'public' order by tablename");
  tables = rows.map(({ tablename }) => tablename);
});
afterAll(() => database.close());

/** The tables that a report does not touch on its way. */
async function fillTheRest({ firmId, engineer, clientId }: Firm, { bridge, draft, submitted }: IssuedReport): Promise<void> {
  await withFirm(database.app, engineer, async (tx) => {
    const reference = { kind: 'design', stage: 'In service', place: 'mean-chord', value: 2.1e6, source: 'Drawing 12' } as const;
    await tx.insert(schema.referenceTensions).values({ firmId, id: randomUUID(), cableId: bridge.cableId, ...reference });
    const remark = { revisionId: draft.revisionId, submissionId: submitted.submissionId, text: 'Well.', authorUserId: engineer.userId };
    await tx.insert(schema.checkComments).values({ firmId, id: randomUUID(), ...remark });
    const invited = { name: 'N', email: 'n@strandnote.example', roles: ['client' as const], clientId, tokenSha256: 'a'.repeat(64) };
    await tx.insert(schema.invitations).values({ firmId, id: randomUUID(), ...invited, expiresAt: new Date(), invitedBy: engineer.userId });
    const event = { at: new Date(), actorUserId: engineer.userId, actorName: engineer.name, act: 'client.changed', details: {} };
    await tx.insert(schema.auditEvents).values({ firmId, ...event, subjectKind: 'client', subjectId: clientId });
  });
}

function countAs(actor: Pick<Actor, 'firmId' | 'userId' | 'clientId'>, table: string, where = 'true'): Promise<number> {
  return withFirm(database.app, actor, async (tx) => {
    const { rows } = await tx.execute<{ count: string }>(sql.raw(`select count(*) from ${table} where ${where}`));
    return Number(rows[0]!.count);
  });
}

const inFirm = (table: string, firmId: string) => `${table === 'firms' ? 'id' : 'firm_id'} = '${firmId}'`;

test('covers every table there is: each holds rows of the other firm, seen by that firm', async () => {
  expect(tables.length).toBeGreaterThan(25);
  for (const table of tables) expect(await countAs(theirs.engineer, table, inFirm(table, theirs.firmId)), table).toBeGreaterThan(0);
});

test("hides every row of another firm from a query written by hand, and from one's own firm named beside it", async () => {
  for (const table of tables) {
    expect(await countAs(mine.engineer, table, inFirm(table, theirs.firmId)), table).toBe(0);
    expect(await countAs(mine.engineer, table, `not (${inFirm(table, mine.firmId)})`), table).toBe(0);
  }
});

test('gives nothing at all to a query that forgot the firm', async () => {
  for (const table of tables) {
    const { rows } = await database.app.$client.query(`select count(*) from ${table}`);
    expect(Number(rows[0].count), table).toBe(0);
    expect(await countAs({ firmId: '', userId: '', clientId: null }, table), table).toBe(0);
  }
});

test('carries nothing over to the next user of a pooled connection', async () => {
  const pool = database.app.$client;
  await Promise.all(Array.from({ length: 25 }, () => countAs(theirs.engineer, 'structures')));
  for (let turn = 0; turn < 25; turn++) {
    expect((await pool.query('select count(*), current_firm() from structures group by 2')).rows).toEqual([]);
  }
});

test('refuses a row for another firm, and changes or deletes none of theirs', async () => {
  const { bridge, survey } = report;
  const foreign = { firmId: theirs.firmId, id: randomUUID(), structureId: bridge.structureId, ...sectionValues };
  await refused(
    withFirm(database.app, mine.engineer, (tx) => tx.insert(schema.sections).values(foreign)),
    insufficientPrivilege,
  );
  await withFirm(database.app, mine.engineer, async (tx) => {
    const changed = await tx.execute(sql`update sections set name = 'x' where id = ${bridge.sectionId}`);
    const deleted = await tx.execute(sql`delete from modal_peaks where id = ${survey.peakId}`);
    expect([changed.rowCount, deleted.rowCount]).toEqual([0, 0]);
  });
});

test('refuses to move a row of the own firm into another', async () => {
  const { rows } = await database.superuser.query('select id from clients where firm_id = $1', [mine.firmId]);
  await refused(
    withFirm(database.app, mine.engineer, (tx) => tx.execute(sql`update clients set firm_id = ${theirs.firmId} where id = ${rows[0].id}`)),
    insufficientPrivilege,
  );
});

test('does not let the application make a firm, nor say whether another firm is a demonstration', async () => {
  const firm = { id: randomUUID(), name: 'Mine too', timeZone: 'UTC', letterhead: {} as never };
  await refused(
    withFirm(database.app, mine.engineer, (tx) => tx.insert(schema.firms).values(firm)),
    insufficientPrivilege,
  );
  await refused(
    withFirm(database.app, mine.engineer, (tx) => tx.execute(sql`update firms set demonstration = true`)),
    insufficientPrivilege,
  );
});

test('tells nobody whether somebody of another firm prepared a submission', async () => {
  const asked = sql`select has_prepared(${theirs.firmId}, ${report.submitted.submissionId}, ${theirs.engineer.userId}) as prepared`;
  const seenBy = (actor: Actor) => withFirm(database.app, actor, async (tx) => (await tx.execute(asked)).rows[0]);
  expect(await seenBy(theirs.checker)).toEqual({ prepared: true });
  expect(await seenBy(mine.engineer)).toEqual({ prepared: false });
});
