import PDFDocument from 'pdfkit';
import { registerFaces } from './faces.ts';

export type PdfDocument = InstanceType<typeof PDFDocument>;

export interface DocumentInfo {
  title: string;
  author: string;
  subject: string;
  keywords: string;
  createdAt: Date;
  paper: 'a4' | 'letter';
}

/** An empty document built to PDF/A-3b: PDF 1.7, tagged, English, every font embedded, its description in XMP as well. */
export function createPdf({ title, author, subject, keywords, createdAt, paper }: DocumentInfo): PdfDocument {
  const doc = new PDFDocument({
    size: paper === 'a4' ? 'A4' : 'LETTER',
    margin: 0,
    pdfVersion: '1.7',
    subset: 'PDF/A-3b',
    tagged: true,
    lang: 'en',
    displayTitle: true,
    // Pages stay open until the end: the title block of each tells how many there are.
    bufferPages: true,
    autoFirstPage: false,
    info: {
      Title: title,
      Author: author,
      Subject: subject,
      Keywords: keywords,
      Creator: 'Strandnote',
      Producer: 'Strandnote (pdfkit)',
      CreationDate: createdAt,
    },
  });
  registerFaces(doc);
  escapeDescription(doc);
  return doc;
}

/** Ends a document and gives its bytes. */
export function finishPdf(doc: PdfDocument): Promise<Buffer> {
  const chunks: Buffer[] = [];
  return new Promise((resolve, reject) => {
    doc.on('data', (chunk: Buffer) => chunks.push(chunk));
    doc.on('end', () => resolve(Buffer.concat(chunks)));
    doc.on('error', reject);
    doc.end();
  });
}

/**
 * pdfkit writes the description into XMP as it is, so that an ampersand in a title breaks the XML. The plain texts stay in
 * the document's own dictionary; only while XMP is written do they stand escaped.
 */
function escapeDescription(doc: PdfDocument): void {
  const inner = doc as unknown as { info: Record<string, unknown>; _addInfo(): void };
  const addInfo = inner._addInfo.bind(doc);
  inner._addInfo = () => {
    const plain = inner.info;
    inner.info = Object.fromEntries(
      Object.entries(plain).map(([key, value]) => [key, typeof value === 'string' ? escapeXml(value) : value]),
    );
    addInfo();
    inner.info = plain;
  };
}

function escapeXml(text: string): string {
  const signs: Record<string, string> = { '&': '&amp;', '<': '&lt;', '>': '&gt;', '"': '&quot;' };
  // XML 1.0 knows no control characters, not even escaped.
  return text.replace(/[\p{Cc}\uFFFE\uFFFF]/gu, ' ').replace(/[&<>"]/g, (sign) => signs[sign]!);
}
