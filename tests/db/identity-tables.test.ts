import { createRequire } from 'node:module';
import { pathToFileURL } from 'node:url';
import { createDb, schema } from '@strandnote/db';
import { beforeAll, expect, test } from 'vitest';
import { createAuth } from '../../apps/api/src/access/auth.ts';
import { getTableConfig, type PgTable } from '../support/drizzle.ts';

interface AuthField {
  type: string | string[];
  required?: boolean;
  unique?: boolean;
  fieldName?: string;
  references?: { model: string; field: string; onDelete?: string };
}
type AuthTables = Record<string, { modelName: string; fields: Record<string, AuthField> }>;

const ours: Record<string, PgTable> = {
  user: schema.user,
  session: schema.session,
  account: schema.account,
  verification: schema.verification,
  rateLimit: schema.rateLimit,
};
const sqlTypes: Record<string, string[]> = {
  string: ['text'],
  number: ['integer', 'bigint'],
  boolean: ['boolean'],
  date: ['timestamp with time zone'],
};
let wanted: AuthTables;

beforeAll(async () => {
  const seams = { log: undefined as never, sendPasswordReset: async () => undefined, recordAct: async () => undefined };
  const env = { AUTH_SECRET: 'a secret that is long enough for a test', publicUrl: 'http://127.0.0.1:4310' };
  // Never connected to: the library is only asked which tables it wants with the very options that the server runs with.
  const { options } = createAuth(createDb('postgres://127.0.0.1:1/none'), env, seams);
  const path = createRequire(new URL('../../apps/api/package.json', import.meta.url)).resolve('better-auth/db');
  const library = (await import(pathToFileURL(path).href)) as { getAuthTables: (options: unknown) => AuthTables };
  wanted = library.getAuthTables(options);
});

test('are the tables that better-auth asks for, and no other', () => {
  expect(Object.keys(wanted).sort()).toEqual(Object.keys(ours).sort());
});

test.each(Object.keys(ours))('%s has the fields that better-auth writes, with their types and bounds', (model) => {
  const { columns, foreignKeys } = getTableConfig(ours[model]!);
  const properties = Object.entries(ours[model]!) as [string, (typeof columns)[number]][];
  const columnOf = (field: string) => properties.find(([property, column]) => property === field && columns.includes(column))?.[1];
  expect(columnOf('id')).toMatchObject({ primary: true });
  const { fields } = wanted[model]!;
  for (const [field, { type, required, unique, references, fieldName = field }] of Object.entries(fields)) {
    const column = columnOf(fieldName);
    expect(column, `${model}.${fieldName}`).toBeDefined();
    expect(sqlTypes[String(type)], `${model}.${fieldName}`).toContain(column!.getSQLType());
    expect(column!.notNull, `${model}.${fieldName}`).toBe(required !== false);
    expect(column!.isUnique, `${model}.${fieldName}`).toBe(unique === true);
    const key = foreignKeys.find((foreign) => foreign.reference().columns.includes(column!));
    expect(key !== undefined && getTableConfig(key.reference().foreignTable).name, `${model}.${fieldName}`).toBe(
      references?.model ?? false,
    );
    if (references) expect(key!.onDelete).toBe(references.onDelete ?? 'cascade');
  }
  const surplus = properties.filter(([property, column]) => property !== 'id' && columns.includes(column) && !(property in fields));
  expect(surplus.map(([property]) => property)).toEqual([]);
});
