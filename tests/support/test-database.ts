import { createHash, randomBytes } from 'node:crypto';
import { readdirSync, readFileSync } from 'node:fs';
import { join } from 'node:path';
import { fileURLToPath } from 'node:url';
import { grantDatabase, prepareDatabase, type RoleUrls } from '@strandnote/db';
import pg from 'pg';

export interface TestDatabase {
  /** The database as each of the four roles. */
  urls: RoleUrls;
  superuserUrl: string;
  drop: () => Promise<void>;
}

// One set of passwords for all: roles belong to the cluster, which several test files use at once.
export const rolePasswords = { owner: 'owner-in-test', identity: 'identity-in-test', app: 'app-in-test', jobs: 'jobs-in-test' };
const roleNames = { owner: 'strandnote_owner', identity: 'strandnote_identity', app: 'strandnote_app', jobs: 'strandnote_jobs' };

/** A database of its own for a test file: a copy of one template that is migrated once for all. */
export async function createTestDatabase(): Promise<TestDatabase> {
  const clusterUrl = process.env.TEST_DATABASE_URL;
  if (!clusterUrl) throw new Error('TEST_DATABASE_URL is not set. Run the tests with: npm test');
  const name = `strandnote_test_${randomBytes(6).toString('hex')}`;
  await withClient(clusterUrl, async (client) => {
    // Of several test files that start at once, one makes the template and the others wait for it; copies are made one by one
    // because PostgreSQL copies only a database that nobody is connected to.
    await client.query('select pg_advisory_lock(702315)');
    const template = await ensureTemplate(client, clusterUrl);
    await client.query(`create database ${name} template ${template}`);
  });
  const urlAs = (role?: keyof typeof rolePasswords) => {
    const url = new URL(clusterUrl);
    url.pathname = `/${name}`;
    if (role) {
      url.username = roleNames[role];
      url.password = rolePasswords[role];
    }
    return url.toString();
  };
  await withClient(urlAs(), grantDatabase);
  return {
    urls: { owner: urlAs('owner'), identity: urlAs('identity'), app: urlAs('app'), jobs: urlAs('jobs') },
    superuserUrl: urlAs(),
    drop: () => withClient(clusterUrl, async (client) => void (await client.query(`drop database if exists ${name} with (force)`))),
  };
}

/** The template carries the hash of what it was made from, so that a changed migration makes another. */
async function ensureTemplate(client: pg.Client, clusterUrl: string): Promise<string> {
  const name = `strandnote_template_${sourcesHash()}`;
  const { rowCount } = await client.query('select 1 from pg_database where datname = $1', [name]);
  if (rowCount === 1) return name;
  const unfinished = `${name}_unfinished`;
  await client.query(`drop database if exists ${unfinished} with (force)`);
  await client.query(`create database ${unfinished}`);
  const url = new URL(clusterUrl);
  url.pathname = `/${unfinished}`;
  await prepareDatabase(url.toString(), rolePasswords);
  await client.query(`alter database ${unfinished} rename to ${name}`);
  return name;
}

function sourcesHash(): string {
  const db = fileURLToPath(new URL('../../packages/db', import.meta.url));
  const migrations = readdirSync(join(db, 'migrations')).filter((file) => file.endsWith('.sql'));
  const hash = createHash('sha256');
  for (const file of [...migrations.sort().map((migration) => join('migrations', migration)), join('src', 'migrate.ts')]) {
    hash.update(readFileSync(join(db, file)));
  }
  return hash.digest('hex').slice(0, 12);
}

async function withClient(url: string, work: (client: pg.Client) => Promise<void>): Promise<void> {
  const client = new pg.Client({ connectionString: url });
  await client.connect();
  try {
    await work(client);
  } finally {
    await client.end();
  }
}
