import { mkdtempSync, readFileSync, rmSync, statSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { beforeEach, expect, test } from 'vitest';
import { createDemonstrationIdentity, keepDemonstrationIdentity } from '../../../apps/api/src/reports/pdf/demonstration-identity.ts';
import { loadSigningIdentity, readIdentity } from '../../../apps/api/src/reports/pdf/signing-identity.ts';
import { asFile, run } from '../../support/rendered-report.ts';

const firmId = '7d8a1c9e-3f52-4a6b-9c1d-2e3f4a5b6c7d';
const now = new Date('2026-09-15T08:30:00.000Z');
let folder: string;

beforeEach(() => {
  folder = mkdtempSync(join(tmpdir(), 'strandnote-signing-'));
  return () => rmSync(folder, { recursive: true });
});

/** A keystore by openssl, with a key of the kind asked for. */
function keystore(newKey: string[], exported: string[] = []): Buffer {
  const [key, certificate, p12] = [asFile('', 'key'), asFile('', 'pem'), asFile('', 'p12')];
  run('openssl', 'req', '-x509', ...newKey, '-nodes', '-keyout', key, '-out', certificate, '-days', '30', '-subj', '/CN=Test');
  run('openssl', 'pkcs12', '-export', ...exported, '-in', certificate, '-inkey', key, '-passout', 'pass:right', '-out', p12);
  return readFileSync(p12);
}

test('a demonstration certificate says of itself that it proves nothing', async () => {
  const { p12, passphrase } = await createDemonstrationIdentity({ name: 'Falk and Reyes', now });
  const identity = await readIdentity(p12, passphrase);
  expect(identity.subject).toBe('Demonstration certificate, proves nothing');
  expect(identity.notBefore.toISOString()).toBe('2026-09-15T08:30:00.000Z');
  expect(run('openssl', 'x509', '-inform', 'DER', '-in', asFile(identity.certificate, 'der'), '-noout', '-subject')).toContain(
    'O = Falk and Reyes',
  );
});

test('keeps a demonstration certificate once, readable by its owner alone', async () => {
  await keepDemonstrationIdentity(folder, { name: 'Falk and Reyes', now });
  const first = readFileSync(join(folder, 'default.p12'));
  await keepDemonstrationIdentity(folder, { name: 'Somebody else', now });
  expect(readFileSync(join(folder, 'default.p12')).equals(first)).toBe(true);
  for (const file of ['default.p12', 'default.pass']) expect(statSync(join(folder, file)).mode & 0o777).toBe(0o600);
  expect((await loadSigningIdentity(folder, firmId)).subject).toContain('proves nothing');
});

test('a firm signs with its own certificate before the default one', async () => {
  await keepDemonstrationIdentity(folder, { name: 'Falk and Reyes', now });
  writeFileSync(join(folder, `${firmId}.p12`), keystore(['-newkey', 'rsa:2048']));
  writeFileSync(join(folder, `${firmId}.pass`), 'right\n');
  expect(await loadSigningIdentity(folder, firmId)).toMatchObject({ subject: 'Test', key: { kind: 'rsa', bits: 2048, hash: 'SHA-256' } });
});

test('says in plain words what is wrong with a certificate', async () => {
  await expect(loadSigningIdentity(folder, firmId)).rejects.toThrow(
    `There is no signing certificate for this firm. The administrator puts ${firmId}.p12 or default.p12`,
  );
  writeFileSync(join(folder, 'default.p12'), keystore(['-newkey', 'rsa:2048']));
  await expect(loadSigningIdentity(folder, firmId)).rejects.toThrow('write it into default.pass');
  writeFileSync(join(folder, 'default.pass'), 'wrong');
  await expect(loadSigningIdentity(folder, firmId)).rejects.toThrow('does not open it');
  writeFileSync(join(folder, 'default.p12'), 'not a keystore');
  await expect(loadSigningIdentity(folder, firmId)).rejects.toThrow('is not a keystore');
  await expect(loadSigningIdentity(folder, '../../etc/passwd')).rejects.toThrow('not the id of a firm');
});

test('refuses keys that are too short or that readers of PDF do not verify', async () => {
  await expect(readIdentity(keystore(['-newkey', 'rsa:1024']), 'right')).rejects.toThrow(
    'has 1024 bits; a signing key needs at least 2048',
  );
  await expect(readIdentity(keystore(['-newkey', 'ed25519']), 'right')).rejects.toThrow('of a kind that readers of PDF do not verify');
  await expect(readIdentity(keystore(['-newkey', 'rsa:2048'], ['-legacy']), 'right')).rejects.toThrow('Export it again with AES');
});

test('takes elliptic keys of the three curves that are in use', async () => {
  for (const [name, curve] of [
    ['prime256v1', 'P-256'],
    ['secp384r1', 'P-384'],
    ['secp521r1', 'P-521'],
  ] as const) {
    expect((await readIdentity(keystore(['-newkey', 'ec', '-pkeyopt', `ec_paramgen_curve:${name}`]), 'right')).key).toMatchObject({
      curve,
    });
  }
});
