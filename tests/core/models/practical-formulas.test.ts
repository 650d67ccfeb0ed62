import { naturalFrequencies, practicalFormulas } from '@strandnote/core';
import { expect, test } from 'vitest';

const cable = { length: 1, massPerLength: 1, bendingStiffness: 1 };
function answers(xi: number) {
  const frequencies = naturalFrequencies(
    { length: 1, massPerLength: 1, ends: ['clamped', 'clamped'] },
    { tension: xi ** 2, bendingStiffness: 1 },
    4,
  );
  const rows = practicalFormulas(
    cable,
    frequencies.map((frequency, i) => ({ mode: i + 1, frequency })),
  );
  return Object.fromEntries(rows.map(({ id, tension }) => [id, tension / xi ** 2]));
}

// Zui, Shinke & Namita 1996, mode 1 over the exact clamped tension (memory, confirmed against the exact solution).
test.each([
  [10, 1.009],
  [30, 1.0],
  [100, 0.997],
  [400, 0.999],
])('at ξ = %d the formula of Zui for mode 1 gives %d of the exact tension', (xi, ratio) => {
  expect(Math.abs(answers(xi)['zui-1']! - ratio)).toBeLessThan(1.5e-3);
});

test('at ξ = 20 the formula of Zui lies between 1.012 and 1.018 of the exact tension', () => {
  expect(answers(20)['zui-1']!).toBeGreaterThan(1.011);
  expect(answers(20)['zui-1']!).toBeLessThan(1.019);
});

test('the formula of Ren stays within five per cent from beam-like to slender', () => {
  // Ren, Chen & Hu 2005 (memory): three branches for clamped ends.
  for (const xi of [15, 40, 100, 200]) expect(Math.abs(answers(xi).ren! - 1)).toBeLessThan(0.05);
});

test('says when a cable lies outside the range of the branch', () => {
  const rows = practicalFormulas(cable, [{ mode: 4, frequency: 40 }]);
  expect(rows.find(({ id }) => id === 'zui-high')?.note).toContain('outside which this cable lies');
});
