import { createDb, type Db } from '@strandnote/db';
import { sql } from 'drizzle-orm';
import type { Logger } from 'pino';
import { createAuth } from './access/auth.ts';
import { recordIdentityAct } from './access/record-identity-act.ts';
import { createLog } from './create-log.ts';
import type { AppDeps } from './deps.ts';
import type { Env } from './env.ts';
import { enqueueMail } from './mail/enqueue-mail.ts';
import { passwordResetMail } from './mail/password-reset-mail.ts';
import { loadSigningIdentity } from './reports/pdf/signing-identity.ts';

export interface OpenDeps {
  deps: AppDeps;
  close: () => Promise<void>;
}

/** Opens what the server and the worker need; the clock is a seam of tests and of the demonstration's past. */
export function createDeps(
  env: Env,
  { clock = () => new Date(), log = createLog(env) }: { clock?: () => Date; log?: Logger } = {},
): OpenDeps {
  const db = createDb(env.DATABASE_URL_APP);
  const identityDb = createDb(env.DATABASE_URL_IDENTITY, { connections: 5 });
  const auth = createAuth(identityDb, env, {
    log,
    sendPasswordReset: ({ email }, token) => sendPasswordReset(db, env, email, token),
    recordAct: (userId, act) => recordIdentityAct({ db, env, clock, log }, userId, act),
  });
  const deps: AppDeps = { env, db, auth, log, clock, signingIdentity: (firmId) => loadSigningIdentity(env.SIGNING_DIR, firmId) };
  const close = async () => {
    await Promise.all([db.$client.end(), identityDb.$client.end()]);
  };
  return { deps, close };
}

async function sendPasswordReset(db: Db, env: Env, to: string, token: string): Promise<void> {
  await db.transaction(async (tx) => {
    // No firm is concerned: the job carries none.
    await tx.execute(sql`select set_config('strandnote.firm_id', '', true)`);
    await enqueueMail(tx, [passwordResetMail({ to, link: `${env.publicUrl}/reset-password?token=${token}` })]);
  });
}
