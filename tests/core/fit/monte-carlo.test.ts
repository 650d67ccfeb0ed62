import { type Cable, estimateTension, monteCarloTension, naturalFrequencies } from '@strandnote/core';
import { expect, test } from 'vitest';
import { seededRandom } from '../seeded-random.ts';

const cable: Cable = {
  length: 90,
  massPerLength: 55,
  bendingStiffness: 2e5,
  relativeUncertainty: { length: 0.003, massPerLength: 0.015, bendingStiffness: 0.1 },
};
const peaks = naturalFrequencies({ ...cable, ends: ['clamped', 'clamped'] }, { tension: 2.4e6, bendingStiffness: 2e5 }, 7).map(
  (frequency, i) => ({
    mode: i + 1,
    frequency,
    standardUncertainty: 0.002 * frequency,
  }),
);

test.each([
  ['known', { ...cable, ends: ['clamped', 'clamped'] } as Cable],
  ['unknown', cable],
])('drawn inputs spread the tension as the budget says, with %s ends (JCGM 101:2008)', (_name, told) => {
  const estimate = estimateTension(told, peaks);
  const drawn = monteCarloTension(told, peaks, seededRandom(8).uniform, 1500);
  expect(drawn.draws).toBe(1500);
  expect(Math.abs(drawn.standardUncertainty / estimate.standardUncertainty - 1)).toBeLessThan(0.1);
  expect(Math.abs(drawn.tension / estimate.tension - 1)).toBeLessThan(0.003);
});

test('the same seed gives the same draws', () => {
  expect(monteCarloTension(cable, peaks, seededRandom(3).uniform, 50)).toEqual(
    monteCarloTension(cable, peaks, seededRandom(3).uniform, 50),
  );
});
