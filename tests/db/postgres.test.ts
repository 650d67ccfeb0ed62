import { chmodSync, existsSync, mkdirSync, mkdtempSync, rmSync, writeFileSync } from 'node:fs';
import { createServer, type Server } from 'node:net';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import pg from 'pg';
import { afterAll, beforeAll, expect, test } from 'vitest';
import { startCluster } from '../../packages/db/bin/postgres.mjs';

let folder: string;
let busy: Server;
const stops: (() => void)[] = [];

beforeAll(async () => {
  folder = mkdtempSync(join(tmpdir(), 'strandnote-cluster-'));
  chmodSync(folder, 0o755);
  busy = createServer();
  await listen(busy, 0);
});
afterAll(async () => {
  for (const stop of stops) stop();
  await new Promise((resolve) => busy.close(resolve));
  rmSync(folder, { recursive: true, force: true });
});

function listen(server: Server, port: number): Promise<void> {
  return new Promise((resolve) => server.listen(port, '127.0.0.1', resolve));
}

function portOf(server: Server): number {
  const address = server.address();
  if (address === null || typeof address === 'string') throw new Error('The server does not listen.');
  return address.port;
}

async function freePort(): Promise<number> {
  const probe = createServer();
  await listen(probe, 0);
  const port = portOf(probe);
  await new Promise((resolve) => probe.close(resolve));
  return port;
}

async function query(url: string, statement: string): Promise<Record<string, unknown>[]> {
  const client = new pg.Client({ connectionString: url });
  await client.connect();
  const { rows } = await client.query(statement);
  await client.end();
  return rows;
}

test('runs on loopback with commits that survive a power cut, and keeps its data over a stop', async () => {
  const home = join(folder, 'kept', 'postgres');
  const port = await freePort();
  // What an interrupted first start leaves behind is begun anew.
  mkdirSync(join(home, 'data.unfinished'), { recursive: true });
  writeFileSync(join(home, 'data.unfinished', 'PG_VERSION'), '15');
  const cluster = startCluster({ home, port, durable: true });
  stops.push(cluster.stop);
  expect(cluster).toMatchObject({ home, port, startedHere: true });
  const url = cluster.url('postgres');
  const [settings] = await query(
    url,
    "select current_setting('fsync') fsync, current_setting('synchronous_commit') commit, current_setting('listen_addresses') host",
  );
  expect(settings).toEqual({ fsync: 'on', commit: 'on', host: '127.0.0.1' });
  await query(url, 'create table kept as select 7 as value');
  expect(startCluster({ home, port, durable: true })).toMatchObject({ port, startedHere: false });
  cluster.stop();
  await expect(query(url, 'select 1')).rejects.toMatchObject({ code: 'ECONNREFUSED' });
  const again = startCluster({ home, port, durable: true });
  stops.push(again.stop);
  expect(again.url('postgres')).toBe(url);
  expect(await query(url, 'select value from kept')).toEqual([{ value: 7 }]);
  await expect(query(url.replace(/:[^:@]+@/, ':wrong@'), 'select 1')).rejects.toMatchObject({ code: '28P01' });
});

test('lies elsewhere when its account cannot reach the folder that was wanted', async () => {
  const closed = join(folder, 'closed');
  mkdirSync(closed, { mode: 0o700 });
  const cluster = startCluster({ home: join(closed, 'postgres'), port: await freePort(), durable: false });
  stops.push(cluster.stop);
  // Only root hands the server to another account; anybody else runs it as themselves.
  const isRoot = process.getuid?.() === 0;
  expect(cluster.home.startsWith(isRoot ? '/var/tmp/strandnote-' : closed)).toBe(true);
  expect(await query(cluster.url('postgres'), "select current_setting('fsync') fsync")).toEqual([{ fsync: 'off' }]);
  cluster.stop();
  rmSync(cluster.home, { recursive: true });
});

test('says what to do about a port that is in use', () => {
  const port = portOf(busy);
  const start = () => startCluster({ home: join(folder, 'busy'), port, durable: false });
  expect(start).toThrow(new RegExp(`^Port ${port} of 127.0.0.1 is in use.* Set PG_PORT .* to a free port\\.$`));
});

test('says what to do about a folder that cannot be written', () => {
  const file = join(folder, 'a-file');
  writeFileSync(file, '');
  const start = () => startCluster({ home: join(file, 'postgres'), port: 1, durable: false });
  expect(start).toThrow(/cannot be written \(ENOTDIR\)\. Give this user the right, or set DATA_DIR to another folder\.$/);
  expect(existsSync(join(file, 'postgres'))).toBe(false);
});
