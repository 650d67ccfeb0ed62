import { readFileSync } from 'node:fs';
import { beforeAll, expect, test } from 'vitest';
import { createDemonstrationIdentity } from '../../../apps/api/src/reports/pdf/demonstration-identity.ts';
import { renderReport } from '../../../apps/api/src/reports/pdf/render-report.ts';
import { signReport } from '../../../apps/api/src/reports/pdf/sign.ts';
import { readIdentity, type SigningIdentity } from '../../../apps/api/src/reports/pdf/signing-identity.ts';
import { asFile, attempt, reportInput, run, sampleReport } from '../../support/rendered-report.ts';
import { sampleReportContent } from '../../support/report-content.ts';

/** A whole second after the certificates of this test begin, which openssl dates to the present. */
const now = new Date((Math.ceil(Date.now() / 1000) + 1) * 1000);
const timeAsPdfsigWritesIt = now.toUTCString().replace(/^\w+, (\d+) (\w+) (\d+) (.*) GMT$/, '$2 $1 $3 $4');
const pdfTime = now.toISOString().slice(0, 19).replace(/[-:T]/g, '');
let elliptic: SigningIdentity;
let rsa: SigningIdentity;
let unsigned: Buffer;

beforeAll(async () => {
  const { p12, passphrase } = await createDemonstrationIdentity({ name: 'Falk and Reyes', now: new Date(now.getTime() - 1000) });
  elliptic = await readIdentity(p12, passphrase);
  rsa = await readIdentity(rsaKeystore(), 'a passphrase');
  unsigned = await sampleReport();
});

/** A keystore that we did not write: openssl's. */
function rsaKeystore(): Buffer {
  const [key, certificate, keystore] = [asFile('', 'key'), asFile('', 'pem'), asFile('', 'p12')];
  const subject = ['-subj', '/O=Falk and Reyes/CN=Signing of reports'];
  run('openssl', 'req', '-x509', '-newkey', 'rsa:2048', '-nodes', '-keyout', key, '-out', certificate, '-days', '3000', ...subject);
  run('openssl', 'pkcs12', '-export', '-in', certificate, '-inkey', key, '-passout', 'pass:a passphrase', '-out', keystore);
  return readFileSync(keystore);
}

interface Parts {
  signedBytes: Buffer;
  cms: Buffer;
  range: number[];
}

/** The signature and the bytes that it is of, by the byte range that the file states. */
function partsOf(pdf: Buffer): Parts {
  const range = /\/ByteRange \[([\d ]+)\]/.exec(pdf.toString('latin1'))![1]!.trim().split(' ').map(Number);
  const [start, length, second, secondLength] = range as [number, number, number, number];
  const signedBytes = Buffer.concat([pdf.subarray(start, start + length), pdf.subarray(second, second + secondLength)]);
  const hex = pdf.subarray(length + 1, second - 1).toString('latin1');
  const padded = Buffer.from(hex, 'hex');
  // DER says how long it is; the rest is the room that was left.
  return { signedBytes, cms: padded.subarray(0, 4 + padded.readUInt16BE(2)), range };
}

test.each([
  ['ECDSA', () => elliptic],
  ['RSA', () => rsa],
])('signs with %s so that another program finds it valid, over the whole file', async (_, identity) => {
  const signed = await signReport(unsigned, identity(), now);
  const told = run('pdfsig', asFile(signed));
  expect(told).toContain('Signature is Valid.');
  expect(told).toContain('Total document signed');
  expect(told).toContain('ETSI.CAdES.detached');
  expect(told).toContain('Signing Hash Algorithm: SHA-256');
  expect(told).toContain(`Signing Time: ${timeAsPdfsigWritesIt}`);
});

test('a single flipped byte is found, wherever it lies', async () => {
  const signed = await signReport(unsigned, elliptic, now);
  const { range } = partsOf(signed);
  for (const position of [2000, Math.floor(range[1]! / 2), range[2]! + 40]) {
    const tampered = Buffer.from(signed);
    tampered[position] = tampered[position]! ^ 1;
    expect(attempt('pdfsig', asFile(tampered)).output).not.toContain('Signature is Valid.');
  }
});

test.each([
  ['ECDSA', () => elliptic],
  ['RSA', () => rsa],
])('the signature by %s is CAdES in the eyes of openssl, and of these bytes only', async (_, identity) => {
  const { certificate } = identity();
  const { signedBytes, cms } = partsOf(await signReport(unsigned, identity(), now));
  const pem = asFile(
    `-----BEGIN CERTIFICATE-----\n${certificate
      .toString('base64')
      .match(/.{1,64}/g)!
      .join('\n')}\n-----END CERTIFICATE-----\n`,
    'pem',
  );
  const verify = (content: Buffer) =>
    attempt(
      'openssl',
      'cms',
      '-verify',
      '-cades',
      '-binary',
      '-inform',
      'DER',
      '-in',
      asFile(cms, 'cms'),
      '-content',
      asFile(content, 'bin'),
      '-CAfile',
      pem,
      '-partial_chain',
      '-purpose',
      'any',
      '-attime',
      String(now.getTime() / 1000),
      '-out',
      asFile('', 'out'),
    );
  expect(verify(signedBytes).output).toContain('CAdES Verification successful');
  const other = Buffer.from(signedBytes);
  other[500] = other[500]! ^ 1;
  expect(verify(other).status).not.toBe(0);
});

test('has signing-certificate-v2 and no signing-time among its attributes', async () => {
  const { cms } = partsOf(await signReport(unsigned, elliptic, now));
  const printed = run('openssl', 'cms', '-cmsout', '-print', '-inform', 'DER', '-in', asFile(cms, 'cms'));
  expect(printed).toContain('id-smime-aa-signingCertificateV2');
  expect(printed).not.toContain('signingTime');
});

test('changes nothing of the approved bytes but the place kept for the signature', async () => {
  const signed = await signReport(unsigned, elliptic, now);
  expect(signed.length).toBe(unsigned.length - 1);
  const { range } = partsOf(signed);
  const dictionary = signed.lastIndexOf('/M (D:', range[1]!);
  expect(signed.subarray(0, dictionary).equals(unsigned.subarray(0, dictionary))).toBe(true);
  const after = range[2]!;
  // Signing drops the line feed after the end of the file, which a signature may not cover.
  expect(signed.subarray(after).equals(unsigned.subarray(after, unsigned.length - 1))).toBe(true);
  const place = signed.subarray(dictionary, range[1]!).toString('latin1');
  expect(place.startsWith(`/M (D:${pdfTime}Z)\n/ByteRange [${range.join(' ')}]`)).toBe(true);
  expect(place.trimEnd().endsWith('\n/Contents')).toBe(true);
  expect(run('qpdf', '--check', asFile(signed))).toContain('No syntax or stream encoding errors found');
});

test('signs a report once only, and never a draft', async () => {
  const signed = await signReport(unsigned, elliptic, now);
  await expect(signReport(signed, elliptic, now)).rejects.toThrow('no empty place for a signature');
  const draft = await renderReport(reportInput(sampleReportContent(), { draft: true }));
  await expect(signReport(draft, elliptic, now)).rejects.toThrow('no empty place for a signature');
});

test('does not sign before or after the certificate is valid', async () => {
  await expect(signReport(unsigned, elliptic, new Date(now.getTime() - 86_400_000))).rejects.toThrow('valid only from');
  await expect(signReport(unsigned, elliptic, new Date(now.getTime() + 11 * 366 * 86_400_000))).rejects.toThrow('expired on');
});
