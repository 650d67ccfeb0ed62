import { expect, test } from 'vitest';
import { readEnv } from '../../apps/api/src/env.ts';

const least = {
  DATABASE_URL_APP: 'postgres://app@127.0.0.1/strandnote',
  DATABASE_URL_IDENTITY: 'postgres://identity@127.0.0.1/strandnote',
  DATABASE_URL_JOBS: 'postgres://jobs@127.0.0.1/strandnote',
  DATA_DIR: '/var/lib/strandnote',
  SIGNING_DIR: '/var/lib/strandnote/signing',
  ANCHOR_FILE: '/var/lib/strandnote/anchors.jsonl',
  AUTH_SECRET: 'x'.repeat(32),
};

test('on loopback the address is known by itself', () => {
  expect(readEnv(least)).toMatchObject({ HOST: '127.0.0.1', PORT: 4310, publicUrl: 'http://127.0.0.1:4310', DEMONSTRATION: false });
});

test('the public address loses its last slash', () => {
  expect(readEnv({ ...least, PUBLIC_URL: 'https://tensions.firm.example/' }).publicUrl).toBe('https://tensions.firm.example');
});

test('names everything that is missing or wrong at once', () => {
  const { AUTH_SECRET: _secret, ...rest } = least;
  expect(() => readEnv({ ...rest, PORT: 'abc' })).toThrow(/AUTH_SECRET.*PORT|PORT.*AUTH_SECRET/s);
  expect(() => readEnv({ ...least, AUTH_SECRET: 'short' })).toThrow('at least 32 characters');
});

test('refuses to be reached by others without knowing its address, and to be a demonstration then', () => {
  expect(() => readEnv({ ...least, HOST: '0.0.0.0' })).toThrow('PUBLIC_URL: Set it to the address');
  const open = { ...least, HOST: '0.0.0.0', PUBLIC_URL: 'https://tensions.firm.example' };
  expect(readEnv(open).HOST).toBe('0.0.0.0');
  expect(() => readEnv({ ...open, DEMONSTRATION: 'true' })).toThrow('runs on loopback only');
});
