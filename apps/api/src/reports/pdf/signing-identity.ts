import { createPrivateKey, createPublicKey, X509Certificate } from 'node:crypto';
import { readFile } from 'node:fs/promises';
import { join } from 'node:path';
import { openKeystore } from './keystore.ts';
import { SigningError } from './signing-error.ts';

/** The certificate with which a firm signs what it issues. */
export interface SigningIdentity {
  /** PKCS #8, DER. */
  privateKey: Buffer;
  /** DER of the certificate of that key, and of those above it as far as the keystore holds them. */
  certificate: Buffer;
  chain: Buffer[];
  key: SigningKey;
  /** Common name of the certificate's subject, or the whole subject where it has none. */
  subject: string;
  notBefore: Date;
  notAfter: Date;
}

export type SigningKey =
  | { kind: 'rsa'; bits: number; hash: 'SHA-256' }
  | { kind: 'ecdsa'; curve: 'P-256' | 'P-384' | 'P-521'; hash: 'SHA-256' | 'SHA-384' | 'SHA-512' };

/**
 * Reads the certificate of a firm: `<firm id>.p12`, or `default.p12` where the firm has none of its own, each with its
 * passphrase in a file of the same name that ends in `.pass`.
 *
 * @param folder where the certificates of this installation lie
 * @throws SigningError when there is none, the passphrase does not open it, or its key is not fit to sign
 */
export async function loadSigningIdentity(folder: string, firmId: string): Promise<SigningIdentity> {
  // The id becomes a file name: nothing but an id may.
  if (!/^[0-9a-f-]{36}$/i.test(firmId)) throw new SigningError('This is not the id of a firm.');
  for (const name of [firmId, 'default']) {
    const keystore = await readIfThere(join(folder, `${name}.p12`));
    if (keystore === null) continue;
    const passphrase = await readIfThere(join(folder, `${name}.pass`));
    if (passphrase === null) {
      throw new SigningError(`The passphrase of the signing certificate ${name}.p12 is missing: write it into ${name}.pass beside it.`);
    }
    return readIdentity(keystore, passphrase.toString('utf8').replace(/\r?\n$/, ''), `${name}.p12`);
  }
  throw new SigningError(
    `There is no signing certificate for this firm. The administrator puts ${firmId}.p12 or default.p12, with the passphrase in a .pass file beside it, into the folder of signing certificates.`,
  );
}

/**
 * Opens a keystore (PKCS #12) and finds the private key and the certificate that belongs to it.
 *
 * @param name what messages call the keystore
 * @throws SigningError in plain words
 */
export async function readIdentity(p12: Buffer, passphrase: string, name = 'the keystore'): Promise<SigningIdentity> {
  const { privateKey, certificates } = await openKeystore(p12, passphrase, name);
  const publicKey = createPublicKey(createPrivateKey({ key: privateKey, format: 'der', type: 'pkcs8' }));
  const wanted = publicKey.export({ format: 'der', type: 'spki' });
  const read = certificates.map((der) => ({ der, x509: new X509Certificate(der) }));
  const own = read.find(({ x509 }) => x509.publicKey.export({ format: 'der', type: 'spki' }).equals(wanted));
  if (!own) throw new SigningError(`${name} holds a private key but no certificate of that key.`);
  return {
    privateKey,
    certificate: own.der,
    chain: read.filter(({ der }) => der !== own.der).map(({ der }) => der),
    key: signingKeyOf(publicKey, name),
    subject: nameOf(own.x509),
    notBefore: new Date(own.x509.validFrom),
    notAfter: new Date(own.x509.validTo),
  };
}

function nameOf({ subject }: X509Certificate): string {
  const commonName = /(?:^|\n)CN=(.*)/.exec(subject)?.[1];
  return (commonName ?? subject.replaceAll('\n', ', ')).replace(/\\(.)/g, '$1');
}

/** @throws SigningError when the certificate is not valid yet or no longer */
export function assertCanSign({ subject, notBefore, notAfter }: SigningIdentity, at: Date): void {
  const day = (date: Date) => date.toISOString().slice(0, 10);
  if (at < notBefore) throw new SigningError(`The signing certificate “${subject}” is valid only from ${day(notBefore)} on.`);
  if (at > notAfter) {
    throw new SigningError(
      `The signing certificate “${subject}” expired on ${day(notAfter)}. The administrator has to put a new one in place.`,
    );
  }
}

const curves: Record<string, Extract<SigningKey, { kind: 'ecdsa' }>> = {
  prime256v1: { kind: 'ecdsa', curve: 'P-256', hash: 'SHA-256' },
  secp384r1: { kind: 'ecdsa', curve: 'P-384', hash: 'SHA-384' },
  secp521r1: { kind: 'ecdsa', curve: 'P-521', hash: 'SHA-512' },
};

function signingKeyOf(publicKey: ReturnType<typeof createPublicKey>, name: string): SigningKey {
  const { asymmetricKeyType, asymmetricKeyDetails } = publicKey;
  if (asymmetricKeyType === 'rsa') {
    const bits = asymmetricKeyDetails?.modulusLength ?? 0;
    // ETSI TS 119 312: shorter RSA keys are no longer recommended for signatures that are to last.
    if (bits < 2048) throw new SigningError(`The RSA key of ${name} has ${bits} bits; a signing key needs at least 2048.`);
    return { kind: 'rsa', bits, hash: 'SHA-256' };
  }
  const curve = asymmetricKeyType === 'ec' ? curves[asymmetricKeyDetails?.namedCurve ?? ''] : undefined;
  if (curve) return curve;
  throw new SigningError(
    `The key of ${name} is of a kind that readers of PDF do not verify. Use RSA with 2048 bits or more, or ECDSA on P-256, P-384 or P-521.`,
  );
}

async function readIfThere(path: string): Promise<Buffer | null> {
  try {
    return await readFile(path);
  } catch (error) {
    if ((error as NodeJS.ErrnoException).code === 'ENOENT') return null;
    throw new SigningError(
      `The signing certificate cannot be read (${(error as NodeJS.ErrnoException).code}). The server needs the right to read its folder.`,
    );
  }
}
