import { randomUUID } from 'node:crypto';
import { createDb, type Db, withFirm } from '@strandnote/db';
import { afterAll, beforeAll, beforeEach, expect, test } from 'vitest';
import { sql } from '../support/drizzle.ts';
import { actorIn, addFirm, addMember, type Firm, type OpenDatabase, openTestDatabase, sha256 } from '../support/fixtures.ts';
import { LifeOfARevision } from './life-of-a-revision.ts';
import { foreignKeyViolation, insufficientPrivilege, refused } from './sql-state.ts';

let database: OpenDatabase;
let owner: Db;
let firm: Firm;

beforeAll(async () => {
  database = await openTestDatabase();
  owner = createDb(database.urls.owner, { connections: 1 });
});
beforeEach(async () => {
  firm = await addFirm(database, 'Ashdown');
});
afterAll(async () => {
  await owner.$client.end();
  await database.close();
});

const ask = async (statement: ReturnType<typeof sql>, db = database.app) => (await db.execute(statement)).rows;
const token = () => sha256(randomUUID());
const now = '2026-09-14T08:00:00Z';

async function invite({ expires = '2026-09-20T08:00:00Z', clientId = null as string | null } = {}): Promise<string> {
  const tokenSha256 = token();
  await database.superuser.query(
    `insert into invitations (firm_id, id, name, email, roles, client_id, token_sha256, expires_at, invited_by)
     values ($1, $2, 'Nell', 'nell@strandnote.example', $3, $4, $5, $6, 'x')`,
    [firm.firmId, randomUUID(), clientId ? ['client'] : ['engineer', 'checker'], clientId, tokenSha256, expires],
  );
  return tokenSha256;
}

const accept = (tokenSha256: string, person: string) =>
  ask(sql`select * from accept_invitation(${tokenSha256}, ${person}, ${randomUUID()}::uuid, ${now}::timestamptz)`);

test('my_firms names the firms in which a person is an active member, and no other', async () => {
  const other = await addFirm(database, 'Birch');
  const gone = await addFirm(database, 'Cedar');
  const person = actorIn(firm.firmId, 'Nell', ['engineer']);
  await addMember(database.superuser, person);
  await addMember(database.superuser, { ...person, ...{ firmId: other.firmId, roles: ['client'], clientId: other.clientId } });
  await addMember(database.superuser, { ...person, firmId: gone.firmId });
  await database.superuser.query('update members set active = false where firm_id = $1 and user_id = $2', [gone.firmId, person.userId]);
  const rows = await ask(sql`select * from my_firms(${person.userId})`);
  expect(rows).toMatchObject([
    { firm_id: firm.firmId, firm_name: 'Ashdown', roles: ['engineer'], client_id: null, client_name: null },
    { firm_id: other.firmId, firm_name: 'Birch', roles: ['client'], client_id: other.clientId, client_name: 'Client of Birch' },
  ]);
  expect(await ask(sql`select * from my_firms('nobody')`)).toEqual([]);
});

test('invitation_by_token tells only who holds the token', async () => {
  const tokenSha256 = await invite();
  expect(await ask(sql`select * from invitation_by_token(${tokenSha256})`)).toMatchObject([{ firm_name: 'Ashdown', name: 'Nell' }]);
  expect(await ask(sql`select * from invitation_by_token(${token()})`)).toEqual([]);
});

test('accept_invitation makes the person a member once, with the roles that were offered', async () => {
  const tokenSha256 = await invite();
  const person = randomUUID();
  expect(await accept(tokenSha256, person)).toMatchObject([{ firm_id: firm.firmId }]);
  expect(await accept(tokenSha256, randomUUID())).toEqual([]);
  expect(await ask(sql`select * from my_firms(${person})`)).toMatchObject([{ roles: ['engineer', 'checker'] }]);
});

test('accept_invitation makes one member of two who accept at the same moment', async () => {
  const tokenSha256 = await invite();
  const accepted = await Promise.all([accept(tokenSha256, randomUUID()), accept(tokenSha256, randomUUID())]);
  expect(accepted.map(({ length }) => length).sort()).toEqual([0, 1]);
});

test('accept_invitation makes nobody a member by an invitation that is too old or was revoked', async () => {
  const person = randomUUID();
  expect(await accept(await invite({ expires: now }), person)).toEqual([]);
  const revoked = await invite();
  await database.superuser.query('update invitations set revoked_at = now() where token_sha256 = $1', [revoked]);
  expect(await accept(revoked, person)).toEqual([]);
  expect(await ask(sql`select * from my_firms(${person})`)).toEqual([]);
});

test('accept_invitation gives a client the organisation that was named, and a member who comes back their new roles', async () => {
  const person = randomUUID();
  await accept(await invite({ clientId: firm.clientId }), person);
  expect(await ask(sql`select * from my_firms(${person})`)).toMatchObject([{ roles: ['client'], client_id: firm.clientId }]);
  await accept(await invite(), person);
  expect(await ask(sql`select * from my_firms(${person})`)).toMatchObject([{ roles: ['engineer', 'checker'], client_id: null }]);
});

test('verify_report tells of issued revisions by their code or the hash of their file, and of no other', async () => {
  const life = await LifeOfARevision.inFirm(database);
  const found = (key: string) => ask(sql`select * from verify_report(${key})`);
  await life.submit();
  await life.approve();
  expect(await found(life.draft.verificationCode)).toEqual([]);
  const { signedFileId, unsignedFileId } = await life.issue();
  const hashOf = async (id: string) => (await database.superuser.query('select sha256 from files where id = $1', [id])).rows[0].sha256;
  const shown = { firm_name: 'Ashdown', letter: 'A', structure_name: 'Linden Bridge', state: 'issued', superseded_by_letter: null };
  expect(await found(life.draft.verificationCode)).toMatchObject([shown]);
  expect(await found(await hashOf(signedFileId))).toMatchObject([shown]);
  expect(await found(await hashOf(unsignedFileId))).toEqual([]);
  expect(await found('')).toEqual([]);
  await life.supersede();
  expect(await found(life.draft.verificationCode)).toMatchObject([{ state: 'superseded', superseded_by_letter: 'B' }]);
});

test('enqueue puts a job into the queue with the firm and the person of the transaction, whatever the payload says', async () => {
  const { firmId, engineer } = firm;
  const forged = JSON.stringify({ firmId: randomUUID(), userId: 'somebody', revisionId: 'r' });
  await withFirm(database.app, engineer, (tx) => tx.execute(sql`select enqueue('render-report', ${forged}::jsonb)`));
  const { rows } = await database.superuser.query(
    `select j.payload from graphile_worker._private_jobs j join graphile_worker._private_tasks t on t.id = j.task_id
     where t.identifier = 'render-report' and j.payload ->> 'firmId' = $1`,
    [firmId],
  );
  expect(rows).toEqual([{ payload: { firmId, userId: engineer.userId, revisionId: 'r' } }]);
});

test('enqueue leaves no job of a transaction that is rolled back', async () => {
  const { engineer } = firm;
  const failing = withFirm(database.app, engineer, async (tx) => {
    await tx.execute(sql`select enqueue('rolled-back', '{}'::jsonb)`);
    throw new Error('changed their mind');
  });
  await expect(failing).rejects.toThrow('changed their mind');
  const { rows } = await database.superuser.query("select 1 from graphile_worker._private_tasks where identifier = 'rolled-back'");
  expect(rows).toEqual([]);
});

test('create_firm is for the operator of an installation, not for the application', async () => {
  const creating = (firmId: string) =>
    sql`select create_firm(${firmId}::uuid, 'New', 'UTC', ${randomUUID()}::uuid, 'A', 'a@strandnote.example', ${token()}, now(), false)`;
  await refused(ask(creating(randomUUID())), insufficientPrivilege);
  const firmId = randomUUID();
  await ask(creating(firmId), owner);
  const { rows } = await database.superuser.query('select roles from invitations where firm_id = $1', [firmId]);
  expect(rows).toEqual([{ roles: ['admin'] }]);
});

test('no other function that runs with the rights of its owner is open to the application', async () => {
  const { rows } = await database.superuser.query(
    `select proname::text as name from pg_proc where prosecdef and pronamespace = 'public'::regnamespace
     and prorettype <> 'trigger'::regtype and has_function_privilege('strandnote_app', oid, 'execute') order by 1`,
  );
  expect(rows.map(({ name }) => name)).toEqual(['accept_invitation', 'enqueue', 'invitation_by_token', 'my_firms', 'verify_report']);
});

test('a member of a client organisation names one of the own firm', async () => {
  const other = await addFirm(database, 'Birch');
  const stray = actorIn(firm.firmId, 'Stray', ['client'], other.clientId);
  await refused(addMember(database.superuser, stray), foreignKeyViolation);
});
