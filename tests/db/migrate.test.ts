import { randomBytes } from 'node:crypto';
import { ensureDatabase, prepareDatabase, schema } from '@strandnote/db';
import pg from 'pg';
import { afterAll, beforeAll, expect, test } from 'vitest';
import { getTableConfig, is, PgTable } from '../support/drizzle.ts';
import { type OpenDatabase, openTestDatabase } from '../support/fixtures.ts';
import { rolePasswords } from '../support/test-database.ts';

let database: OpenDatabase;

beforeAll(async () => {
  database = await openTestDatabase();
});
afterAll(() => database.close());

/** Everything that a migration can make, in words. */
async function describe(): Promise<unknown[]> {
  const { rows } = await database.superuser.query(`
    select 'column' as kind, table_schema || '.' || table_name || '.' || column_name as name, data_type || is_nullable as what
      from information_schema.columns where table_schema in ('public', 'identity', 'graphile_worker')
    union all select 'constraint', conrelid::regclass || '.' || conname, pg_get_constraintdef(oid) from pg_constraint
    union all select 'index', indexname, indexdef from pg_indexes where schemaname in ('public', 'identity')
    union all select 'function', oid::regprocedure::text, md5(prosrc || coalesce(proconfig::text, '') || coalesce(proacl::text, ''))
      from pg_proc where pronamespace = 'public'::regnamespace
    union all select 'policy', polrelid::regclass || '.' || polname, pg_get_expr(polqual, polrelid) from pg_policy
    union all select 'trigger', tgrelid::regclass || '.' || tgname, pg_get_triggerdef(oid) from pg_trigger where not tgisinternal
    union all select 'grant', c.oid::regclass::text, c.relacl::text from pg_class c where relnamespace = 'public'::regnamespace
    union all select 'migration', id::text, hash from drizzle.__drizzle_migrations order by 1, 2, 3`);
  return rows;
}

test('makes the same of a database that is up to date: a second run changes nothing', async () => {
  const before = await describe();
  expect(before.length).toBeGreaterThan(500);
  expect(await prepareDatabase(database.superuserUrl, rolePasswords)).toEqual(database.urls);
  expect(await describe()).toEqual(before);
});

test('migrates once when several processes start at the same moment', async () => {
  const name = `strandnote_start_${randomBytes(6).toString('hex')}`;
  const url = await ensureDatabase(database.superuserUrl, name);
  expect(await ensureDatabase(database.superuserUrl, name)).toBe(url);
  try {
    const [first, second] = await Promise.all([prepareDatabase(url, rolePasswords), prepareDatabase(url, rolePasswords)]);
    expect(first).toEqual(second);
    const client = new pg.Client({ connectionString: url });
    await client.connect();
    const { rows } = await client.query('select count(*)::int, count(distinct hash)::int as different from drizzle.__drizzle_migrations');
    await client.end();
    expect(rows[0].count).toBe(rows[0].different);
  } finally {
    await database.superuser.query(`drop database ${name} with (force)`);
  }
});

test('makes every table and column that the code names, and no other', async () => {
  const inCode = Object.values(schema).flatMap((table) => {
    if (!is(table, PgTable)) return [];
    const { name, schema: inSchema = 'public', columns } = getTableConfig(table);
    return columns.map((column) => `${inSchema}.${name}.${column.name} ${column.getSQLType()}${column.notNull ? ' not null' : ''}`);
  });
  const { rows } = await database.superuser.query<{ line: string }>(`
    select c.relnamespace::regnamespace || '.' || c.relname || '.' || a.attname || ' ' || format_type(a.atttypid, a.atttypmod)
      || case when a.attnotnull then ' not null' else '' end as line
    from pg_attribute a join pg_class c on c.oid = a.attrelid
    where c.relnamespace::regnamespace::text in ('public', 'identity') and c.relkind = 'r' and a.attnum > 0 and not a.attisdropped`);
  expect(rows.map(({ line }) => line).sort()).toEqual(inCode.sort());
});

test('makes every constraint and index that the code names', async () => {
  const inCode = Object.values(schema).flatMap((table) => {
    if (!is(table, PgTable)) return [];
    const { checks, foreignKeys, indexes } = getTableConfig(table);
    return [
      ...checks.map(({ name }) => name),
      ...foreignKeys.map((key) => key.getName()),
      ...indexes.flatMap(({ config }) => config.name ?? []),
    ];
  });
  const { rows } = await database.superuser.query<{ name: string }>(
    'select conname as name from pg_constraint union select indexname from pg_indexes',
  );
  const made = new Set(rows.map(({ name }) => name));
  expect(inCode.length).toBeGreaterThan(80);
  expect(inCode.filter((name) => !made.has(name))).toEqual([]);
});

test('gives each role what it is for: the accounts to one, the queue to another, neither to the application', async () => {
  const asRole = async (role: keyof typeof database.urls, statement: string) => {
    const client = new pg.Client({ connectionString: database.urls[role] });
    await client.connect();
    try {
      return await client.query(statement).then(
        () => 'done',
        (error: { code: string }) => error.code,
      );
    } finally {
      await client.end();
    }
  };
  const accounts = 'select * from identity."user"';
  const queue = 'select * from graphile_worker.jobs';
  const firms = 'select * from public.firms';
  const outcome = async (statement: string) => Promise.all((['identity', 'app', 'jobs'] as const).map((role) => asRole(role, statement)));
  expect(await outcome(accounts)).toEqual(['done', '42501', '42501']);
  expect(await outcome(queue)).toEqual(['42501', '42501', 'done']);
  expect(await outcome(firms)).toEqual(['42501', 'done', '42501']);
  expect(await outcome('create table public.mine ()')).toEqual(['42501', '42501', '42501']);
  expect(await outcome('create temporary table mine ()')).toEqual(['42501', '42501', '42501']);
});
