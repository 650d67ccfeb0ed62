import { type BudgetLine, formatNumber, type ModelRow, type Quantity, type TensionEstimate } from '@strandnote/core';
import { reminder } from './cautions.ts';
import { moment } from './dates.ts';
import { setDefinitions } from './definitions.ts';
import { ink } from './ink.ts';
import { percent, signed, significant } from './quantities.ts';
import type { Report, ResultRow } from './report-input.ts';
import { setTable } from './table.ts';
import { styles, type TextStyle } from './text-layout.ts';

const small: TextStyle = { ...styles.cell, size: 8 };

/** How the tension follows: models side by side, the bracket, the budget, notes, and how to compute it again. */
export function setCableModels(report: Report, row: ResultRow): void {
  const { output } = row.span.estimate!;
  setModels(report, output);
  setBudget(report, output);
  setNotes(report, output);
  setProvenance(report, row);
}

function setModels({ sheet, quantities }: Report, output: TensionEstimate): void {
  const force = quantities.symbol('force');
  const bending = quantities.symbol('bending-stiffness');
  sheet.heading(3, 'Models side by side', { keep: 80 });
  setTable<ModelRow>(sheet, {
    rows: output.models,
    padding: 1.5,
    columns: [
      {
        head: 'Model',
        width: 126,
        style: small,
        cell: ({ id, name }) => ({ text: name, style: id === 'adopted' ? { ...small, face: 'text-strong' } : small }),
      },
      {
        head: `Tension, ${force}`,
        width: 50,
        align: 'decimal',
        style: styles.figure,
        cell: ({ tension, id }) => (id === 'adopted' && output.boundsOnly !== null ? '–' : quantities.tensionBeside(tension, output)),
      },
      {
        head: 'to adopted, %',
        width: 46,
        align: 'decimal',
        style: styles.figure,
        cell: ({ tension, id }) => (id === 'adopted' || output.boundsOnly !== null ? '–' : signed(100 * (tension / output.tension - 1), 1)),
      },
      {
        head: `EI, ${bending}`,
        width: 52,
        align: 'right',
        style: styles.figure,
        cell: ({ bendingStiffness }) => (bendingStiffness === null ? '–' : quantities.figure(bendingStiffness, 'bending-stiffness')),
      },
      {
        head: 'χ²',
        width: 34,
        align: 'decimal',
        style: styles.figure,
        cell: ({ chiSquared }) => (chiSquared === null ? '–' : formatNumber(chiSquared, 1)),
      },
      {
        head: 'AICc',
        width: 36,
        align: 'decimal',
        style: styles.figure,
        cell: ({ aicc }) => (aicc === null ? '–' : formatNumber(aicc, 1)),
      },
      { head: 'What it leaves out', width: sheet.width - 344, style: { ...small, size: 7.6 }, cell: ({ note }) => note },
    ],
  });
  sheet.space(4);
  const { hinged, clamped } = output.bracket;
  sheet.paragraph(
    `Bracket of the ends: ${quantities.tensionBeside(hinged, output)} ${force} if both are hinged, ${quantities.tensionBeside(clamped, output)} ${force} if both are clamped. ξ = ${formatNumber(output.dimensionless.xi, 0)}${output.dimensionless.lambdaSquared === null ? '' : `, λ² = ${formatNumber(output.dimensionless.lambdaSquared, significant(output.dimensionless.lambdaSquared, 2))}`}.`,
    styles.noteInk,
    { after: 2 },
  );
  sheet.paragraph(reminder, { ...styles.note, size: 7.6 }, { after: 0 });
}

/** Units of the budget as the engine writes them, and what they measure. */
const quantityOfUnit: Record<string, Quantity> = { m: 'length', 'kg/m': 'mass-per-length', 'N·m²': 'bending-stiffness', N: 'force' };

function setBudget({ sheet, quantities }: Report, output: TensionEstimate): void {
  const shown = ({ value, unit, standardUncertainty }: BudgetLine) => {
    const quantity = quantityOfUnit[unit];
    if (value === null) return '–';
    return quantity
      ? `${quantities.figure(value, quantity, standardUncertainty)} ${quantities.symbol(quantity)}`
      : `${formatNumber(value, significant(value, 4))} ${unit}`;
  };
  sheet.heading(3, 'Uncertainty budget', { keep: 80 });
  setTable<BudgetLine>(sheet, {
    rows: output.budget,
    padding: 1.5,
    columns: [
      { head: 'Source', width: 112, cell: ({ label }) => label },
      { head: 'Value', width: 84, align: 'right', style: styles.figure, cell: shown },
      {
        head: 'u, %',
        width: 40,
        align: 'decimal',
        style: styles.figure,
        cell: ({ relative }) => (relative === null ? '–' : percent(relative, 2)),
      },
      { head: 'Distribution', width: 62, style: small, cell: ({ distribution }) => distribution },
      {
        head: 'Sensitivity',
        width: 52,
        align: 'decimal',
        style: styles.figure,
        cell: ({ sensitivity }) => (sensitivity === null ? '–' : signed(sensitivity, 2)),
      },
      {
        head: 'adds to u(T)/T, %',
        width: 54,
        align: 'decimal',
        style: styles.figure,
        cell: ({ contribution }) => percent(contribution, 2),
      },
      {
        head: 'of variance, %',
        width: sheet.width - 404,
        cell: (line) => ({
          drawing: {
            height: 10.6,
            alt: `${percent(line.shareOfVariance, 0)} % of the variance`,
            draw: (x, y, width) => drawShare(line, x, y, width),
          },
        }),
      },
    ],
  });
  sheet.space(4);
  const { standardUncertainty, expanded, tension } = output;
  sheet.paragraph(
    `Combined standard uncertainty ${quantities.spread(standardUncertainty, 'force')} ${quantities.symbol('force')} (${percent(standardUncertainty / tension, 2)} %); expanded uncertainty U = ${quantities.spread(expanded.U, 'force')} ${quantities.symbol('force')} with k = ${formatNumber(expanded.k, 2)} for a coverage of 95 %.`,
    styles.noteInk,
    { after: 0 },
  );

  function drawShare({ shareOfVariance }: BudgetLine, x: number, y: number, width: number): void {
    const room = width - 26;
    sheet.textAt(percent(shareOfVariance, 0), x, y, styles.figure, { align: 'right', width: 20 });
    sheet.doc.rect(x + 26, y + 3, Math.max(0.4, room * shareOfVariance), 5).fill(ink.ink);
  }
}

/** What explains the result; what warns of it stands at the head of the page. */
function setNotes({ sheet }: Report, { diagnostics }: TensionEstimate): void {
  if (diagnostics.length === 0) return;
  sheet.heading(3, 'Notes', { keep: 30 });
  for (const { message } of diagnostics) sheet.paragraph(message, styles.noteInk, { after: 2 });
}

function setProvenance({ sheet, content }: Report, { cable, span }: ResultRow): void {
  const estimate = span.estimate!;
  sheet.heading(3, 'To compute it again', { keep: 46 });
  const place = `cables[${content.cables.indexOf(cable)}].spans[${cable.spans.indexOf(span)}].estimate.input`;
  setDefinitions(
    sheet,
    [
      { term: 'Estimate', value: estimate.id, style: styles.figure },
      { term: 'Engine', value: `version ${estimate.engineVersion}, computed ${moment(estimate.createdAt, content.structure.timeZone)}` },
      { term: 'Inputs', value: [{ text: 'content.json, ' }, { text: place, face: 'figures' }] },
    ],
    { termWidth: 74 },
  );
}
