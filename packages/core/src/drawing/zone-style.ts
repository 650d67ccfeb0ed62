import type { Pigment, Stroke } from './figure.ts';

/** The zones of the decision rule, and why none is given where none is. */
export type DrawnZone =
  | 'within'
  | 'within-not-proven'
  | 'outside-not-proven'
  | 'outside'
  | 'bounds-only'
  | 'no-limit-agreed'
  | 'not-comparable'
  | 'not-measured';

export interface ZoneStyle {
  /** The line of a cable in the elevation. */
  line: Stroke;
  /** The bar of the interval. */
  bar: Pigment;
  /** What stands at the line, so that the zone is told without colour; null where it needs none. */
  sign: '!' | '?!' | '?' | null;
}

const hairline: Stroke = { pigment: 'muted', width: 0.8 };

const styles: Record<DrawnZone, ZoneStyle> = {
  within: { line: { pigment: 'verdigris', width: 1.5 }, bar: 'ink', sign: null },
  'within-not-proven': { line: { pigment: 'ochre', width: 2.2, dash: [8, 4] }, bar: 'ochre', sign: '?' },
  'outside-not-proven': { line: { pigment: 'ochre', width: 2.2, dash: [10, 4, 2, 4] }, bar: 'ochre', sign: '?!' },
  outside: { line: { pigment: 'minium', width: 4 }, bar: 'minium', sign: '!' },
  'bounds-only': { line: hairline, bar: 'muted', sign: null },
  'no-limit-agreed': { line: hairline, bar: 'ink', sign: null },
  'not-comparable': { line: hairline, bar: 'muted', sign: null },
  'not-measured': { line: hairline, bar: 'muted', sign: null },
};

/** How a zone is drawn, by form as well as by pigment: it survives a black-and-white printer. */
export function zoneStyle(zone: DrawnZone): ZoneStyle {
  return styles[zone];
}
