import { linearScale, roundStep, roundTicks, tickLabel } from '@strandnote/core/drawing';
import fc from 'fast-check';
import { expect, test } from 'vitest';

test('a scale maps its bounds to its ends and all between in proportion', () => {
  const scale = linearScale([10, 20], [0, 100]);
  expect([scale(10), scale(15), scale(20)]).toEqual([0, 50, 100]);
});

test('bounds that are alike still give a finite map', () => {
  expect(linearScale([7, 7], [0, 100])(7)).toBe(50);
});

test('ticks are round values within the bounds', () => {
  expect(roundTicks(0, 1, 4)).toEqual([0, 0.5, 1]);
  expect(roundTicks(-0.35, 0.35, 4)).toEqual([-0.2, 0, 0.2]);
  expect(roundTicks(3, 3, 4)).toEqual([]);
});

test('ticks stay within their bounds, ascend, and are never many', () => {
  fc.assert(
    fc.property(fc.double({ min: -1e6, max: 1e6, noNaN: true }), fc.double({ min: 1e-3, max: 1e6, noNaN: true }), (from, width) => {
      const ticks = roundTicks(from, from + width, 4);
      expect(ticks.length).toBeLessThanOrEqual(6);
      for (const [index, tick] of ticks.entries()) {
        expect(tick).toBeGreaterThanOrEqual(from - width * 1e-6);
        expect(tick).toBeLessThanOrEqual(from + width * (1 + 1e-6));
        if (index > 0) expect(tick).toBeGreaterThan(ticks[index - 1]!);
      }
    }),
  );
});

test('steps are 1, 2 or 5 times a power of ten, and not smaller than asked', () => {
  expect([0.03, 1, 1.1, 4, 7].map(roundStep)).toEqual([0.05, 1, 2, 5, 10].map((step) => expect.closeTo(step, 12)));
});

test('a label has the digits of its step and a real minus sign', () => {
  expect(tickLabel(-0.5, 0.5)).toBe('\u22120.5');
  expect(tickLabel(1.5, 0.02)).toBe('1.50');
  expect(tickLabel(2000, 500)).toBe('2000');
});
