import type { Frame } from './frame.ts';
import { ink } from './ink.ts';
import type { ReportInput } from './report-input.ts';
import type { Sheet } from './sheet.ts';
import { layoutLines, styles, type TextStyle } from './text-layout.ts';

const mark: TextStyle = { face: 'text-strong', size: 8.5, leading: 1.2, pigment: 'minium' };
/** Paler than any hairline, yet seen on a printed page. */
const pale = '#EDF2EF';
const acrossSize = 66;

export const draftMark = 'Draft, not checked';
export const demonstrationMark = 'Demonstration data, simulated';

/** What a page says before anything else is set on it: whose survey it is of, and that it is a draft or a demonstration. */
export function drawPageMarks(sheet: Sheet, frame: Frame, input: ReportInput): void {
  const { structure, campaign, firm } = input.content;
  if (input.draft) drawAcross(sheet, frame, draftMark);
  else if (firm.demonstration) drawAcross(sheet, frame, 'Demonstration');
  const y = frame.top + 7;
  sheet.textAt([structure.name, campaign.name, sheet.running].filter(Boolean).join('  ·  '), sheet.room.left, y, styles.head);
  const marks = [input.draft ? draftMark : null, firm.demonstration ? demonstrationMark : null].filter((text) => text !== null);
  if (marks.length > 0) drawBoxed(sheet, marks.join('. '), y);
}

function drawBoxed(sheet: Sheet, text: string, y: number): void {
  const { width } = layoutLines(sheet.faces, text, mark)[0]!;
  const x = sheet.room.right - width - 6;
  sheet.doc
    .rect(x - 6, y - 3, width + 12, 16)
    .lineWidth(0.9)
    .undash()
    .strokeColor(ink.minium)
    .stroke();
  sheet.textAt(text, x, y, mark);
}

/** Under the content, so that it hides nothing; as outlines, so that no program that reads the page mixes it into the text. */
function drawAcross({ doc, faces }: Sheet, frame: Frame, text: string): void {
  const [middleX, middleY] = [(frame.left + frame.right) / 2, (frame.top + frame.bottom) / 2];
  const { unitsPerEm, width, letters } = faces.outlines(text, 'text-strong');
  const scale = acrossSize / unitsPerEm;
  doc.save();
  doc.translate(middleX, middleY).rotate(-52).scale(scale, -scale);
  // A third of an em is about the middle of the letters.
  doc.translate(-width / 2, -unitsPerEm / 3);
  for (const { x, path } of letters) {
    if (path === '') continue;
    doc.save();
    doc.translate(x, 0).path(path).fill(pale);
    doc.restore();
  }
  doc.restore();
}
