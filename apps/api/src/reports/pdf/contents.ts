import { ink } from './ink.ts';
import type { Report } from './report-input.ts';
import { layoutLines, styles } from './text-layout.ts';

export interface ListedPart {
  title: string;
  /** Where it begins in the document. */
  destination: string;
}

const step = 15;

/** The list of contents; its page numbers are filled in when everything is set. */
export function setContents({ sheet }: Report, parts: readonly ListedPart[]): void {
  sheet.heading(2, 'Contents', { keep: parts.length * step });
  const list = sheet.tag('TOC');
  for (const { title, destination } of parts) {
    const entry = sheet.tag('TOCI', {}, undefined, list);
    const y = sheet.y;
    const [line] = layoutLines(sheet.faces, title, styles.body);
    sheet.link(entry, destination, title, [sheet.left, y, sheet.width, step], () => sheet.textAt(title, sheet.left, y, styles.body));
    sheet.artifact(() => {
      const { doc } = sheet;
      doc.moveTo(sheet.left + line!.width + 6, y + 9.5).lineTo(sheet.room.right - 26, y + 9.5);
      doc
        .lineWidth(0.4)
        .dash([0.6, 2.4] as never, {})
        .strokeColor(ink.muted)
        .stroke()
        .undash();
    });
    sheet.later(entry, (pageOf) =>
      sheet.textAt(
        String(pageOf(destination)),
        sheet.room.right - 24,
        y,
        { ...styles.figure, size: 9.5, leading: 1.4 },
        { align: 'right', width: 24 },
      ),
    );
    sheet.y += step;
  }
}
