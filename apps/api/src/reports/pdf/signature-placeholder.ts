import { SIG_FLAGS, SUBFILTER_ETSI_CADES_DETACHED, DEFAULT_BYTE_RANGE_PLACEHOLDER as UNKNOWN_OFFSET } from '@signpdf/utils';
import type { PdfDocument } from './pdf-document.ts';
import { SigningError } from './signing-error.ts';

/** Room for a signature with a chain of three certificates of RSA 4096, and to spare. */
const signatureBytes = 16_384;
/** Stands until the file is signed; as long as the time that takes its place. */
const timeUnknown = new Date('1970-01-01T00:00:00Z');

interface PdfReference {
  data: Record<string, unknown>;
  end(): void;
}

/** Parts of pdfkit's document that its types leave out. */
interface DocumentWithForm {
  _root: PdfReference;
  page: { dictionary: PdfReference; annotations: PdfReference[] };
  ref(data: object): PdfReference;
  initForm(): void;
}

/**
 * Keeps a place for a signature in a document, so that issuing signs the very bytes that were approved.
 *
 * @param signer the firm in whose name the file will be signed
 * @param reason why it is signed, in a sentence
 */
export function addSignaturePlaceholder(doc: PdfDocument, { signer, reason }: { signer: string; reason: string }): void {
  const inner = doc as unknown as DocumentWithForm;
  const signature = inner.ref({
    Type: 'Sig',
    Filter: 'Adobe.PPKLite',
    SubFilter: SUBFILTER_ETSI_CADES_DETACHED,
    M: timeUnknown,
    ByteRange: [0, UNKNOWN_OFFSET, UNKNOWN_OFFSET, UNKNOWN_OFFSET],
    Contents: Buffer.alloc(signatureBytes),
    Name: pdfText(signer),
    Reason: pdfText(reason),
  });
  inner.initForm();
  const form = inner._root.data.AcroForm as PdfReference;
  // pdfkit's form asks readers to draw its fields anew, which PDF/A forbids. DR stays: pdfkit's own ending reads it.
  form.data = { Fields: [], DR: form.data.DR, SigFlags: SIG_FLAGS.SIGNATURES_EXIST | SIG_FLAGS.APPEND_ONLY };
  const widget = inner.ref({
    Type: 'Annot',
    Subtype: 'Widget',
    FT: 'Sig',
    // Printed and locked; of no size, hence without an appearance.
    F: 132,
    Rect: [0, 0, 0, 0],
    T: pdfText('Signature'),
    V: signature,
    P: inner.page.dictionary,
  });
  inner.page.annotations.push(widget);
  (form.data.Fields as PdfReference[]).push(widget);
  signature.end();
  widget.end();
}

/** pdfkit writes a String object as a text of PDF, a plain string as a name. */
function pdfText(text: string): object {
  return Object(text);
}

/**
 * Where in a rendered file the time of the signature stands.
 *
 * @throws SigningError when the file has no empty place for a signature, or more than one
 */
export function findPlaceholder(pdf: Buffer): { timePosition: number; timeLength: number } {
  const unknown = `/M (D:19700101000000Z)\n/ByteRange [0 /${UNKNOWN_OFFSET} /${UNKNOWN_OFFSET} /${UNKNOWN_OFFSET}]`;
  const position = pdf.indexOf(unknown, 0, 'latin1');
  if (position === -1) throw new SigningError('This file has no empty place for a signature: it was signed before, or is not a report.');
  if (pdf.indexOf(unknown, position + 1, 'latin1') !== -1) throw new SigningError('This file has more than one place for a signature.');
  return { timePosition: position + '/M '.length, timeLength: '(D:19700101000000Z)'.length };
}
