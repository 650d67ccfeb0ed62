import { AuthenticatedSafe, CertBag, Certificate, PFX, PKCS8ShroudedKeyBag, PrivateKeyInfo, SafeBag, SafeContents } from 'pkijs';
import { cryptoEngine } from './crypto-engine.ts';
import { SigningError } from './signing-error.ts';

const oid = {
  keyBag: '1.2.840.113549.1.12.10.1.1',
  shroudedKeyBag: '1.2.840.113549.1.12.10.1.2',
  certBag: '1.2.840.113549.1.12.10.1.3',
};
const pbes2 = '1.2.840.113549.1.5.13';

/** What a keystore holds: a private key (PKCS #8, DER) and certificates (DER) in the order of the file. */
export interface Keystore {
  privateKey: Buffer;
  certificates: Buffer[];
}

/**
 * Opens a PKCS #12 file that is encrypted the way current tools write it (PBES2 with AES).
 *
 * @param name what messages call the file
 * @throws SigningError in plain words: not a keystore, wrong passphrase, old encryption, no key
 */
export async function openKeystore(p12: Buffer, passphrase: string, name: string): Promise<Keystore> {
  const pfx = parsePfx(p12, name);
  const password = toPassword(passphrase);
  const safe = await checkPassphrase(pfx, password, name);
  const bags = await openSafe(safe, password, name);
  const keys = await Promise.all(bags.map((bag) => privateKeyOf(bag, password, name)));
  const privateKey = keys.find((key) => key !== null);
  if (!privateKey) throw new SigningError(`${name} holds no private key.`);
  return { privateKey, certificates: bags.flatMap(certificateOf) };
}

/**
 * Writes a key and its certificate as a PKCS #12 file: AES-256, 210 000 rounds (OWASP's figure for PBKDF2 with SHA-512),
 * integrity by HMAC-SHA-256.
 */
export async function sealKeystore({ privateKey, certificates }: Keystore, passphrase: string): Promise<Buffer> {
  const password = toPassword(passphrase);
  const encryption = {
    password,
    contentEncryptionAlgorithm: { name: 'AES-CBC', length: 256 },
    hmacHashAlgorithm: 'SHA-512',
    iterationCount: 210_000,
  };
  const keyBag = new PKCS8ShroudedKeyBag({ parsedValue: PrivateKeyInfo.fromBER(new Uint8Array(privateKey)) });
  await keyBag.makeInternalValues(encryption as never, cryptoEngine);
  const certBags = certificates.map(
    (der) => new SafeBag({ bagId: oid.certBag, bagValue: new CertBag({ parsedValue: Certificate.fromBER(new Uint8Array(der)) }) }),
  );
  const contents = [
    new SafeContents({ safeBags: [new SafeBag({ bagId: oid.shroudedKeyBag, bagValue: keyBag })] }),
    new SafeContents({ safeBags: certBags }),
  ];
  const safe = new AuthenticatedSafe({ parsedValue: { safeContents: contents.map((value) => ({ privacyMode: 0, value })) } });
  await safe.makeInternalValues({ safeContents: contents.map(() => ({})) }, cryptoEngine);
  const pfx = new PFX({ parsedValue: { integrityMode: 0, authenticatedSafe: safe } });
  await pfx.makeInternalValues(
    { password, iterations: 100_000, pbkdf2HashAlgorithm: 'SHA-256', hmacHashAlgorithm: 'SHA-256' },
    cryptoEngine,
  );
  return Buffer.from(pfx.toSchema().toBER());
}

/** The door that pkijs's types keep shut although its own keystore goes through it. */
interface ShroudedKey {
  encryptionAlgorithm: { algorithmId: string };
  parsedValue?: PrivateKeyInfo;
  parseInternalValues(parameters: { password: ArrayBuffer }, engine: typeof cryptoEngine): Promise<void>;
}

function toPassword(passphrase: string): ArrayBuffer {
  return new Uint8Array(Buffer.from(passphrase, 'utf8')).buffer;
}

function parsePfx(p12: Buffer, name: string): PFX {
  try {
    return PFX.fromBER(new Uint8Array(p12));
  } catch {
    throw new SigningError(`${name} is not a keystore in the PKCS #12 format (.p12 or .pfx).`);
  }
}

async function checkPassphrase(pfx: PFX, password: ArrayBuffer, name: string): Promise<AuthenticatedSafe> {
  try {
    await pfx.parseInternalValues({ password, checkIntegrity: true }, cryptoEngine);
    return pfx.parsedValue!.authenticatedSafe!;
  } catch {
    throw new SigningError(`The passphrase beside ${name} does not open it, or the file is damaged.`);
  }
}

async function openSafe(safe: AuthenticatedSafe, password: ArrayBuffer, name: string): Promise<SafeBag[]> {
  try {
    await safe.parseInternalValues({ safeContents: safe.safeContents.map(() => ({ password })) }, cryptoEngine);
  } catch {
    throw oldEncryption(name);
  }
  const opened = safe.parsedValue.safeContents as { value: SafeContents }[];
  return opened.flatMap(({ value }) => value.safeBags);
}

async function privateKeyOf({ bagId, bagValue }: SafeBag, password: ArrayBuffer, name: string): Promise<Buffer | null> {
  if (bagId === oid.keyBag) return Buffer.from((bagValue as unknown as PrivateKeyInfo).toSchema().toBER());
  if (bagId !== oid.shroudedKeyBag) return null;
  const shrouded = bagValue as unknown as ShroudedKey;
  if (shrouded.encryptionAlgorithm.algorithmId !== pbes2) throw oldEncryption(name);
  await shrouded.parseInternalValues({ password }, cryptoEngine);
  return Buffer.from(shrouded.parsedValue!.toSchema().toBER());
}

function certificateOf({ bagId, bagValue }: SafeBag): Buffer[] {
  if (bagId !== oid.certBag) return [];
  const { parsedValue } = bagValue as unknown as CertBag;
  return parsedValue instanceof Certificate ? [Buffer.from(parsedValue.toSchema().toBER())] : [];
}

function oldEncryption(name: string): SigningError {
  return new SigningError(`${name} is encrypted in an old way that is no longer safe. Export it again with AES encryption (PBES2).`);
}
