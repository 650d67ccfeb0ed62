import type { Mark } from './figure.ts';
import { linearScale, roundTicks, tickLabel } from './linear-scale.ts';

export interface PlotSize {
  width: number;
  height: number;
}

export interface PlotFrame {
  x: (value: number) => number;
  y: (value: number) => number;
  /** Axes, ticks and their labels; drawn under the data. */
  marks: Mark[];
}

interface FrameInput {
  size: PlotSize;
  xDomain: readonly [number, number];
  yDomain: readonly [number, number];
  /** Ticks of the x axis with their words. */
  xTicks: readonly { at: number; label: string }[];
  xTitle: string;
  yTitle: string;
}

const labelSize = 12;
const left = 58;
const right = 10;
const top = 24;
const bottom = 38;

/** Axes of a plot: round ticks up, given ticks along, hairlines across, titles at the ends where they are read. */
export function plotFrame({ size, xDomain, yDomain, xTicks, xTitle, yTitle }: FrameInput): PlotFrame {
  const x = linearScale(xDomain, [left, size.width - right]);
  const y = linearScale(yDomain, [size.height - bottom, top]);
  const yTicks = roundTicks(yDomain[0], yDomain[1], 4);
  const step = yTicks.length > 1 ? yTicks[1]! - yTicks[0]! : 1;
  const words = { kind: 'text', size: labelSize, pigment: 'muted' } as const;
  const grid = yTicks.flatMap((tick): Mark[] => [
    { kind: 'line', x1: left, x2: size.width - right, y1: y(tick), y2: y(tick), stroke: { pigment: 'line', width: 0.8 } },
    { ...words, font: 'figures', x: left - 6, y: y(tick) + 4, text: tickLabel(tick, step), anchor: 'end' },
  ]);
  const foot = size.height - bottom;
  const ruler = xTicks.flatMap((tick): Mark[] => [
    { kind: 'line', x1: x(tick.at), x2: x(tick.at), y1: foot, y2: foot + 4, stroke: { pigment: 'ink', width: 1 } },
    { ...words, font: 'figures', x: x(tick.at), y: foot + 17, text: tick.label, anchor: 'middle' },
  ]);
  const marks: Mark[] = [
    ...grid,
    { kind: 'line', x1: left, x2: size.width - right, y1: foot, y2: foot, stroke: { pigment: 'ink', width: 1 } },
    ...ruler,
    { ...words, font: 'text', x: 0, y: labelSize, text: yTitle, anchor: 'start' },
    { ...words, font: 'text', x: size.width - right, y: size.height - 4, text: xTitle, anchor: 'end' },
  ];
  return { x, y, marks };
}

/** Labels that do not run into each other: every tick while there is room, then only some of them. */
export function thinned<Tick>(ticks: readonly Tick[], width: number, perLabel = 26): Tick[] {
  const every = Math.max(1, Math.ceil((ticks.length * perLabel) / Math.max(1, width - left - right)));
  return ticks.filter((_, index) => index % every === 0);
}
