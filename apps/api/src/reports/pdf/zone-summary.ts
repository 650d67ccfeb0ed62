import { type Mark, zoneStyle } from '@strandnote/core/drawing';
import type { Zone } from '@strandnote/core/report-content';
import { drawFigure } from './draw-figure.ts';
import { roundPercent, shareWithUncertainty } from './quantities.ts';
import { isMeasured, type Report, type ResultRow, zoneCounts } from './report-input.ts';
import { setTable } from './table.ts';
import { type Inline, styles } from './text-layout.ts';
import { counted, referenceWords, zonesByConcern, zoneWords } from './words.ts';

/** What came out, in a sentence, as a table of zones that is also the key to the elevation, and beside it what to look at first. */
export function setZoneSummary(report: Report): void {
  const { sheet } = report;
  sheet.heading(2, 'Result in short', { keep: 120 });
  sheet.paragraph(resultInWords(report), styles.body, { after: 6 });
  const top = sheet.y;
  setZones(report);
  const below = sheet.y;
  sheet.y = top;
  setCablesToLookAt(report, sheet.left + zonesWidth + 16);
  sheet.y = Math.max(below, sheet.y);
}

const zonesWidth = 196;

function setZones(report: Report): void {
  setTable(report.sheet, {
    rows: zoneCounts(report.rows),
    padding: 2,
    columns: [
      { head: 'Zone', width: 96, cell: ({ zone }) => ({ text: zoneWords[zone], style: { ...styles.cell, face: 'text-strong' } }) },
      { head: 'Cables', width: 42, align: 'right', style: styles.figure, cell: ({ count }) => String(count) },
      {
        head: 'Drawn',
        width: 58,
        cell: ({ zone }) => ({
          drawing: { height: 10.6, alt: `Line of a cable ${zoneWords[zone]}`, draw: (x, y) => drawSample(report, zone, x, y) },
        }),
      },
    ],
  });
}

function resultInWords({ rows, content }: Report): Inline {
  const measured = rows.filter(isMeasured).length;
  const { basis } = content.campaign;
  const what = content.cables.length === rows.length ? 'cable' : 'span';
  const covered =
    measured === rows.length
      ? `All ${counted(rows.length, what)} of this report were measured.`
      : `${measured} of ${counted(rows.length, what)} were measured; ${rows.length - measured === 1 ? 'the other is' : 'the others are'} listed with the reason.`;
  return [{ text: `${covered} ` }, { text: limitsInWords(basis) }];
}

/** The limits agreed before the survey, in words. */
export function limitsInWords({ referenceKind, lowerLimit, upperLimit }: Report['content']['campaign']['basis']): string {
  const reference = referenceWords[referenceKind as keyof typeof referenceWords] ?? 'reference tension';
  if (lowerLimit === null && upperLimit === null)
    return `No limits were agreed before the survey, so that no zone is given; the tensions stand beside the ${reference}.`;
  if (lowerLimit === null) return `The limit agreed before the survey is ${roundPercent(upperLimit!)} of the ${reference}, upwards.`;
  if (upperLimit === null) return `The limit agreed before the survey is ${roundPercent(lowerLimit)} of the ${reference}, downwards.`;
  return `The limits agreed before the survey are ${roundPercent(lowerLimit)} and ${roundPercent(upperLimit)} of the ${reference}.`;
}

const shownAtMost = 7;
const concern: readonly Zone[] = ['outside', 'outside-not-proven', 'within-not-proven'];

function setCablesToLookAt(report: Report, x: number): void {
  const { sheet, quantities } = report;
  const rows = report.rows
    .filter(({ span }) => concern.includes(span.decision.zone))
    .toSorted((a, b) => zonesByConcern.indexOf(a.span.decision.zone) - zonesByConcern.indexOf(b.span.decision.zone) || away(b) - away(a));
  if (rows.length === 0) return;
  setTable(sheet, {
    x,
    rows: rows.slice(0, shownAtMost),
    padding: 2,
    columns: [
      {
        head: 'Look first at',
        width: 50,
        style: { ...styles.figure, face: 'figures-strong' },
        cell: ({ name, destination }) => ({ text: name, leadsTo: destination }),
      },
      {
        head: `Tension, ${quantities.symbol('force')}`,
        width: 68,
        align: 'right',
        style: styles.figure,
        cell: (row) => tensionOf(row, report),
      },
      { head: 'to reference, %', width: 70, align: 'right', style: styles.figure, cell: toReference },
      { head: 'Zone', width: sheet.room.right - x - 188, cell: ({ span }) => zoneWords[span.decision.zone] },
    ],
  });
  if (rows.length > shownAtMost)
    sheet.textAt(`and ${rows.length - shownAtMost} more, see the results of all cables`, x, sheet.y + 3, styles.note);
}

function tensionOf({ span }: ResultRow, { quantities }: Report): string {
  const { value, uncertainty } = quantities.tension(span.estimate!.output);
  return `${value} ± ${uncertainty}`;
}

/** Tension over reference, minus one, with its 95 % interval, in per cent; a dash where they are not compared. */
export function toReference({ cable, span }: ResultRow): string {
  const { toReference: share } = span.decision;
  if (share === null || !cable.referenceTension || !span.estimate) return '–';
  return shareWithUncertainty(share, span.estimate.output.expanded.U / cable.referenceTension.meanChordValue);
}

function away({ span }: ResultRow): number {
  return Math.abs(span.decision.toReference ?? 0);
}

function drawSample({ sheet }: Report, zone: Zone, x: number, y: number): void {
  const { line, sign } = zoneStyle(zone);
  const middle = 6.5;
  const marks: Mark[] = [
    { kind: 'line', x1: 0, x2: sign ? 38 : 54, y1: middle, y2: middle, stroke: { ...line, width: line.width * 0.72 } },
  ];
  if (sign)
    marks.push({ kind: 'text', x: 48, y: middle + 3, text: sign, size: 9, anchor: 'middle', pigment: line.pigment, font: 'text-strong' });
  drawFigure(sheet.doc, sheet.faces, { width: 58, height: 10.6, marks }, { x, y });
}
