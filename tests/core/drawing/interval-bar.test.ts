import { type IntervalBarValues, intervalBar, sharedScale, shareOfReference } from '@strandnote/core/drawing';
import { expect, test } from 'vitest';

const stay: IntervalBarValues = {
  zone: 'within',
  tension: 3_520_000,
  interval: [3_410_000, 3_630_000],
  bracket: { hinged: 3_600_000, clamped: 3_480_000 },
  lowerLimit: 3_325_000,
  upperLimit: 3_675_000,
  reference: 3_500_000,
  lastSurvey: 3_560_000,
};
const size = { width: 600, height: 50 };
const scale = { from: 3_200_000, to: 3_800_000 };
const x = (tension: number) => (tension - scale.from) / 1000;

test('every part of the bar lies at its value on the scale', () => {
  const { marks } = intervalBar(stay, scale, size);
  const rects = marks.filter((mark) => mark.kind === 'rect');
  expect(rects[0]).toMatchObject({ fill: 'wash', x: x(3_325_000), width: 350 });
  expect(rects[1]).toMatchObject({ fill: 'ink', x: x(3_410_000), width: 220 });
  expect(marks).toContainEqual(expect.objectContaining({ kind: 'line', x1: x(3_520_000), stroke: { pigment: 'ink', width: 3 } }));
  expect(marks).toContainEqual(
    expect.objectContaining({ kind: 'line', x1: x(3_500_000), stroke: expect.objectContaining({ dash: [3, 2] }) }),
  );
  expect(marks).toContainEqual(expect.objectContaining({ kind: 'circle', cx: x(3_560_000), fill: 'sheet' }));
  expect(marks).toContainEqual(expect.objectContaining({ kind: 'line', x1: x(3_480_000), x2: x(3_600_000), y1: 41, y2: 41 }));
});

test('without an agreed limit there is no band, and with one limit the band is open to the other side', () => {
  const band = (values: IntervalBarValues) =>
    intervalBar(values, scale, size).marks.find((mark) => mark.kind === 'rect' && mark.fill === 'wash');
  expect(band({ ...stay, lowerLimit: null, upperLimit: null })).toBeUndefined();
  expect(band({ ...stay, lowerLimit: null })).toMatchObject({ x: 0, width: x(3_675_000) });
});

test('where only bounds are given the bar is hollow and shows no best value', () => {
  const { marks } = intervalBar({ ...stay, zone: 'bounds-only' }, scale, size);
  expect(marks.some((mark) => mark.kind === 'line' && mark.stroke.width === 3)).toBe(false);
  const bar = marks.filter((mark) => mark.kind === 'rect')[1];
  expect(bar).toMatchObject({ stroke: { pigment: 'muted' } });
  expect(bar).not.toHaveProperty('fill');
});

test('a cable that was not measured shows its limits and reference alone', () => {
  const { marks } = intervalBar(
    { ...stay, zone: 'not-measured', tension: null, interval: null, bracket: null, lastSurvey: null },
    scale,
    size,
  );
  expect(marks.filter((mark) => mark.kind === 'rect')).toHaveLength(1);
  expect(marks.some((mark) => mark.kind === 'circle')).toBe(false);
});

test('what lies beyond the scale ends at its edge in an arrowhead', () => {
  const { marks } = intervalBar({ ...stay, zone: 'outside', tension: 3_905_000, interval: [3_785_000, 4_025_000] }, scale, size);
  expect(marks).toContainEqual(expect.objectContaining({ kind: 'rect', fill: 'minium', x: 585, width: 15 }));
  expect(marks).toContainEqual(expect.objectContaining({ kind: 'path', fill: 'minium' }));
});

test('the scale of a column holds all that is drawn in it', () => {
  const other = { ...stay, interval: [2_900_000, 3_100_000] as const, lastSurvey: 4_000_000 };
  const shared = sharedScale([stay, other]);
  expect(shared.from).toBeLessThan(2_900_000);
  expect(shared.to).toBeGreaterThan(4_000_000);
  expect(sharedScale([])).toEqual({ from: 0, to: 1 });
  const lone = sharedScale([{ zone: 'within', tension: 5, interval: null }]);
  expect(lone.to).toBeGreaterThan(lone.from);
});

test('as shares of the reference, cables of different tension share a scale', () => {
  expect(shareOfReference(stay)).toMatchObject({ tension: 3_520_000 / 3_500_000, reference: 1, lowerLimit: 0.95, upperLimit: 1.05 });
  expect(shareOfReference({ ...stay, reference: null })).toBeNull();
});
