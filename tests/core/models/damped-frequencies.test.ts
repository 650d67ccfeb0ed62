import { type Cable, dampedFrequencies, naturalFrequencies } from '@strandnote/core';
import { expect, test } from 'vitest';

const hinged = ['hinged', 'hinged'] as ['hinged', 'hinged'];

// Damper near the end of a string (Krenk 2000; Main & Jones 2002; computed exact roots, mode 1), x_d/L = 0.02,
// κ = c n (x_d/L)/(π √(T m)): damping ratio and shift of frequency, both over x_d/L.
test.each([
  [0.01, 0.09769, 0.00933],
  // The optimum 1/π², written 0.1013.
  [1 / Math.PI ** 2, 0.51057, 0.50727],
  [0.5, 0.19526, 0.98125],
  [2.0, 0.05054, 1.01788],
])('a damper of κ = %d damps and shifts the first mode as its exact root says', (kappa, damping, shift) => {
  const [place, tension, massPerLength] = [0.02, 4, 1];
  const coefficient = (kappa * Math.PI * Math.sqrt(tension * massPerLength)) / place;
  const cable: Cable = { length: 1, massPerLength, ends: hinged, attachments: [{ kind: 'damper', position: place, coefficient }] };
  const [first] = dampedFrequencies(cable, { tension, bendingStiffness: 0 }, 1);
  expect(first!.dampingRatio / place).toBeCloseTo(damping, 4);
  expect((first!.frequency / 1 - 1) / place).toBeCloseTo(shift, 4);
});

test('a locked damper shortens the cable to what lies beyond it', () => {
  const cable: Cable = { length: 1, massPerLength: 1, ends: hinged, attachments: [{ kind: 'damper', position: 0.02, coefficient: 1e6 }] };
  const [first] = dampedFrequencies(cable, { tension: 4, bendingStiffness: 0 }, 1);
  expect(first!.frequency).toBeCloseTo(1 / 0.98, 6);
});

test('a damper of nothing leaves the frequencies of the cable with its ends, masses and bending', () => {
  const bare: Cable = {
    length: 60,
    massPerLength: 40,
    ends: ['clamped', { rotationalStiffness: 1e5 }],
    attachments: [{ kind: 'mass', position: 20, mass: 100 }],
  };
  const state = { tension: 1.5e6, bendingStiffness: 2e5 };
  const damped = dampedFrequencies(
    { ...bare, attachments: [...bare.attachments!, { kind: 'damper', position: 2, coefficient: 0 }] },
    state,
    5,
  );
  naturalFrequencies(bare, state, 5).forEach((frequency, i) => {
    expect(Math.abs(damped[i]!.frequency / frequency - 1)).toBeLessThan(1e-9);
    expect(Math.abs(damped[i]!.dampingRatio)).toBeLessThan(1e-9);
  });
});

test('asks for the coefficient of a damper', () => {
  const cable: Cable = { length: 1, massPerLength: 1, ends: hinged, attachments: [{ kind: 'damper', position: 0.02 }] };
  expect(() => dampedFrequencies(cable, { tension: 1 }, 1)).toThrow(
    expect.objectContaining({ code: 'attachment-unknown', field: 'attachments[0].coefficient' }),
  );
  expect(() => naturalFrequencies(cable, { tension: 1 }, 1)).toThrow(expect.objectContaining({ code: 'attachment-unknown' }));
});
