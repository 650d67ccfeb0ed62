import { type Figure, type Mark, rounded } from './figure.ts';

export interface StringFigureOptions {
  /** Mode number, integer >= 1. */
  mode: number;
  /** Place of the sensor as a share of the free length from the lower end, 0–1; none is drawn without it. */
  sensor?: number | null;
  width: number;
  height: number;
  /** Width of the solid line; the other lines follow it. */
  lineWidth?: number;
  /** One pigment for everything, as in the mark of the product. */
  plain?: 'verdigris' | 'ink';
}

/**
 * The string figure: a cable between two anchor ticks, in the standing wave of one mode, the half-period later dashed,
 * with the sensor as a dot on the line at rest.
 *
 * @param options see StringFigureOptions; sizes in the unit of the sheet
 * @returns the display list
 */
export function stringFigure({ mode, sensor, width, height, lineWidth = 1.5, plain }: StringFigureOptions): Figure {
  const pigment = plain ?? 'ink';
  const inset = lineWidth * 1.5;
  const middle = height / 2;
  const amplitude = height * 0.4;
  const span = { from: inset, to: width - inset, middle };
  const tick = { kind: 'line', y1: height * 0.1, y2: height * 0.9, stroke: { pigment, width: lineWidth * 1.5 } } as const;
  const marks: Mark[] = [
    { ...tick, x1: span.from, x2: span.from },
    { ...tick, x1: span.to, x2: span.to },
    {
      kind: 'path',
      d: wavePath(mode, -amplitude, span),
      stroke: { pigment, width: lineWidth * 0.85, dash: [lineWidth * 1.6, lineWidth * 1.6] },
    },
    { kind: 'path', d: wavePath(mode, amplitude, span), stroke: { pigment, width: lineWidth } },
  ];
  if (typeof sensor === 'number' && sensor >= 0 && sensor <= 1) {
    marks.push({ kind: 'circle', cx: span.from + sensor * (span.to - span.from), cy: middle, r: lineWidth * 2.4, fill: 'minium' });
  }
  return { width, height, marks };
}

/**
 * How much of a mode's largest displacement a sensor feels: |sin(nπx/L)|.
 *
 * @param mode mode number, integer >= 1
 * @param place share of the free length from an end, 0–1
 * @returns 0 at a node or an end, 1 at a crest
 * Source: modes of a taut string; the bending boundary layer at the ends is neglected.
 */
export function heardShare(mode: number, place: number): number {
  return Math.abs(Math.sin(mode * Math.PI * place));
}

/** Cubic pieces of an eighth of a wave each, matched in value and slope: no eye sees the difference from a sine. */
function wavePath(mode: number, amplitude: number, { from, to, middle }: { from: number; to: number; middle: number }): string {
  const pieces = mode * 4;
  const step = (to - from) / pieces;
  const height = (index: number) => middle - amplitude * Math.sin((index * Math.PI) / 4);
  const rise = (index: number) => (-amplitude * Math.cos((index * Math.PI) / 4) * Math.PI) / 4 / 3;
  const parts = [`M${rounded(from)} ${rounded(height(0))}`];
  for (let index = 0; index < pieces; index += 1) {
    const x = from + index * step;
    const first = `${rounded(x + step / 3)} ${rounded(height(index) + rise(index))}`;
    const second = `${rounded(x + (2 * step) / 3)} ${rounded(height(index + 1) - rise(index + 1))}`;
    parts.push(`C${first} ${second} ${rounded(x + step)} ${rounded(height(index + 1))}`);
  }
  return parts.join('');
}
