import { expect, test } from 'vitest';
import { createCampaign, editCampaign } from '../../../apps/api/contract/index.ts';
import { campaignFields, campaignValues, newCampaignValues } from '../../../apps/mobile/src/features/campaigns/campaign-form-values.ts';
import { fieldOfCampaign } from '../../../apps/mobile/src/features/campaigns/campaign-problems.ts';
import { problemOfDay, readDay } from '../../../apps/mobile/src/features/campaigns/day-text.ts';
import { readEntry } from '../../../apps/mobile/src/lib/quantity-entry.ts';
import { campaignOf } from '../site/surveyed-cable.ts';

const filled = {
  ...newCampaignValues('structure', '2026-12-01'),
  name: 'Winter survey',
  stage: 'In service',
  referenceKind: 'design' as const,
};

test('nothing is agreed by default', () => {
  expect(newCampaignValues('structure', '2026-12-01')).toMatchObject({
    referenceKind: null,
    limits: null,
    below: { si: null },
    above: { si: null },
  });
});

test('limits in per cent become fractions of the reference, exactly', () => {
  const percent = (text: string) => readEntry(text, 'percent', 'si');
  const { basis } = campaignFields({ ...filled, limits: 'agreed', below: percent('5'), above: percent('7,5') });
  expect([basis.lowerLimit, basis.upperLimit]).toEqual([0.95, 1.075]);
});

test('limits that were typed and then taken back are not sent', () => {
  const typed = { ...filled, below: readEntry('5', 'percent', 'si'), above: readEntry('5', 'percent', 'si') };
  expect(campaignFields({ ...typed, limits: 'none' }).basis).toMatchObject({ lowerLimit: null, upperLimit: null });
  expect(campaignFields({ ...typed, limits: 'agreed', referenceKind: 'none' }).basis).toMatchObject({
    referenceKind: null,
    lowerLimit: null,
  });
});

test('what the form sends is what the contract takes; a row left empty is no instrument', () => {
  const body = { id: '3f0c8f0e-94b0-4e0c-8f7a-0f7a1a3f7c11', ...campaignFields({ ...filled, limits: 'none' }), cableIds: null };
  expect(createCampaign.parse(body)).toMatchObject({ instruments: [], endsOn: null, steelTemperature: null });
});

test('a stored campaign opens in the form and comes back as it was', () => {
  const campaign = campaignOf([], {
    endsOn: '2026-09-03',
    instruments: [{ name: 'Accelerometer', serial: '17', calibratedOn: '2026-01-05', calibrationDue: null }],
    basis: {
      referenceKind: 'design',
      lowerLimit: 0.92,
      upperLimit: null,
      decisionRule: 'whole interval',
      criticalContact: 'duty engineer',
    },
  });
  const { name, startsOn, endsOn, crew, instruments, weather, steelTemperature, airTemperature, traffic, stage, basis } = campaign;
  const stored = { name, startsOn, endsOn, crew, instruments, weather, steelTemperature, airTemperature, traffic, stage, basis };
  expect(editCampaign.parse(campaignFields(campaignValues(campaign, 'us')))).toEqual(stored);
});

test('days are read as they are written, and a day that does not exist is said', () => {
  expect([readDay('2026-12-01'), readDay('1.12.2026'), readDay('')]).toEqual(['2026-12-01', '2026-12-01', null]);
  expect(problemOfDay('2026-02-30', { name: 'The last day' })).toBe('“2026-02-30” is no date. Write it as 2026-12-01.');
  expect(problemOfDay('', { name: 'The first day', required: true })).toBe('The first day is missing.');
});

test('a refusal of the server finds its field', () => {
  expect(['endsOn', 'basis.lowerLimit', 'instruments.0.name', 'instruments[1].name', 'id'].map(fieldOfCampaign)).toEqual([
    'endsOn',
    'below',
    'instruments.0.name',
    'instruments.1.name',
    null,
  ]);
});
