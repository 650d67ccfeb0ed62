import { expect, test } from 'vitest';
import { tensionAtMeanChord } from '../../../apps/api/src/reports/mean-chord.ts';

test('brings an end force to the mean chord by half the weight that hangs between the ends', () => {
  // 60 kg/m over a rise of 50 m: 60 · 9.80665 · 50 / 2 = 14 709.975 N.
  expect(tensionAtMeanChord(2e6, 'upper-end', 60, 50)).toBeCloseTo(2e6 - 14709.975, 6);
  expect(tensionAtMeanChord(2e6, 'lower-end', 60, 50)).toBeCloseTo(2e6 + 14709.975, 6);
  expect(tensionAtMeanChord(2e6, 'mean-chord', 60, 50)).toBe(2e6);
});
