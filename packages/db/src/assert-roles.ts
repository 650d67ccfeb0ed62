import pg from 'pg';

/**
 * The self-test at the start of a server: refuses to run with a database that would not hold the firms apart.
 *
 * @param appUrl address of the database as the application's role
 * @throws {Error} a sentence that names what is wrong
 */
export async function assertRolesAreSafe(appUrl: string): Promise<void> {
  const client = new pg.Client({ connectionString: appUrl });
  try {
    await client.connect();
  } catch (error) {
    throw new Error(`The database cannot be reached as the role of the application: ${(error as Error).message}.`);
  }
  try {
    for (const { query, sentence } of tests) {
      const { rows } = await client.query<{ name: string }>(query);
      if (rows.length > 0) throw new Error(`The database is not safe to use: ${sentence} (${rows.map(({ name }) => name).join(', ')}).`);
    }
  } finally {
    await client.end();
  }
}

const anyRight = "'SELECT, INSERT, UPDATE, DELETE, TRUNCATE, REFERENCES, TRIGGER'";
const tablesOf = (schema: string) =>
  `SELECT c.relname AS name FROM pg_class c WHERE c.relnamespace = to_regnamespace('${schema}') AND c.relkind IN ('r', 'p', 'v', 'm', 'f')`;

/** Each query lists what is wrong; none is well. */
const tests = [
  {
    query: `SELECT rolname AS name FROM pg_roles WHERE rolname = current_user
      AND (rolsuper OR rolbypassrls OR rolcreaterole OR rolcreatedb OR rolreplication)`,
    sentence: 'the role of the application may pass by row-level security',
  },
  {
    query: `SELECT r.rolname AS name FROM pg_auth_members m JOIN pg_roles r ON r.oid = m.roleid JOIN pg_roles me ON me.oid = m.member
      WHERE me.rolname = current_user`,
    sentence: 'the role of the application is a member of another role',
  },
  {
    query: `SELECT relname AS name FROM pg_class WHERE relowner = current_user::regrole
      UNION ALL SELECT proname FROM pg_proc WHERE proowner = current_user::regrole
      UNION ALL SELECT nspname FROM pg_namespace WHERE nspowner = current_user::regrole`,
    sentence: 'the role of the application owns something',
  },
  {
    // A temporary table could stand before a real one in a function that runs with its owner's rights.
    query: `SELECT current_database() AS name WHERE has_database_privilege(current_database(), 'CREATE, TEMPORARY')
      UNION ALL SELECT nspname FROM pg_namespace WHERE nspname !~ '^pg_' AND has_schema_privilege(oid, 'CREATE')`,
    sentence: 'the role of the application may make tables or functions',
  },
  {
    query: `${tablesOf('public')} AND (c.relkind NOT IN ('r', 'p') OR NOT c.relrowsecurity OR NOT c.relforcerowsecurity
      OR NOT EXISTS (SELECT 1 FROM pg_policy p WHERE p.polrelid = c.oid))`,
    sentence: 'a table has no forced row-level security',
  },
  {
    query: `SELECT c.relname || '.' || p.polname AS name FROM pg_policy p JOIN pg_class c ON c.oid = p.polrelid
      WHERE coalesce(pg_get_expr(p.polqual, p.polrelid), 'current_firm()') NOT LIKE '%current_firm()%'
      OR coalesce(pg_get_expr(p.polwithcheck, p.polrelid), 'current_firm()') NOT LIKE '%current_firm()%'`,
    sentence: 'a policy does not ask for the firm',
  },
  {
    query: `${tablesOf('identity')} AND (has_table_privilege(c.oid, ${anyRight}) OR has_any_column_privilege(c.oid, 'SELECT, INSERT, UPDATE'))
      UNION ALL SELECT nspname FROM pg_namespace WHERE nspname IN ('identity', 'graphile_worker') AND has_schema_privilege(oid, 'USAGE')`,
    sentence: 'the role of the application reaches the accounts or the queue of jobs',
  },
  {
    query: `SELECT r.rolname || ' on ' || t.name AS name FROM pg_roles r, (${tablesOf('public')}) t
      WHERE r.rolname IN ('strandnote_identity', 'strandnote_jobs') AND has_table_privilege(r.oid, to_regclass('public.' || t.name), ${anyRight})`,
    sentence: 'another role reaches the data of firms',
  },
  {
    query: `${tablesOf('public')} AND c.relname IN ('estimates', 'files', 'file_chunks', 'submissions', 'submission_sources', 'signatures',
      'contributions', 'audit_events') AND (has_table_privilege(c.oid, 'UPDATE, DELETE, TRUNCATE') OR has_any_column_privilege(c.oid, 'UPDATE'))`,
    sentence: 'the role of the application may change what is append-only',
  },
  {
    query: `SELECT p.proname AS name FROM pg_proc p WHERE p.prosecdef AND p.pronamespace = to_regnamespace('public')
      AND NOT EXISTS (SELECT 1 FROM unnest(p.proconfig) setting WHERE setting LIKE 'search_path=%pg_temp')`,
    sentence: "a function that runs with its owner's rights has no fixed search path",
  },
];
