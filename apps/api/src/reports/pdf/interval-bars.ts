import { type IntervalBarValues, type IntervalScale, intervalBar, sharedScale, shareOfReference } from '@strandnote/core/drawing';
import { drawFigure } from './draw-figure.ts';
import { signed } from './quantities.ts';
import type { Report, ResultRow } from './report-input.ts';
import type { Cell } from './table.ts';
import { zoneWords } from './words.ts';

/** All that the bar of a span is drawn from (N); of an estimate that allows bounds only, the bounds. */
export function barOf({ cable, span }: ResultRow): IntervalBarValues {
  const output = span.estimate?.output ?? null;
  const boundsOnly = output?.boundsOnly != null;
  return {
    // A hollow bar says that there is no best value, whatever else is said of the cable.
    zone: boundsOnly ? 'bounds-only' : span.decision.zone,
    tension: output && !boundsOnly ? output.tension : null,
    interval: output?.interval95 ?? null,
    bracket: output?.bracket ?? null,
    lowerLimit: span.decision.lowerLimit,
    upperLimit: span.decision.upperLimit,
    reference: cable.referenceTension?.meanChordValue ?? null,
    lastSurvey: span.lastSurvey?.tension ?? null,
  };
}

/** The scale that all bars of a report share, as shares of the reference; null where no cable has a reference. */
export function scaleOfBars(rows: readonly ResultRow[]): IntervalScale | null {
  // Bounds are wide by their nature: they may run off the scale, so that the tensions fill it.
  const tensions = rows.filter(({ span }) => span.estimate?.output.boundsOnly === null);
  const bars = tensions.map((row) => shareOfReference(barOf(row))).filter((bar) => bar !== null);
  if (bars.length === 0) return null;
  const { from, to } = sharedScale(bars);
  // One cable far off would press all others into a line; it ends in an arrowhead instead.
  return { from: Math.max(from, 0.75), to: Math.min(to, 1.3) };
}

export function scaleInWords({ from, to }: IntervalScale): string {
  return `${signed(100 * (from - 1), 0)} to ${signed(100 * (to - 1), 0)} %`;
}

const height = 16;
/** Points for a unit of the drawing: its strokes are made for a screen. */
const onPaper = 0.7;

/** A cell with the bar of a span on the shared scale; a dash where it has no reference. */
export function barCell({ sheet, quantities }: Report, row: ResultRow, scale: IntervalScale): Cell {
  const bar = shareOfReference(barOf(row));
  if (bar === null || bar.interval === null) return { text: '–' };
  const interval = row.span.estimate ? `${quantities.interval(row.span.estimate.output)} ${quantities.symbol('force')}` : '';
  const alt = `95 % interval ${interval}, ${zoneWords[row.span.decision.zone]}`;
  return {
    drawing: {
      height,
      alt,
      draw: (x, y, width) =>
        drawFigure(sheet.doc, sheet.faces, intervalBar(bar, scale, { width: width / onPaper, height: height / onPaper }), {
          x,
          y,
          scale: onPaper,
        }),
    },
  };
}
