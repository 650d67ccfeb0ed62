import { drawLine } from './draw-text.ts';
import { ink } from './ink.ts';
import { baseline, type Element, type Sheet } from './sheet.ts';
import { type Inline, type Line, layoutLines, plainText, styles, type TextStyle } from './text-layout.ts';

/** What stands in a cell: text, a drawing, or both, one under the other. */
export interface Cell {
  text?: Inline;
  style?: TextStyle;
  drawing?: { height: number; alt: string; draw: (x: number, y: number, width: number) => void };
  /** Destination in the document that the text leads to. */
  leadsTo?: string;
  /** The number of the page on which that destination lies, known only when everything is set. */
  pageOf?: string;
}

export interface Column<Row> {
  head: Inline;
  /** Points. */
  width: number;
  /** `decimal` lines figures up at their decimal points. */
  align?: 'left' | 'right' | 'decimal';
  style?: TextStyle;
  cell: (row: Row) => Inline | Cell;
}

export interface Table<Row> {
  columns: readonly Column<Row>[];
  rows: readonly Row[];
  /** Left edge; the room's by default. */
  x?: number;
  /** Space above and below the text of a row. */
  padding?: number;
  /** Short cells stand in the middle of their row, beside a drawing that fills it. */
  middle?: boolean;
  /** What stands under the rows of every page that the table leaves unfinished. */
  foot?: { height: number; draw: (y: number) => void };
}

interface LaidCell {
  cell: Cell;
  style: TextStyle;
  lines: Line[];
  height: number;
}
interface LaidTable<Row> {
  table: Table<Row>;
  x: number;
  width: number;
  padding: number;
  head: Line[][];
  headHeight: number;
  rows: { cells: LaidCell[]; height: number }[];
  /** Width of the longest fraction in each column. */
  fractions: number[];
}

const gap = 6;

/** Sets a table; where it runs over a page, its head is repeated. The first column names the rows. */
export function setTable<Row>(sheet: Sheet, table: Table<Row>): void {
  const laid = layTable(sheet, table);
  sheet.need(laid.headHeight + (laid.rows[0]?.height ?? 0));
  const element = sheet.tag('Table');
  const head = sheet.tag('TR', {}, undefined, sheet.tag('THead', {}, undefined, element));
  setHead(sheet, laid, (_, draw) => sheet.tag('TH', { scope: 'Column' }, draw, head));
  const body = sheet.tag('TBody', {}, undefined, element);
  for (const { cells, height } of laid.rows) {
    if (sheet.y + height + (table.foot?.height ?? 0) > sheet.room.bottom + 0.01) {
      if (table.foot) sheet.artifact(() => table.foot!.draw(sheet.y), 'Pagination');
      sheet.newPage();
      setHead(sheet, laid, (_, draw) => sheet.artifact(draw, 'Pagination'));
    }
    setRow(sheet, laid, cells, height, sheet.tag('TR', {}, undefined, body));
    sheet.artifact(() => sheet.rule(laid.x, laid.x + laid.width, sheet.y));
  }
}

function layTable<Row>(sheet: Sheet, table: Table<Row>): LaidTable<Row> {
  const { columns } = table;
  const padding = table.padding ?? 2.6;
  const head = columns.map((column) => layoutLines(sheet.faces, column.head, styles.head, inner(columns, column)));
  const headLines = Math.max(...head.map((lines) => lines.length));
  const rows = table.rows.map((row) => {
    const cells = columns.map((column) => layCell(sheet, column.cell(row), column, inner(columns, column)));
    return { cells, height: Math.max(...cells.map(({ height }) => height)) + 2 * padding };
  });
  return {
    table,
    x: table.x ?? sheet.left,
    width: columns.reduce((sum, { width }) => sum + width, 0),
    padding,
    head,
    headHeight: headLines * styles.head.size * styles.head.leading + 2 * padding + 1,
    rows,
    fractions: columns.map((column, index) =>
      column.align === 'decimal' ? Math.max(0, ...rows.map(({ cells }) => fractionWidth(sheet, cells[index]!))) : 0,
    ),
  };
}

/** Width of a column's text: columns are parted by a gap, except after the last. */
function inner<Row>(columns: readonly Column<Row>[], column: Column<Row>): number {
  return column.width - (column === columns.at(-1) ? 0 : gap);
}

function layCell<Row>(sheet: Sheet, given: Inline | Cell, column: Column<Row>, width: number): LaidCell {
  const cell: Cell = typeof given === 'string' || Array.isArray(given) ? { text: given as Inline } : (given as Cell);
  const style = cell.style ?? column.style ?? styles.cell;
  const lines = cell.text === undefined ? [] : layoutLines(sheet.faces, cell.text, style, width);
  return { cell, style, lines, height: lines.length * style.size * style.leading + (cell.drawing?.height ?? 0) };
}

function setHead<Row>(sheet: Sheet, laid: LaidTable<Row>, setCell: (index: number, draw: () => void) => void): void {
  const { table, x, head, padding, headHeight, width } = laid;
  const step = styles.head.size * styles.head.leading;
  let left = x;
  for (const [index, column] of table.columns.entries()) {
    const lines = head[index]!;
    // Words stand on the rule, however many lines the tallest head has.
    const top = sheet.y + headHeight - padding - lines.length * step;
    const room = inner(table.columns, column);
    const at = left;
    setCell(index, () => {
      for (const [row, line] of lines.entries()) {
        const shift = column.align && column.align !== 'left' ? room - line.width : 0;
        drawLine(sheet.doc, line, at + shift, top + row * step + baseline(styles.head));
      }
    });
    left += column.width;
  }
  sheet.y += headHeight;
  sheet.artifact(() => sheet.rule(x, x + width, sheet.y, 0.8, ink.ink));
}

function setRow<Row>(sheet: Sheet, laid: LaidTable<Row>, cells: readonly LaidCell[], height: number, row: Element): void {
  let left = laid.x;
  for (const [index, column] of laid.table.columns.entries()) {
    const short = (height - 2 * laid.padding - cells[index]!.height) / 2;
    const top = sheet.y + laid.padding + (laid.table.middle ? short : 0);
    const element = index === 0 ? sheet.tag('TH', { scope: 'Row' }, undefined, row) : sheet.tag('TD', {}, undefined, row);
    setCell(
      sheet,
      { laid: cells[index]!, column, x: left, room: inner(laid.table.columns, column), fraction: laid.fractions[index]! },
      top,
      element,
    );
    left += column.width;
  }
  sheet.y += height;
}

interface Place<Row> {
  laid: LaidCell;
  column: Column<Row>;
  x: number;
  room: number;
  fraction: number;
}

function setCell<Row>(sheet: Sheet, place: Place<Row>, top: number, element: Element): void {
  const { laid, x, room } = place;
  const { cell, lines, style } = laid;
  const draw = () => {
    for (const [index, line] of lines.entries()) {
      drawLine(sheet.doc, line, x + shiftOf(sheet, place, line), top + index * style.size * style.leading + baseline(style));
    }
  };
  if (lines.length > 0) {
    if (cell.leadsTo) sheet.link(element, cell.leadsTo, plainText(cell.text!), [x, top, room, laid.height], draw);
    else element.add(draw);
  }
  if (cell.pageOf)
    sheet.later(element, (pageOf) => sheet.textAt(String(pageOf(cell.pageOf!)), x, top, style, { align: 'right', width: room }));
  if (cell.drawing) {
    const y = top + lines.length * style.size * style.leading;
    const { alt, height, draw: paint } = cell.drawing;
    sheet.tag('Figure', { alt, bbox: [x, y, x + room, y + height] }, () => paint(x, y, room), element);
  }
}

function shiftOf<Row>(sheet: Sheet, { laid, column, room, fraction }: Place<Row>, line: Line): number {
  if (column.align === 'right') return room - line.width;
  if (column.align === 'decimal') return room - line.width - fraction + fractionWidth(sheet, laid);
  return 0;
}

/** Width of what stands from the decimal point on. */
function fractionWidth(sheet: Sheet, { cell, style }: LaidCell): number {
  const text = plainText(cell.text ?? '');
  const point = text.lastIndexOf('.');
  return point === -1 ? 0 : sheet.faces.widthOf(text.slice(point), style.face, style.size);
}
