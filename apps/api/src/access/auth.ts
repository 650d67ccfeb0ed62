import { randomUUID } from 'node:crypto';
import { type Db, schema } from '@strandnote/db';
import { betterAuth } from 'better-auth';
import { drizzleAdapter } from 'better-auth/adapters/drizzle';
import type { Env } from '../env.ts';

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

export interface AuthSeams {
  sendPasswordReset: (person: { email: string; name: string }, token: string) => Promise<void>;
}

/** Identity only: accounts, sessions, reset. Firms, roles and invitations are our own. */
export function createAuth(identityDb: Db, env: Pick<Env, 'AUTH_SECRET' | 'publicUrl'>, seams: AuthSeams) {
  const { user, session, account, verification, rateLimit } = schema;
  return betterAuth({
    appName: 'Strandnote',
    baseURL: env.publicUrl,
    basePath: '/api/auth',
    secret: env.AUTH_SECRET,
    trustedOrigins: [new URL(env.publicUrl).origin],
    database: drizzleAdapter(identityDb, { provider: 'pg', schema: { user, session, account, verification, rateLimit } }),
    emailAndPassword: {
      enabled: true,
      disableSignUp: true,
      minPasswordLength: 12,
      maxPasswordLength: 128,
      revokeSessionsOnPasswordReset: true,
      sendResetPassword: ({ user: person, token }) => seams.sendPasswordReset(person, token),
    },
    session: { expiresIn: 60 * 60 * 24 * 14, updateAge: 60 * 60 * 24 },
    rateLimit: {
      enabled: true,
      storage: 'database',
      window: 60,
      max: 120,
      customRules: { '/sign-in/email': { window: 60, max: 10 }, '/request-password-reset': { window: 60, max: 5 } },
    },
    advanced: {
      database: { generateId: () => randomUUID() },
      useSecureCookies: env.publicUrl.startsWith('https:'),
      // Both are switched off by the library when NODE_ENV is "test": here they are always on.
      disableCSRFCheck: false,
      disableOriginCheck: false,
      ipAddress: { ipAddressHeaders: ['x-strandnote-client'] },
    },
    telemetry: { enabled: false },
  });
}
