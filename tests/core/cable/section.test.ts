import {
  boundaryLayerLength,
  questionPlausibility,
  sagExtensibility,
  strandCatalogue,
  strandSection,
  stringLikeness,
} from '@strandnote/core';
import { expect, test } from 'vitest';

test('a stay of 37 strands has the area, mass and breaking load of its catalogue', () => {
  // prEN 10138-3 Y1860S7, 15.7 mm: 150 mm², 1.172 kg/m, 279 kN.
  const section = strandSection('y1860s7-15.7', 37);
  expect(section.steelArea).toBeCloseTo(37 * 150e-6, 12);
  expect(section.steelMass).toBeCloseTo(37 * 1.172, 9);
  expect(section.breakingLoad).toBeCloseTo(37 * 279e3, 3);
  expect(section.axialStiffness).toBeCloseTo(195e9 * 37 * 150e-6, 0);
  expect(section.bendingStiffnessBounds[1] / section.bendingStiffnessBounds[0]).toBeGreaterThan(8);
});

test('the steel of every catalogue strand has the density of steel, sheathed ones more', () => {
  for (const strand of strandCatalogue) {
    const density = strand.massPerLength / strand.area;
    expect(density).toBeGreaterThan(7600);
    expect(density).toBeLessThan(strand.sheathed ? 9000 : 8000);
    expect(strand.source.length).toBeGreaterThan(5);
  }
});

test('names an unknown strand and a broken count', () => {
  expect(() => strandSection('none', 1)).toThrow(expect.objectContaining({ code: 'missing', field: 'type' }));
  expect(() => strandSection('wire-7', 2.5)).toThrow(expect.objectContaining({ code: 'out-of-range', field: 'count' }));
});

test('the dimensionless numbers of a published cable come out', () => {
  // Mehrabi & Tabatabai 1998, cable 2 (memory): λ² 50.7, ξ 302.7.
  const [H, E, A, I] = [0.7259e6, 1.7186e10, 7.611e-3, 4.6097e-6];
  expect(stringLikeness(100, H, E * I)).toBeCloseTo(302.7, 1);
  expect(boundaryLayerLength(H, E * I)).toBeCloseTo(100 / 302.7, 4);
  expect(sagExtensibility({ length: 100, massPerLength: 400, axialStiffness: E * A, inclination: 0 }, H, 9.8)).toBeCloseTo(50.7, 1);
});

test('asks about a length in millimetres, a frequency in the wrong decade and a mass per piece, and not about ordinary stays', () => {
  const stay = { length: 100, massPerLength: 60, bendingStiffness: 2e5 };
  const peaks = [1, 2, 3].map((mode) => ({ mode, frequency: 1.1 * mode }));
  const codes = (cable: object, list = peaks) =>
    questionPlausibility({ ...stay, ...cable }, list).map(({ code, field }) => `${code} ${field}`);
  expect(codes({})).toEqual([]);
  expect(codes({ length: 100_000 })).toContain('length-looks-like-mm length');
  expect(codes({ massPerLength: 6000 })).toContain('mass-unusual massPerLength');
  expect(codes({}, [peaks[0]!, { mode: 2, frequency: 2200 }, peaks[2]!])).toContain('frequency-looks-like-kilohertz peaks[1].frequency');
  expect(codes({}, [peaks[0]!, { mode: 4, frequency: 2.2 }, peaks[2]!])).toContain('frequencies-not-in-steps peaks[1].frequency');
});
