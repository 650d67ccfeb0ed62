import { createHash, randomBytes } from 'node:crypto';
import { type Actor, withFirm } from '@strandnote/db';
import { afterAll, beforeAll, expect, test } from 'vitest';
import { loadFile } from '../../../apps/api/src/files/load-file.ts';
import { storeFile } from '../../../apps/api/src/files/store-file.ts';
import { startTestServer, type TestServer } from '../../support/test-server.ts';

let server: TestServer;
let actor: Actor;
beforeAll(async () => {
  server = await startTestServer();
  actor = { firmId: await server.createFirm(), userId: 'ines', name: 'Ines Falk', roles: ['engineer'], clientId: null };
});
afterAll(() => server.stop());

const store = (bytes: Buffer) =>
  withFirm(server.deps.db, actor, (tx) =>
    storeFile(tx, actor, { kind: 'record', name: 'record.bin', mediaType: 'application/octet-stream', bytes }),
  );
const load = (id: string, as = actor) => withFirm(server.deps.db, as, (tx) => loadFile(tx, id));

test.each([0, 1, 1024 * 1024, 1024 * 1024 + 1, 2.5 * 1024 * 1024])('gives back a file of %i bytes as it was', async (size) => {
  const bytes = randomBytes(size);
  const { id, sha256 } = await store(bytes);
  const loaded = await load(id);
  expect(loaded.bytes.equals(bytes)).toBe(true);
  expect([sha256, loaded.sha256]).toEqual(Array(2).fill(createHash('sha256').update(bytes).digest('hex')));
  const { rows } = await server.superuser.query('select max(length(data)) as largest, count(*) from file_chunks where file_id = $1', [id]);
  expect(Number(rows[0].count)).toBe(Math.ceil(size / (1024 * 1024)));
  expect(rows[0].largest ?? 0).toBeLessThanOrEqual(1024 * 1024);
});

test('is not there for another firm', async () => {
  const { id } = await store(Buffer.from('ours'));
  await expect(load(id, { ...actor, firmId: await server.createFirm('Second firm') })).rejects.toThrow('There is no such file.');
});

test('refuses to give out bytes that are not those that were stored', async () => {
  const { id } = await store(Buffer.from('ours'));
  await server.superuser.query(
    `set session_replication_role = replica; update file_chunks set data = 'ourz' where file_id = '${id}'; set session_replication_role = origin`,
  );
  await expect(load(id)).rejects.toThrow('is not what was stored');
});
