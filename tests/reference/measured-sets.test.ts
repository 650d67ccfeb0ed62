import { estimateTension, naturalFrequencies } from '@strandnote/core';
import { expect, test } from 'vitest';

// J. Bono 2015, Natural frequencies of straw tubes, Mu2e-doc-6392 (printed): thin tubes, both ends glued, tension = hanging mass
// × 9.8 m/s²; mass per length 3.9608e-4 kg/m with the air, EI = 3.6(1.0)e-3 N·m².
const hangingMass = [0.101, 0.202, 0.302, 0.403, 0.499, 0.6, 0.701];
const firstFrequency: [number, number[]][] = [
  [1.168, [23.788, 32.49, 40.261, 46.051, 50.909, 54.499, 58.637]],
  [0.95, [30.84, 40.99, 49.2576, 56.31402, 62.04, 67.347, 72.5]],
  [0.6415, [49.667, 66.6, 78.053, 86.828, 94.511, 104.05, 112.352]],
  [0.4, [92.16, 120.43794, 137.5, 151.37616, 162.6, 174.6, 186.4]],
];
const ends = ['clamped', 'clamped'] as ['clamped', 'clamped'];
const tube = { massPerLength: 3.9608e-4, ends };

function mean(values: readonly number[]): number {
  return values.reduce((sum, value) => sum + value, 0) / values.length;
}
function sampleStandardDeviation(values: readonly number[]): number {
  const centre = mean(values);
  return Math.sqrt(values.reduce((sum, value) => sum + (value - centre) ** 2, 0) / (values.length - 1));
}

test('the tension of glued straw tubes under known weights is met on average within 3 %', () => {
  const ratios = firstFrequency.flatMap(([length, frequencies]) =>
    frequencies.map((frequency, i) => {
      const cable = {
        ...tube,
        length,
        bendingStiffness: 3.6e-3,
        relativeUncertainty: { length: 0.002, massPerLength: 0.01, bendingStiffness: 0.28 },
      };
      return estimateTension(cable, [{ mode: 1, frequency, standardUncertainty: 0.005 * frequency }]).tension / (9.8 * hangingMass[i]!);
    }),
  );
  expect(mean(ratios)).toBeGreaterThan(0.97);
  expect(mean(ratios)).toBeLessThan(1.03);
  expect(sampleStandardDeviation(ratios)).toBeLessThanOrEqual(0.05);
});

test('as taut strings the same tubes are over-read by 15 to 58 %', () => {
  const over = firstFrequency.map(([length, frequencies]) =>
    mean(frequencies.map((frequency, i) => (4 * tube.massPerLength * (length * frequency) ** 2) / (9.8 * hangingMass[i]!))),
  );
  expect(over[0]!).toBeCloseTo(1.15, 1);
  expect(over[3]!).toBeCloseTo(1.58, 1);
});

// Guitar strings, J. Woodhouse 2004, Acta Acustica 90 (memory): L = 0.65 m; T N, m g/m, EI 1e-6 N·m², f Hz.
test.each([
  [70.3, 0.38, 130, 329.6],
  [53.4, 0.52, 160, 246.9],
  [58.3, 0.9, 310, 196.0],
  [71.2, 1.95, 51, 146.8],
  [73.9, 3.61, 40, 110.0],
  [71.6, 6.24, 57, 82.4],
])('a guitar string of %d N sounds its note', (tension, gramsPerMetre, stiffness, frequency) => {
  const cable = { length: 0.65, massPerLength: 1e-3 * gramsPerMetre, ends: ['hinged', 'hinged'] as ['hinged', 'hinged'] };
  const [first] = naturalFrequencies(cable, { tension, bendingStiffness: 1e-6 * stiffness }, 1);
  expect(Math.abs(first! / frequency - 1)).toBeLessThan(4e-3);
});
