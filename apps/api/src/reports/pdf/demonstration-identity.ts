import { randomBytes, webcrypto } from 'node:crypto';
import { access, mkdir, writeFile } from 'node:fs/promises';
import { join } from 'node:path';
import { Set as AsnSet, BitString, Integer, Sequence, Utf8String } from 'asn1js';
import { AttributeTypeAndValue, BasicConstraints, Certificate, Extension, RelativeDistinguishedNames, Time } from 'pkijs';
import { cryptoEngine } from './crypto-engine.ts';
import { sealKeystore } from './keystore.ts';

const oid = {
  commonName: '2.5.4.3',
  organization: '2.5.4.10',
  organizationalUnit: '2.5.4.11',
  basicConstraints: '2.5.29.19',
  keyUsage: '2.5.29.15',
};
const tenYears = 10 * 365.25 * 24 * 3600 * 1000;

/**
 * A self-signed certificate for a demonstration. It shows how a signed report looks and is verified; whoever reads its
 * subject sees that it says nothing about who signed.
 *
 * @param name the firm that it stands for
 * @param now start of its validity, which lasts ten years
 * @returns a keystore and the passphrase that opens it
 */
export async function createDemonstrationIdentity({
  name,
  now,
}: {
  name: string;
  now: Date;
}): Promise<{ p12: Buffer; passphrase: string }> {
  const keys = await webcrypto.subtle.generateKey({ name: 'ECDSA', namedCurve: 'P-256' }, true, ['sign', 'verify']);
  const certificate = new Certificate({ version: 2, serialNumber: serialNumber() });
  certificate.subject = distinguishedName(name);
  certificate.issuer = distinguishedName(name);
  certificate.notBefore = new Time({ type: 0, value: now });
  certificate.notAfter = new Time({ type: 0, value: new Date(now.getTime() + tenYears) });
  certificate.extensions = extensions();
  await certificate.subjectPublicKeyInfo.importKey(keys.publicKey as never, cryptoEngine);
  await certificate.sign(keys.privateKey as never, 'SHA-256', cryptoEngine);
  const privateKey = Buffer.from(await webcrypto.subtle.exportKey('pkcs8', keys.privateKey));
  const passphrase = randomBytes(24).toString('base64url');
  const p12 = await sealKeystore({ privateKey, certificates: [Buffer.from(certificate.toSchema(true).toBER())] }, passphrase);
  return { p12, passphrase };
}

/**
 * Puts a demonstration certificate into a folder of signing certificates, unless there is one already.
 *
 * @param file name without its ending: `default`, or the id of a firm
 */
export async function keepDemonstrationIdentity(folder: string, about: { name: string; now: Date }, file = 'default'): Promise<void> {
  if (await isThere(join(folder, `${file}.p12`))) return;
  const { p12, passphrase } = await createDemonstrationIdentity(about);
  await mkdir(folder, { recursive: true, mode: 0o700 });
  // The passphrase first: a keystore that is there is complete.
  await writeFile(join(folder, `${file}.pass`), passphrase, { mode: 0o600 });
  await writeFile(join(folder, `${file}.p12`), p12, { mode: 0o600 });
}

async function isThere(path: string): Promise<boolean> {
  return access(path).then(
    () => true,
    () => false,
  );
}

/** Twenty octets at most and positive (RFC 5280, 4.1.2.2). */
function serialNumber(): Integer {
  const bytes = randomBytes(16);
  bytes[0] = (bytes[0]! & 0x7f) | 0x40;
  return new Integer({ valueHex: new Uint8Array(bytes).buffer });
}

/** The name of the certificate. Parts longer than 64 characters are cut (RFC 5280, upper bounds of attributes). */
function distinguishedName(firm: string): RelativeDistinguishedNames {
  const parts: [string, string][] = [
    [oid.organization, firm],
    [oid.organizationalUnit, 'Demonstration: made by this program, checked by nobody'],
    [oid.commonName, 'Demonstration certificate, proves nothing'],
  ];
  const sets = parts.map(([type, value]) => {
    const attribute = new AttributeTypeAndValue({ type, value: new Utf8String({ value: value.slice(0, 64) }) });
    return new AsnSet({ value: [attribute.toSchema()] });
  });
  // Given as parts, pkijs would write them as one part with several values; read from bytes it keeps them apart.
  return RelativeDistinguishedNames.fromBER(new Sequence({ value: sets }).toBER());
}

function extensions(): Extension[] {
  // Digital signature and content commitment: the first two bits of KeyUsage.
  const keyUsage = new BitString({ valueHex: new Uint8Array([0b1100_0000]).buffer, unusedBits: 6 });
  return [
    new Extension({ extnID: oid.basicConstraints, critical: true, extnValue: new BasicConstraints({ cA: false }).toSchema().toBER() }),
    new Extension({ extnID: oid.keyUsage, critical: true, extnValue: keyUsage.toBER() }),
  ];
}
