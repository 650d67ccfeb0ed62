import { z } from 'zod';
import { cable, referenceKind } from './cables.ts';
import { estimate } from './estimates.ts';
import { measurement } from './measurements.ts';
import { id, isoDate, listOf, optionalText, quantity, typedText } from './primitives.ts';
import { elevationLines } from './structures.ts';

export const instrument = z.strictObject({
  name: typedText(80),
  serial: optionalText(60),
  calibratedOn: isoDate.nullable(),
  calibrationDue: isoDate.nullable(),
});
export type Instrument = z.infer<typeof instrument>;

/** What was agreed with the client before the work. Limits are fractions of the reference (0.95, 1.05); null where none was agreed. */
export const basisOfAssessment = z.strictObject({
  referenceKind: referenceKind.nullable(),
  lowerLimit: quantity('The lower limit', { above: 0, to: 1 }).nullable(),
  upperLimit: quantity('The upper limit', { from: 1, to: 5 }).nullable(),
  decisionRule: optionalText(400),
  criticalContact: optionalText(200),
});
export type BasisOfAssessment = z.infer<typeof basisOfAssessment>;

const temperature = (name: string) => quantity(name, { from: -60, to: 90 }).nullable();
const campaignFields = {
  name: typedText(120),
  startsOn: isoDate,
  endsOn: isoDate.nullable(),
  crew: optionalText(300),
  instruments: z.array(instrument).max(30),
  weather: optionalText(300),
  steelTemperature: temperature('The steel temperature'),
  airTemperature: temperature('The air temperature'),
  traffic: optionalText(300),
  stage: typedText(120),
  basis: basisOfAssessment,
};
const datesRule = { path: ['endsOn'], message: 'The last day must not be before the first.' };
const datesInOrder = (campaign: { startsOn?: string | undefined; endsOn?: string | null | undefined }) =>
  !campaign.startsOn || !campaign.endsOn || campaign.startsOn <= campaign.endsOn;

/** A new campaign covers every cable of the structure unless cables are named. */
export const createCampaign = z
  .strictObject({ id, ...campaignFields, cableIds: z.array(id).min(1, 'Choose at least one cable.').nullable() })
  .refine(datesInOrder, datesRule);
export type CreateCampaign = z.infer<typeof createCampaign>;
export const editCampaign = z
  .strictObject({ ...campaignFields, state: z.enum(['open', 'closed']) })
  .partial()
  .refine(datesInOrder, datesRule);
export type EditCampaign = z.infer<typeof editCampaign>;

export const campaign = z.object({
  id,
  structureId: id,
  structureName: z.string(),
  number: z.number().int(),
  ...campaignFields,
  state: z.enum(['open', 'closed']),
  cableCount: z.number().int(),
  measuredCount: z.number().int(),
});
export type Campaign = z.infer<typeof campaign>;
export const campaignList = listOf(campaign);

export const editCampaignCable = z.strictObject({ notMeasuredReason: typedText(300).nullable() });
export type EditCampaignCable = z.infer<typeof editCampaignCable>;

/** The checklist of a campaign with all that a phone needs to work on it without a signal. */
export const campaignCable = z.object({
  cable,
  notMeasuredReason: z.string().nullable(),
  measurements: z.array(measurement),
  estimates: z.array(estimate),
  /** The tension of each span in the last earlier campaign (N), for the hollow dot. */
  lastSurvey: z.array(
    z.object({ spanId: id, tension: z.number(), campaignName: z.string(), startsOn: isoDate, steelTemperature: z.number().nullable() }),
  ),
});
export type CampaignCable = z.infer<typeof campaignCable>;
export const campaignDetail = campaign.extend({
  structureTimeZone: z.string(),
  elevation: elevationLines.nullable(),
  cables: z.array(campaignCable),
});
export type CampaignDetail = z.infer<typeof campaignDetail>;
