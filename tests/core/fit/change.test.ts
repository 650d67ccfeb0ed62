import { naturalFrequencies, tensionChange } from '@strandnote/core';
import { expect, test } from 'vitest';

const cable = { length: 100, massPerLength: 60 };
const exactEnds = ['clamped', 'clamped'] as ['clamped', 'clamped'];

function peaksAt(tension: number, bendingStiffness: number) {
  return naturalFrequencies({ ...cable, ends: exactEnds }, { tension, bendingStiffness }, 8).map((frequency, i) => ({
    mode: i + 1,
    frequency,
    standardUncertainty: 0.002 * frequency,
  }));
}

test.each([20, 50, 120, 300])('a change of 10 %% is found at ξ = %d, where the rule of frequencies alone is biased', (xi) => {
  const tension = 3e6;
  const bendingStiffness = (tension * cable.length ** 2) / xi ** 2;
  const before = peaksAt(tension, bendingStiffness);
  const after = peaksAt(1.1 * tension, bendingStiffness);
  const known = { ...cable, bendingStiffness, relativeUncertainty: { bendingStiffness: 0.2, length: 0.003, massPerLength: 0.02 } };
  const result = tensionChange(known, before, after, { betweenCampaigns: 0 });
  expect(Math.abs(result.change - 0.1)).toBeLessThan(0.004);
  expect(result.interval95[0]).toBeLessThan(0.1);
  expect(result.interval95[1]).toBeGreaterThan(0.1);
  // The joint fit at 8 modes of 0.2 % knows the change to a few tenths of a per cent, whatever mass and length.
  expect(result.standardUncertainty).toBeLessThan(0.006);
  const rule = (after[0]!.frequency / before[0]!.frequency) ** 2 - 1;
  if (xi <= 50) expect(Math.abs(result.change - 0.1)).toBeLessThan(Math.abs(rule - 0.1) / 2);
});

test('two equal surveys show no change, and the between-campaign term sets what could have been seen', () => {
  const peaks = peaksAt(2e6, 1e5);
  const known = { ...cable, bendingStiffness: 1e5, relativeUncertainty: { bendingStiffness: 0.3 } };
  const result = tensionChange(known, peaks, peaks);
  expect(Math.abs(result.change)).toBeLessThan(1e-9);
  expect(result.significant).toBe(false);
  expect(result.standardUncertainty).toBeGreaterThan(0.01);
  expect(result.smallestDetectable).toBeGreaterThan(3.6 * 0.01);
});

test('names the field of the second campaign when its peaks are wrong', () => {
  const peaks = peaksAt(2e6, 1e5);
  expect(() => tensionChange(cable, peaks, [])).toThrow(expect.objectContaining({ code: 'no-peaks', field: 'after.peaks' }));
});
