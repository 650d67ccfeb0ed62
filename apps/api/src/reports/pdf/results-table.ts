import { setBarKey } from './bar-key.ts';
import { shortCaution } from './cautions.ts';
import { drawLine } from './draw-text.ts';
import { barCell, scaleInWords, scaleOfBars } from './interval-bars.ts';
import type { Report, ResultRow } from './report-input.ts';
import { baseline } from './sheet.ts';
import { type Cell, type Column, setTable } from './table.ts';
import { layoutLines, styles, type TextStyle } from './text-layout.ts';
import { referenceWords, zoneWords } from './words.ts';
import { toReference } from './zone-summary.ts';

const figure: TextStyle = { ...styles.figure, size: 8 };
const strong: TextStyle = { ...figure, face: 'figures-strong' };
const small: TextStyle = { ...styles.cell, size: 8 };

const lineHeight = styles.note.size * styles.note.leading;

/** The results of all cables on one scale, with the caution that belongs to them. */
export function setResultsTable(report: Report): void {
  const { sheet, rows } = report;
  const scale = scaleOfBars(rows);
  if (scale) setBarKey(sheet);
  const caution = layoutLines(sheet.faces, shortCaution(report), styles.note, sheet.width);
  const draw = (y: number) => {
    for (const [index, line] of caution.entries())
      drawLine(sheet.doc, line, sheet.left, y + 6 + index * lineHeight + baseline(styles.note));
  };
  // Every page that shows a tension carries the caution: the last as content, those before as its repetition.
  const foot = { height: 6 + caution.length * lineHeight, draw };
  setTable(sheet, { rows, padding: 2, middle: true, columns: columns(report, scale), foot });
  sheet.space(6);
  sheet.paragraph(shortCaution(report), styles.note);
}

function columns(report: Report, scale: ReturnType<typeof scaleOfBars>): Column<ResultRow>[] {
  const { quantities, sheet } = report;
  const unit = quantities.symbol('force');
  const fixed: Column<ResultRow>[] = [
    { head: 'Cable', width: 48, style: strong, cell: (row) => nameCell(row) },
    { head: `Tension ${unit}`, width: 44, align: 'decimal', style: strong, cell: (row) => single(row, report)?.value ?? '–' },
    { head: '± U', width: 28, align: 'decimal', style: figure, cell: (row) => single(row, report)?.uncertainty ?? '' },
    {
      head: `95 % interval ${unit}`,
      width: 70,
      align: 'right',
      style: figure,
      cell: ({ span }) => (span.estimate ? quantities.interval(span.estimate.output) : '–'),
    },
    { head: `${referenceHead(report)} ${unit}`, width: 44, align: 'decimal', style: figure, cell: (row) => referenceOf(row, report) },
    { head: 'to reference %', width: 62, align: 'right', style: figure, cell: toReference },
  ];
  const bar: Column<ResultRow>[] = scale
    ? [{ head: `Interval, ${scaleInWords(scale)} of reference`, width: 86, cell: (row) => barCell(report, row, scale) }]
    : [];
  const used = [...fixed, ...bar].reduce((sum, { width }) => sum + width, 0);
  return [
    ...fixed,
    ...bar,
    { head: 'Zone', width: sheet.width - used - 22, style: small, cell: ({ span }) => zoneWords[span.decision.zone] },
    {
      head: 'Page',
      width: 22,
      align: 'right',
      style: figure,
      cell: (row): Cell => (row.span.estimate ? { text: ' ', pageOf: row.destination } : { text: '–' }),
    },
  ];
}

function nameCell(row: ResultRow): Cell {
  return row.span.estimate ? { text: row.name, leadsTo: row.destination } : { text: row.name };
}

/** The tension of a span, where a single one may be given. */
export function single({ span }: ResultRow, { quantities }: Report): { value: string; uncertainty: string } | null {
  const output = span.estimate?.output;
  return output && output.boundsOnly === null ? quantities.tension(output) : null;
}

/** The reference at the mean of the chord, where tensions are compared. */
function referenceOf({ cable, span }: ResultRow, { quantities }: Report): string {
  const reference = cable.referenceTension;
  if (reference === null) return '–';
  return span.estimate
    ? quantities.tensionBeside(reference.meanChordValue, span.estimate.output)
    : quantities.figure(reference.meanChordValue, 'force');
}

function referenceHead({ rows }: Report): string {
  const kinds = new Set(rows.flatMap(({ cable }) => (cable.referenceTension ? [cable.referenceTension.kind] : [])));
  return kinds.size === 1 && kinds.has('design') ? 'Design' : kinds.size === 1 ? referenceWords[[...kinds][0]!] : 'Reference';
}
