import { resultsCsv } from '../../issued/results-csv.ts';
import type { PdfDocument } from './pdf-document.ts';
import type { ReportInput } from './report-input.ts';

/** Attaches the content as it was hashed, and the table of results, as associated files of the document. */
export function attachData(doc: PdfDocument, { content, contentJson, contentSha256, renderedAt }: ReportInput): void {
  const dated = { relationship: 'Data', creationDate: renderedAt, modifiedDate: renderedAt } as const;
  doc.file(Buffer.from(contentJson, 'utf8'), {
    ...dated,
    name: 'content.json',
    type: 'application/json',
    description: `The content of the report as it was checked: every input and result, SI units. SHA-256 ${contentSha256}`,
  });
  doc.file(Buffer.from(resultsCsv(content), 'utf8'), {
    ...dated,
    name: 'results.csv',
    type: 'text/csv',
    description: 'The table of results, one row for each span, SI units',
  });
}
