import { fileURLToPath } from 'node:url';
import { drizzle } from 'drizzle-orm/node-postgres';
import { migrate } from 'drizzle-orm/node-postgres/migrator';
import { runMigrations } from 'graphile-worker';
import pg from 'pg';

export interface RolePasswords {
  owner: string;
  identity: string;
  app: string;
  jobs: string;
}

/** Addresses of one database as each of its roles. */
export type RoleUrls = Record<keyof RolePasswords, string>;

const roles: Record<keyof RolePasswords, { name: string; rights: string }> = {
  // Owns the tables. Row-level security is forced on owners too, and functions across firms run as this role.
  owner: { name: 'strandnote_owner', rights: 'BYPASSRLS' },
  identity: { name: 'strandnote_identity', rights: 'NOBYPASSRLS' },
  app: { name: 'strandnote_app', rights: 'NOBYPASSRLS' },
  jobs: { name: 'strandnote_jobs', rights: 'NOBYPASSRLS' },
};

/**
 * Brings a database to the present schema: roles, tables, policies and the job queue. Running it again changes nothing.
 *
 * @param superuserUrl address of the database as a superuser
 * @param passwords of the four roles; set anew each time
 * @returns addresses of the database as each role
 */
export async function prepareDatabase(superuserUrl: string, passwords: RolePasswords): Promise<RoleUrls> {
  const urls = roleUrls(superuserUrl, passwords);
  await asSuperuser(superuserUrl, async (client) => {
    // Of several installations' processes that start at once, one migrates and the others find it done. The lock ends with the session.
    await client.query('SELECT pg_advisory_lock(702316)');
    await prepareRoles(client, passwords);
    await migrateTables(urls.owner);
    await runMigrations({ connectionString: urls.jobs });
    await makeQueueDoor(client);
  });
  return urls;
}

async function prepareRoles(client: pg.Client, passwords: RolePasswords): Promise<void> {
  // Roles belong to the cluster, whose other databases may be prepared at this moment: an advisory lock would not be seen there.
  await client.query('BEGIN');
  await client.query('LOCK TABLE pg_authid IN SHARE ROW EXCLUSIVE MODE');
  for (const [role, { name, rights }] of Object.entries(roles)) {
    await client.query(`DO $$ BEGIN CREATE ROLE ${name} LOGIN; EXCEPTION WHEN duplicate_object THEN NULL; END $$`);
    const password = pg.escapeLiteral(passwords[role as keyof RolePasswords]);
    await client.query(`ALTER ROLE ${name} LOGIN NOSUPERUSER NOCREATEROLE NOCREATEDB NOREPLICATION ${rights} PASSWORD ${password}`);
  }
  await client.query('ALTER SCHEMA public OWNER TO strandnote_owner; REVOKE CREATE ON SCHEMA public FROM PUBLIC');
  await grantDatabase(client);
  await client.query('COMMIT');
}

/** Rights on the database itself, which a copy of it does not take over. */
export async function grantDatabase(client: pg.Client): Promise<void> {
  const { rows } = await client.query<{ name: string }>('SELECT current_database() AS name');
  const database = pg.escapeIdentifier(rows[0]!.name);
  await client.query(`REVOKE ALL ON DATABASE ${database} FROM PUBLIC`);
  await client.query(`GRANT CONNECT ON DATABASE ${database} TO strandnote_owner, strandnote_identity, strandnote_app, strandnote_jobs`);
  await client.query(`GRANT CREATE ON DATABASE ${database} TO strandnote_owner, strandnote_jobs`);
}

/** Makes a database where there is none of that name. @returns its address as the superuser */
export async function ensureDatabase(superuserUrl: string, name: string): Promise<string> {
  await asSuperuser(superuserUrl, async (client) => {
    const { rowCount } = await client.query('SELECT 1 FROM pg_database WHERE datname = $1', [name]);
    if (rowCount === 0) await client.query(`CREATE DATABASE ${pg.escapeIdentifier(name)}`);
  });
  const url = new URL(superuserUrl);
  url.pathname = `/${name}`;
  return url.toString();
}

function roleUrls(superuserUrl: string, passwords: RolePasswords): RoleUrls {
  const urlOf = (role: keyof RolePasswords) => {
    const url = new URL(superuserUrl);
    url.username = roles[role].name;
    url.password = passwords[role];
    return url.toString();
  };
  return { owner: urlOf('owner'), identity: urlOf('identity'), app: urlOf('app'), jobs: urlOf('jobs') };
}

async function migrateTables(ownerUrl: string): Promise<void> {
  const pool = new pg.Pool({ connectionString: ownerUrl, max: 1 });
  try {
    await migrate(drizzle({ client: pool }), { migrationsFolder: fileURLToPath(new URL('../migrations', import.meta.url)) });
  } finally {
    await pool.end();
  }
}

/** A door into the job queue for the application: whatever it puts in carries the firm and the person of its transaction. */
async function makeQueueDoor(client: pg.Client): Promise<void> {
  await client.query(`
    CREATE OR REPLACE FUNCTION public.enqueue(task text, payload jsonb) RETURNS void
      LANGUAGE plpgsql SECURITY DEFINER SET search_path = pg_catalog, pg_temp AS $$
    BEGIN
      PERFORM graphile_worker.add_job(task, (payload || jsonb_build_object(
        'firmId', nullif(current_setting('strandnote.firm_id', true), ''),
        'userId', nullif(current_setting('strandnote.user_id', true), '')))::json);
    END $$;
    ALTER FUNCTION public.enqueue(text, jsonb) OWNER TO strandnote_jobs;
    REVOKE EXECUTE ON FUNCTION public.enqueue(text, jsonb) FROM PUBLIC;
    GRANT EXECUTE ON FUNCTION public.enqueue(text, jsonb) TO strandnote_app, strandnote_identity;
    GRANT USAGE ON SCHEMA public TO strandnote_identity, strandnote_jobs`);
}

async function asSuperuser(url: string, work: (client: pg.Client) => Promise<void>): Promise<void> {
  const client = new pg.Client({ connectionString: url });
  await client.connect();
  try {
    await work(client);
  } finally {
    await client.end();
  }
}
