import { randomUUID } from 'node:crypto';
import supertest from 'supertest';
import { afterAll, beforeAll, expect, test, vi } from 'vitest';
import { jobLog } from '../../apps/api/src/jobs/job-log.ts';
import { password, type SignedIn, startTestServer, type TestServer } from '../support/test-server.ts';

const lines: string[] = [];
let server: TestServer;
let admin: SignedIn;
let cookie: string;

beforeAll(async () => {
  server = await startTestServer({ lines });
  admin = await server.join(await server.createFirm(), { name: 'Petra Lund', roles: ['admin'] });
  cookie = await server.signIn(admin.email);
});
afterAll(() => server.stop());

const logged = () => lines.join('\n');
const value = (pair: string) => pair.slice(pair.indexOf('=') + 1);

test('requests are logged, without cookie, authorization, body or password', async () => {
  await admin.get('/structures');
  await supertest(server.app).get('/api/v1/me').set('Cookie', cookie).set('Authorization', 'Bearer a-bearer-token');
  expect(logged()).toContain(`/api/v1/firms/`);
  expect(logged()).toContain('"method":"POST","path":"/api/auth/sign-in/email"');
  for (const secret of [password, value(cookie), decodeURIComponent(value(cookie)).split('.')[0]!, 'a-bearer-token', admin.email]) {
    expect(logged()).not.toContain(secret);
  }
});

test('an invitation and a new password leave no token in the log, neither of their making nor of their use', async () => {
  const email = 'nia@strandnote.example';
  await admin.post('/invitations', { id: randomUUID(), name: 'Nia Sol', email, roles: ['engineer'], clientId: null });
  await supertest(server.app)
    .post('/api/auth/request-password-reset')
    .set('Origin', server.deps.env.publicUrl)
    .send({ email: admin.email });
  await server.runJobs();
  const tokens = server.mail.map(({ text }) => /(?:invitation\/|token=)(\S+)/.exec(text)![1]!);
  expect(tokens).toHaveLength(2);
  for (const token of tokens) {
    await supertest(server.app).get(`/api/v1/invitations/${token}`);
    await supertest(server.app).get(`/invitation/${token}`).set('Referer', `http://127.0.0.1:4310/reset-password?token=${token}`);
    await supertest(server.app).get(`/reset-password?token=${token}`);
    expect(logged()).not.toContain(token);
  }
  expect(logged()).toContain('/api/v1/invitations/…');
});

test('a query that fails is logged without its values', async () => {
  await server.superuser.query('alter table clients add constraint refuse_for_now check (length(name) < 5) not valid');
  const reply = await admin.post('/clients', {
    id: randomUUID(),
    name: 'A name that is secret',
    contactName: '',
    contactEmail: '',
    address: '',
  });
  await server.superuser.query('alter table clients drop constraint refuse_for_now');
  expect(reply.status).toBe(500);
  expect(logged()).toContain('Failed query: insert into \\"clients\\"');
  expect(logged()).not.toContain('A name that is secret');
});

test('a sign-in that fails inside is logged without its values, and printed nowhere', async () => {
  const printed = vi.spyOn(console, 'error');
  await server.superuser.query('alter table identity.session add constraint refuse_for_now check (user_id is null) not valid');
  const reply = await supertest(server.app)
    .post('/api/auth/sign-in/email')
    .set('Origin', server.deps.env.publicUrl)
    .send({ email: admin.email, password });
  await server.superuser.query('alter table identity.session drop constraint refuse_for_now');
  expect(reply.body).toMatchObject({ status: 500, code: 'internal' });
  expect(logged()).toContain('Failed query: insert into \\"identity\\".\\"session\\"');
  expect(logged()).not.toContain(admin.userId);
  expect(printed).not.toHaveBeenCalled();
  printed.mockRestore();
});

test('a job that fails is named, and its message is not shown', () => {
  const before = lines.length;
  const job = { id: '7', task_identifier: 'mail', attempts: 2, payload: { text: 'the text of a message' } };
  jobLog(server.deps.log).error('Failed task 7 with the text of a message', { error: new Error('no route'), job });
  const line = lines.slice(before).join('\n');
  expect(JSON.parse(line)).toMatchObject({ job: { id: '7', task: 'mail', attempts: 2 }, err: { message: 'no route' } });
  expect(line).not.toContain('the text of a message');
});
