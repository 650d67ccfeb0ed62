import type { Db } from '@strandnote/db';
import type { Logger } from 'pino';
import type { Auth } from './access/auth.ts';
import type { Env } from './env.ts';
import type { SigningIdentity } from './reports/pdf/signing-identity.ts';

/** What commands and routes are given. Clock, mail and signing key are seams: tests and demonstrations put fakes there. */
export interface AppDeps {
  env: Env;
  db: Db;
  auth: Auth;
  log: Logger;
  clock: () => Date;
  /** The certificate with which a firm signs. */
  signingIdentity: (firmId: string) => Promise<SigningIdentity>;
}
