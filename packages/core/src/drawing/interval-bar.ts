import type { Figure, Mark, Pigment } from './figure.ts';
import { linearScale } from './linear-scale.ts';
import { type DrawnZone, zoneStyle } from './zone-style.ts';

/** One tension with all that it is seen against; every value in the same unit, which may be a share of the reference. */
export interface IntervalBarValues {
  zone: DrawnZone;
  /** Best value and 95 % interval; null where the cable was not measured. */
  tension: number | null;
  interval: readonly [number, number] | null;
  /** Tension if both ends are hinged, and if both are clamped. */
  bracket?: { hinged: number; clamped: number } | null;
  lowerLimit?: number | null;
  upperLimit?: number | null;
  reference?: number | null;
  lastSurvey?: number | null;
}

export interface IntervalScale {
  from: number;
  to: number;
}

/**
 * The scale on which a column of bars stands, so that the eye can run down it: everything that is drawn, and a little room.
 *
 * @param column the values of every row
 * @returns the bounds; 0–1 where there is nothing to draw
 */
export function sharedScale(column: readonly IntervalBarValues[]): IntervalScale {
  const values = column.flatMap(drawnValues);
  if (values.length === 0) return { from: 0, to: 1 };
  const from = Math.min(...values);
  const to = Math.max(...values);
  const room = to > from ? (to - from) * 0.06 : Math.abs(to) * 0.05 || 1;
  return { from: from - room, to: to + room };
}

/**
 * The same values as shares of the reference tension, so that cables of different tension share a scale.
 *
 * @returns null without a reference > 0
 */
export function shareOfReference(values: IntervalBarValues): IntervalBarValues | null {
  const { reference } = values;
  if (reference === null || reference === undefined || !(reference > 0)) return null;
  const share = <Value extends number | null | undefined>(value: Value) => (typeof value === 'number' ? value / reference : null);
  return {
    zone: values.zone,
    tension: share(values.tension),
    interval: values.interval && [values.interval[0] / reference, values.interval[1] / reference],
    bracket: values.bracket ? { hinged: values.bracket.hinged / reference, clamped: values.bracket.clamped / reference } : null,
    lowerLimit: share(values.lowerLimit),
    upperLimit: share(values.upperLimit),
    reference: 1,
    lastSurvey: share(values.lastSurvey),
  };
}

/**
 * The interval bar: agreed limits as a washed band, the reference as a dashed tick, the 95 % interval as a solid bar with the
 * best value as a heavy tick, the bracket of end fixity as a whisker under it, the last survey as a hollow dot.
 * What lies beyond the scale ends at its edge in an arrowhead. Where only bounds are given the bar is hollow, without a best value.
 *
 * @param values the tension and what it is seen against
 * @param scale the bounds of the scale, in the same unit
 * @param size width and height of the sheet
 * @returns the display list
 */
export function intervalBar(values: IntervalBarValues, scale: IntervalScale, size: { width: number; height: number }): Figure {
  const { width, height } = size;
  const at = linearScale([scale.from, scale.to], [0, width]);
  const ruler: Ruler = {
    at: (value) => Math.min(width, Math.max(0, at(value))),
    inside: (value) => value >= scale.from && value <= scale.to,
    height,
    width,
  };
  const marks: Mark[] = [
    ...limitBand(values, ruler),
    { kind: 'line', x1: 0, x2: width, y1: height - 0.5, y2: height - 0.5, stroke: { pigment: 'line', width: 1 } },
    ...referenceTick(values, ruler),
    ...intervalMarks(values, ruler),
    ...bracketWhisker(values, ruler),
    ...lastSurveyDot(values, ruler),
  ];
  return { width, height, marks };
}

interface Ruler {
  /** Coordinate of a value, held within the sheet. */
  at: (value: number) => number;
  inside: (value: number) => boolean;
  height: number;
  width: number;
}

function drawnValues({ tension, interval, bracket, lowerLimit, upperLimit, reference, lastSurvey }: IntervalBarValues): number[] {
  const all = [tension, ...(interval ?? []), bracket?.hinged, bracket?.clamped, lowerLimit, upperLimit, reference, lastSurvey];
  return all.filter((value): value is number => typeof value === 'number' && Number.isFinite(value));
}

function limitBand({ lowerLimit, upperLimit }: IntervalBarValues, { at, height, width }: Ruler): Mark[] {
  if (typeof lowerLimit !== 'number' && typeof upperLimit !== 'number') return [];
  // A limit on one side only: the band is open to the other.
  const from = typeof lowerLimit === 'number' ? at(lowerLimit) : 0;
  const to = typeof upperLimit === 'number' ? at(upperLimit) : width;
  if (!(to > from)) return [];
  const edge = { kind: 'line', y1: 0, y2: height * 0.72, stroke: { pigment: 'verdigris', width: 0.5 } } as const;
  const edges = [typeof lowerLimit === 'number' ? from : null, typeof upperLimit === 'number' ? to : null].filter((x) => x !== null);
  return [
    { kind: 'rect', x: from, y: 0, width: to - from, height: height * 0.72, fill: 'wash' },
    ...edges.map((x): Mark => ({ ...edge, x1: x, x2: x })),
  ];
}

function referenceTick({ reference }: IntervalBarValues, { at, inside, height }: Ruler): Mark[] {
  if (typeof reference !== 'number' || !inside(reference)) return [];
  const x = at(reference);
  return [{ kind: 'line', x1: x, x2: x, y1: 0, y2: height * 0.72, stroke: { pigment: 'verdigris', width: 1.5, dash: [3, 2] } }];
}

function intervalMarks({ zone, tension, interval }: IntervalBarValues, ruler: Ruler): Mark[] {
  if (!interval) return [];
  const { at, inside, height } = ruler;
  const pigment = zoneStyle(zone).bar;
  const [from, to] = [at(interval[0]), at(interval[1])];
  const bar = { kind: 'rect', x: from, y: height * 0.22, width: Math.max(1, to - from), height: height * 0.26 } as const;
  const marks: Mark[] = [zone === 'bounds-only' ? { ...bar, stroke: { pigment, width: 1 } } : { ...bar, fill: pigment }];
  if (!inside(interval[0])) marks.push(arrowhead('left', pigment, ruler));
  if (!inside(interval[1])) marks.push(arrowhead('right', pigment, ruler));
  if (zone !== 'bounds-only' && typeof tension === 'number' && inside(tension)) {
    const x = at(tension);
    marks.push({ kind: 'line', x1: x, x2: x, y1: height * 0.06, y2: height * 0.64, stroke: { pigment, width: 3 } });
  }
  return marks;
}

function arrowhead(side: 'left' | 'right', pigment: Pigment, { height, width }: Ruler): Mark {
  const [edge, back] = side === 'left' ? [0, 6] : [width, width - 6];
  const [top, middle, foot] = [height * 0.15, height * 0.35, height * 0.55];
  return { kind: 'path', d: `M${edge} ${middle}L${back} ${top}L${back} ${foot}Z`, fill: pigment };
}

function bracketWhisker({ bracket }: IntervalBarValues, { at, height }: Ruler): Mark[] {
  if (!bracket) return [];
  const [from, to] = [at(Math.min(bracket.hinged, bracket.clamped)), at(Math.max(bracket.hinged, bracket.clamped))];
  const y = height * 0.82;
  const stroke = { pigment: 'muted', width: 1.2 } as const;
  const cap = { kind: 'line', y1: y - height * 0.08, y2: y + height * 0.08, stroke } as const;
  return [
    { kind: 'line', x1: from, x2: to, y1: y, y2: y, stroke },
    { ...cap, x1: from, x2: from },
    { ...cap, x1: to, x2: to },
  ];
}

function lastSurveyDot({ lastSurvey }: IntervalBarValues, { at, inside, height }: Ruler): Mark[] {
  if (typeof lastSurvey !== 'number' || !inside(lastSurvey)) return [];
  return [
    { kind: 'circle', cx: at(lastSurvey), cy: height * 0.35, r: height * 0.12, fill: 'sheet', stroke: { pigment: 'ink', width: 1.5 } },
  ];
}
