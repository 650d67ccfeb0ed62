import { mkdtempSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import supertest from 'supertest';
import { afterAll, beforeAll, expect, test } from 'vitest';
import { type SignedIn, startTestServer, type TestServer } from '../support/test-server.ts';

let server: TestServer;
let person: SignedIn;
const webRoot = mkdtempSync(join(tmpdir(), 'strandnote-web-'));

beforeAll(async () => {
  writeFileSync(join(webRoot, 'index.html'), '<!doctype html><title>Strandnote</title>');
  server = await startTestServer({ settings: { WEB_ROOT: webRoot } });
  person = await server.join(await server.createFirm(), { name: 'Ines Falk', roles: ['engineer'] });
});
afterAll(async () => {
  await server.stop();
  rmSync(webRoot, { recursive: true });
});

const directives = (policy: string) =>
  Object.fromEntries(
    policy.split(';').map((directive) => {
      const [name, ...values] = directive.trim().split(' ');
      return [name, values];
    }),
  );

test.each(['/', '/api/v1/docs', '/api/v1/health', '/api/v1/nowhere', '/api/auth/get-session'])(
  '%s lets no script run that is not a file of ours, and no page frame it',
  async (path) => {
    const { headers } = await supertest(server.app).get(path).set('Accept', 'text/html');
    const policy = directives(headers['content-security-policy']!);
    expect(policy['script-src']).toEqual(["'self'"]);
    expect(policy['script-src-attr']).toEqual(["'none'"]);
    expect(policy['default-src']).toEqual(["'self'"]);
    expect(policy['object-src']).toEqual(["'none'"]);
    expect(policy['base-uri']).toEqual(["'self'"]);
    expect(policy['form-action']).toEqual(["'self'"]);
    expect(policy['frame-ancestors']).toEqual(["'none'"]);
    expect(headers['x-content-type-options']).toBe('nosniff');
    expect(headers['referrer-policy']).toBe('same-origin');
    expect(headers['x-powered-by']).toBeUndefined();
  },
);

test('replies of the API are kept by no cache', async () => {
  expect((await person.get('/structures')).headers['cache-control']).toBe('no-store');
  expect((await person.get('/nowhere')).headers['cache-control']).toBe('no-store');
});

test('no other site may read a reply', async () => {
  const { headers } = await supertest(server.app).get('/api/v1/health').set('Origin', 'https://elsewhere.example');
  expect(headers['access-control-allow-origin']).toBeUndefined();
  expect(headers['cross-origin-resource-policy']).toBe('same-origin');
});

test('the page of the API has no script', async () => {
  const { text } = await supertest(server.app).get('/api/v1/docs');
  expect(text).toContain('/api/v1/firms/:firmId/structures');
  expect(text).not.toMatch(/<script|\son\w+=/i);
});
