import QRCode from 'qrcode';
import { ink } from './ink.ts';
import type { Report } from './report-input.ts';
import { styles, type TextStyle } from './text-layout.ts';

const code: TextStyle = { face: 'figures-strong', size: 15, leading: 1.3, pigment: 'ink' };
const size = 92;

/** How anybody can find out whether a copy is genuine and current, without an account. */
export function setVerification(report: Report): void {
  const { sheet, input } = report;
  sheet.need(size + 30);
  const top = sheet.y;
  const x = sheet.room.right - size;
  sheet.tag('Figure', { alt: `QR code of ${input.verificationUrl}`, bbox: [x, top, x + size, top + size] }, () => drawQr(report, x, top));
  const width = sheet.width - size - 24;
  sheet.paragraph(input.verificationCode, code, { after: 2, width });
  sheet.paragraph(input.verificationUrl, styles.figure, { after: 6, width });
  const steps = [
    'Open this address, or scan the code at the right. No account is needed. The page says whether this revision is current, superseded or withdrawn, and gives the SHA-256 of the issued file.',
    'Drop your copy of this file on that page: it is compared in your browser, and nothing is sent.',
    'Any program that reads PDF shows the signature of the file. A copy that was changed in a single byte shows it as invalid.',
    'Attached to this file are content.json, which holds every input and result as it was checked, and results.csv for a spreadsheet. The SHA-256 of content.json is the content hash of the signatures. The engine version named on a cable’s page computes the same tension from it again.',
  ];
  for (const [index, step] of steps.entries()) {
    sheet.paragraph(`${index + 1}. ${step}`, styles.body, { after: 3, width: sheet.y < top + size ? width : sheet.width });
  }
  sheet.y = Math.max(sheet.y, top + size);
  if (input.draft) sheet.paragraph('A draft cannot be verified: until the report is issued the page knows no file.', styles.strong);
}

function drawQr({ sheet, input }: Report, x: number, y: number): void {
  const { modules } = QRCode.create(input.verificationUrl, { errorCorrectionLevel: 'M' });
  const step = size / modules.size;
  for (let row = 0; row < modules.size; row += 1) {
    for (const [from, to] of darkRuns(modules, row)) {
      // Runs overlap a little, so that no white line shows between rows on screen.
      sheet.doc.rect(x + from * step, y + row * step, (to - from) * step, step + 0.03);
    }
  }
  sheet.doc.fill(ink.ink);
}

function darkRuns(modules: { size: number; get(row: number, column: number): number }, row: number): [number, number][] {
  const runs: [number, number][] = [];
  for (let column = 0; column < modules.size; column += 1) {
    if (!modules.get(row, column)) continue;
    const last = runs.at(-1);
    if (last && last[1] === column) last[1] = column + 1;
    else runs.push([column, column + 1]);
  }
  return runs;
}
