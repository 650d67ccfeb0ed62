import { type Frame, titleBlockHeight } from './frame.ts';
import { ink } from './ink.ts';
import type { ReportInput } from './report-input.ts';
import type { Sheet } from './sheet.ts';
import { layoutLines, type TextStyle } from './text-layout.ts';

interface Field {
  label: string;
  value: string;
  /** Share of the width of its row. */
  share: number;
  style?: TextStyle;
}

const value: TextStyle = { face: 'text-strong', size: 8.6, leading: 1.1, pigment: 'ink' };
const code: TextStyle = { face: 'figures-strong', size: 8.6, leading: 1.1, pigment: 'ink' };
const label: TextStyle = { face: 'text', size: 6.5, leading: 1.1, pigment: 'muted' };

/** The frame of the sheet and its title block, drawn when the number of pages is known. */
export function drawTitleBlock(sheet: Sheet, frame: Frame, input: ReportInput, page: { number: number; count: number }): void {
  const { doc } = sheet;
  const { left, right, top, bottom } = frame;
  const middle = bottom - titleBlockHeight / 2;
  doc
    .rect(left, top, right - left, bottom - top)
    .lineWidth(0.8)
    .undash()
    .strokeColor(ink.ink)
    .stroke();
  sheet.rule(left, right, bottom - titleBlockHeight, 0.8, ink.ink);
  sheet.rule(left, right, middle, 0.4, ink.ink);
  const { firm, report, structure } = input.content;
  drawRow(sheet, frame, bottom - titleBlockHeight, [
    { label: 'Firm', value: firm.name, share: 0.42 },
    { label: 'Report', value: `${report.title}`, share: 0.58 },
  ]);
  drawRow(sheet, frame, middle, [
    { label: 'Number', value: report.number, share: 0.11, style: code },
    { label: 'Revision', value: report.letter, share: 0.08, style: code },
    { label: 'State', value: stateWords(input), share: 0.205 },
    { label: 'Structure', value: structure.name, share: 0.225 },
    { label: 'Verification code', value: input.verificationCode, share: 0.24, style: code },
    { label: 'Page', value: `${page.number} of ${page.count}`, share: 0.14, style: code },
  ]);
}

export function stateWords({ draft }: Pick<ReportInput, 'draft'>): string {
  return draft ? 'Draft, not checked' : 'Checked and approved';
}

function drawRow(sheet: Sheet, { left, right }: Frame, top: number, fields: readonly Field[]): void {
  let x = left;
  for (const [index, field] of fields.entries()) {
    const width = field.share * (right - left);
    if (index > 0)
      sheet.doc
        .moveTo(x, top)
        .lineTo(x, top + titleBlockHeight / 2)
        .lineWidth(0.4)
        .strokeColor(ink.ink)
        .stroke();
    sheet.textAt(field.label, x + 5, top + 2.5, label);
    sheet.textAt(fitted(sheet, field, width - 10), x + 5, top + 10.5, field.style ?? value);
    x += width;
  }
}

/** A value that is too long for its field ends in an ellipsis; it stands in full on the first page. */
function fitted(sheet: Sheet, { value: text, style = value }: Field, width: number): string {
  const widthOf = (shown: string) => layoutLines(sheet.faces, shown, style)[0]!.width;
  const single = text.replace(/\s+/g, ' ');
  if (widthOf(single) <= width) return single;
  const letters = [...single];
  while (letters.length > 1 && widthOf(`${letters.join('').trimEnd()}…`) > width) letters.pop();
  return `${letters.join('').trimEnd()}…`;
}
