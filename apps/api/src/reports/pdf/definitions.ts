import { drawLine } from './draw-text.ts';
import type { Sheet } from './sheet.ts';
import { baseline } from './sheet.ts';
import { type Inline, layoutLines, styles, type TextStyle } from './text-layout.ts';

export interface Definition {
  term: string;
  value: Inline;
  style?: TextStyle;
}

const term: TextStyle = styles.head;

/** Terms with their values, in one or two columns: tagged as a table whose rows are named by the terms. */
export function setDefinitions(
  sheet: Sheet,
  items: readonly Definition[],
  {
    columns = 1,
    perColumn = Math.ceil(items.length / columns),
    termWidth = 92,
    x = sheet.left,
    width = sheet.width,
    gap = 18,
  }: { columns?: number; perColumn?: number; termWidth?: number; x?: number; width?: number; gap?: number } = {},
): void {
  const room = (width - gap * (columns - 1)) / columns;
  const laid = items.map((item) => {
    const style = item.style ?? styles.cell;
    const lines = layoutLines(sheet.faces, item.value, style, room - termWidth);
    const name = layoutLines(sheet.faces, item.term, term, termWidth - 6);
    return {
      style,
      lines,
      name,
      height: Math.max(lines.length * style.size * style.leading, name.length * term.size * term.leading) + 3.5,
    };
  });
  const table = sheet.tag('Table');
  const body = sheet.tag('TBody', {}, undefined, table);
  const top = sheet.y;
  let lowest = top;
  for (const [index, { style, lines, name, height }] of laid.entries()) {
    const column = Math.min(columns - 1, Math.floor(index / perColumn));
    const left = x + column * (room + gap);
    if (index === column * perColumn) sheet.y = top;
    if (columns === 1) sheet.need(height);
    const row = sheet.tag('TR', {}, undefined, body);
    const y = sheet.y;
    sheet.tag(
      'TH',
      { scope: 'Row' },
      () => {
        for (const [at, line] of name.entries()) drawLine(sheet.doc, line, left, y + at * term.size * term.leading + baseline(style));
      },
      row,
    );
    sheet.tag(
      'TD',
      {},
      () => {
        for (const [at, line] of lines.entries())
          drawLine(sheet.doc, line, left + termWidth, y + at * style.size * style.leading + baseline(style));
      },
      row,
    );
    sheet.y += height;
    lowest = columns === 1 ? sheet.y : Math.max(lowest, sheet.y);
  }
  sheet.y = lowest;
}
