import { attachData } from './attachments.ts';
import { frameOf, roomWithin } from './frame.ts';
import { drawPageMarks } from './page-marks.ts';
import { createPdf, finishPdf } from './pdf-document.ts';
import { Quantities } from './quantities.ts';
import { type Report, type ReportInput, resultRows } from './report-input.ts';
import { setReport } from './report-parts.ts';
import { Sheet } from './sheet.ts';
import { addSignaturePlaceholder } from './signature-placeholder.ts';
import { drawTitleBlock } from './title-block.ts';

export type { ReportInput } from './report-input.ts';

/**
 * Renders the document of a report: content in, bytes out. The same input gives the same bytes on one version of Node.
 *
 * @param input frozen content and what is known about it; quantities are SI
 * @returns a PDF built to PDF/A-3b, tagged, with the content attached; unless it is a draft, with an empty place for the
 *   signature
 */
export function renderReport(input: ReportInput): Promise<Buffer> {
  const doc = createPdf(describe(input));
  const report = openReport(doc, input);
  setReport(report);
  const { sheet } = report;
  sheet.end();
  drawTitleBlocks(report);
  setBookmarks(report);
  attachData(doc, input);
  if (!input.draft) addSignaturePlaceholder(doc, { signer: input.content.firm.name, reason: reasonOf(input) });
  return finishPdf(doc);
}

function openReport(doc: ReturnType<typeof createPdf>, input: ReportInput): Report {
  const page = input.paper === 'letter' ? { width: 612, height: 792 } : { width: 595.28, height: 841.89 };
  const frame = frameOf(page);
  const sheet: Sheet = new Sheet(doc, roomWithin(frame), () => sheet.artifact(() => drawPageMarks(sheet, frame, input), 'Pagination'));
  return { sheet, input, content: input.content, quantities: new Quantities(input.units ?? 'si'), rows: resultRows(input.content) };
}

function drawTitleBlocks({ sheet, input }: Report): void {
  for (let number = 1; number <= sheet.pages; number += 1) {
    sheet.doc.switchToPage(number - 1);
    const { width, height } = sheet.doc.page;
    sheet.artifact(() => drawTitleBlock(sheet, frameOf({ width, height }), input, { number, count: sheet.pages }), 'Pagination');
  }
}

/** Bookmarks of the parts; cables stand together under the first of theirs. */
function setBookmarks({ sheet }: Report): void {
  const root = sheet.doc.outline;
  for (const { title, page } of sheet.landmarks) root.addItem(title, { pageNumber: page - 1 } as never);
}

function describe({ content, contentSha256, renderedAt, paper = 'a4' }: ReportInput) {
  const { report, structure, firm } = content;
  return {
    title: `${report.number} revision ${report.letter}: ${report.title}`,
    author: firm.name,
    subject: `Cable tensions of ${structure.name}, estimated from vibration`,
    keywords: `content SHA-256 ${contentSha256}`,
    createdAt: renderedAt,
    paper,
  };
}

function reasonOf({ content, contentSha256 }: ReportInput): string {
  const { report, firm, client } = content;
  return `Issued for ${firm.name} to ${client.name}: report ${report.number}, revision ${report.letter}, content SHA-256 ${contentSha256}`;
}
