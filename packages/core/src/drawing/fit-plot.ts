import { type Figure, type Mark, type Pigment, polylinePath, type Stroke } from './figure.ts';
import { type PlotSize, plotFrame } from './plot-frame.ts';

export interface FitPlotPeak {
  mode: number;
  /** Hz */
  frequency: number;
  /** Hz; no whisker is drawn without it. */
  standardUncertainty?: number | null;
  used: boolean;
}

export interface FitPlotCurve {
  /** What the legend calls it: "hinged ends". */
  name: string;
  /** Frequencies of the model (Hz), mode by mode. */
  values: readonly { mode: number; frequency: number }[];
}

const curveStrokes: readonly Stroke[] = [
  { pigment: 'verdigris', width: 1.6 },
  { pigment: 'ochre', width: 1.4, dash: [6, 3] },
  { pigment: 'muted', width: 1.4, dash: [2, 3] },
];

/**
 * The fit plot: (f_n/n)² against n². A stiff string with hinged ends is a straight line there, its height the tension, its slope the
 * bending stiffness; a wrong mode number jumps out of it.
 *
 * @param peaks frequencies that were read (Hz); set aside ones are drawn hollow
 * @param curves models that were fitted, at most three
 * @param size width and height of the sheet
 * @returns the display list; empty without peaks
 */
export function fitPlot(peaks: readonly FitPlotPeak[], curves: readonly FitPlotCurve[], size: PlotSize): Figure {
  const drawn = curves.slice(0, curveStrokes.length);
  if (peaks.length === 0) return { ...size, marks: [] };
  const modes = [...new Set([...peaks, ...drawn.flatMap((curve) => curve.values)].map(({ mode }) => mode))].sort((a, b) => a - b);
  const highest = modes.at(-1)!;
  const frame = plotFrame({
    size,
    xDomain: [0, highest ** 2 * 1.03],
    yDomain: yDomain([...peaks.flatMap(whisker), ...drawn.flatMap((curve) => curve.values.map(height))]),
    xTicks: spaced(modes, size.width),
    xTitle: 'mode n, spaced as n²',
    yTitle: '(f/n)² in Hz²',
  });
  const marks: Mark[] = [
    ...frame.marks,
    ...drawn.flatMap((curve, index): Mark[] => {
      const points = curve.values.map((value) => ({ x: frame.x(value.mode ** 2), y: frame.y(height(value)) }));
      const d = polylinePath(points);
      return d === '' ? [] : [{ kind: 'path', d, stroke: curveStrokes[index]! }];
    }),
    ...peaks.flatMap((peak) => peakMarks(peak, frame)),
    ...legend(drawn, size),
  ];
  return { ...size, marks };
}

function height({ mode, frequency }: { mode: number; frequency: number }): number {
  return (frequency / mode) ** 2;
}

/** Ends of the 95 % whisker of a peak. */
function whisker({ mode, frequency, standardUncertainty }: FitPlotPeak): [number, number] {
  const reach = 2 * (standardUncertainty ?? 0);
  return [height({ mode, frequency: Math.max(0, frequency - reach) }), height({ mode, frequency: frequency + reach })];
}

function yDomain(values: readonly number[]): [number, number] {
  const [low, high] = [Math.min(...values), Math.max(...values)];
  // A flat line is no cliff: the axis never spans less than 2 % of what it shows.
  const room = Math.max((high - low) * 0.12, high * 0.01);
  return [low - room, high + room];
}

/** Low modes crowd together on a scale of squares: only labels that have room are written. */
function spaced(modes: readonly number[], width: number): { at: number; label: string }[] {
  const highest = modes.at(-1)!;
  let last = Number.NEGATIVE_INFINITY;
  return modes
    .filter((mode) => {
      const place = (mode / highest) ** 2 * (width - 70);
      if (place - last < 16 && mode !== highest) return false;
      last = place;
      return true;
    })
    .map((mode) => ({ at: mode ** 2, label: String(mode) }));
}

function peakMarks(peak: FitPlotPeak, frame: { x: (value: number) => number; y: (value: number) => number }): Mark[] {
  const x = frame.x(peak.mode ** 2);
  const [low, high] = whisker(peak);
  const pigment: Pigment = peak.used ? 'ink' : 'muted';
  const dot: Mark = {
    kind: 'circle',
    cx: x,
    cy: frame.y(height(peak)),
    r: 3.5,
    fill: peak.used ? 'ink' : 'sheet',
    stroke: { pigment, width: 1.4 },
  };
  if (!peak.standardUncertainty) return [dot];
  return [{ kind: 'line', x1: x, x2: x, y1: frame.y(low), y2: frame.y(high), stroke: { pigment, width: 1 } }, dot];
}

function legend(curves: readonly FitPlotCurve[], { width }: PlotSize): Mark[] {
  let x = width - 10;
  return curves.toReversed().flatMap((curve, reversed): Mark[] => {
    const stroke = curveStrokes[curves.length - 1 - reversed]!;
    // Six and a half units a letter at this size, a line of twenty before it.
    const words = curve.name.length * 6.5;
    const marks: Mark[] = [
      { kind: 'text', x, y: 12, text: curve.name, size: 12, anchor: 'end', pigment: 'ink', font: 'text' },
      { kind: 'line', x1: x - words - 26, x2: x - words - 6, y1: 8, y2: 8, stroke },
    ];
    x -= words + 40;
    return marks;
  });
}
