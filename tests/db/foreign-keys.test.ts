import { randomUUID } from 'node:crypto';
import { afterAll, beforeAll, expect, test } from 'vitest';
import { addBridge, addFirm, type Bridge, type Firm, type OpenDatabase, openTestDatabase } from '../support/fixtures.ts';
import { foreignKeyViolation, refused } from './sql-state.ts';

let database: OpenDatabase;
let mine: Firm;
let theirs: Firm;
let theirBridge: Bridge;

beforeAll(async () => {
  database = await openTestDatabase();
  mine = await addFirm(database, 'Ashdown');
  theirs = await addFirm(database, 'Birch');
  theirBridge = await addBridge(database.app, theirs.engineer);
});
afterAll(() => database.close());

interface Key {
  table: string;
  name: string;
  columns: string[];
  target: string;
  targetColumns: string[];
}

async function foreignKeys(): Promise<Key[]> {
  const { rows } = await database.superuser.query(`
    select c.conrelid::regclass::text as "table", c.conname::text as name, c.confrelid::regclass::text as target,
      array(select a.attname::text from unnest(c.conkey) with ordinality k(n, o)
        join pg_attribute a on a.attrelid = c.conrelid and a.attnum = k.n order by o) as columns,
      array(select a.attname::text from unnest(c.confkey) with ordinality k(n, o)
        join pg_attribute a on a.attrelid = c.confrelid and a.attnum = k.n order by o) as "targetColumns"
    from pg_constraint c where c.contype = 'f' and c.connamespace = 'public'::regnamespace`);
  return rows;
}

test('go over the firm and the identifier together, or to the firm itself', async () => {
  const keys = await foreignKeys();
  expect(keys.length).toBeGreaterThan(50);
  const odd = keys.filter(({ target, columns, targetColumns }) =>
    target === 'firms'
      ? columns.join() !== 'firm_id'
      : columns.length !== 2 || columns[0] !== 'firm_id' || targetColumns.join() !== 'firm_id,id',
  );
  expect(odd).toEqual([]);
});

test('are there for every column that names a row of another table', async () => {
  const { rows } = await database.superuser.query<{ table: string; column: string }>(
    `select table_name as "table", column_name as "column" from information_schema.columns
     where table_schema = 'public' and data_type = 'uuid' and column_name not in ('id')`,
  );
  const keys = await foreignKeys();
  const bare = rows.filter(({ table, column }) => !keys.some((key) => key.table === table && key.columns.includes(column)));
  // Contributions and sources name rows of several tables; the text beside the identifier says of which.
  expect(bare.map(({ table, column }) => `${table}.${column}`).sort()).toEqual(['contributions.entity_id', 'submission_sources.entity_id']);
});

test('refuse a row that points into another firm, even one written with every right', async () => {
  const insert = (structureId: string) =>
    database.superuser.query(
      "insert into campaigns (firm_id, id, structure_id, number, name, starts_on, instruments, stage, basis) \
      values ($1, $2, $3, 1, 'Survey', '2026-09-14', '[]', 'In service', '{}')",
      [mine.firmId, randomUUID(), structureId],
    );
  await database.superuser.query("select set_config('strandnote.user_id', 'operator', false)");
  await refused(insert(theirBridge.structureId), foreignKeyViolation);
  const { structureId } = await addBridge(database.app, mine.engineer);
  expect((await insert(structureId)).rowCount).toBe(1);
  await refused(
    database.superuser.query('update structures set client_id = $1 where id = $2', [theirs.clientId, structureId]),
    foreignKeyViolation,
  );
});
