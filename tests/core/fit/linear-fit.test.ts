import { fitHingedLine, fitLine, stiffStringFrequencies } from '@strandnote/core';
import { expect, test } from 'vitest';

test('the calibration of a thermometer gives the printed line', () => {
  // JCGM 100:2008 (GUM), H.3 (printed).
  const t = [21.521, 22.012, 22.512, 23.003, 23.507, 23.999, 24.513, 25.002, 25.503, 26.01, 26.511];
  const b = [-0.171, -0.169, -0.166, -0.159, -0.164, -0.165, -0.156, -0.157, -0.159, -0.161, -0.16];
  const line = fitLine(
    t.map((value) => value - 20),
    b,
  );
  expect(line.intercept).toBeCloseTo(-0.1712, 4);
  expect(line.interceptUncertainty).toBeCloseTo(0.0029, 4);
  expect(line.slope).toBeCloseTo(0.00218, 5);
  expect(line.slopeUncertainty).toBeCloseTo(0.00067, 5);
  expect(line.correlation).toBeCloseTo(-0.93, 3);
  expect(line.residualDeviation).toBeCloseTo(0.0035, 4);
  const at30 = line.intercept + 10 * line.slope;
  const variance =
    line.interceptUncertainty ** 2 +
    100 * line.slopeUncertainty ** 2 +
    20 * line.correlation * line.interceptUncertainty * line.slopeUncertainty;
  expect(at30).toBeCloseTo(-0.1494, 4);
  expect(Math.sqrt(variance)).toBeCloseTo(0.0041, 4);
});

test('the certified line of Norris is met to ten digits', () => {
  // NIST StRD Norris (printed).
  const x = [
    0.2, 337.4, 118.2, 884.6, 10.1, 226.5, 666.3, 996.3, 448.6, 777, 558.2, 0.4, 0.6, 775.5, 666.9, 338, 447.5, 11.6, 556, 228.1, 995.8,
    887.6, 120.2, 0.3, 0.3, 556.8, 339.1, 887.2, 999, 779, 11.1, 118.3, 229.2, 669.1, 448.9, 0.5,
  ];
  const y = [
    0.1, 338.8, 118.1, 888, 9.2, 228.1, 668.5, 998.5, 449.1, 778.9, 559.2, 0.3, 0.1, 778.1, 668.8, 339.3, 448.9, 10.8, 557.7, 228.3, 998,
    888.8, 119.6, 0.3, 0.6, 557.6, 339.3, 888, 998.5, 778.9, 10.2, 117.6, 228.9, 668.4, 449.2, 0.2,
  ];
  const line = fitLine(x, y);
  const certified: [number, number][] = [
    [line.intercept, -0.262323073774029],
    [line.interceptUncertainty, 0.232818234301152],
    [line.slope, 1.00211681802045],
    [line.slopeUncertainty, 0.429796848199937e-3],
    [line.residualDeviation!, 0.884796396144373],
  ];
  for (const [found, value] of certified) expect(Math.abs(found / value - 1)).toBeLessThan(1e-10);
});

test('a hinged stiff string is read back from its own frequencies', () => {
  const cable = { length: 80, massPerLength: 45 };
  const frequencies = stiffStringFrequencies(cable, { tension: 2.5e6, bendingStiffness: 3e5 }, 6);
  const fit = fitHingedLine(
    cable,
    frequencies.map((frequency, i) => ({ mode: i + 1, frequency })),
  );
  expect(Math.abs(fit.tension / 2.5e6 - 1)).toBeLessThan(1e-12);
  expect(Math.abs(fit.bendingStiffness / 3e5 - 1)).toBeLessThan(1e-9);
});

test('one mode makes no line', () => {
  expect(() => fitHingedLine({ length: 10, massPerLength: 1 }, [{ mode: 2, frequency: 3 }])).toThrow(
    expect.objectContaining({ code: 'too-few-peaks' }),
  );
});
