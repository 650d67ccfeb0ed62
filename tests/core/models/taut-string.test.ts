import { fromSi, tautStringFrequencies, tautStringTension, toSi } from '@strandnote/core';
import { expect, test } from 'vitest';

test('a wire of a textbook has the printed frequencies', () => {
  // W. T. Thomson, Vibration Theory and Applications, art. 8.2 (printed, transcription): inches, pounds-force, lb·s²/in⁴.
  const inch = 0.0254;
  const poundForce = 4.4482216152605;
  const massPerLength = (0.00306796 * 0.00073 * poundForce) / inch ** 2;
  const frequencies = tautStringFrequencies({ length: 100 * inch, massPerLength }, 500 * poundForce, 3);
  [74.708, 149.42, 224.12].forEach((value, i) => {
    expect(Math.abs(frequencies[i]! / value - 1)).toBeLessThan(1e-4);
  });
});

// FHWA-HRT-05-083 (Kumarasena, Jones, Irwin, Taylor 2007), Appendix F, Table 15 (printed, transcription): kg/m, MN, m, Hz.
test.each([
  ['13S', 32.5, 1.65, 59.523, 1.893],
  ['14S', 47.93, 1.6, 67.345, 1.355],
  ['16S', 47.93, 2.16, 87.333, 1.215],
  ['18S', 52.87, 2.73, 112.28, 1.012],
  ['20S', 70.12, 3.35, 139.701, 0.782],
  ['22S', 70.12, 3.55, 168.403, 0.668],
  ['24S', 76.03, 4.53, 197.847, 0.617],
])('stay %s of a published bridge has the printed string tension', (_name, massPerLength, meganewtons, length, frequency) => {
  expect(Math.abs(tautStringTension({ length, massPerLength }, frequency, 1) / (1e6 * meganewtons) - 1)).toBeLessThan(2.5e-3);
});

test('US customary inputs give the tension in both systems', () => {
  // Computed: L = 328.08 ft, 40.318 lb/ft, f_1 = 1.2 Hz → 776.9 kip = 3456 kN.
  const cable = { length: toSi(328.08, 'length', 'us'), massPerLength: toSi(40.318, 'mass-per-length', 'us') };
  const tension = tautStringTension(cable, 1.2, 1);
  expect(fromSi(tension, 'force', 'us')).toBeCloseTo(776.9, 1);
  expect(fromSi(tension, 'force', 'si')).toBeCloseTo(3456, 0);
});
