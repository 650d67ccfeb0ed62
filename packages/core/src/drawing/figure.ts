/**
 * The display list that every drawing of the product is: plain marks on a sheet of width × height, y downwards, in the
 * unit of the sheet (CSS pixels in the app, points in the PDF). Colours are named by pigment, so that a theme or a
 * printer decides what they are.
 */
export type Pigment = 'ink' | 'muted' | 'line' | 'wash' | 'sheet' | 'verdigris' | 'minium' | 'ochre';

export interface Stroke {
  pigment: Pigment;
  width: number;
  /** Lengths of dashes and gaps in turn; a full line without. */
  dash?: readonly number[];
  round?: boolean;
}

export type Mark =
  | { kind: 'line'; x1: number; y1: number; x2: number; y2: number; stroke: Stroke }
  /** `d` in SVG path syntax, of absolute M, L, C and Z only. */
  | { kind: 'path'; d: string; stroke?: Stroke; fill?: Pigment }
  | { kind: 'rect'; x: number; y: number; width: number; height: number; stroke?: Stroke; fill?: Pigment }
  | { kind: 'circle'; cx: number; cy: number; r: number; stroke?: Stroke; fill?: Pigment }
  /** `y` is the baseline. */
  | {
      kind: 'text';
      x: number;
      y: number;
      text: string;
      size: number;
      anchor: 'start' | 'middle' | 'end';
      pigment: Pigment;
      font: TextFont;
    };

export type TextFont = 'text' | 'text-strong' | 'figures' | 'symbol';

export interface Figure {
  width: number;
  height: number;
  marks: Mark[];
}

export interface Place {
  x: number;
  y: number;
}

/** A coordinate with the hundredths that a screen or printer can show. */
export function rounded(value: number): number {
  const hundredths = Math.round(value * 100) / 100;
  return hundredths === 0 ? 0 : hundredths;
}

/** SVG path through points, straight from each to the next; empty for fewer than two. */
export function polylinePath(points: readonly Place[]): string {
  if (points.length < 2) return '';
  return points.map(({ x, y }, index) => `${index === 0 ? 'M' : 'L'}${rounded(x)} ${rounded(y)}`).join('');
}
