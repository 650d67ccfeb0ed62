import { describe, expect, test } from 'vitest';
import {
  type AgreedBasis,
  chooseReference,
  decideAsAgreed,
  type HungCable,
  referenceAtMeanChord,
  type StatedReference,
} from '../../../packages/core/src/index.ts';

const agreed: AgreedBasis = { stage: 'In service', basis: { referenceKind: 'design', lowerLimit: 0.95, upperLimit: 1.05 } };

function stated(id: string, changes: Partial<StatedReference> = {}): StatedReference {
  return { id, kind: 'design', stage: 'In service', place: 'mean-chord', value: 1e6, dated: null, retiredAt: null, ...changes };
}

describe('the reference that a cable is compared with', () => {
  test('is of the kind agreed and not retired', () => {
    const references = [stated('a', { kind: 'lift-off' }), stated('b', { retiredAt: '2026-01-01T00:00:00Z' }), stated('c')];
    expect(chooseReference(references, agreed)?.id).toBe('c');
    expect(chooseReference(references.slice(0, 2), agreed)).toBeNull();
  });

  test('is for the stage of the survey where there is one, though written otherwise, and the latest of those', () => {
    const references = [
      stated('newest', { stage: 'Erection', dated: '2026-01-01' }),
      stated('older', { stage: ' in SERVICE ', dated: '2019-05-01' }),
      stated('newer', { dated: '2020-05-01' }),
    ];
    expect(chooseReference(references, agreed)?.id).toBe('newer');
    expect(chooseReference(references.slice(0, 1), agreed)?.id).toBe('newest');
  });

  test('loses half the weight of the cable on its way from the upper end to the mean chord', () => {
    const section = { steelArea: 1e-3, modulus: 2e11, steelMass: 40, steelMassSource: 'weighed', sheathMass: 10, groutMass: 0 } as const;
    const rest = { addedMassSource: 'weighed', massRelativeUncertainty: null, bendingStiffnessLow: 1, bendingStiffnessHigh: 2 } as const;
    const spans = [{ chordLength: 100, inclination: Math.PI / 6 }];
    const cable: HungCable = { section: { ...section, ...rest }, lowerAnchor: null, upperAnchor: null, spans };
    // m g Δh / 2 with Δh = 100 m · sin 30°; the weight by hand, at standard gravity.
    expect(referenceAtMeanChord({ value: 1e6, place: 'upper-end' }, cable)).toBeCloseTo(1e6 - (50 * 9.80665 * 50) / 2, 6);
    const anchored = { ...cable, lowerAnchor: { z: 0 }, upperAnchor: { z: 20 } };
    expect(referenceAtMeanChord({ value: 1e6, place: 'lower-end' }, anchored)).toBeCloseTo(1e6 + (50 * 9.80665 * 20) / 2, 6);
  });
});

describe('the zone under the basis agreed', () => {
  const estimate = { tension: 1.02e6, interval95: [1.01e6, 1.03e6] as const, boundsOnly: null };

  test('has its limits in newtons at the mean chord', () => {
    const decision = decideAsAgreed(estimate, { meanChordValue: 1e6, stage: 'in service' }, agreed);
    expect(decision).toMatchObject({ zone: 'within', lowerLimit: 0.95e6, upperLimit: 1.05e6 });
    expect(decision.toReference).toBeCloseTo(0.02, 12);
  });

  test('is not given across stages, and shows no limits there', () => {
    const decision = decideAsAgreed(estimate, { meanChordValue: 1e6, stage: 'Erection' }, agreed);
    expect(decision).toMatchObject({ zone: 'not-comparable', lowerLimit: null, upperLimit: null, toReference: null });
    expect(decision.reason).toBe('The reference is for the stage “Erection”, the survey for “In service”.');
  });

  test('says whether no reference was agreed or the cable has none', () => {
    const none = { ...agreed, basis: { ...agreed.basis, referenceKind: null } };
    expect(decideAsAgreed(estimate, null, none).reason).toBe('No reference was agreed before the survey.');
    expect(decideAsAgreed(estimate, null, agreed).reason).toContain('no reference tension of the kind');
  });
});
