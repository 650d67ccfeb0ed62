import { randomUUID } from 'node:crypto';
import { type Actor, schema, withFirm } from '@strandnote/db';
import { afterAll, beforeAll, describe, expect, test } from 'vitest';
import { sql } from '../support/drizzle.ts';
import { addFirm, type Firm, type OpenDatabase, openTestDatabase } from '../support/fixtures.ts';
import { addIssuedReport, type IssuedReport } from '../support/report-fixtures.ts';
import { insufficientPrivilege, refused } from './sql-state.ts';

const { auditEvents, checkComments, invitations, referenceTensions } = schema;

let database: OpenDatabase;
let mine: Firm;
let theirs: Firm;

/** The tables into which the application writes rows; the first test finds any that is missing here. */
const written = [
  ...['audit_events', 'cable_checks', 'cables', 'campaign_cables', 'campaigns', 'check_comments', 'clients', 'estimates', 'file_chunks'],
  ...['files', 'invitations', 'measurements', 'members', 'modal_peaks', 'reference_tensions', 'reports', 'revision_cables', 'revisions'],
  ...['sections', 'signatures', 'spans', 'structures', 'submission_sources', 'submissions'],
];

beforeAll(async () => {
  database = await openTestDatabase();
  mine = await addFirm(database, 'Ashdown');
  theirs = await addFirm(database, 'Birch');
  await fillTheRest(mine, await addIssuedReport(database.app, mine));
  // Policies alone are looked at: with the guards and keys off, nothing else stands in the way of a row for another firm.
  for (const table of written) await database.superuser.query(`alter table ${table} disable trigger all`);
});
afterAll(() => database.close());

/** The tables that a report does not touch on its way. */
async function fillTheRest({ firmId, engineer, clientId }: Firm, { bridge, draft, submitted }: IssuedReport): Promise<void> {
  await withFirm(database.app, engineer, async (tx) => {
    const reference = { kind: 'design', stage: 'In service', place: 'mean-chord', value: 2.1e6, source: 'Drawing 12' } as const;
    await tx.insert(referenceTensions).values({ firmId, id: randomUUID(), cableId: bridge.cableId, ...reference });
    const remark = { revisionId: draft.revisionId, submissionId: submitted.submissionId, text: 'Well.', authorUserId: engineer.userId };
    await tx.insert(checkComments).values({ firmId, id: randomUUID(), ...remark });
    const invited = { name: 'N', email: 'n@strandnote.example', roles: ['client' as const], clientId, tokenSha256: 'a'.repeat(64) };
    await tx.insert(invitations).values({ firmId, id: randomUUID(), ...invited, expiresAt: new Date(), invitedBy: engineer.userId });
    const event = { at: new Date(), actorUserId: engineer.userId, actorName: engineer.name, act: 'client.changed', details: {} };
    await tx.insert(auditEvents).values({ firmId, ...event, subjectKind: 'client', subjectId: clientId });
  });
}

/** Writes a row like one of our own, under this firm, and takes it back. */
async function writeCopy(table: string, actor: Actor, firmId: string): Promise<number> {
  const row = await database.superuser.query(`select to_jsonb(t) as one from ${table} t where firm_id = $1 limit 1`, [mine.firmId]);
  const copy = JSON.stringify({ ...row.rows[0].one, ...uniques(table), firm_id: firmId });
  let count = 0;
  const rollback = new Error('taken back');
  const { rows } = await database.superuser.query(
    `select string_agg(quote_ident(column_name), ', ') as columns from information_schema.columns
     where table_schema = 'public' and table_name = $1 and is_generated = 'NEVER'`,
    [table],
  );
  const { columns } = rows[0];
  await withFirm(database.app, actor, async (tx) => {
    const insert = sql`insert into ${sql.raw(table)} (${sql.raw(columns)})
      select ${sql.raw(columns)} from jsonb_populate_record(null::${sql.raw(table)}, ${copy}::jsonb)`;
    count = (await tx.execute(insert)).rowCount ?? 0;
    throw rollback;
  }).catch((error: unknown) => {
    if (error !== rollback) throw error;
  });
  return count;
}

/** What may stand once only, made anew. */
function uniques(table: string): Record<string, unknown> {
  const once: Record<string, Record<string, unknown>> = {
    audit_events: { sequence: 900 },
    file_chunks: { index: 900 },
    members: { user_id: randomUUID() },
    cables: { reference: 'W-99u' },
    campaigns: { number: 99 },
    campaign_cables: { cable_id: randomUUID() },
    modal_peaks: { mode: 9 },
    invitations: { token_sha256: 'b'.repeat(64) },
    reports: { number: 'SN-99' },
    revisions: { letter: 'Z', state: 'approved', verification_code: randomUUID() },
    revision_cables: { cable_id: randomUUID() },
    submissions: { number: 99 },
    submission_sources: { entity_id: randomUUID() },
    cable_checks: { cable_id: randomUUID() },
  };
  return { id: randomUUID(), ...once[table] };
}

test('names every table into which the application writes', async () => {
  const { rows } = await database.superuser.query(
    `select c.relname as name from pg_class c where c.relnamespace = 'public'::regnamespace and c.relkind = 'r'
     and (has_table_privilege('strandnote_app', c.oid, 'INSERT') or has_any_column_privilege('strandnote_app', c.oid, 'INSERT')) order by 1`,
  );
  expect(rows.map(({ name }) => name)).toEqual([...written].sort());
});

describe.each(written)('%s', (table) => {
  test('takes a row of the own firm, so that nothing but the firm is what is refused below', async () => {
    expect(await writeCopy(table, mine.engineer, mine.firmId)).toBe(1);
  });

  test('refuses a row for another firm, or for none', async () => {
    await refused(writeCopy(table, mine.engineer, theirs.firmId), insufficientPrivilege, /row-level security/);
    await refused(writeCopy(table, mine.engineer, randomUUID()), insufficientPrivilege, /row-level security/);
  });

  test('refuses a row by somebody who set no firm', async () => {
    const nobody = { ...mine.engineer, firmId: '', userId: '' };
    await refused(writeCopy(table, nobody, mine.firmId), insufficientPrivilege, /row-level security/);
  });

  test('refuses to move a row into another firm', async () => {
    const move = sql.raw(`update ${table} set firm_id = '${theirs.firmId}'`);
    await refused(
      withFirm(database.app, mine.engineer, (tx) => tx.execute(move)),
      insufficientPrivilege,
    );
  });

  test('refuses a row by a client, though the firm is the right one', async () => {
    await refused(writeCopy(table, mine.client, mine.firmId), insufficientPrivilege, /row-level security/);
  });
});
