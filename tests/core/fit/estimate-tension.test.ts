import { type Cable, type EndCondition, estimateTension, type ModalPeak, naturalFrequencies } from '@strandnote/core';
import { tensionEstimate } from '@strandnote/core/report-content';
import { expect, test } from 'vitest';
import { seededRandom } from '../seeded-random.ts';

const clamped = ['clamped', 'clamped'] as [EndCondition, EndCondition];
const stay: Cable = {
  length: 100,
  massPerLength: 60,
  bendingStiffnessBounds: [1e5, 8e5],
  relativeUncertainty: { length: 0.003, massPerLength: 0.01 },
};
function peaksOf(cable: Cable, tension: number, bendingStiffness: number, count = 8, relative = 0.002): ModalPeak[] {
  return naturalFrequencies(cable, { tension, bendingStiffness }, count).map((frequency, i) => ({
    mode: i + 1,
    frequency,
    standardUncertainty: relative * frequency,
  }));
}

test('with everything known the tension comes back exactly', () => {
  for (const ends of [clamped, ['hinged', 'clamped'], ['hinged', 'hinged'], [{ rotationalStiffness: 2e5 }, 'hinged']] as [
    EndCondition,
    EndCondition,
  ][]) {
    const cable: Cable = {
      ...stay,
      ends,
      bendingStiffness: 3e5,
      relativeUncertainty: { ...stay.relativeUncertainty, bendingStiffness: 0 },
    };
    const estimate = estimateTension(cable, peaksOf(cable, 3e6, 3e5));
    expect(Math.abs(estimate.tension / 3e6 - 1)).toBeLessThan(1e-9);
    expect(estimate.goodness.chiSquared).toBeLessThan(1e-9);
  }
});

test('the bracket holds the tension, and unknown ends widen the interval over both of its ends', () => {
  const peaks = peaksOf({ ...stay, ends: clamped }, 3e6, 3e5);
  const estimate = estimateTension(stay, peaks);
  expect(estimate.bracket.hinged).toBeGreaterThan(estimate.bracket.clamped);
  expect(estimate.tension).toBeGreaterThan(estimate.bracket.clamped);
  expect(estimate.tension).toBeLessThan(estimate.bracket.hinged);
  const known = estimateTension({ ...stay, ends: clamped }, peaks);
  const width = (e: typeof estimate) => e.interval95[1] - e.interval95[0];
  expect(width(estimate)).toBeGreaterThan(width(known));
});

test('the budget adds up to the variance of the result, and knows that T goes with L² and m', () => {
  const estimate = estimateTension(stay, peaksOf({ ...stay, ends: clamped }, 3e6, 3e5));
  const variance = estimate.budget.reduce((sum, { contribution }) => sum + contribution ** 2, 0);
  expect(Math.sqrt(variance)).toBeCloseTo(estimate.standardUncertainty / estimate.tension, 6);
  expect(estimate.budget.reduce((sum, { shareOfVariance }) => sum + shareOfVariance, 0)).toBeCloseTo(1, 12);
  const sensitivity = (source: string) => estimate.budget.find((line) => line.source === source)!.sensitivity!;
  expect(sensitivity('length')).toBeCloseTo(2, 1);
  expect(sensitivity('mass')).toBeCloseTo(1, 1);
});

test.each(['length', 'massPerLength', 'axialStiffness'] as const)('the sensitivity by %s is that of the whole fit', (field) => {
  const cable: Cable = {
    ...stay,
    axialStiffness: 1.5e9,
    inclination: 0.2,
    relativeUncertainty: { length: 0.003, massPerLength: 0.01, axialStiffness: 0.05 },
  };
  const peaks = peaksOf({ ...cable, ends: clamped }, 1.2e6, 3e5);
  const at = (factor: number) => Math.log(estimateTension({ ...cable, [field]: cable[field]! * factor }, peaks).tension);
  const source = { length: 'length', massPerLength: 'mass', axialStiffness: 'axial-stiffness' }[field];
  const stated = estimateTension(cable, peaks).budget.find((line) => line.source === source)!.sensitivity!;
  expect(Math.abs(stated - (at(1.001) - at(0.999)) / 0.002)).toBeLessThan(0.02);
});

test('sag is solved inside the fit, and out-of-plane peaks know none', () => {
  const cable: Cable = {
    ...stay,
    ends: clamped,
    axialStiffness: 2e9,
    inclination: 0.3,
    bendingStiffness: 3e5,
    relativeUncertainty: { bendingStiffness: 0.01 },
  };
  const inPlane = peaksOf(cable, 1.5e6, 3e5);
  expect(Math.abs(estimateTension(cable, inPlane).tension / 1.5e6 - 1)).toBeLessThan(1e-5);
  const { axialStiffness: _, ...flat } = cable;
  const outOfPlane = peaksOf(flat, 1.5e6, 3e5).map((peak) => ({ ...peak, plane: 'out-of-plane' as const }));
  expect(Math.abs(estimateTension(cable, [...inPlane, ...outOfPlane]).tension / 1.5e6 - 1)).toBeLessThan(1e-5);
});

test('masses and supports are solved inside the fit', () => {
  const cable: Cable = {
    ...stay,
    ends: clamped,
    bendingStiffness: 3e5,
    relativeUncertainty: { bendingStiffness: 0.01 },
    attachments: [
      { kind: 'mass', position: 31, mass: 300 },
      { kind: 'support', position: 96, stiffness: 2e5 },
    ],
  };
  expect(Math.abs(estimateTension(cable, peaksOf(cable, 2e6, 3e5)).tension / 2e6 - 1)).toBeLessThan(2e-5);
});

test('a damper of unknown effect shifts the estimate down and widens it by its reach', () => {
  const cable: Cable = { ...stay, ends: clamped };
  const peaks = peaksOf(cable, 3e6, 3e5);
  const plain = estimateTension(cable, peaks);
  const damped = estimateTension({ ...cable, attachments: [{ kind: 'damper', position: 2 }] }, peaks);
  expect(damped.tension / plain.tension).toBeCloseTo(1 - 2 * 0.01, 3);
  // A uniform shift of 2 ln(1 − s/L), s from 0 to 2 m, has a standard deviation of 0.04/√12.
  expect(damped.budget.find(({ source }) => source === 'damper')!.contribution).toBeCloseTo(0.0404 / Math.sqrt(12), 4);
});

test('survives JSON and the schema of what is stored', () => {
  for (const cable of [stay, { length: 100, massPerLength: 60 }, { ...stay, bendingStiffness: 0 }]) {
    const estimate = estimateTension(cable, peaksOf({ ...stay, ends: clamped }, 3e6, 3e5));
    expect(tensionEstimate.parse(JSON.parse(JSON.stringify(estimate)))).toEqual(estimate);
  }
});

test('residuals set the uncertainty when none is stated, implausible ones are scaled, and both are said', () => {
  const random = seededRandom(5);
  const noisy = peaksOf({ ...stay, ends: clamped }, 3e6, 3e5).map((peak) => ({
    ...peak,
    frequency: peak.frequency * (1 + 0.004 * random.normal()),
  }));
  const unstated = estimateTension(
    stay,
    noisy.map(({ mode, frequency }) => ({ mode, frequency })),
  );
  expect(unstated.inputs.frequencyUncertaintySource).toBe('residuals');
  expect(unstated.diagnostics.map(({ code }) => code)).toContain('frequency-uncertainty-from-residuals');
  const tooSure = estimateTension(
    stay,
    noisy.map((peak) => ({ ...peak, standardUncertainty: 0.0003 * peak.frequency })),
  );
  expect(tooSure.goodness.scale).toBeGreaterThan(3);
  expect(tooSure.warnings.map(({ code }) => code)).toContain('residuals-too-large');
});

test('one peak, or two, are fitted with what can be fitted, and the answer says what is missing', () => {
  const peaks = peaksOf({ ...stay, ends: clamped }, 3e6, 3e5);
  const one = estimateTension(stay, peaks.slice(0, 1));
  expect(one.warnings.map(({ code }) => code)).toContain('single-peak');
  expect(one.models.map(({ id }) => id)).not.toContain('hinged-line');
  const bare = estimateTension({ length: 100, massPerLength: 60 }, peaks.slice(0, 2));
  expect(bare.bendingStiffness).toBeNull();
  expect(bare.warnings.map(({ code }) => code)).toContain('bending-stiffness-unknown');
  expect(bare.interval95[0]).toBeLessThan(3e6);
  expect(bare.interval95[1]).toBeGreaterThan(3e6);
});

test('above 15 % expanded uncertainty, or with unknown ends below ξ = 20, only bounds are given', () => {
  const wide = estimateTension(
    { ...stay, relativeUncertainty: { length: 0.003, massPerLength: 0.1 } },
    peaksOf({ ...stay, ends: clamped }, 3e6, 3e5),
  );
  expect(wide.boundsOnly).toContain('15 %');
  const short: Cable = {
    ...stay,
    length: 4,
    bendingStiffness: 3e5,
    relativeUncertainty: { length: 0.001, massPerLength: 0.005, bendingStiffness: 0.02 },
  };
  expect(estimateTension(short, peaksOf({ ...short, ends: clamped }, 3e6, 3e5, 8, 0.0005)).boundsOnly).not.toBeNull();
});

test('a wrong mode number stands out', () => {
  const peaks = peaksOf({ ...stay, ends: clamped }, 3e6, 3e5);
  const wrong = peaks.filter(({ mode }) => mode !== 5).map((peak) => (peak.mode === 8 ? { ...peak, mode: 9 } : peak));
  expect(estimateTension(stay, wrong).warnings.map(({ code }) => code)).toContain('residuals-too-large');
});

test.each([
  [{ ...stay, length: 0 }, {}, 'out-of-range', 'length'],
  [{ ...stay, massPerLength: Number.NaN }, {}, 'not-finite', 'massPerLength'],
  [stay, { mode: 0 }, 'mode-invalid', 'peaks[1].mode'],
  [stay, { mode: -2 }, 'mode-invalid', 'peaks[1].mode'],
  [stay, { mode: 1.5 }, 'mode-invalid', 'peaks[1].mode'],
  [stay, { mode: 1 }, 'mode-repeated', 'peaks[1].mode'],
  [stay, { frequency: 0.5 }, 'frequencies-not-increasing', 'peaks[1].frequency'],
  [stay, { frequency: Number.POSITIVE_INFINITY }, 'not-finite', 'peaks[1].frequency'],
  [{ ...stay, ends: ['hinged', { fixity: [0.6, 0.2] }] as [EndCondition, EndCondition] }, {}, 'out-of-range', 'ends[1].fixity'],
  [{ ...stay, bendingStiffnessBounds: [5e5, 1e5] as [number, number] }, {}, 'out-of-range', 'bendingStiffnessBounds'],
])('refuses what cannot be, naming the field (%#)', (cable, change, code, field) => {
  const peaks = [
    { mode: 1, frequency: 1.1 },
    { mode: 2, frequency: 2.2, ...change },
    { mode: 3, frequency: 3.3 },
  ];
  expect(() => estimateTension(cable, peaks)).toThrow(expect.objectContaining({ code, field }));
});
