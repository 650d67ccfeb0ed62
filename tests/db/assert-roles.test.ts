import { randomBytes } from 'node:crypto';
import { assertRolesAreSafe } from '@strandnote/db';
import { afterAll, beforeAll, expect, test } from 'vitest';
import { type OpenDatabase, openTestDatabase } from '../support/fixtures.ts';

let database: OpenDatabase;
// Roles belong to the whole cluster, where other tests run meanwhile: what is spoilt here is a role of this file's own.
const imposter = `imposter_${randomBytes(6).toString('hex')}`;

beforeAll(async () => {
  database = await openTestDatabase();
  await database.superuser.query(`create role ${imposter} login password 'imposter'`);
  await database.superuser.query(`grant connect on database ${database.superuser.database} to ${imposter}`);
});
afterAll(async () => {
  await database.superuser.query(`drop owned by ${imposter} cascade`);
  await database.superuser.query(`drop role ${imposter}`);
  await database.close();
});

function asImposter(): string {
  const url = new URL(database.urls.app);
  url.username = imposter;
  url.password = 'imposter';
  return url.toString();
}

async function expectUnsafe(spoil: string, mend: string, sentence: RegExp, url = database.urls.app): Promise<void> {
  await database.superuser.query(spoil);
  try {
    await expect(assertRolesAreSafe(url)).rejects.toThrow(sentence);
  } finally {
    await database.superuser.query(mend);
  }
  await assertRolesAreSafe(url);
}

test('accepts the database as it is migrated', async () => {
  await assertRolesAreSafe(database.urls.app);
  await assertRolesAreSafe(asImposter());
});

test.each(['superuser', 'bypassrls', 'createrole', 'createdb', 'replication'])('refuses a role with %s', async (right) => {
  await expectUnsafe(
    `alter role ${imposter} ${right}`,
    `alter role ${imposter} no${right}`,
    new RegExp(`may pass by row-level security \\(${imposter}\\)`),
    asImposter(),
  );
});

test('refuses a role that is a member of another, which could take its place', async () => {
  await expectUnsafe(
    `grant pg_read_all_data to ${imposter}`,
    `revoke pg_read_all_data from ${imposter}`,
    /is a member of another role/,
    asImposter(),
  );
});

test('refuses a role that owns a table or may make one', async () => {
  await expectUnsafe(`create schema theirs authorization ${imposter}`, 'drop schema theirs', /owns something \(theirs\)/, asImposter());
  await expectUnsafe(
    `grant create on schema public to ${imposter}`,
    `revoke create on schema public from ${imposter}`,
    /may make tables/,
    asImposter(),
  );
  const name = database.superuser.database;
  await expectUnsafe(
    `grant temporary on database ${name} to ${imposter}`,
    `revoke temporary on database ${name} from ${imposter}`,
    /may make tables/,
    asImposter(),
  );
});

test('refuses a table whose row-level security is not forced, is off, or has no policy', async () => {
  const sentence = /a table has no forced row-level security \((cables|notes)\)/;
  await expectUnsafe('alter table cables no force row level security', 'alter table cables force row level security', sentence);
  await expectUnsafe('alter table cables disable row level security', 'alter table cables enable row level security', sentence);
  await expectUnsafe('create table notes (firm_id uuid)', 'drop table notes', sentence);
});

test('refuses a view, which reads with the rights of its owner', async () => {
  await expectUnsafe('create view notes as select * from cables', 'drop view notes', /no forced row-level security \(notes\)/);
});

test('refuses a policy that does not ask for the firm', async () => {
  await expectUnsafe(
    'create policy open_door on cables to strandnote_app using (true)',
    'drop policy open_door on cables',
    /does not ask for the firm \(cables.open_door\)/,
  );
  await expectUnsafe(
    'create policy open_door on cables for insert to strandnote_app with check (current_client() is null)',
    'drop policy open_door on cables',
    /does not ask for the firm/,
  );
});

test('refuses a role that reaches the accounts or the queue', async () => {
  const sentence = /reaches the accounts or the queue of jobs/;
  await expectUnsafe(
    `grant select (email) on identity."user" to ${imposter}`,
    `revoke select (email) on identity."user" from ${imposter}`,
    sentence,
    asImposter(),
  );
  for (const schema of ['identity', 'graphile_worker']) {
    await expectUnsafe(
      `grant usage on schema ${schema} to ${imposter}`,
      `revoke usage on schema ${schema} from ${imposter}`,
      sentence,
      asImposter(),
    );
  }
});

test("refuses the role of the accounts or of the queue when it reaches firms' data", async () => {
  for (const role of ['strandnote_identity', 'strandnote_jobs']) {
    await expectUnsafe(`grant select on cables to ${role}`, `revoke select on cables from ${role}`, new RegExp(`${role} on cables`));
  }
});

test('refuses a role that may change what is append-only, be it one column', async () => {
  const sentence = /may change what is append-only \(estimates\)/;
  await expectUnsafe('grant delete on estimates to strandnote_app', 'revoke delete on estimates from strandnote_app', sentence);
  await expectUnsafe(
    'grant update (engine_version) on estimates to strandnote_app',
    'revoke update (engine_version) on estimates from strandnote_app',
    sentence,
  );
});

test("refuses a function with its owner's rights that finds tables by the caller's path", async () => {
  await expectUnsafe(
    "create function peek() returns bigint language sql security definer as 'select count(*) from public.cables'",
    'drop function peek()',
    /no fixed search path \(peek\)/,
  );
});

test('says so when the database cannot be reached', async () => {
  const url = new URL(database.urls.app);
  url.password = 'wrong';
  await expect(assertRolesAreSafe(url.toString())).rejects.toThrow(/cannot be reached as the role of the application: password/);
});
