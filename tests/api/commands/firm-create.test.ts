import { afterAll, beforeAll, expect, test, vi } from 'vitest';
import { runFirmCreate } from '../../../apps/api/src/commands/firm-create.ts';
import { firmsPresent } from '../../../apps/api/src/demonstration/firms-present.ts';
import { startTestServer, type TestServer } from '../../support/test-server.ts';
import { ok } from '../surveyed-bridge.ts';

let server: TestServer;
beforeAll(async () => {
  server = await startTestServer();
  // The command's clock is the world's: what it prints holds from today.
  server.now.at = new Date();
});
afterAll(() => server.stop());

const publicUrl = 'https://tensions.firm.example';

test('makes a firm and prints the invitation of its administrator, which can be accepted', async () => {
  expect(await firmsPresent(server.urls.owner)).toBe('none');
  const log = vi.spyOn(console, 'log').mockImplementation(() => undefined);
  await runFirmCreate(['Falk and Reyes', 'Petra Lund', 'Petra@Strandnote.example'], { ownerUrl: server.urls.owner, publicUrl });
  const said = log.mock.calls.flat().join('\n');
  log.mockRestore();
  const token = /https:\/\/tensions\.firm\.example\/invitation\/(\S+)/.exec(said)![1]!;
  expect((await server.anonymous('get', `/invitations/${token}`)).body).toMatchObject({
    firmName: 'Falk and Reyes',
    email: 'petra@strandnote.example',
    roles: ['admin'],
  });
  await ok(server.anonymous('post', `/invitations/${token}/acceptance`, { password: 'a long new password' }));
  await server.signIn('petra@strandnote.example', 'a long new password');
  expect(await firmsPresent(server.urls.owner)).toBe('real');
});

test('asks for what is missing in a sentence', async () => {
  const run = (...args: string[]) => runFirmCreate(args, { ownerUrl: server.urls.owner, publicUrl });
  await expect(run('Falk and Reyes')).rejects.toThrow('Give the name of the firm, the name of its administrator');
  await expect(run('Falk and Reyes', 'Petra Lund', 'no-address')).rejects.toThrow('e-mail address');
});
