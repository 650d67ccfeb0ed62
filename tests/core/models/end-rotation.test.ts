import { naturalFrequencies } from '@strandnote/core';
import { expect, test } from 'vitest';

type Ends = NonNullable<Parameters<typeof naturalFrequencies>[0]['ends']>;

/** f_n over n/(2L)·√(T/m), at L = m = EI = 1. */
function ratios(ends: Ends, xi: number, count: number): number[] {
  return naturalFrequencies({ length: 1, massPerLength: 1, ends }, { tension: xi ** 2, bendingStiffness: 1 }, count).map(
    (frequency, index) => frequency / (((index + 1) / 2) * xi),
  );
}
function spring(stiffness: number): Ends {
  return [{ rotationalStiffness: stiffness }, { rotationalStiffness: stiffness }];
}
function expectRelative(actual: number[], expected: number[], tolerance: number) {
  expected.forEach((value, index) => {
    expect(Math.abs(actual[index]! / value - 1)).toBeLessThan(tolerance);
  });
}

// Ratios computed from the characteristic equations of Morse & Ingard 1968 and Blevins 1979 by root finding to 1e-13.
const rows: [string, Ends, number, number[]][] = [
  ['clamped', ['clamped', 'clamped'], 5, [1.80507851, 2.23926562, 2.77394739, 3.34724075, 3.9395231]],
  ['clamped', ['clamped', 'clamped'], 10, [1.30485284, 1.45251662, 1.65940772, 1.90104256, 2.16368586]],
  ['clamped', ['clamped', 'clamped'], 50, [1.04374036, 1.04993232, 1.06015739, 1.07428067, 1.09212672]],
  ['clamped', ['clamped', 'clamped'], 200, [1.01022601, 1.0106009, 1.01122541, 1.01209904, 1.01322111]],
  ['hinged–clamped', ['hinged', 'clamped'], 10, [1.16445131, 1.30755711, 1.50982218, 1.7481247, 2.00858389]],
  ['hinged–clamped', ['hinged', 'clamped'], 100, [1.0106009, 1.01209904, 1.01459077, 1.01806849, 1.02252166]],
  ['springs kL/EI = 1', spring(1), 10, [1.06594765, 1.19696526, 1.38801996, 1.61795435]],
  ['springs kL/EI = 10', spring(10), 10, [1.15767311, 1.28577746, 1.47157623, 1.69497589]],
  ['springs kL/EI = 100', spring(100), 50, [1.02940099, 1.03538547, 1.04527259, 1.05893832]],
];
test.each(rows)('%s ends match the exact characteristic equation (row %#)', (_name, ends, xi, expected) => {
  expectRelative(ratios(ends, xi, expected.length), expected, 1e-8);
});

test('clamped ends at ξ = 1000 match the exact characteristic equation', () => {
  // Computed from the characteristic equation (Morse & Ingard 1968), given to six decimals.
  expectRelative(ratios(['clamped', 'clamped'], 1000, 5), [1.002009, 1.002024, 1.002049, 1.002083, 1.002128], 5e-7);
});

test('without tension the cable is a beam', () => {
  // Blevins 1979; Young & Felgar 1949 (printed).
  const beam = (ends: Ends, count: number) =>
    naturalFrequencies({ length: 1, massPerLength: 1, ends }, { tension: 0, bendingStiffness: 1 }, count).map((f) =>
      Math.sqrt(2 * Math.PI * f),
    );
  expectRelative(beam(['clamped', 'clamped'], 4), [4.730040744862704, 7.853204624095838, 10.99560783800167, 14.13716549125746], 1e-13);
  expectRelative(beam(['hinged', 'clamped'], 3), [3.926602312047919, 7.06858275, 10.21017612], 1e-9);
  expectRelative(beam(['hinged', 'hinged'], 3), [Math.PI, 2 * Math.PI, 3 * Math.PI], 1e-14);
});

test('a clamped steel beam matches printed frequencies', () => {
  // Lalanne, Berthier & Der Hagopian 1980 (printed, transcription).
  const [b, h, e, density] = [0.4, 0.5, 2e11, 7800];
  const frequencies = naturalFrequencies(
    { length: 10, massPerLength: density * b * h, ends: ['clamped', 'clamped'] },
    { tension: 0, bendingStiffness: (e * b * h ** 3) / 12 },
    4,
  );
  expectRelative(frequencies, [26.025373, 71.739944, 140.638973, 232.483361], 1e-4);
});

test('a hinged–clamped mode n at ξ is the clamped mode 2n at 2ξ', () => {
  for (const xi of [3, 8, 30, 120]) {
    const clamped = ratios(['clamped', 'clamped'], 2 * xi, 10);
    expectRelative(
      ratios(['hinged', 'clamped'], xi, 5),
      [1, 3, 5, 7, 9].map((i) => clamped[i]!),
      1e-12,
    );
  }
});

test('large ξ follows the expansion for clamped ends', () => {
  // Morse 1936 (memory): 1 + 2/ξ + (4 + n²π²/2)/ξ²; the next term is of order 100/ξ³.
  const xi = 1000;
  expectRelative(
    ratios(['clamped', 'clamped'], xi, 3),
    [1, 2, 3].map((n) => 1 + 2 / xi + (4 + (n ** 2 * Math.PI ** 2) / 2) / xi ** 2),
    200 / xi ** 3,
  );
});

test('refuses to predict frequencies for ends that are not known', () => {
  expect(() => naturalFrequencies({ length: 50, massPerLength: 60 }, { tension: 1e6, bendingStiffness: 1e5 }, 3)).toThrow(
    expect.objectContaining({ code: 'ends-unknown', field: 'ends[0]' }),
  );
});
