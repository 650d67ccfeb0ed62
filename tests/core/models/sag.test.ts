import { naturalFrequencies, sagExtensibility } from '@strandnote/core';
import { expect, test } from 'vitest';

function expectRelative(actual: number, expected: number, tolerance: number) {
  expect(Math.abs(actual / expected - 1)).toBeLessThan(tolerance);
}

/** Frequencies over that of the taut string, for a level string of the λ² wanted. */
function stringRatios(lambdaSquared: number, count: number): number[] {
  const cable = { length: 100, massPerLength: 1000, inclination: 0, ends: ['hinged', 'hinged'] as ['hinged', 'hinged'] };
  const tension = 1e6;
  const unit = sagExtensibility({ ...cable, axialStiffness: 1 }, tension);
  const fundamental = Math.sqrt(tension / 1000) / 200;
  const axialStiffness = lambdaSquared / unit;
  return naturalFrequencies({ ...cable, axialStiffness }, { tension, bendingStiffness: 0 }, count).map((f) => f / fundamental);
}

// Symmetric in-plane modes of a string: Irvine & Caughey 1974, computed from their frequency equation.
test.each([
  [0.1, [1.00409745, 3.00015224]],
  [1, [1.04020049, 3.00153582]],
  [10, [1.34512451, 3.01682545]],
  [50.7, [2.17235945, 3.13851325]],
])('a string of λ² = %d has the symmetric modes of Irvine and Caughey', (lambdaSquared, expected) => {
  const symmetric = stringRatios(lambdaSquared, 4).filter((ratio) => Math.abs(ratio - 2) > 1e-9 && Math.abs(ratio - 4) > 1e-9);
  expected.forEach((value, i) => {
    expectRelative(symmetric[i]!, value, 1e-8);
  });
});

test('the first symmetric mode meets the first antisymmetric one at λ² = 4π², and mode 3 reaches 4 at 16π²', () => {
  // Irvine & Caughey 1974: exact crossovers.
  expectRelative(stringRatios(4 * Math.PI ** 2, 2)[0]!, 2, 1e-9);
  expectRelative(stringRatios(4 * Math.PI ** 2, 2)[1]!, 2, 1e-9);
  expectRelative(stringRatios(16 * Math.PI ** 2, 4)[2]!, 4, 1e-9);
});

test('an inextensible string sags into the limit of Irvine and Caughey', () => {
  expectRelative(stringRatios(1e9, 2)[1]!, 2.86059331, 1e-7);
});

// Mehrabi & Tabatabai 1998 (J. Struct. Eng. 124:1313): parameters from memory, frequencies computed, clamped, in-plane.
const cables = [
  { H: 2.9036e6, E: 1.5988e10, A: 7.8507e-3, I: 4.9535e-6, expected: [0.44085, 0.85487, 1.2829] },
  { H: 0.7259e6, E: 1.7186e10, A: 7.611e-3, I: 4.6097e-6, expected: [0.42893, 0.46283, 0.67229] },
  { H: 26.13254e6, E: 2.0826e13, A: 7.8633e-3, I: 4.9204e-6, expected: [1.39991, 2.68211, 4.06419] },
];
test.each(cables)(
  'a sagging stiff cable of H = $H N has the frequencies computed for Mehrabi and Tabatabai',
  ({ H, E, A, I, expected }) => {
    const cable = {
      length: 100,
      massPerLength: 400,
      axialStiffness: E * A,
      inclination: 0,
      ends: ['clamped', 'clamped'] as ['clamped', 'clamped'],
    };
    const found = naturalFrequencies(cable, { tension: H, bendingStiffness: E * I, gravity: 9.8 }, 3);
    expected.forEach((value, i) => {
      expect(Math.abs(found[i]! - value)).toBeLessThan(6e-6);
    });
  },
);

test('out of its plane a cable knows no sag', () => {
  const cable = { length: 100, massPerLength: 400, inclination: 0, ends: ['clamped', 'hinged'] as ['clamped', 'hinged'] };
  const state = { tension: 1e6, bendingStiffness: 1e5 };
  expect(naturalFrequencies({ ...cable, axialStiffness: 1e8 }, { ...state, plane: 'out-of-plane' }, 6)).toEqual(
    naturalFrequencies(cable, state, 6),
  );
});

test('sag fades with the axial stiffness', () => {
  const cable = { length: 100, massPerLength: 60, inclination: 0.3, ends: ['clamped', 'hinged'] as ['clamped', 'hinged'] };
  const state = { tension: 3e6, bendingStiffness: 2e5 };
  const without = naturalFrequencies(cable, state, 6);
  naturalFrequencies({ ...cable, axialStiffness: 1 }, state, 6).forEach((f, i) => {
    expectRelative(f, without[i]!, 1e-8);
  });
});
