import { z } from 'zod';

/** The only reader of the process's environment. */
const environment = z
  .object({
    /** The database as each of its roles. */
    DATABASE_URL_APP: z.string(),
    DATABASE_URL_IDENTITY: z.string(),
    DATABASE_URL_JOBS: z.string(),
    /** Address to listen on; anything but loopback is a real installation. */
    HOST: z.string().default('127.0.0.1'),
    PORT: z.coerce.number().int().min(0).max(65_535).default(4310),
    /** Where people reach it, behind TLS or a trusted proxy. */
    PUBLIC_URL: z.url().optional(),
    /** Number of proxies in front, or the name of a trusted range ("loopback"). */
    TRUST_PROXY: z.string().default('loopback'),
    DATA_DIR: z.string(),
    /** The exported web app; left out, only the API is served. */
    WEB_ROOT: z.string().optional(),
    AUTH_SECRET: z.string().min(32, 'AUTH_SECRET needs at least 32 characters.'),
    SMTP_URL: z.string().optional(),
    MAIL_FROM: z.string().default('Strandnote <strandnote@localhost>'),
    /** Folder of signing certificates: <firm id>.p12 or default.p12, with the passphrase in a .pass file beside it. */
    SIGNING_DIR: z.string(),
    /** Where the heads of the audit chains are appended, outside the database. */
    ANCHOR_FILE: z.string(),
    LOG_LEVEL: z.enum(['fatal', 'error', 'warn', 'info', 'debug', 'silent']).default('info'),
    DEMONSTRATION: z.stringbool().default(false),
  })
  .refine(({ HOST, PUBLIC_URL }) => isLoopback(HOST) || PUBLIC_URL !== undefined, {
    path: ['PUBLIC_URL'],
    message: 'Set it to the address where people reach the server, such as https://tensions.firm.example.',
  })
  .refine(({ HOST, PUBLIC_URL, DEMONSTRATION }) => !DEMONSTRATION || (isLoopback(HOST) && PUBLIC_URL === undefined), {
    path: ['DEMONSTRATION'],
    message: 'A demonstration shows its mail to anyone, and so runs on loopback only.',
  });

function isLoopback(host: string): boolean {
  return ['127.0.0.1', 'localhost', '::1'].includes(host);
}

export type Env = z.infer<typeof environment> & { publicUrl: string };

/** @throws Error with a sentence that names what is missing or wrong */
export function readEnv(variables: Record<string, string | undefined> = process.env): Env {
  const parsed = environment.safeParse(variables);
  if (!parsed.success) {
    const problems = parsed.error.issues.map(({ path, message }) => `${path.join('.')}: ${message}`);
    throw new Error(`The environment is not complete. ${problems.join('; ')}`);
  }
  const publicUrl = (parsed.data.PUBLIC_URL ?? `http://127.0.0.1:${parsed.data.PORT}`).replace(/\/$/, '');
  return { ...parsed.data, publicUrl };
}
