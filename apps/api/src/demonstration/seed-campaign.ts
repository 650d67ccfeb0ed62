import type { CreateCampaign } from '@strandnote/api/contract';
import type { Actor } from '@strandnote/db';
import { createCampaign } from '../campaigns/create-campaign.ts';
import { excuseCable } from '../campaigns/excuse-cable.ts';
import type { AppDeps } from '../deps.ts';
import { saveEstimates } from '../estimates/save-estimates.ts';
import { putMeasurement } from '../measurements/put-measurement.ts';
import { type EnteredCable, finishedStage } from './seed-structure.ts';
import type { SeededRandom } from './seeded-random.ts';
import { simulatePeaks, type Truth } from './simulate-survey.ts';

export interface SeedCampaign {
  structureId: string;
  name: string;
  day: string;
  steelTemperature: number;
  /** The cables that were visited, with how they really are. */
  visited: { cable: EnteredCable; truth: Truth; modeCount: number }[];
  excused: { cable: EnteredCable; reason: string }[];
  limits: [lower: number, upper: number] | null;
}

/** Enters a campaign with simulated peaks and saves its estimates. @returns the campaign's id */
export async function seedCampaign(deps: AppDeps, engineer: Actor, campaign: SeedCampaign, random: SeededRandom): Promise<string> {
  const id = random.uuid();
  await createCampaign(deps, engineer, campaign.structureId, campaignBody(id, campaign));
  for (const [index, { cable, truth, modeCount }] of campaign.visited.entries()) {
    const minutes = 9 * 60 + index * 8;
    const time = `${String(Math.floor(minutes / 60)).padStart(2, '0')}:${String(minutes % 60).padStart(2, '0')}`;
    await putMeasurement(
      deps,
      engineer,
      { campaignId: id, measurementId: random.uuid() },
      {
        spanId: cable.spanId,
        visitedAt: `${campaign.day}T${time}:00Z`,
        sensorPosition: 3.2,
        excitation: 'ambient',
        lowerDamperState: 'none',
        upperDamperState: 'none',
        bushingState: 'none',
        crossTied: false,
        steelTemperature: campaign.steelTemperature,
        note: '',
        peaks: simulatePeaks(cable.section, cable.span, truth, modeCount, random),
        version: 0,
      },
    );
  }
  for (const { cable, reason } of campaign.excused) {
    await excuseCable(deps, engineer, { campaignId: id, cableId: cable.cableId }, { notMeasuredReason: reason });
  }
  await saveEstimates(deps, engineer, id, { measurementIds: null });
  return id;
}

function campaignBody(id: string, { name, day, steelTemperature, limits }: SeedCampaign): CreateCampaign {
  return {
    id,
    name,
    startsOn: day,
    endsOn: day,
    crew: 'I. Callowell, one assistant',
    instruments: [{ name: 'Accelerometer, three axes', serial: 'LM-0042', calibratedOn: '2025-01-20', calibrationDue: '2027-01-20' }],
    weather: 'Overcast, wind 3 to 5 m/s',
    steelTemperature,
    airTemperature: steelTemperature + 1,
    traffic: 'One lane closed, light traffic on the other',
    stage: finishedStage,
    basis: {
      referenceKind: 'design',
      lowerLimit: limits?.[0] ?? null,
      upperLimit: limits?.[1] ?? null,
      decisionRule: limits ? 'Four zones by the 95 % interval, each side on its own; agreed with the County before the survey.' : '',
      criticalContact: 'Duty engineer of the County, bridges',
    },
    cableIds: null,
  };
}
