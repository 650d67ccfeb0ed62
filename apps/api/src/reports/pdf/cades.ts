import { createHash, webcrypto } from 'node:crypto';
import { ObjectIdentifier, OctetString, Sequence } from 'asn1js';
import {
  Attribute,
  Certificate,
  ContentInfo,
  EncapsulatedContentInfo,
  IssuerAndSerialNumber,
  SignedAndUnsignedAttributes,
  SignedData,
  SignerInfo,
} from 'pkijs';
import { cryptoEngine } from './crypto-engine.ts';
import type { SigningIdentity, SigningKey } from './signing-identity.ts';

const oid = {
  data: '1.2.840.113549.1.7.1',
  signedData: '1.2.840.113549.1.7.2',
  contentType: '1.2.840.113549.1.9.3',
  messageDigest: '1.2.840.113549.1.9.4',
  signingCertificateV2: '1.2.840.113549.1.9.16.2.47',
};

/**
 * A detached CMS signature for SubFilter ETSI.CAdES.detached (PAdES baseline B-B): signing-certificate-v2 among the signed
 * attributes, and no signing-time, since the time of a PAdES signature is the M of its dictionary.
 *
 * @param bytes what is signed
 * @returns DER of the ContentInfo
 * Source: ETSI EN 319 142-1, 6.3; RFC 5652; RFC 5035 (ESSCertIDv2).
 */
export async function signDetached(bytes: Buffer, identity: SigningIdentity): Promise<Buffer> {
  const certificate = Certificate.fromBER(new Uint8Array(identity.certificate));
  const signed = new SignedData({
    version: 1,
    encapContentInfo: new EncapsulatedContentInfo({ eContentType: oid.data }),
    certificates: [certificate, ...identity.chain.map((der) => Certificate.fromBER(new Uint8Array(der)))],
    signerInfos: [
      new SignerInfo({
        version: 1,
        sid: new IssuerAndSerialNumber({ issuer: certificate.issuer, serialNumber: certificate.serialNumber }),
        signedAttrs: new SignedAndUnsignedAttributes({ type: 0, attributes: signedAttributes(bytes, identity) }),
      }),
    ],
  });
  await signed.sign((await importKey(identity)) as never, 0, identity.key.hash, undefined, cryptoEngine);
  const content = new ContentInfo({ contentType: oid.signedData, content: signed.toSchema(true) });
  return Buffer.from(content.toSchema().toBER());
}

function signedAttributes(bytes: Buffer, { certificate, key }: SigningIdentity): Attribute[] {
  const digest = createHash(nodeName(key)).update(bytes).digest();
  // ESSCertIDv2 leaves out its hash algorithm, since SHA-256 is the default.
  const certificateHash = octets(createHash('sha256').update(certificate).digest());
  const attributes = [
    new Attribute({ type: oid.contentType, values: [new ObjectIdentifier({ value: oid.data })] }),
    new Attribute({ type: oid.messageDigest, values: [octets(digest)] }),
    new Attribute({
      type: oid.signingCertificateV2,
      values: [new Sequence({ value: [new Sequence({ value: [new Sequence({ value: [certificateHash] })] })] })],
    }),
  ];
  // DER sorts a SET OF by its encodings, and readers hash the sorted form.
  const der = (attribute: Attribute) => Buffer.from(attribute.toSchema().toBER());
  return attributes.sort((a, b) => Buffer.compare(der(a), der(b)));
}

function octets(bytes: Buffer): OctetString {
  return new OctetString({ valueHex: new Uint8Array(bytes).buffer });
}

function nodeName({ hash }: SigningKey): string {
  return hash.toLowerCase().replace('-', '');
}

function importKey({ privateKey, key }: SigningIdentity): Promise<webcrypto.CryptoKey> {
  const algorithm = key.kind === 'rsa' ? { name: 'RSASSA-PKCS1-v1_5', hash: key.hash } : { name: 'ECDSA', namedCurve: key.curve };
  return webcrypto.subtle.importKey('pkcs8', new Uint8Array(privateKey), algorithm, false, ['sign']);
}
