import pg from 'pg';

/**
 * The self-test at the start of a server: refuses to run with a database that would not hold the firms apart.
 *
 * @param appUrl address of the database as the application's role
 * @throws {Error} a sentence that names what is wrong
 */
export async function assertRolesAreSafe(appUrl: string): Promise<void> {
  const client = new pg.Client({ connectionString: appUrl });
  await client.connect();
  try {
    for (const { query, sentence } of tests) {
      const { rows } = await client.query<{ name: string }>(query);
      if (rows.length > 0) throw new Error(`The database is not safe to use: ${sentence} (${rows.map(({ name }) => name).join(', ')}).`);
    }
  } finally {
    await client.end();
  }
}

/** Each query lists what is wrong; none is well. */
const tests = [
  {
    query: `SELECT rolname AS name FROM pg_roles WHERE rolname = current_user AND (rolsuper OR rolbypassrls OR rolcreaterole OR rolcreatedb)`,
    sentence: 'the role of the application may pass by row-level security',
  },
  {
    query: `SELECT r.rolname AS name FROM pg_auth_members m JOIN pg_roles r ON r.oid = m.roleid JOIN pg_roles me ON me.oid = m.member
      WHERE me.rolname = current_user`,
    sentence: 'the role of the application is a member of another role',
  },
  {
    query: `SELECT c.relname AS name FROM pg_class c JOIN pg_roles r ON r.oid = c.relowner WHERE r.rolname = current_user`,
    sentence: 'the role of the application owns something',
  },
  {
    query: `SELECT c.relname AS name FROM pg_class c JOIN pg_namespace n ON n.oid = c.relnamespace
      WHERE n.nspname = 'public' AND c.relkind IN ('r', 'p')
      AND (NOT c.relrowsecurity OR NOT c.relforcerowsecurity OR NOT EXISTS (SELECT 1 FROM pg_policy p WHERE p.polrelid = c.oid))`,
    sentence: 'a table has no forced row-level security',
  },
  {
    query: `SELECT c.relname AS name FROM pg_class c JOIN pg_namespace n ON n.oid = c.relnamespace
      WHERE n.nspname = 'identity' AND c.relkind = 'r' AND has_table_privilege(c.oid, 'SELECT, INSERT, UPDATE, DELETE')`,
    sentence: 'the role of the application reaches the accounts',
  },
  {
    query: `SELECT c.relname AS name FROM pg_class c JOIN pg_namespace n ON n.oid = c.relnamespace
      WHERE n.nspname = 'public' AND c.relname IN ('estimates', 'files', 'file_chunks', 'submissions', 'submission_sources', 'signatures',
        'contributions', 'audit_events') AND has_table_privilege(c.oid, 'UPDATE, DELETE, TRUNCATE')`,
    sentence: 'the role of the application may change what is append-only',
  },
];
