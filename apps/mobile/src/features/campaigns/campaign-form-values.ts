import type { Campaign, CreateCampaign, EditCampaign, ReferenceTension, UnitSystem } from '@strandnote/api/contract';
import { emptyEntry, enteredValue, type QuantityEntry } from '../../lib/quantity-entry.ts';
import { dayText, readDay } from './day-text.ts';

export interface InstrumentValues {
  name: string;
  serial: string;
  calibratedOn: string;
  calibrationDue: string;
}

/** The form as it is typed. Nothing is agreed by default: the limits are asked for. */
export interface CampaignValues {
  structureId: string | null;
  name: string;
  startsOn: string;
  endsOn: string;
  crew: string;
  instruments: InstrumentValues[];
  weather: string;
  steelTemperature: QuantityEntry;
  airTemperature: QuantityEntry;
  traffic: string;
  stage: string;
  referenceKind: ReferenceTension['kind'] | 'none' | null;
  limits: 'none' | 'agreed' | null;
  /** How far below and above the reference, as fractions. */
  below: QuantityEntry;
  above: QuantityEntry;
  decisionRule: string;
  criticalContact: string;
  cables: 'all' | 'chosen';
  cableIds: string[];
}

export const emptyInstrument: InstrumentValues = { name: '', serial: '', calibratedOn: '', calibrationDue: '' };

export function newCampaignValues(structureId: string | null, today: string): CampaignValues {
  return {
    structureId,
    name: '',
    startsOn: today,
    endsOn: '',
    crew: '',
    instruments: [emptyInstrument],
    weather: '',
    steelTemperature: emptyEntry,
    airTemperature: emptyEntry,
    traffic: '',
    stage: '',
    referenceKind: null,
    limits: null,
    below: emptyEntry,
    above: emptyEntry,
    decisionRule: '',
    criticalContact: '',
    cables: 'all',
    cableIds: [],
  };
}

export function campaignValues(campaign: Campaign, system: UnitSystem): CampaignValues {
  const { basis } = campaign;
  const share = (limit: number | null) =>
    enteredValue(limit === null ? null : Number(Math.abs(limit - 1).toPrecision(9)), 'percent', system);
  return {
    structureId: campaign.structureId,
    name: campaign.name,
    startsOn: campaign.startsOn,
    endsOn: campaign.endsOn ?? '',
    crew: campaign.crew,
    instruments: campaign.instruments.map(({ name, serial, calibratedOn, calibrationDue }) => ({
      name,
      serial,
      calibratedOn: dayText(calibratedOn),
      calibrationDue: dayText(calibrationDue),
    })),
    weather: campaign.weather,
    steelTemperature: enteredValue(campaign.steelTemperature, 'temperature', system),
    airTemperature: enteredValue(campaign.airTemperature, 'temperature', system),
    traffic: campaign.traffic,
    stage: campaign.stage,
    referenceKind: basis.referenceKind ?? 'none',
    limits: basis.lowerLimit === null && basis.upperLimit === null ? 'none' : 'agreed',
    below: share(basis.lowerLimit),
    above: share(basis.upperLimit),
    decisionRule: basis.decisionRule,
    criticalContact: basis.criticalContact,
    cables: 'all',
    cableIds: [],
  };
}

/** What is sent of a form without problems; an instrument without a name is a row that was left empty. */
export function campaignFields(values: CampaignValues): Omit<CreateCampaign, 'id' | 'cableIds'> & EditCampaign {
  const { below, above } = values;
  const agreed = values.limits === 'agreed' && values.referenceKind !== 'none';
  return {
    name: values.name.trim(),
    startsOn: readDay(values.startsOn)!,
    endsOn: readDay(values.endsOn),
    crew: values.crew.trim(),
    instruments: values.instruments
      .filter((instrument) => !isEmptyInstrument(instrument))
      .map(({ name, serial, calibratedOn, calibrationDue }) => ({
        name: name.trim(),
        serial: serial.trim(),
        calibratedOn: readDay(calibratedOn),
        calibrationDue: readDay(calibrationDue),
      })),
    weather: values.weather.trim(),
    steelTemperature: values.steelTemperature.si,
    airTemperature: values.airTemperature.si,
    traffic: values.traffic.trim(),
    stage: values.stage.trim(),
    basis: {
      referenceKind: values.referenceKind === 'none' ? null : values.referenceKind,
      lowerLimit: agreed && below.si !== null ? withoutNoise(1 - below.si) : null,
      upperLimit: agreed && above.si !== null ? withoutNoise(1 + above.si) : null,
      decisionRule: values.decisionRule.trim(),
      criticalContact: values.criticalContact.trim(),
    },
  };
}

export function isEmptyInstrument(instrument: InstrumentValues): boolean {
  return Object.values(instrument).every((text) => text.trim() === '');
}

/** 1 − 0.05 is 0.95, not 0.9499999999999999. */
function withoutNoise(value: number): number {
  return Number(value.toPrecision(12));
}
