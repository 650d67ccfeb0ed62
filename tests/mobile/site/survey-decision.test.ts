import { expect, test } from 'vitest';
import { decideSpan as serverDecides } from '../../../apps/api/src/reports/decide-span.ts';
import { freezeReference } from '../../../apps/api/src/reports/freeze-reference.ts';
import { referenceWords } from '../../../apps/mobile/src/features/site/site-words.ts';
import { agreedInWords, decideSpan } from '../../../apps/mobile/src/features/site/survey-decision.ts';
import { cableNamed, campaignOf, designTension } from './surveyed-cable.ts';

const estimate = (tension: number) => ({ tension, interval95: [0.98 * tension, 1.02 * tension] as [number, number], boundsOnly: null });
const anchors = { lowerAnchor: { x: 0, y: 5, z: 0 }, upperAnchor: { x: 60, y: 5, z: 50 } };
const cables = {
  plain: cableNamed('plain', { references: [designTension(2.5e6)] }),
  'two designs, one of this stage': cableNamed('two', {
    references: [designTension(2.6e6, { stage: 'Before asphalt', dated: '2020-01-01' }), designTension(2.4e6, { stage: ' in SERVICE ' })],
  }),
  'an upper end force': cableNamed('end', { ...anchors, references: [designTension(2.5e6, { place: 'upper-end' })] }),
  'another stage': cableNamed('stage', { references: [designTension(2.5e6, { stage: 'Before asphalt' })] }),
  'a retired reference': cableNamed('retired', { references: [designTension(2.5e6, { retiredAt: '2026-01-01T00:00:00Z' })] }),
};
const bases = {
  '±10 %': { referenceKind: 'design', lowerLimit: 0.9, upperLimit: 1.1 },
  'no limit': { referenceKind: 'design', lowerLimit: null, upperLimit: null },
  'no reference': { referenceKind: null, lowerLimit: null, upperLimit: null },
} as const;

test.each(Object.keys(cables) as (keyof typeof cables)[])('the phone comes to the zone that the report freezes: %s', (name) => {
  const cable = cables[name];
  for (const basis of Object.values(bases)) {
    const campaign = campaignOf([], { basis: { ...basis, decisionRule: '', criticalContact: '' } });
    for (const tension of [2.0e6, 2.24e6, 2.5e6, 2.74e6, 3.0e6]) {
      const frozen = serverDecides({
        estimate: estimate(tension),
        notMeasuredReason: null,
        reference: freezeReference(cable, campaign),
        stage: campaign.stage,
        basis: campaign.basis,
      });
      const { zone, reason, lowerLimit, upperLimit, toReference } = decideSpan(cable, campaign, estimate(tension));
      expect({ zone, reason, lowerLimit, upperLimit, toReference }).toEqual(frozen);
    }
  }
});

test.each([
  [{ referenceKind: 'design', lowerLimit: 0.95, upperLimit: 1.05 }, 'design ±5 %'],
  [{ referenceKind: 'design', lowerLimit: 0.95, upperLimit: 1.08 }, 'design −5 % to +8 %'],
  [{ referenceKind: 'lift-off', lowerLimit: null, upperLimit: 1.1 }, 'lift-off reading, at most +10 %'],
  [{ referenceKind: 'last-survey', lowerLimit: null, upperLimit: null }, 'last survey, no limit agreed'],
  [{ referenceKind: null, lowerLimit: null, upperLimit: null }, 'no reference agreed'],
] as const)('what was agreed is said in words: %o', (basis, words) => {
  expect(agreedInWords(campaignOf([], { basis: { ...basis, decisionRule: '', criticalContact: '' } }), referenceWords)).toBe(words);
});
