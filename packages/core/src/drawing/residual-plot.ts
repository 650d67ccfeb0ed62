import type { Figure, Mark } from './figure.ts';
import { roundStep } from './linear-scale.ts';
import { type PlotSize, plotFrame, thinned } from './plot-frame.ts';

export interface PlottedResidual {
  mode: number;
  /** Frequency read over frequency of the model, minus one. */
  residual: number;
  /** Standard uncertainty of the frequency, relative; no band is drawn without it. */
  standardUncertainty?: number | null;
  used: boolean;
}

/**
 * The residual plot: how far each frequency lies from the model, in per cent, over a band of ± 2 standard uncertainties.
 *
 * @param residuals one per peak, relative; set aside ones are drawn hollow
 * @param size width and height of the sheet
 * @returns the display list; empty without residuals
 */
export function residualPlot(residuals: readonly PlottedResidual[], size: PlotSize): Figure {
  if (residuals.length === 0) return { ...size, marks: [] };
  const modes = [...new Set(residuals.map(({ mode }) => mode))].sort((a, b) => a - b);
  const reach = largest(residuals);
  const frame = plotFrame({
    size,
    xDomain: [modes[0]! - 0.6, modes.at(-1)! + 0.6],
    yDomain: [-reach, reach],
    xTicks: thinned(modes, size.width).map((mode) => ({ at: mode, label: String(mode) })),
    xTitle: 'mode',
    yTitle: 'read over model, %',
  });
  const half = Math.min(10, Math.abs(frame.x(1) - frame.x(0)) * 0.3);
  const zero: Mark = {
    kind: 'line',
    x1: frame.x(modes[0]! - 0.6),
    x2: frame.x(modes.at(-1)! + 0.6),
    y1: frame.y(0),
    y2: frame.y(0),
    stroke: { pigment: 'ink', width: 1 },
  };
  const bands = residuals.flatMap(({ mode, standardUncertainty }): Mark[] => {
    if (!standardUncertainty) return [];
    const [top, foot] = [frame.y(200 * standardUncertainty), frame.y(-200 * standardUncertainty)];
    return [{ kind: 'rect', x: frame.x(mode) - half, y: top, width: 2 * half, height: foot - top, fill: 'wash' }];
  });
  const dots = residuals.flatMap(({ mode, residual, used }): Mark[] => {
    const [x, y] = [frame.x(mode), frame.y(100 * residual)];
    return [
      { kind: 'line', x1: x, x2: x, y1: frame.y(0), y2: y, stroke: { pigment: used ? 'ink' : 'muted', width: 1.2 } },
      { kind: 'circle', cx: x, cy: y, r: 3.5, fill: used ? 'ink' : 'sheet', stroke: { pigment: used ? 'ink' : 'muted', width: 1.4 } },
    ];
  });
  return { ...size, marks: [...bands, ...frame.marks, zero, ...dots] };
}

/** Half the height of the plot (%): a round number over all that is drawn, and never so small that noise looks like a misfit. */
function largest(residuals: readonly PlottedResidual[]): number {
  const values = residuals.map(({ residual, standardUncertainty }) => 100 * Math.max(Math.abs(residual), 2 * (standardUncertainty ?? 0)));
  return roundStep(Math.max(0.1, ...values) * 1.05);
}
