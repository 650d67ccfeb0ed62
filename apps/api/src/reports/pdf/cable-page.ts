import { formatNumber } from '@strandnote/core';
import { intervalBar, sharedScale } from '@strandnote/core/drawing';
import { setCableInputs } from './cable-inputs.ts';
import { setCableModels } from './cable-models.ts';
import { setCablePeaks } from './cable-peaks.ts';
import { shortCaution } from './cautions.ts';
import { drawFigure } from './draw-figure.ts';
import { barOf } from './interval-bars.ts';
import type { Report, ResultRow } from './report-input.ts';
import { layoutLines, styles, type TextStyle } from './text-layout.ts';
import { cableKindWords, capitalised, referenceWords, zoneWords } from './words.ts';
import { toReference } from './zone-summary.ts';

const large: TextStyle = { face: 'text-strong', size: 24, leading: 1.15, pigment: 'ink' };
const beside: TextStyle = { face: 'text', size: 14, leading: 1.15, pigment: 'ink' };
const zoneStyle: TextStyle = { face: 'text-strong', size: 12, leading: 1.2, pigment: 'ink' };
const warning: TextStyle = { ...styles.noteInk, pigment: 'ochre' };
const small: TextStyle = { ...styles.note, size: 7.6 };

/** One span on a leaf of its own: what came out, what went in, what was heard, and how the tension follows. */
export function setCablePage(report: Report, row: ResultRow): void {
  const { sheet } = report;
  sheet.running = `Cable ${row.name}`;
  sheet.newPage();
  sheet.heading(2, `Cable ${row.name}`, { name: row.destination });
  sheet.paragraph(identity(row), styles.note, { after: 6 });
  setResult(report, row);
  setCableInputs(report, row);
  setCablePeaks(report, row);
  setCableModels(report, row);
}

function identity({ cable }: ResultRow): string {
  return [
    capitalised(cableKindWords[cable.kind]),
    cable.sectionName,
    cable.ownerReference && `owner’s reference ${cable.ownerReference}`,
    cable.paintedMark && `painted mark ${cable.paintedMark}`,
  ]
    .filter(Boolean)
    .join('  ·  ');
}

const barWidth = 210;

function setResult(report: Report, row: ResultRow): void {
  const { sheet } = report;
  const top = sheet.y;
  const barLeft = sheet.room.right - barWidth;
  setTension(report, row, barLeft - sheet.left - 16);
  const below = sheet.y;
  sheet.y = top;
  setBar(report, row, barLeft);
  sheet.y = Math.max(below, sheet.y) + 2;
  for (const { severity, message } of row.span.estimate!.output.warnings) {
    const lead = severity === 'serious' ? 'Serious: ' : severity === 'caution' ? 'Caution: ' : '';
    sheet.paragraph([{ text: lead, face: 'text-strong' }, { text: message }], warning, { after: 2 });
  }
  sheet.paragraph(shortCaution(report), small, { after: 0 });
}

function setTension({ sheet, quantities }: Report, row: ResultRow, width: number): void {
  const { output } = row.span.estimate!;
  const symbol = quantities.symbol('force');
  const { value, uncertainty } = quantities.tension(output);
  const interval = `${quantities.interval(output)} ${symbol}`;
  const [figure] =
    output.boundsOnly === null ? layoutLines(sheet.faces, value, large) : layoutLines(sheet.faces, interval, { ...large, size: 18 });
  const y = sheet.y;
  sheet.tag('P', {}, () => {
    sheet.textAt(output.boundsOnly === null ? value : interval, sheet.left, y, output.boundsOnly === null ? large : { ...large, size: 18 });
    if (output.boundsOnly === null) sheet.textAt(`± ${uncertainty} ${symbol}`, sheet.left + figure!.width + 6, y + 9, beside);
  });
  sheet.y += 29;
  const factor = `k = ${formatNumber(output.expanded.k, 2)}`;
  sheet.paragraph(
    output.boundsOnly === null ? `95 % interval ${interval}, ${factor}` : `95 % interval, bounds only. ${output.boundsOnly}`,
    styles.noteInk,
    { after: 4, width },
  );
  sheet.paragraph(capitalised(zoneWords[row.span.decision.zone]), zoneStyle, { after: 1, width });
  const compared = comparison(row);
  if (compared) sheet.paragraph(compared, styles.noteInk, { after: 0, width });
}

function comparison(row: ResultRow): string {
  const { cable, span } = row;
  const share = toReference(row);
  const against = cable.referenceTension && share !== '–' ? `To the ${referenceWords[cable.referenceTension.kind]}: ${share} %. ` : '';
  return span.decision.reason === span.estimate!.output.boundsOnly ? against.trim() : `${against}${span.decision.reason}`;
}

function setBar({ sheet, quantities }: Report, row: ResultRow, x: number): void {
  const bar = barOf(row);
  const scale = sharedScale([bar]);
  const height = 40;
  const y = sheet.y + 4;
  const symbol = quantities.symbol('force');
  const ends = [scale.from, scale.to].map((value) => `${quantities.tensionBeside(value, row.span.estimate!.output)}`);
  sheet.tag('Figure', { alt: `Interval bar from ${ends[0]} to ${ends[1]} ${symbol}`, bbox: [x, y, x + barWidth, y + height + 33] }, () => {
    drawFigure(sheet.doc, sheet.faces, intervalBar(bar, scale, { width: barWidth, height }), { x, y });
    sheet.textAt(ends[0]!, x, y + height + 2, small);
    sheet.textAt(`${ends[1]} ${symbol}`, x, y + height + 2, small, { align: 'right', width: barWidth });
    for (const [index, words] of partsInWords(row).entries()) sheet.textAt(words, x, y + height + 13 + 10 * index, small);
  });
  sheet.y = y + height + 34;
}

/** What is drawn in this bar besides the interval, in two lines. */
function partsInWords({ cable, span }: ResultRow): string[] {
  const lines = [
    [
      span.decision.lowerLimit !== null || span.decision.upperLimit !== null ? 'band: limits' : null,
      cable.referenceTension ? 'dashed: reference' : null,
      span.lastSurvey ? 'dot: last survey' : null,
    ],
    ['whisker: both ends hinged … clamped'],
  ];
  return lines.map((words) => words.filter(Boolean).join('  ·  ')).filter((words) => words !== '');
}
