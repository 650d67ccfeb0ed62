import { createDb, type Db } from '@strandnote/db';
import { sql } from 'drizzle-orm';
import { type Logger, pino } from 'pino';
import { createAuth } from './access/auth.ts';
import type { AppDeps } from './deps.ts';
import type { Env } from './env.ts';
import { enqueueMail } from './mail/enqueue-mail.ts';
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
  const auth = createAuth(identityDb, env, { sendPasswordReset: (person, token) => sendPasswordReset(db, env, person, token) });
  const deps: AppDeps = { env, db, auth, log, clock, signingIdentity: (firmId) => loadSigningIdentity(env.SIGNING_DIR, firmId) };
  const close = async () => {
    await Promise.all([db.$client.end(), identityDb.$client.end()]);
  };
  return { deps, close };
}

/** Secrets never reach the log: not the cookie, not a password, not a token in an address. */
export function createLog({ LOG_LEVEL }: Pick<Env, 'LOG_LEVEL'>): Logger {
  return pino({
    level: LOG_LEVEL,
    redact: {
      paths: ['req.headers.cookie', 'req.headers.authorization', 'res.headers["set-cookie"]', '*.password', '*.token'],
      censor: 'kept back',
    },
  });
}

async function sendPasswordReset(db: Db, env: Env, person: { email: string; name: string }, token: string): Promise<void> {
  await db.transaction(async (tx) => {
    // No firm is concerned: the job carries none.
    await tx.execute(sql`select set_config('strandnote.firm_id', '', true)`);
    await enqueueMail(tx, [
      {
        to: person.email,
        subject: 'A new password for Strandnote',
        text: `Somebody, most likely you, asked for a new password. Choose one within an hour:\n\n${env.publicUrl}/reset-password?token=${token}\n\nIf it was not you, nothing has to be done.`,
      },
    ]);
  });
}
