import type { FrozenReference } from '@strandnote/core/report-content';
import { expect, test } from 'vitest';
import { decideSpan, type SpanToDecide } from '../../../apps/api/src/reports/decide-span.ts';

const reference: FrozenReference = {
  kind: 'design',
  stage: 'In service',
  place: 'mean-chord',
  value: 1e6,
  meanChordValue: 1e6,
  relativeUncertainty: null,
  source: 'Drawing 12',
  dated: null,
};
function decide(over: Partial<SpanToDecide>, interval95: [number, number] = [0.98e6, 1.02e6], tension = 1e6) {
  return decideSpan({
    estimate: { tension, interval95, boundsOnly: null },
    notMeasuredReason: null,
    reference,
    stage: 'in service ',
    basis: { referenceKind: 'design', lowerLimit: 0.95, upperLimit: 1.05 },
    ...over,
  });
}

test('gives the four zones on both sides by the interval, not by the tension alone', () => {
  expect(decide({}).zone).toBe('within');
  expect(decide({}, [0.99e6, 1.06e6], 1.03e6).zone).toBe('within-not-proven');
  expect(decide({}, [1.04e6, 1.1e6], 1.06e6).zone).toBe('outside-not-proven');
  expect(decide({}, [1.051e6, 1.1e6], 1.07e6).zone).toBe('outside');
  expect(decide({}, [0.94e6, 1.0e6], 0.97e6).zone).toBe('within-not-proven');
  expect(decide({}, [0.9e6, 0.96e6], 0.94e6).zone).toBe('outside-not-proven');
  expect(decide({}, [0.9e6, 0.949e6], 0.92e6).zone).toBe('outside');
});

test('counts an interval that ends on the limit as within', () => {
  expect(decide({}, [0.95e6, 1.05e6]).zone).toBe('within');
});

test('takes the worse side where an interval crosses both limits', () => {
  expect(decide({}, [0.9e6, 1.1e6]).zone).toBe('within-not-proven');
  expect(decide({}, [0.9e6, 1.2e6], 1.06e6).zone).toBe('outside-not-proven');
});

test('judges one side alone where only one limit was agreed', () => {
  const basis = { referenceKind: 'design', lowerLimit: null, upperLimit: 1.05 };
  expect(decide({ basis }, [0.5e6, 0.6e6], 0.55e6)).toMatchObject({ zone: 'within', lowerLimit: null, upperLimit: 1.05e6 });
});

test('gives no zone without an agreed limit, but says how the tension compares', () => {
  const decision = decide({ basis: { referenceKind: 'design', lowerLimit: null, upperLimit: null } }, [1.0e6, 1.04e6], 1.02e6);
  expect(decision.zone).toBe('no-limit-agreed');
  expect(decision.toReference).toBeCloseTo(0.02, 12);
  expect(decide({ basis: { referenceKind: null, lowerLimit: 0.95, upperLimit: 1.05 } }).zone).toBe('no-limit-agreed');
  expect(decide({ reference: null }).zone).toBe('no-limit-agreed');
});

test('does not compare across construction stages', () => {
  const decision = decide({ stage: 'Before deck closure' });
  expect(decision).toMatchObject({ zone: 'not-comparable', toReference: null });
  expect(decision.reason).toContain('Before deck closure');
});

test('gives bounds only where the estimate is too wide for a verdict', () => {
  expect(decide({ estimate: { tension: 1e6, interval95: [0.8e6, 1.2e6], boundsOnly: 'Too wide.' } })).toMatchObject({
    zone: 'bounds-only',
    reason: 'Too wide.',
    toReference: null,
  });
});

test('says why a cable was not measured', () => {
  expect(decide({ estimate: null, notMeasuredReason: 'Scaffold in the way' })).toMatchObject({
    zone: 'not-measured',
    reason: 'Scaffold in the way',
  });
});
