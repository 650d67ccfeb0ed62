import { naturalFrequencies } from '@strandnote/core';
import { expect, test } from 'vitest';

const hinged = ['hinged', 'hinged'] as ['hinged', 'hinged'];
function expectRelative(actual: number[], expected: number[], tolerance: number) {
  expected.forEach((value, i) => {
    expect(Math.abs(actual[i]! / value - 1)).toBeLessThan(tolerance);
  });
}

// Point mass M = μ m L on a string at a: roots of sin k = μ k sin(ka/L) sin(k(1 − a/L)), computed.
test.each([
  [0.05, 0.5, [0.952465, 2.0, 2.859365]],
  [0.1, 0.3, [0.935728, 1.848964, 2.974748]],
])('a mass of %d of the string at %d of its length lowers the modes as its equation says', (mu, place, expected) => {
  const cable = { length: 1, massPerLength: 1, ends: hinged, attachments: [{ kind: 'mass' as const, position: place, mass: mu }] };
  const found = naturalFrequencies(cable, { tension: 1, bendingStiffness: 0 }, 3).map((f) => 2 * f);
  expectRelative(found, expected, 1e-6);
});

test('attachments of nothing change nothing', () => {
  const cable = {
    length: 80,
    massPerLength: 50,
    axialStiffness: 1e9,
    inclination: 0.5,
    ends: ['clamped', { rotationalStiffness: 2e5 }] as ['clamped', { rotationalStiffness: number }],
  };
  const state = { tension: 2e6, bendingStiffness: 1e5 };
  const attachments = [
    { kind: 'mass' as const, position: 7, mass: 0 },
    { kind: 'support' as const, position: 31, stiffness: 0 },
  ];
  expectRelative(naturalFrequencies({ ...cable, attachments }, state, 8), naturalFrequencies(cable, state, 8), 1e-12);
});

test('a rigid support in the middle leaves the antisymmetric modes of a hinged cable and raises the others above them', () => {
  const cable = { length: 40, massPerLength: 30, ends: hinged };
  const state = { tension: 1e6, bendingStiffness: 2e5 };
  const bare = naturalFrequencies(cable, state, 8);
  const held = naturalFrequencies({ ...cable, attachments: [{ kind: 'support', position: 20, stiffness: 1e15 }] }, state, 8);
  expectRelative([held[0]!, held[2]!, held[4]!], [bare[1]!, bare[3]!, bare[5]!], 1e-6);
  expect(held[1]!).toBeGreaterThan(held[0]!);
});

test('a mass at a place lowers every mode and a support raises it, never past its neighbour', () => {
  const cable = { length: 60, massPerLength: 40, ends: ['clamped', 'hinged'] as ['clamped', 'hinged'] };
  const state = { tension: 1.5e6, bendingStiffness: 3e5 };
  const bare = naturalFrequencies(cable, state, 9);
  const loaded = naturalFrequencies({ ...cable, attachments: [{ kind: 'mass', position: 13, mass: 400 }] }, state, 8);
  const held = naturalFrequencies({ ...cable, attachments: [{ kind: 'support', position: 13, stiffness: 4e5 }] }, state, 8);
  for (let i = 0; i < 8; i++) {
    expect(loaded[i]!).toBeLessThanOrEqual(bare[i]! * (1 + 1e-12));
    expect(held[i]!).toBeGreaterThanOrEqual(bare[i]! * (1 - 1e-12));
    expect(held[i]!).toBeLessThanOrEqual(bare[i + 1]! * (1 + 1e-12));
    if (i > 0) expect(loaded[i]!).toBeGreaterThanOrEqual(bare[i - 1]! * (1 - 1e-12));
  }
});

test('refuses an attachment beyond the ends, naming it', () => {
  const cable = { length: 10, massPerLength: 1, ends: hinged, attachments: [{ kind: 'mass' as const, position: 10, mass: 1 }] };
  expect(() => naturalFrequencies(cable, { tension: 1 }, 1)).toThrow(
    expect.objectContaining({ code: 'attachment-outside', field: 'attachments[0].position' }),
  );
});
