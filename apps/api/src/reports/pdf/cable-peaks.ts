import { formatNumber, type PeakResidual } from '@strandnote/core';
import { fitPlot, residualPlot, stringFigure } from '@strandnote/core/drawing';
import type { FrozenPeak } from '@strandnote/core/report-content';
import { drawFigure } from './draw-figure.ts';
import { signed } from './quantities.ts';
import type { Report, ResultRow } from './report-input.ts';
import { setTable } from './table.ts';
import { styles } from './text-layout.ts';
import { counted, planeWords } from './words.ts';

interface PeakRow {
  peak: FrozenPeak;
  residual: PeakResidual | null;
  /** Standard uncertainty with which the peak was weighted (Hz); null for a peak set aside without one. */
  uncertainty: number | null;
}

/** What was heard: the modal peaks beside their fitted values, then both as drawings. */
export function setCablePeaks(report: Report, row: ResultRow): void {
  const { sheet } = report;
  const rows = peakRows(row);
  sheet.heading(3, 'Modal peaks', { keep: 70 });
  setTable(sheet, {
    rows,
    padding: 1.2,
    columns: [
      { head: 'Mode', width: 32, style: { ...styles.figure, face: 'figures-strong' }, cell: ({ peak }) => String(peak.mode) },
      { head: 'Shape, sensor', width: 74, cell: ({ peak }) => shape(report, row, peak) },
      {
        head: 'Read, Hz',
        width: 56,
        align: 'decimal',
        style: styles.figure,
        cell: ({ peak, uncertainty }) => formatNumber(peak.frequency, decimals(uncertainty)),
      },
      {
        head: 'u, Hz',
        width: 50,
        align: 'decimal',
        style: styles.figure,
        cell: ({ uncertainty }) => (uncertainty ? formatNumber(uncertainty, decimals(uncertainty)) : '–'),
      },
      {
        head: 'Fitted, Hz',
        width: 58,
        align: 'decimal',
        style: styles.figure,
        cell: ({ residual, uncertainty }) => (residual ? formatNumber(residual.fitted, decimals(uncertainty)) : '–'),
      },
      {
        head: 'Residual, %',
        width: 54,
        align: 'decimal',
        style: styles.figure,
        cell: ({ residual }) => (residual ? signed(100 * residual.relative, 2) : '–'),
      },
      {
        head: 'over u',
        width: 40,
        align: 'decimal',
        style: styles.figure,
        cell: ({ residual }) => (residual ? signed(residual.standardised, 1) : '–'),
      },
      { head: 'Remarks', width: sheet.width - 364, style: { ...styles.cell, size: 8 }, cell: ({ peak }) => remark(peak) },
    ],
  });
  sheet.space(3);
  sheet.paragraph(uncertaintyInWords(row), styles.note, { after: 6 });
  setPlots(report, row, rows);
}

function peakRows({ span }: ResultRow): PeakRow[] {
  const { residuals, inputs } = span.estimate!.output;
  return span
    .measurement!.peaks.toSorted((a, b) => Number(b.used) - Number(a.used) || a.plane.localeCompare(b.plane) || a.frequency - b.frequency)
    .map((peak) => {
      const index = peak.used ? residuals.findIndex(({ mode, plane }) => mode === peak.mode && plane === peak.plane) : -1;
      const weighted = index === -1 ? null : inputs.frequencyUncertainty[index]! * peak.frequency;
      return { peak, residual: residuals[index] ?? null, uncertainty: weighted ?? peak.standardUncertainty };
    });
}

function decimals(uncertainty: number | null): number {
  return uncertainty ? Math.min(5, Math.max(2, 1 - Math.floor(Math.log10(uncertainty)))) : 3;
}

function remark({ used, setAsideReason, plane, source }: FrozenPeak): string {
  const words = [plane === 'out-of-plane' ? planeWords[plane] : null, source === 'record' ? 'from a record' : 'typed']
    .filter(Boolean)
    .join(', ');
  return used ? words : `Set aside: ${setAsideReason || 'no reason given'}`;
}

function shape({ sheet }: Report, { span }: ResultRow, { mode, used }: FrozenPeak) {
  if (!used) return '';
  const position = span.measurement!.sensorPosition;
  const length = span.estimate!.output.inputs.length;
  const figure = stringFigure({ mode, sensor: position === null ? null : position / length, width: 62, height: 13, lineWidth: 0.9 });
  return {
    drawing: {
      height: 13,
      alt: `Mode ${mode} between its anchors, with the sensor`,
      draw: (x: number, y: number) => drawFigure(sheet.doc, sheet.faces, figure, { x, y }),
    },
  };
}

function uncertaintyInWords({ span }: ResultRow): string {
  const { inputs, goodness } = span.estimate!.output;
  const origin = {
    stated: 'u is the standard uncertainty stated for each peak',
    residuals: 'u was estimated from the residuals, since none was stated',
    assumed: 'u was assumed, since none was stated and the residuals are too few to show it',
    mixed: 'u is as stated where it was stated, and estimated elsewhere',
  }[inputs.frequencyUncertaintySource];
  const enlarged = goodness.scale > 1 ? `, enlarged ${formatNumber(goodness.scale, 1)} times to match the residuals` : '';
  return `${origin}${enlarged}. χ² = ${formatNumber(goodness.chiSquared, 1)} on ${counted(goodness.degreesOfFreedom, 'degree')} of freedom${goodness.pValue === null ? '' : `, p = ${goodness.pValue < 0.001 ? '< 0.001' : formatNumber(goodness.pValue, 3)}`}.`.replace(
    '= <',
    '<',
  );
}

const scale = 0.78;
const plotHeight = 150;

function setPlots(report: Report, row: ResultRow, rows: readonly PeakRow[]): void {
  const { sheet } = report;
  const gap = 14;
  // The fit needs room for its legend, the residuals only for their modes.
  const widths = [sheet.width * 0.61 - gap / 2, sheet.width * 0.39 - gap / 2] as const;
  const sizeOf = (width: number) => ({ width: width / scale, height: plotHeight / scale });
  sheet.need(plotHeight + 14);
  const y = sheet.y;
  const residuals = rows.flatMap(({ peak, residual, uncertainty }) =>
    residual
      ? [{ mode: peak.mode, residual: residual.relative, standardUncertainty: uncertainty && uncertainty / peak.frequency, used: true }]
      : [],
  );
  const peaks = drawnPeaks(rows);
  const plots = [
    { alt: `Fit plot of ${rows.length} peaks over the square of the mode number`, figure: fitPlot(peaks, curves(row), sizeOf(widths[0])) },
    { alt: `Residual plot of ${residuals.length} peaks in per cent`, figure: residualPlot(residuals, sizeOf(widths[1])) },
  ];
  for (const [index, { alt, figure }] of plots.entries()) {
    const x = sheet.left + index * (widths[0] + gap);
    sheet.tag('Figure', { alt, bbox: [x, y, x + widths[index]!, y + plotHeight] }, () =>
      drawFigure(sheet.doc, sheet.faces, figure, { x, y, scale }),
    );
  }
  sheet.y = y + plotHeight + 8;
}

/** Peaks for the fit plot. One set aside far from the line would press the others flat; the table has it. */
function drawnPeaks(rows: readonly PeakRow[]) {
  const level = ({ peak }: PeakRow) => (peak.frequency / peak.mode) ** 2;
  const used = rows.filter(({ peak }) => peak.used).map(level);
  const near = (row: PeakRow) => level(row) > Math.min(...used) * 0.9 && level(row) < Math.max(...used) * 1.1;
  return rows
    .filter((row) => row.peak.used || near(row))
    .map(({ peak, uncertainty }) => ({ mode: peak.mode, frequency: peak.frequency, standardUncertainty: uncertainty, used: peak.used }));
}

/** The adopted fit between its bounds. */
function curves({ span }: ResultRow) {
  const { models } = span.estimate!.output;
  const names: [string, string][] = [
    ['adopted', 'adopted'],
    ['hinged', 'hinged'],
    ['clamped', 'clamped'],
  ];
  return names.flatMap(([id, name]) => {
    const model = models.find((candidate) => candidate.id === id);
    const values = model?.residuals.filter(({ plane }) => plane === model.residuals[0]!.plane) ?? [];
    return values.length > 1 ? [{ name, values: values.map(({ mode, fitted }) => ({ mode, frequency: fitted })) }] : [];
  });
}
