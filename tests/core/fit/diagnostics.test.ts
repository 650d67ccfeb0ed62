import { type Cable, estimateTension, naturalFrequencies } from '@strandnote/core';
import { expect, test } from 'vitest';

const told: Cable = {
  length: 100,
  massPerLength: 60,
  bendingStiffnessBounds: [1e5, 8e5],
  axialStiffness: 1.5e9,
  inclination: 0.3,
  relativeUncertainty: { length: 0.003, massPerLength: 0.01 },
};
function estimateOf(change: Partial<Cable>, tension: number, bendingStiffness: number, options = {}, count = 8) {
  const cable = { ...told, ...change };
  const frequencies = naturalFrequencies({ ...cable, ends: ['clamped', 'clamped'] }, { tension, bendingStiffness }, count);
  const peaks = frequencies.map((frequency, i) => ({ mode: i + 1, frequency, standardUncertainty: 0.001 * frequency }));
  return estimateTension(cable, peaks, options);
}
const codes = (notes: { code: string }[]) => notes.map(({ code }) => code);

test('an ordinary stay carries no warning', () => {
  expect(codes(estimateOf({}, 3e6, 3e5).warnings)).toEqual([]);
});

test('says when sag matters, when bending dominates and what kind of cable it is', () => {
  expect(codes(estimateOf({}, 1e6, 3e5).diagnostics)).toContain('sag-matters');
  const short = estimateOf({ length: 5 }, 3e6, 3e5, {}, 6);
  expect(codes(short.warnings)).toContain('bending-dominates');
  expect(short.diagnostics.find(({ code }) => code === 'kind-of-cable')!.message).toContain('beam');
});

test('names the modes that the sensor could not hear', () => {
  const note = estimateOf({}, 3e6, 3e5, { sensorPosition: 50 }).warnings.find(({ code }) => code === 'sensor-blind');
  expect(note?.message).toContain('mode 2, 4, 6, 8');
});

test('says when the frequencies press bending stiffness against its bounds', () => {
  const outside = estimateOf({ length: 20, bendingStiffnessBounds: [1e4, 1e5] }, 3e6, 1.5e5);
  expect(codes(outside.warnings)).toContain('bending-stiffness-at-bound');
});

test('says what to measure next when one source decides the interval', () => {
  const heavy = estimateOf({ relativeUncertainty: { length: 0.001, massPerLength: 0.05 } }, 3e6, 3e5);
  expect(heavy.diagnostics.find(({ code }) => code === 'interval-dominated')!.message).toContain('weigh');
  expect(heavy.budget[0]!.source).toBe('mass');
});
