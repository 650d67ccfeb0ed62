import { mkdirSync, mkdtempSync, rmSync, writeFileSync } from 'node:fs';
import { createRequire } from 'node:module';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { brotliCompressSync, gzipSync } from 'node:zlib';
import supertest from 'supertest';
import { afterAll, expect, test } from 'vitest';
import { errorHandler } from '../../../apps/api/src/http/error-handler.ts';
import { serveWebApp } from '../../../apps/api/src/http/web-app.ts';

const express = createRequire(new URL('../../../apps/api/package.json', import.meta.url))('express');
const root = mkdtempSync(join(tmpdir(), 'strandnote-web-'));
const outside = mkdtempSync(join(tmpdir(), 'strandnote-outside-'));
const page = '<!doctype html><title>Strandnote</title>';
const script = 'console.log("a script of the app")';
put('index.html', page, true);
put('_expo/static/js/entry-1a2b.js', script, true);
put('_expo/static/js/small-3c4d.js', 'small', false);
put('assets/__node_modules/.pnpm/face@1.ttf', 'a face', false);
put('strandnote.webmanifest', '{}', true);
put('.secret', 'not for you', false);
writeFileSync(join(outside, 'file.js.br'), 'a secret beside');

const app = express().use(serveWebApp(root)).use(errorHandler);
afterAll(() => {
  rmSync(root, { recursive: true });
  rmSync(outside, { recursive: true });
});

function put(path: string, text: string, compressed: boolean): void {
  mkdirSync(join(root, path, '..'), { recursive: true });
  writeFileSync(join(root, path), text);
  if (!compressed) return;
  writeFileSync(join(root, `${path}.br`), brotliCompressSync(text));
  writeFileSync(join(root, `${path}.gz`), gzipSync(text));
}

const get = (path: string, headers: Record<string, string> = {}) =>
  supertest(app)
    .get(path)
    .set({ 'Accept-Encoding': 'identity', ...headers });

test('sends brotli to a browser that takes it, though the browser names gzip first', async () => {
  const reply = await get('/_expo/static/js/entry-1a2b.js', { 'Accept-Encoding': 'gzip, deflate, br, zstd' });
  expect(reply.headers).toMatchObject({
    'content-encoding': 'br',
    vary: 'Accept-Encoding',
    'content-type': 'text/javascript; charset=utf-8',
    'cache-control': 'public, max-age=31536000, immutable',
  });
});

test('sends gzip, or the file as it is, to those that take no more', async () => {
  const zipped = await get('/_expo/static/js/entry-1a2b.js', { 'Accept-Encoding': 'gzip' });
  expect([zipped.headers['content-encoding'], zipped.text]).toEqual(['gzip', script]);
  const plain = await get('/_expo/static/js/entry-1a2b.js');
  expect([plain.headers['content-encoding'], plain.text]).toEqual([undefined, script]);
  expect((await get('/_expo/static/js/small-3c4d.js', { 'Accept-Encoding': 'br' })).text).toBe('small');
});

test('answers the load of any page with the app, which is asked for anew each time', async () => {
  for (const path of ['/', '/some-firm/desk', '/verify/ABCD']) {
    const reply = await get(path, { Accept: 'text/html,*/*', 'Accept-Encoding': 'br, gzip' });
    expect([path, reply.status, reply.headers['content-encoding'], reply.headers['cache-control']]).toEqual([path, 200, 'br', 'no-cache']);
    expect(reply.headers['content-type']).toMatch(/^text\/html/);
  }
  expect((await get('/index.html')).headers['cache-control']).toMatch(/no-cache|max-age=0/);
});

test('says of a file that is not there that it is not there', async () => {
  expect((await get('/_expo/static/js/gone.js')).status).toBe(404);
  expect((await get('/gone.js')).status).toBe(404);
});

test('keeps fonts under their folder with a dot for a year, and other dot files to itself', async () => {
  const face = await get('/assets/__node_modules/.pnpm/face@1.ttf');
  expect([face.status, face.headers['cache-control']]).toEqual([200, 'public, max-age=31536000, immutable']);
  expect((await get('/.secret')).status).toBe(404);
});

test('gives nothing from outside its folder, however the way out is written', async () => {
  const name = outside.split('/').at(-1)!;
  for (const path of [`/../${name}/file.js`, `/%2e%2e/${name}/file.js`, `/..%2f${name}/file.js`, '/%E0%A4%A.js', '/%00.js']) {
    const reply = await get(path, { 'Accept-Encoding': 'br' });
    expect([path, reply.status >= 400 && reply.status < 500]).toEqual([path, true]);
    expect(reply.text ?? '').not.toContain('a secret beside');
  }
});
