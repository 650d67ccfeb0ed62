import { afterAll, beforeAll, expect, test } from 'vitest';
import { type SignedIn, startTestServer, type TestServer } from '../../support/test-server.ts';
import { ok } from '../surveyed-bridge.ts';

let server: TestServer;
let firmId: string;
let admin: SignedIn;

beforeAll(async () => {
  server = await startTestServer();
  firmId = await server.createFirm('Falk and Reyes');
  await server.createFirm('Second firm');
  admin = await server.join(firmId, { name: 'Petra Lund', roles: ['admin'] });
});
afterAll(() => server.stop());

test('changes the firm of the administrator and no other, and writes down what was before', async () => {
  const letterhead = { addressLines: ['1 Quay Street'], phone: '1', email: '', registration: '' };
  const changed = (await ok(admin.patch('', { name: 'Falk, Reyes and Sol', letterhead }))).body;
  expect(changed).toMatchObject({ id: firmId, name: 'Falk, Reyes and Sol', letterhead });
  const { rows } = await server.superuser.query('select name from firms order by name');
  expect(rows.map(({ name }) => name)).toEqual(['Falk, Reyes and Sol', 'Second firm']);
  const events = await server.superuser.query("select details from audit_events where act = 'firm.changed'");
  expect(events.rows[0].details).toMatchObject({ from: { name: 'Falk and Reyes' }, to: { name: 'Falk, Reyes and Sol', letterhead } });
});

test('writes nothing down when nothing changes', async () => {
  const count = async () => (await server.superuser.query("select 1 from audit_events where act = 'firm.changed'")).rowCount;
  const before = await count();
  await ok(admin.patch('', { name: 'Falk, Reyes and Sol' }));
  await ok(admin.patch('', {}));
  expect(await count()).toBe(before);
});

test('refuses a time zone that does not exist, and what an administrator may not set', async () => {
  expect((await admin.patch('', { timeZone: 'Mars/Olympus' })).body.errors).toEqual([
    { field: 'timeZone', message: 'A time zone looks like Europe/London.' },
  ]);
  expect((await admin.patch('', { demonstration: true })).body.errors[0].field).toBe('demonstration');
  expect((await admin.patch('', { nextReportNumber: 1 })).body.errors[0].field).toBe('nextReportNumber');
});
