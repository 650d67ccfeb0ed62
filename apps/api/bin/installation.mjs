// What start and the commands share: the data folder, its secrets, the cluster and the database. Run after the install.
import { randomBytes } from 'node:crypto';
import { existsSync, mkdirSync, readFileSync, writeFileSync } from 'node:fs';
import { join, resolve } from 'node:path';
import { startCluster } from '../../../packages/db/bin/postgres.mjs';
import { root } from './bootstrap.mjs';

export const dataFolder = resolve(process.env.DATA_DIR ?? join(root, '.data', 'strandnote'));

/** Secrets are made once and kept in the data folder, readable by its owner alone. */
function readSecrets() {
  const file = join(dataFolder, 'secrets.json');
  if (existsSync(file)) return JSON.parse(readFileSync(file, 'utf8'));
  const secret = () => randomBytes(24).toString('hex');
  const secrets = { auth: secret(), database: { owner: secret(), identity: secret(), app: secret(), jobs: secret() } };
  writeFileSync(file, JSON.stringify(secrets), { mode: 0o600 });
  return secrets;
}

function makeDataFolder() {
  try {
    mkdirSync(dataFolder, { recursive: true });
    // The account that PostgreSQL runs as walks through; what is secret in here is closed by itself.
    mkdirSync(join(dataFolder, 'signing'), { recursive: true, mode: 0o700 });
  } catch (error) {
    throw new Error(`The data folder ${dataFolder} cannot be written (${error.code}). Set DATA_DIR to a folder that this user may write.`);
  }
}

const host = process.env.HOST ?? '127.0.0.1';
const onLoopback = ['127.0.0.1', 'localhost', '::1'].includes(host);

/** An installation that others reach must know its own address: links in mail and the check of a request's origin need it. */
function assertPublicAddress() {
  if (onLoopback || process.env.PUBLIC_URL) return;
  throw new Error(
    `HOST is ${host}, so others can reach this server. Set PUBLIC_URL to its address, such as https://tensions.firm.example, and start again.`,
  );
}

/** Only loopback shows a demonstration, and only where there is one already or nothing at all. */
async function isDemonstration(ownerUrl) {
  if (!onLoopback || process.env.PUBLIC_URL) return false;
  const { firmsPresent } = await import('../src/demonstration/firms-present.ts');
  const present = await firmsPresent(ownerUrl);
  if (present === 'demonstration' && !existsSync(join(dataFolder, 'demonstration.json'))) {
    throw new Error(`The demonstration was interrupted while it was laid. Delete the folder ${dataFolder} and start again.`);
  }
  return present !== 'real';
}

/** Starts the database and brings it up to date. Must run with the TypeScript loader registered. */
export async function openInstallation() {
  assertPublicAddress();
  makeDataFolder();
  const secrets = readSecrets();
  const cluster = process.env.DATABASE_SUPERUSER_URL
    ? { url: () => process.env.DATABASE_SUPERUSER_URL, startedHere: false, stop: () => undefined }
    : startCluster({ home: join(dataFolder, 'postgres'), port: Number(process.env.PG_PORT ?? 4311), durable: true });
  try {
    return { cluster, ...(await describeInstallation(cluster, secrets)) };
  } catch (error) {
    if (cluster.startedHere) cluster.stop();
    throw error;
  }
}

async function describeInstallation(cluster, secrets) {
  const { prepareDatabase, ensureDatabase } = await import('../../../packages/db/src/migrate.ts');
  const superuserUrl = process.env.DATABASE_SUPERUSER_URL ?? (await ensureDatabase(cluster.url('postgres'), 'strandnote'));
  const urls = await prepareDatabase(superuserUrl, secrets.database);
  const port = Number(process.env.PORT ?? 4310);
  const demonstration = await isDemonstration(urls.owner);
  const environment = {
    NODE_ENV: 'production',
    HOST: host,
    PORT: String(port),
    DATABASE_URL_APP: urls.app,
    DATABASE_URL_IDENTITY: urls.identity,
    DATABASE_URL_JOBS: urls.jobs,
    DATA_DIR: dataFolder,
    SIGNING_DIR: process.env.SIGNING_DIR ?? join(dataFolder, 'signing'),
    ANCHOR_FILE: process.env.ANCHOR_FILE ?? join(dataFolder, 'audit-anchors.jsonl'),
    AUTH_SECRET: secrets.auth,
    DEMONSTRATION: String(demonstration),
  };
  return { urls, environment, demonstration, address: process.env.PUBLIC_URL ?? `http://127.0.0.1:${port}` };
}
