import { type Actor, schema, withFirm } from '@strandnote/db';
import { afterAll, beforeAll, expect, test } from 'vitest';
import { eq, sql } from '../support/drizzle.ts';
import { actorIn, addFirm, addMember, type Firm, type OpenDatabase, openTestDatabase } from '../support/fixtures.ts';
import {
  addDraft,
  addIssuedReport,
  addRevision,
  approve,
  type Draft,
  type IssuedReport,
  issue,
  sourcesOf,
  submit,
} from '../support/report-fixtures.ts';
import { insufficientPrivilege, refused } from './sql-state.ts';

let database: OpenDatabase;
let firm: Firm;
let issued: IssuedReport;
let draft: Draft;
/** A person of another client of the same firm. */
let stranger: Actor;

beforeAll(async () => {
  database = await openTestDatabase();
  firm = await addFirm(database, 'Ashdown');
  issued = await addIssuedReport(database.app, firm);
  draft = await addDraft(database.app, firm.engineer, firm, issued.bridge, issued.survey);
  const otherClientId = '00000000-0000-4000-8000-000000000001';
  await database.superuser.query("insert into clients (firm_id, id, name) values ($1, $2, 'Other client')", [firm.firmId, otherClientId]);
  stranger = actorIn(firm.firmId, 'Stranger', ['client'], otherClientId);
  await addMember(database.superuser, stranger);
});
afterAll(() => database.close());

async function visibleTo(actor: Actor): Promise<Record<string, number>> {
  const { rows: tables } = await database.superuser.query("select tablename from pg_tables where schemaname = 'public' order by 1");
  const counts: Record<string, number> = {};
  await withFirm(database.app, actor, async (tx) => {
    for (const { tablename } of tables) {
      const { rows } = await tx.execute<{ count: string }>(sql.raw(`select count(*) from ${tablename}`));
      if (Number(rows[0]!.count) > 0) counts[tablename] = Number(rows[0]!.count);
    }
  });
  return counts;
}

test('shows a client the frozen content, signatures and signed file that were addressed to it, itself and the firm, nothing else', async () => {
  expect(await visibleTo(firm.client)).toEqual({
    ...{ firms: 1, members: 1, reports: 1, revisions: 1, submissions: 1, signatures: 3, files: 1, file_chunks: 1 },
  });
  const seen = await withFirm(database.app, firm.client, async (tx) => ({
    revisions: (await tx.select().from(schema.revisions)).map(({ id }) => id),
    files: (await tx.select().from(schema.files)).map(({ id }) => id),
    members: (await tx.select().from(schema.members)).map(({ userId }) => userId),
  }));
  expect(seen).toEqual({ revisions: [issued.draft.revisionId], files: [issued.signedFileId], members: [firm.client.userId] });
});

test('shows another client of the firm nothing of it', async () => {
  expect(await visibleTo(stranger)).toEqual({ firms: 1, members: 1 });
});

test('goes by the addressee at the issue, not by the client that the report or the structure has since', async () => {
  await database.superuser.query('update reports set client_id = $1 where id = $2', [stranger.clientId, issued.draft.reportId]);
  expect((await visibleTo(stranger)).revisions).toBeUndefined();
  expect((await visibleTo(firm.client)).revisions).toBe(1);
  await database.superuser.query('update reports set client_id = $1 where id = $2', [firm.clientId, issued.draft.reportId]);
});

test('goes on showing a revision that was superseded or withdrawn, and never a draft, one in check or one approved', async () => {
  const { bridge, survey } = issued;
  const { engineer, checker, client } = firm;
  const statesSeen = async () =>
    withFirm(database.app, client, async (tx) =>
      (await tx.select().from(schema.revisions)).map(({ letter, state }) => `${letter} ${state}`).sort(),
    );
  const second = await withFirm(database.app, engineer, (tx) => addRevision(tx, engineer, { ...issued.draft, letter: 'B' }));
  expect(await statesSeen()).toEqual(['A issued']);
  const submitted = await submit(database.app, engineer, second, sourcesOf(bridge, survey, second.revisionId));
  await approve(database.app, checker, second, submitted);
  expect(await statesSeen()).toEqual(['A issued']);
  await withFirm(database.app, engineer, (tx) =>
    tx
      .update(schema.revisions)
      .set({ state: 'superseded', supersededBy: second.revisionId, supersededAt: new Date() })
      .where(eq(schema.revisions.id, issued.draft.revisionId)),
  );
  await issue(database.app, engineer, second, submitted);
  expect(await statesSeen()).toEqual(['A superseded', 'B issued']);
  await withFirm(database.app, engineer, (tx) =>
    tx
      .update(schema.revisions)
      .set({ state: 'withdrawn', withdrawnAt: new Date(), withdrawnReason: 'A wrong mass.' })
      .where(eq(schema.revisions.id, second.revisionId)),
  );
  expect(await statesSeen()).toEqual(['A superseded', 'B withdrawn']);
  expect(draft.revisionId).not.toBe(second.revisionId);
});

test('goes by the state too: what was addressed to them before its issue stays hidden', async () => {
  const { superuser } = database;
  const address = async (clientId: string | null) => {
    await superuser.query("set session_replication_role = 'replica'");
    await superuser.query('update revisions set addressed_client_id = $1 where id = $2', [clientId, draft.revisionId]);
    await superuser.query("set session_replication_role = 'origin'");
  };
  const before = await visibleTo(firm.client);
  await address(firm.clientId);
  expect(await visibleTo(firm.client)).toEqual(before);
  await address(null);
});

test('lets a client write an event in their own name, and neither read the trail nor write in another name', async () => {
  const event = (actorUserId: string) => ({
    firmId: firm.firmId,
    at: new Date(),
    actorUserId,
    actorName: 'Reader',
    act: 'report.downloaded',
    subjectKind: 'revision',
    subjectId: issued.draft.revisionId,
    details: {},
  });
  await withFirm(database.app, firm.client, async (tx) => {
    await tx.insert(schema.auditEvents).values(event(firm.client.userId));
    expect(await tx.select().from(schema.auditEvents)).toEqual([]);
  });
  await refused(
    withFirm(database.app, firm.client, (tx) => tx.insert(schema.auditEvents).values(event(firm.engineer.userId))),
    insufficientPrivilege,
  );
});

test('lets a client change how they see units, and not become staff or somebody of another client', async () => {
  const change = (set: object) =>
    withFirm(database.app, firm.client, (tx) => tx.update(schema.members).set(set).returning({ userId: schema.members.userId }));
  expect(await change({ units: 'us' })).toEqual([{ userId: firm.client.userId }]);
  await refused(change({ roles: ['engineer'], clientId: null }), insufficientPrivilege);
  await refused(change({ clientId: stranger.clientId }), insufficientPrivilege);
});

test('lets a client insert, change or delete nothing of the firm', async () => {
  const { firmId, client } = firm;
  await refused(
    withFirm(database.app, client, (tx) => tx.insert(schema.clients).values({ firmId, id: draft.revisionId, name: 'Mine' })),
    insufficientPrivilege,
  );
  await withFirm(database.app, client, async (tx) => {
    const statements = [sql`update revisions set deputy_user_id = 'x'`, sql`update firms set name = 'x'`, sql`delete from modal_peaks`];
    for (const statement of statements) expect((await tx.execute(statement)).rowCount).toBe(0);
  });
});
