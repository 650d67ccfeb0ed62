import { type Cable, EstimationError, estimateTension, naturalFrequencies, numberModes } from '@strandnote/core';
import fc from 'fast-check';
import { expect, test } from 'vitest';

const campaign = process.env.STRANDNOTE_CAMPAIGN === 'full';
const state = fc.record({
  xi: fc.double({ min: 5, max: 400, noNaN: true }),
  length: fc.double({ min: 2, max: 200, noNaN: true }),
  mass: fc.double({ min: 1, max: 200, noNaN: true }),
  speed: fc.double({ min: 40, max: 300, noNaN: true }),
  s1: fc.double({ min: 0, max: 50, noNaN: true }),
  s2: fc.double({ min: 0, max: 50, noNaN: true }),
});
type State = { xi: number; length: number; mass: number; speed: number; s1: number; s2: number };
function cableOf({ xi, length, mass, speed, s1, s2 }: State) {
  const tension = mass * speed ** 2;
  const bendingStiffness = (tension * length ** 2) / xi ** 2;
  const unit = Math.sqrt(tension * bendingStiffness);
  const ends = [{ rotationalStiffness: s1 * unit }, { rotationalStiffness: s2 * unit }] as Cable['ends'];
  return { cable: { length, massPerLength: mass, ends } as Cable, tension, bendingStiffness };
}
function expectClose(a: readonly number[], b: readonly number[], tolerance: number) {
  a.forEach((value, i) => {
    expect(Math.abs(value / b[i]! - 1)).toBeLessThan(tolerance);
  });
}

test('frequencies scale with √(T EI-wise), 1/√m and with length by similarity', () => {
  fc.assert(
    fc.property(state, fc.double({ min: 0.1, max: 10, noNaN: true }), (s, c) => {
      const { cable, tension, bendingStiffness } = cableOf(s);
      const base = naturalFrequencies(cable, { tension, bendingStiffness }, 6);
      const heavier = naturalFrequencies({ ...cable, massPerLength: cable.massPerLength * c }, { tension, bendingStiffness }, 6);
      expectClose(
        heavier.map((f) => f * Math.sqrt(c)),
        base,
        1e-11,
      );
      // L → cL, T → c²T, EI → c⁴EI, k → c³k leaves every frequency.
      const ends = cable.ends!.map((end) => ({
        rotationalStiffness: (end as { rotationalStiffness: number }).rotationalStiffness * c ** 3,
      })) as Cable['ends'];
      const longer = naturalFrequencies(
        { ...cable, length: cable.length * c, ends } as Cable,
        { tension: tension * c ** 2, bendingStiffness: bendingStiffness * c ** 4 },
        6,
      );
      expectClose(longer, base, 1e-11);
    }),
    { numRuns: 200 },
  );
});

test('frequencies rise with tension, stiffness and the hold of an end, and lie between hinged and clamped', () => {
  fc.assert(
    fc.property(state, (s) => {
      const { cable, tension, bendingStiffness } = cableOf(s);
      const base = naturalFrequencies(cable, { tension, bendingStiffness }, 5);
      const more = [
        naturalFrequencies(cable, { tension: 1.01 * tension, bendingStiffness }, 5),
        naturalFrequencies(cableOf({ ...s, s1: s.s1 + 1 }).cable, { tension, bendingStiffness }, 5),
        naturalFrequencies({ ...cable, ends: ['clamped', 'clamped'] }, { tension, bendingStiffness }, 5),
      ];
      const least = naturalFrequencies({ ...cable, ends: ['hinged', 'hinged'] }, { tension, bendingStiffness }, 5);
      base.forEach((f, i) => {
        for (const set of more) expect(set[i]!).toBeGreaterThanOrEqual(f * (1 - 1e-13));
        expect(least[i]!).toBeLessThanOrEqual(f * (1 + 1e-13));
      });
    }),
    { numRuns: 200 },
  );
});

test('limits join: a spring from nothing to rigid runs from hinged to clamped, and vanishing stiffness leaves a string', () => {
  const { cable, tension, bendingStiffness } = cableOf({ xi: 30, length: 40, mass: 50, speed: 120, s1: 0, s2: 0 });
  const held = (k: number): Cable => ({ ...cable, ends: [{ rotationalStiffness: k }, { rotationalStiffness: k }] });
  const given = { tension, bendingStiffness };
  expectClose(naturalFrequencies(held(1e15), given, 6), naturalFrequencies({ ...cable, ends: ['clamped', 'clamped'] }, given, 6), 1e-8);
  expectClose(naturalFrequencies(held(1e-6), given, 6), naturalFrequencies({ ...cable, ends: ['hinged', 'hinged'] }, given, 6), 1e-10);
  expectClose(
    naturalFrequencies({ ...cable, ends: ['clamped', 'clamped'] }, { tension, bendingStiffness: 1e-9 }, 6),
    naturalFrequencies(cable, { tension, bendingStiffness: 0 }, 6),
    1e-6,
  );
});

test('the estimate scales with m, and with L² when bending stiffness goes along', () => {
  fc.assert(
    fc.property(state, fc.double({ min: 0.3, max: 3, noNaN: true }), (s, c) => {
      const { cable, tension, bendingStiffness } = cableOf({ ...s, xi: Math.max(s.xi, 20) });
      const peaks = naturalFrequencies(cable, { tension, bendingStiffness }, 6).map((frequency, i) => ({
        mode: i + 1,
        frequency,
        standardUncertainty: 0.002 * frequency,
      }));
      const known: Cable = {
        length: cable.length,
        massPerLength: cable.massPerLength,
        bendingStiffness,
        relativeUncertainty: { length: 0.002, massPerLength: 0.01, bendingStiffness: 0.3 },
      };
      const base = estimateTension(known, peaks).tension;
      const heavier = estimateTension(
        { ...known, massPerLength: known.massPerLength * c, bendingStiffness: bendingStiffness * c },
        peaks,
      ).tension;
      const longer = estimateTension({ ...known, length: known.length * c, bendingStiffness: bendingStiffness * c ** 4 }, peaks).tension;
      expectClose([heavier / c, longer / c ** 2], [base, base], 1e-8);
    }),
    { numRuns: 40 },
  );
});

const wild = fc.oneof(
  fc.double(),
  fc.constantFrom(0, -1, 1e-300, 1e300, Number.NaN, Number.POSITIVE_INFINITY, 1, 1e6),
  fc.double({ min: 1e-3, max: 1e3, noNaN: true }),
);
const end = fc.oneof(
  fc.constantFrom('hinged', 'clamped', 'unknown'),
  fc.record({ fixity: fc.tuple(fc.double({ min: 0, max: 1, noNaN: true }), fc.double({ min: 0, max: 1, noNaN: true })) }),
  fc.record({ rotationalStiffness: wild }),
);
const usual = (low: number, high: number) =>
  fc.oneof({ arbitrary: fc.double({ min: low, max: high, noNaN: true }), weight: 12 }, { arbitrary: wild, weight: 1 });
const wildCable = fc.record(
  {
    length: usual(0.1, 300),
    massPerLength: usual(0.001, 500),
    bendingStiffness: usual(0, 1e7),
    bendingStiffnessBounds: fc.tuple(usual(1, 1e5), usual(1e5, 1e8)),
    axialStiffness: usual(1e4, 1e10),
    inclination: fc.double({ min: -2, max: 2, noNaN: true }),
    ends: fc.tuple(end, end),
    attachments: fc.array(fc.record({ kind: fc.constantFrom('mass', 'damper'), position: wild, mass: wild }), { maxLength: 1 }),
  },
  { requiredKeys: ['length', 'massPerLength'] },
);
/** Mostly a rising series, now and then anything. */
const wildPeaks = fc.oneof(
  fc.array(fc.record({ mode: fc.integer({ min: 0, max: 12 }), frequency: usual(0.1, 50) }), { maxLength: 5 }),
  fc
    .tuple(usual(0.1, 50), fc.array(fc.double({ min: 0.2, max: 3, noNaN: true }), { minLength: 1, maxLength: 8 }))
    .map(([first, steps]) =>
      steps.map((_, i) => ({ mode: i + 1, frequency: first * steps.slice(0, i + 1).reduce((sum, step) => sum + step, 0) })),
    ),
);

function finiteNumbers(value: unknown): boolean {
  if (typeof value === 'number') return Number.isFinite(value);
  if (Array.isArray(value)) return value.every(finiteNumbers);
  return typeof value === 'object' && value !== null ? Object.values(value).every(finiteNumbers) : true;
}

test('whatever is typed gives a finite result or a typed error', { timeout: 1_200_000 }, () => {
  fc.assert(
    fc.property(wildCable, wildPeaks, (cable, peaks) => {
      for (const attempt of [
        () => estimateTension(cable as unknown as Cable, peaks),
        () => numberModes(peaks.map(({ frequency }) => frequency)),
      ]) {
        try {
          expect(finiteNumbers(attempt())).toBe(true);
        } catch (error) {
          if (!(error instanceof EstimationError)) throw error;
        }
      }
    }),
    { numRuns: campaign ? 100_000 : 400, seed: 7 },
  );
});
