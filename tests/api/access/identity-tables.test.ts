import { createRequire } from 'node:module';
import { afterAll, beforeAll, expect, test } from 'vitest';
import { startTestServer, type TestServer } from '../../support/test-server.ts';

const fromApi = createRequire(new URL('../../../apps/api/package.json', import.meta.url));
let server: TestServer;
beforeAll(async () => {
  server = await startTestServer();
});
afterAll(() => server.stop());

test('the tables of identity have every column that the library asks for', async () => {
  const { getAuthTables } = fromApi('better-auth/db') as { getAuthTables: (options: object) => Record<string, { fields: object }> };
  const asked = getAuthTables(server.deps.auth.options);
  expect(Object.keys(asked).sort()).toEqual(['account', 'rateLimit', 'session', 'user', 'verification']);
  const { rows } = await server.superuser.query(
    "select table_name || '.' || column_name as name from information_schema.columns where table_schema = 'identity'",
  );
  const present = rows.map(({ name }) => name);
  const wanted = Object.entries(asked).flatMap(([table, { fields }]) =>
    ['id', ...Object.keys(fields)].map((field) => `${inSql(table)}.${inSql(field)}`),
  );
  expect(wanted.length).toBeGreaterThan(25);
  expect(wanted.filter((name) => !present.includes(name))).toEqual([]);
});

function inSql(name: string): string {
  return name.replace(/[A-Z]/g, (letter) => `_${letter.toLowerCase()}`);
}
