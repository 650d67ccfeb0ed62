import { canBeProven, decide, tensionAt } from '@strandnote/core';
import { expect, test } from 'vitest';

const estimate = (tension: number, interval95: [number, number]) => ({ tension, interval95, boundsOnly: null });
const question = { estimate: estimate(1e6, [0.98e6, 1.02e6]), lowerLimit: 0.95e6, upperLimit: 1.05e6, reference: 1e6, notComparable: null };

test.each([
  [1e6, [0.98e6, 1.02e6], 'within', 'within', 'within'],
  [1.04e6, [1.0e6, 1.08e6], 'within', 'within-not-proven', 'within-not-proven'],
  [1.06e6, [1.02e6, 1.1e6], 'within', 'outside-not-proven', 'outside-not-proven'],
  [1.2e6, [1.1e6, 1.3e6], 'within', 'outside', 'outside'],
  [0.8e6, [0.7e6, 0.9e6], 'outside', 'within', 'outside'],
  [0.94e6, [0.9e6, 0.98e6], 'outside-not-proven', 'within', 'outside-not-proven'],
] as const)('%d N lies in the zone of its whole interval (%#)', (tension, interval, lower, upper, zone) => {
  expect(decide({ ...question, estimate: estimate(tension, [...interval]) })).toMatchObject({ lower, upper, zone });
});

test('without a limit, an estimate or a comparable reference there is no zone, and the reason is given', () => {
  expect(decide({ ...question, lowerLimit: null, upperLimit: null })).toMatchObject({ zone: 'no-limit-agreed', toReference: 0 });
  expect(decide({ ...question, estimate: null }).zone).toBe('not-measured');
  expect(decide({ ...question, notComparable: 'Other stage.' })).toMatchObject({
    zone: 'not-comparable',
    reason: 'Other stage.',
    toReference: null,
  });
  expect(decide({ ...question, estimate: { ...question.estimate, boundsOnly: 'Too wide.' } })).toMatchObject({
    zone: 'bounds-only',
    reason: 'Too wide.',
  });
});

test('a tension is brought from the mean chord to either end by half the weight of the rise', () => {
  const cable = { massPerLength: 60, rise: 50 };
  const half = (60 * 9.80665 * 50) / 2;
  expect(tensionAt(1e6, 'mean-chord', 'upper-end', cable)).toBeCloseTo(1e6 + half, 6);
  expect(tensionAt(1e6, 'upper-end', 'lower-end', cable)).toBeCloseTo(1e6 - 2 * half, 6);
  expect(tensionAt(tensionAt(1e6, 'lower-end', 'mean-chord', cable), 'mean-chord', 'lower-end', cable)).toBeCloseTo(1e6, 6);
});

test('limits closer than the whole interval can never be proven', () => {
  expect(canBeProven(30e3, 0.98e6, 1.02e6)).toBe(false);
  expect(canBeProven(15e3, 0.98e6, 1.02e6)).toBe(true);
  expect(canBeProven(1e9, null, 1e6)).toBe(true);
});
