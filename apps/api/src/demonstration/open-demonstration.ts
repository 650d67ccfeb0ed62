import { existsSync } from 'node:fs';
import { readFile, writeFile } from 'node:fs/promises';
import { join } from 'node:path';
import { z } from 'zod';
import { createDeps } from '../create-deps.ts';
import { readEnv } from '../env.ts';
import { keepDemonstrationIdentity } from '../reports/pdf/demonstration-identity.ts';
import { startFakeMailServer } from './mailbox.ts';
import { seedDemonstration } from './seed-demonstration.ts';

const account = z.object({ role: z.string(), email: z.string(), password: z.string() });
export type DemonstrationAccount = z.infer<typeof account>;

/**
 * Opens a demonstration: a fake mail server, a certificate that proves nothing, and, the first time, an invented county with its
 * bridges. The passwords are made at random once and kept in the data folder.
 *
 * @param environment of the server that will run
 */
export async function openDemonstration(environment: Record<string, string>, dataFolder: string, ownerUrl: string) {
  const mailServer = await startFakeMailServer(dataFolder, () => new Date());
  // Valid from before the demonstration's past, so that its reports of last year are signed within it.
  await keepDemonstrationIdentity(environment.SIGNING_DIR!, { name: 'Larkmoor Structural', now: new Date('2025-01-01T00:00:00Z') });
  const file = join(dataFolder, 'demonstration.json');
  if (!existsSync(file)) {
    const env = readEnv({ ...environment, LOG_LEVEL: 'silent', SMTP_URL: mailServer.url });
    const past = { at: new Date() };
    const { deps, close } = createDeps(env, { clock: () => past.at });
    try {
      const accounts = await seedDemonstration(deps, ownerUrl, past);
      await writeFile(file, JSON.stringify(accounts, null, 2), { mode: 0o600 });
    } finally {
      await close();
    }
  }
  return { accounts: z.array(account).parse(JSON.parse(await readFile(file, 'utf8'))), mailServer };
}
