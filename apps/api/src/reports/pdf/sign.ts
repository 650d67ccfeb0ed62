import { SignPdf } from '@signpdf/signpdf';
import { Signer } from '@signpdf/utils';
import { signDetached } from './cades.ts';
import { findPlaceholder } from './signature-placeholder.ts';
import { assertCanSign, type SigningIdentity } from './signing-identity.ts';

/**
 * Signs a rendered report: PAdES B-B in the place kept for it at rendering. Of the bytes only that place changes, and no
 * length: the byte range, the time M and the signature itself.
 *
 * @param pdf as rendered at approval, with its empty placeholder
 * @param at the time of signing, which the signature states as its M
 * @returns the signed file
 * @throws SigningError when the certificate is not valid at that time, or the file has no empty place for a signature
 */
export async function signReport(pdf: Buffer, identity: SigningIdentity, at: Date): Promise<Buffer> {
  assertCanSign(identity, at);
  const dated = Buffer.from(pdf);
  const { timePosition, timeLength } = findPlaceholder(dated);
  dated.write(pdfTime(at).padEnd(timeLength), timePosition, 'latin1');
  return Buffer.from(await new SignPdf().sign(dated, new CadesSigner(identity)));
}

class CadesSigner extends Signer {
  readonly #identity: SigningIdentity;

  constructor(identity: SigningIdentity) {
    super();
    this.#identity = identity;
  }

  override sign(bytes: Buffer): Promise<Buffer> {
    return signDetached(bytes, this.#identity);
  }
}

/** A date as PDF writes it: (D:20260914080000Z). */
function pdfTime(at: Date): string {
  return `(D:${at.toISOString().slice(0, 19).replace(/[-:T]/g, '')}Z)`;
}
