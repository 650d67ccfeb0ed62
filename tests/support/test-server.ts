import { randomUUID } from 'node:crypto';
import { mkdtempSync, rmSync } from 'node:fs';
import { createRequire } from 'node:module';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import type { Role } from '@strandnote/api/contract';
import type { RoleUrls } from '@strandnote/db';
import pg from 'pg';
import supertest from 'supertest';
import { createApp } from '../../apps/api/src/app.ts';
import { createDeps } from '../../apps/api/src/create-deps.ts';
import { createLog } from '../../apps/api/src/create-log.ts';
import type { AppDeps } from '../../apps/api/src/deps.ts';
import { readEnv } from '../../apps/api/src/env.ts';
import { createTasks } from '../../apps/api/src/jobs/tasks.ts';
import { createAccount } from '../../apps/api/src/members/accept-invitation.ts';
import { keepDemonstrationIdentity } from '../../apps/api/src/reports/pdf/demonstration-identity.ts';
import { type ReceivedMail, startMailServer } from './mail-server.ts';
import { createTestDatabase } from './test-database.ts';

/** Everybody's in tests. */
export const password = 'correct horse battery staple';
const fromApi = createRequire(new URL('../../apps/api/package.json', import.meta.url));
const { Logger, runOnce } = fromApi('graphile-worker') as typeof import('../../apps/api/node_modules/graphile-worker');

export interface Reply {
  status: number;
  // Replies are looked at by name in tests; their shape is proved by the contract on the way out.
  // biome-ignore lint/suspicious/noExplicitAny: see above
  body: any;
  text: string;
  headers: Record<string, string>;
  bytes: Buffer;
}

type Express = ReturnType<typeof createApp>;
type Method = 'get' | 'post' | 'put' | 'patch' | 'delete';
type Methods = Record<Method, (path: string, body?: object) => Promise<Reply>>;

/** A person signed in, in one firm: paths are below /api/v1/firms/:firmId. */
export interface SignedIn extends Methods {
  userId: string;
  name: string;
  email: string;
  password: string;
  /** The same session, with paths below another firm. */
  elsewhere: (firmId: string) => Methods;
}

export interface TestServer {
  app: Express;
  deps: AppDeps;
  urls: RoleUrls;
  superuser: pg.Client;
  mail: ReceivedMail[];
  anchorFile: string;
  /** What the server believes the time to be, a second later each time it looks; set it to move the clock. */
  now: { at: Date };
  createFirm: (name?: string) => Promise<string>;
  createClient: (firmId: string, name?: string) => Promise<string>;
  join: (firmId: string, person: { name: string; roles: Role[]; clientId?: string }) => Promise<SignedIn>;
  /** The session cookie of the person with this address. */
  signIn: (email: string, password?: string) => Promise<string>;
  anonymous: (method: Method, path: string, body?: object) => Promise<Reply>;
  /** Runs every job in the queue to its end, as the worker would. */
  runJobs: () => Promise<void>;
  stop: () => Promise<void>;
}

/** @param settings of the environment that differ, such as PUBLIC_URL; `lines` collects the log */
export async function startTestServer({
  settings = {},
  lines,
}: {
  settings?: Record<string, string>;
  lines?: string[];
} = {}): Promise<TestServer> {
  const database = await createTestDatabase();
  const mailServer = await startMailServer();
  const folder = mkdtempSync(join(tmpdir(), 'strandnote-test-'));
  const env = readEnv({
    DATABASE_URL_APP: database.urls.app,
    DATABASE_URL_IDENTITY: database.urls.identity,
    DATABASE_URL_JOBS: database.urls.jobs,
    DATA_DIR: folder,
    SIGNING_DIR: folder,
    ANCHOR_FILE: join(folder, 'anchors.jsonl'),
    AUTH_SECRET: 'a secret that is long enough for a test',
    SMTP_URL: mailServer.url,
    LOG_LEVEL: process.env.TEST_LOG_LEVEL ?? (lines ? 'debug' : 'silent'),
    ...settings,
  });
  const now = { at: new Date('2026-09-14T08:00:00.000Z') };
  await keepDemonstrationIdentity(folder, { name: 'Strandnote in test', now: now.at });
  const { deps, close } = createDeps(env, {
    clock: () => tick(now),
    log: createLog(env, lines && { write: (line) => void lines.push(line) }),
  });
  const app = createApp(deps);
  const superuser = new pg.Client({ connectionString: database.superuserUrl });
  await superuser.connect();
  let people = 0;

  async function call(method: Method, path: string, cookie: string | null, body?: object): Promise<Reply> {
    const request = supertest(app)[method](path).set('Origin', env.publicUrl).buffer(true).parse(readBytes);
    if (cookie !== null) request.set('Cookie', cookie);
    const reply = body === undefined ? await request : await request.send(body);
    const bytes = reply.body as Buffer;
    const text = bytes.toString('utf8');
    const isJson = /json/.test(String(reply.headers['content-type']));
    return { status: reply.status, headers: reply.headers, bytes, text, body: isJson ? JSON.parse(text) : undefined };
  }

  async function createFirm(name = 'Falk and Reyes'): Promise<string> {
    const id = randomUUID();
    await superuser.query(
      `insert into firms (id, name, time_zone, letterhead) values ($1, $2, 'UTC', '{"addressLines":["1 Quay Street"],"phone":"","email":"","registration":""}')`,
      [id, name],
    );
    return id;
  }

  async function createClient(firmId: string, name = 'County Roads'): Promise<string> {
    const id = randomUUID();
    await superuser.query('insert into clients (firm_id, id, name) values ($1, $2, $3)', [firmId, id, name]);
    return id;
  }

  async function joinFirm(
    firmId: string,
    { name, roles, clientId }: { name: string; roles: Role[]; clientId?: string },
  ): Promise<SignedIn> {
    people += 1;
    const email = `person-${people}@strandnote.example`;
    const userId = await createAccount(deps, { email, name }, password);
    await superuser.query('insert into members (firm_id, id, user_id, name, email, roles, client_id) values ($1, $2, $3, $4, $5, $6, $7)', [
      firmId,
      randomUUID(),
      userId,
      name,
      email,
      roles,
      clientId ?? null,
    ]);
    const cookie = await signIn(email);
    const below = (id: string): Methods => {
      const inFirm = (method: Method) => (path: string, body?: object) => call(method, `/api/v1/firms/${id}${path}`, cookie, body);
      return { get: inFirm('get'), post: inFirm('post'), put: inFirm('put'), patch: inFirm('patch'), delete: inFirm('delete') };
    };
    return { userId, name, email, password, ...below(firmId), elsewhere: below };
  }

  async function signIn(email: string, typed = password): Promise<string> {
    const reply = await call('post', '/api/auth/sign-in/email', null, { email, password: typed });
    if (reply.status !== 200) throw new Error(`Signing in failed: ${reply.status} ${reply.text}`);
    return [reply.headers['set-cookie']]
      .flat()
      .map((cookie) => String(cookie).split(';')[0])
      .join('; ');
  }

  return {
    app,
    deps,
    urls: database.urls,
    superuser,
    mail: mailServer.received,
    anchorFile: env.ANCHOR_FILE,
    now,
    createFirm,
    createClient,
    join: joinFirm,
    signIn,
    anonymous: (method, path, body) => call(method, `/api/v1${path}`, null, body),
    runJobs: () =>
      runOnce({ connectionString: database.urls.jobs, taskList: createTasks(deps), logger: new Logger(() => () => undefined) }),
    stop: async () => {
      await superuser.end();
      await close();
      await mailServer.stop();
      await database.drop();
      rmSync(folder, { recursive: true, force: true });
    },
  };
}

function tick(now: { at: Date }): Date {
  now.at = new Date(now.at.getTime() + 1000);
  return new Date(now.at);
}

function readBytes(response: supertest.Response, done: (error: Error | null, bytes: Buffer) => void): void {
  const chunks: Buffer[] = [];
  response.on('data', (chunk: Buffer) => chunks.push(chunk));
  response.on('end', () => done(null, Buffer.concat(chunks)));
}
