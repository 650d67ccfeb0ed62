import { randomUUID } from 'node:crypto';
import { type Db, schema } from '@strandnote/db';
import { betterAuth } from 'better-auth';
import { drizzleAdapter } from 'better-auth/adapters/drizzle';
import { createAuthMiddleware, isAPIError } from 'better-auth/api';
import type { Logger } from 'pino';
import type { Env } from '../env.ts';
import { ownOrigins } from '../http/own-origin.ts';

export type Auth = ReturnType<typeof createAuth>;

/** The paths of better-auth that are served; everything else of it does not exist here. */
export const identityPaths = [
  '/sign-in/email',
  '/sign-out',
  '/get-session',
  '/request-password-reset',
  '/reset-password',
  '/list-sessions',
  '/revoke-session',
  '/revoke-sessions',
  '/revoke-other-sessions',
  '/change-password',
] as const;

export type IdentityAct = 'session.started' | 'session.ended' | 'password.changed' | 'password.reset';

export interface AuthSeams {
  log: Logger;
  sendPasswordReset: (person: { email: string; name: string }, token: string) => Promise<void>;
  /** Writes an act down; what cannot be written down does not happen. */
  recordAct: (userId: string, act: IdentityAct) => Promise<void>;
}

/** Identity only: accounts, sessions, reset. Firms, roles and invitations are our own. */
export function createAuth(identityDb: Db, env: Pick<Env, 'AUTH_SECRET' | 'publicUrl'>, seams: AuthSeams) {
  const { user, session, account, verification, rateLimit } = schema;
  return betterAuth({
    appName: 'Strandnote',
    baseURL: env.publicUrl,
    basePath: '/api/auth',
    secret: env.AUTH_SECRET,
    trustedOrigins: ownOrigins(env.publicUrl),
    database: drizzleAdapter(identityDb, { provider: 'pg', schema: { user, session, account, verification, rateLimit } }),
    emailAndPassword: {
      enabled: true,
      disableSignUp: true,
      minPasswordLength: 12,
      maxPasswordLength: 128,
      revokeSessionsOnPasswordReset: true,
      sendResetPassword: ({ user: person, token }) => seams.sendPasswordReset(person, token),
      onPasswordReset: ({ user: person }) => seams.recordAct(person.id, 'password.reset'),
    },
    session: { expiresIn: 60 * 60 * 24 * 14, updateAge: 60 * 60 * 24 },
    rateLimit: {
      enabled: true,
      storage: 'database',
      window: 60,
      max: 120,
      customRules: { '/sign-in/email': { window: 60, max: 10 }, '/request-password-reset': { window: 60, max: 5 } },
    },
    databaseHooks: {
      session: {
        create: { before: ({ userId }) => seams.recordAct(userId, 'session.started') },
        delete: { before: ({ userId }) => seams.recordAct(userId, 'session.ended') },
      },
    },
    hooks: { after: afterChangeOfPassword(seams) },
    advanced: {
      database: { generateId: () => randomUUID() },
      useSecureCookies: env.publicUrl.startsWith('https:'),
      defaultCookieAttributes: { httpOnly: true, sameSite: 'lax' },
      // Both are switched off by the library when NODE_ENV is "test": here they are always on.
      disableCSRFCheck: false,
      disableOriginCheck: false,
      ipAddress: { ipAddressHeaders: ['x-strandnote-client'] },
    },
    // Only the sentence: what the library adds to it may hold a person's address.
    logger: { level: 'warn', log: (level, message) => seams.log[level]({ from: 'better-auth' }, message) },
    // What fails is thrown to our own error handler: the library would print the failed query with its values.
    onAPIError: { throw: true },
    telemetry: { enabled: false },
  });
}

function afterChangeOfPassword({ recordAct }: AuthSeams) {
  return createAuthMiddleware(async ({ path, context }) => {
    if (path !== '/change-password' || isAPIError(context.returned) || !context.session) return;
    await recordAct(context.session.user.id, 'password.changed');
  });
}
