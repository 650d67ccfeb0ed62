import { heardShare, stringFigure } from '@strandnote/core/drawing';
import { expect, test } from 'vitest';

function endsOf(d: string): { x: number; y: number }[] {
  const start = d.match(/^M([\d.-]+) ([\d.-]+)/)!;
  const pieces = [...d.matchAll(/C[\d.-]+ [\d.-]+ [\d.-]+ [\d.-]+ ([\d.-]+) ([\d.-]+)/g)];
  return [start, ...pieces].map((match) => ({ x: Number(match[1]), y: Number(match[2]) }));
}

function solidWave(mode: number) {
  const { marks } = stringFigure({ mode, width: 140, height: 30 });
  const path = marks.find((mark) => mark.kind === 'path' && mark.stroke?.dash === undefined);
  if (path?.kind !== 'path') throw new Error('no wave');
  return endsOf(path.d);
}

test.each([1, 2, 3, 6])('mode %i starts and ends at rest at the anchors and crosses the line at rest n − 1 times', (mode) => {
  const points = solidWave(mode);
  expect(points[0]!.y).toBeCloseTo(15, 6);
  expect(points.at(-1)!.y).toBeCloseTo(15, 1);
  const inner = points.slice(1, -1).filter(({ y }) => Math.abs(y - 15) < 1e-6);
  expect(inner).toHaveLength(mode - 1);
});

test('the wave stays within a thousandth of its height from the sine', () => {
  const { marks } = stringFigure({ mode: 1, width: 1000, height: 1000, lineWidth: 0 });
  const path = marks.findLast((mark) => mark.kind === 'path');
  if (path?.kind !== 'path') throw new Error('no wave');
  const numbers = path.d.match(/-?[\d.]+/g)!.map(Number);
  // Middle of the first cubic piece, by Bernstein's weights at one half.
  const at = (axis: number) => (numbers[axis]! + 3 * numbers[2 + axis]! + 3 * numbers[4 + axis]! + numbers[6 + axis]!) / 8;
  expect(Math.abs(at(1) - (500 - 400 * Math.sin((Math.PI * at(0)) / 1000)))).toBeLessThan(1);
});

test('the half-period later is drawn dashed and mirrored', () => {
  const { marks } = stringFigure({ mode: 2, width: 140, height: 30 });
  const waves = marks
    .filter((mark) => mark.kind === 'path')
    .map((mark) => ({ dashed: mark.stroke?.dash !== undefined, points: endsOf(mark.d) }));
  const [dashed, solid] = [waves.find((wave) => wave.dashed)!, waves.find((wave) => !wave.dashed)!];
  for (const [index, point] of solid.points.entries()) expect(point.y + dashed.points[index]!.y).toBeCloseTo(30, 1);
});

test('the sensor stands on the line at rest at its share of the free length, and not outside it', () => {
  const dot = (sensor: number | null) =>
    stringFigure({ mode: 1, sensor, width: 203, height: 30, lineWidth: 1 }).marks.find((mark) => mark.kind === 'circle');
  expect(dot(0.25)).toMatchObject({ cx: 1.5 + 50, cy: 15, fill: 'minium' });
  expect(dot(null)).toBeUndefined();
  expect(dot(1.2)).toBeUndefined();
});

test('a sensor at a node hears nothing and one at a crest hears all of a mode', () => {
  expect(heardShare(2, 0.5)).toBeCloseTo(0, 12);
  expect(heardShare(2, 0.25)).toBeCloseTo(1, 12);
  // A sensor 3 m up a stay of 100 m hears mode 1 at 9 % of its amplitude.
  expect(heardShare(1, 0.03)).toBeCloseTo(0.094, 3);
});
