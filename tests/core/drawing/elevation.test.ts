import { cablePlanes, type ElevationCable, elevation } from '@strandnote/core/drawing';
import { expect, test } from 'vitest';

const deck = [
  { x: 0, z: 10 },
  { x: 200, z: 10 },
];
const supports = [
  [
    { x: 100, z: 0 },
    { x: 100, z: 60 },
  ],
];

function stay(id: string, x: number, zone: ElevationCable['zone']): ElevationCable {
  return { id, reference: id, lower: { x, z: 10 }, upper: { x: 100, z: 50 }, zone };
}

test('the structure fills the width at one scale along and up', () => {
  const { height, lines } = elevation({ deck, supports, cables: [stay('W-01', 20, 'within')] }, { width: 424, maxHeight: 300 });
  // 400 units for 200 m: two a metre, so 60 m take 120 and the margins 24.
  expect(height).toBeCloseTo(144, 6);
  expect(lines[0]).toMatchObject({ x1: 12 + 40, y1: 12 + 100, x2: 12 + 200, y2: 12 + 20 });
});

test('a high structure is held by the largest height and stands in the middle', () => {
  const { height, lines } = elevation({ deck, supports, cables: [stay('W-01', 100, 'within')] }, { width: 424, maxHeight: 84 });
  expect(height).toBeCloseTo(84, 6);
  expect(lines[0]!.x2).toBeCloseTo(212, 6);
});

test('each zone has a form of its own', () => {
  const zones = ['within', 'within-not-proven', 'outside-not-proven', 'outside', 'no-limit-agreed'] as const;
  const forms = zones.map((zone) => {
    const { marks } = elevation({ deck: [], supports: [], cables: [stay('a', 20, zone)] }, { width: 400, maxHeight: 300 });
    const line = marks.find((mark) => mark.kind === 'line');
    const sign = marks.find((mark) => mark.kind === 'text');
    if (line?.kind !== 'line') throw new Error('no line');
    return JSON.stringify([line.stroke.width, line.stroke.dash ?? null, sign?.kind === 'text' ? sign.text : null]);
  });
  expect(new Set(forms).size).toBe(zones.length);
});

test('signs do not cover each other, even where cables lie side by side', () => {
  const cables = [20, 22, 24].map((x) => stay(`W-${x}`, x, 'outside'));
  const { marks } = elevation({ deck, supports, cables }, { width: 900, maxHeight: 300 });
  const boxes = marks.filter((mark) => mark.kind === 'rect');
  expect(boxes).toHaveLength(3);
  for (const [index, a] of boxes.entries()) {
    for (const b of boxes.slice(index + 1)) {
      expect(Math.abs(a.x - b.x) >= 18 || Math.abs(a.y - b.y) >= 18).toBe(true);
    }
  }
});

test('cables that need a look are drawn over the others', () => {
  const { marks } = elevation(
    { deck, supports, cables: [stay('a', 20, 'outside'), stay('b', 40, 'within')] },
    { width: 400, maxHeight: 300 },
  );
  expect(marks.filter((mark) => mark.kind === 'line').at(-1)).toMatchObject({ stroke: { pigment: 'minium' } });
});

test('nothing to draw is an empty sheet', () => {
  expect(elevation({ deck: [], supports: [], cables: [] }, { width: 400, maxHeight: 300 })).toMatchObject({ height: 0, marks: [] });
});

test('cables are parted into the planes in which they hang', () => {
  const cables = [-9.5, 9.5, -9.4, 9.6].map((y, id) => ({ id, y }));
  const planes = cablePlanes(cables);
  expect(planes.map((plane) => plane.cables.map(({ id }) => id))).toEqual([
    [0, 2],
    [1, 3],
  ]);
  expect(planes[0]!.y).toBeCloseTo(-9.45, 9);
  expect(cablePlanes([])).toEqual([]);
});
