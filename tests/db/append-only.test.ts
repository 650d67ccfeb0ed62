import { withFirm } from '@strandnote/db';
import { afterAll, beforeAll, expect, test } from 'vitest';
import { sql } from '../support/drizzle.ts';
import { addFirm, type Firm, type OpenDatabase, openTestDatabase } from '../support/fixtures.ts';
import { addIssuedReport } from '../support/report-fixtures.ts';
import { insufficientPrivilege, refused } from './sql-state.ts';

let database: OpenDatabase;
let firm: Firm;

const appendOnly = {
  estimates: 'engine_version',
  files: 'name',
  file_chunks: 'data',
  submissions: 'content',
  submission_sources: 'entity',
  signatures: 'statement',
  contributions: 'user_id',
  audit_events: 'act',
};

beforeAll(async () => {
  database = await openTestDatabase();
  firm = await addFirm(database, 'Ashdown');
  await addIssuedReport(database.app, firm);
  await withFirm(database.app, firm.engineer, (tx) =>
    tx.execute(sql`insert into audit_events (firm_id, at, actor_user_id, actor_name, act, subject_kind, subject_id, details)
      values (${firm.firmId}, now(), ${firm.engineer.userId}, 'E', 'report.created', 'report', 'r', '{}')`),
  );
});
afterAll(() => database.close());

const asApp = (statement: string) => withFirm(database.app, firm.engineer, (tx) => tx.execute(sql.raw(statement)));

test.each(Object.entries(appendOnly))('lets the application neither change nor delete rows of %s', async (table, column) => {
  await refused(asApp(`update ${table} set ${column} = ${column}`), insufficientPrivilege);
  await refused(asApp(`delete from ${table}`), insufficientPrivilege);
  await refused(asApp(`truncate ${table} cascade`), insufficientPrivilege);
});

test.each(Object.entries(appendOnly))('stops even an operator with every right by a trigger on %s', async (table, column) => {
  const { rows } = await database.superuser.query(`select count(*) from ${table}`);
  expect(Number(rows[0].count)).toBeGreaterThan(0);
  // By its own trigger: truncating also asks those of the tables that refer to it.
  const ownTrigger = new RegExp(`^Rows of ${table} are never changed`);
  await refused(database.superuser.query(`update ${table} set ${column} = ${column}`), 'SN004', ownTrigger);
  await refused(database.superuser.query(`delete from ${table}`), 'SN004', ownTrigger);
  await refused(database.superuser.query(`truncate ${table} cascade`), 'SN004', ownTrigger);
});

test('lets the application write neither contributions nor heads of the audit chain by hand', async () => {
  const { firmId, engineer } = firm;
  await refused(
    asApp(`insert into contributions values ('${firmId}', gen_random_uuid(), 'cable', gen_random_uuid(), '${engineer.userId}', now())`),
    insufficientPrivilege,
  );
  await refused(asApp(`update audit_heads set sequence = 0`), insufficientPrivilege);
  await refused(asApp(`delete from audit_heads`), insufficientPrivilege);
});

test('grants the application deletion of peaks, ticks and the cables of a draft, and of nothing else', async () => {
  const { rows } = await database.superuser.query(
    `select table_name::text as name from information_schema.role_table_grants
     where grantee = 'strandnote_app' and privilege_type in ('DELETE', 'TRUNCATE') order by 1`,
  );
  expect(rows.map(({ name }) => name)).toEqual(['cable_checks', 'modal_peaks', 'revision_cables']);
});

test('lets the application not turn the guards off', async () => {
  await refused(asApp('alter table estimates disable trigger append_only'), insufficientPrivilege);
  await refused(asApp(`set local session_replication_role = 'replica'`), insufficientPrivilege);
  await refused(asApp('set local role strandnote_owner'), insufficientPrivilege);
});
