import { randomUUID } from 'node:crypto';
import type { CreateCable, CreateCampaign, CreateSection, PutMeasurement } from '@strandnote/api/contract';
import type { Reply, SignedIn } from '../support/test-server.ts';

/** An invented bridge with two stays, and an engineer's way to a campaign that is ready to be reported. */

export function sectionBody(): CreateSection {
  return {
    id: randomUUID(),
    name: '31 strands',
    strandKey: null,
    strandCount: 31,
    steelArea: 0.00465,
    modulus: 195e9,
    modulusSource: 'supplier',
    steelMass: 40,
    steelMassSource: 'supplier',
    sheathMass: 5,
    groutMass: 0,
    addedMassSource: 'as-built',
    massRelativeUncertainty: null,
    bendingStiffnessLow: 3e4,
    bendingStiffnessHigh: 3e5,
    breakingLoad: 8.6e6,
    breakingLoadSource: 'supplier',
  };
}

export function cableBody(sectionId: string, position: number): CreateCable {
  return {
    id: randomUUID(),
    sectionId,
    reference: `W-0${position}`,
    ownerReference: '',
    paintedMark: '',
    kind: 'stay',
    position,
    lowerAnchor: null,
    upperAnchor: null,
    notes: '',
    spans: [
      {
        id: randomUUID(),
        name: '',
        chordLength: 80,
        chordLengthSource: 'as-built',
        chordLengthTolerance: 0.03,
        lowerDeduction: 1,
        lowerDeductionTolerance: 0.06,
        upperDeduction: 0.5,
        upperDeductionTolerance: 0.06,
        deductionSource: 'taped',
        inclination: 0.5,
        lowerEnd: { kind: 'socket' },
        upperEnd: { kind: 'socket' },
        lowerDamper: 'none',
        upperDamper: 'none',
        damperPosition: null,
      },
    ],
  };
}

export function campaignBody(over: Partial<CreateCampaign> = {}): CreateCampaign {
  return {
    id: randomUUID(),
    name: 'Autumn survey',
    startsOn: '2026-09-01',
    endsOn: '2026-09-02',
    crew: '',
    instruments: [],
    weather: 'Dry',
    steelTemperature: 16,
    airTemperature: 15,
    traffic: 'Open',
    stage: 'In service',
    basis: { referenceKind: 'design', lowerLimit: 0.8, upperLimit: 1.2, decisionRule: '', criticalContact: '' },
    cableIds: null,
    ...over,
  };
}

export function measurementBody(spanId: string, frequencies: number[], over: Partial<PutMeasurement> = {}): PutMeasurement {
  return {
    spanId,
    visitedAt: '2026-09-01T09:00:00.000Z',
    sensorPosition: 3,
    excitation: 'ambient',
    lowerDamperState: 'none',
    upperDamperState: 'none',
    bushingState: 'none',
    crossTied: false,
    steelTemperature: 17,
    note: '',
    version: 0,
    peaks: frequencies.map((frequency, index) => ({
      id: randomUUID(),
      mode: index + 1,
      frequency,
      standardUncertainty: null,
      plane: 'in-plane',
      source: 'typed',
      used: true,
      setAsideReason: null,
    })),
    ...over,
  };
}

export interface SurveyedBridge {
  structureId: string;
  campaignId: string;
  sectionId: string;
  cables: { id: string; spanId: string; measurementId: string }[];
}

export const frequencies = [1.505, 3.012, 4.523, 6.041, 7.567];

/** Structure, two cables with a design tension, a campaign, a measurement of each cable and its estimate. */
export async function surveyBridge(engineer: SignedIn, over: Partial<CreateCampaign> = {}): Promise<SurveyedBridge> {
  const structureId = randomUUID();
  await ok(
    engineer.post('/structures', {
      id: structureId,
      name: 'Orrin Bridge',
      reference: '',
      kind: 'cable-stayed',
      ownerName: '',
      clientId: null,
      place: '',
      timeZone: 'Europe/London',
      elevation: null,
      notes: '',
    }),
  );
  const section = sectionBody();
  await ok(engineer.post(`/structures/${structureId}/sections`, section));
  const cables = [cableBody(section.id, 1), cableBody(section.id, 2)];
  for (const cable of cables) {
    await ok(engineer.post(`/structures/${structureId}/cables`, cable));
    await ok(
      engineer.post(`/cables/${cable.id}/references`, {
        id: randomUUID(),
        kind: 'design',
        stage: 'In service',
        place: 'mean-chord',
        value: 2.5e6,
        relativeUncertainty: null,
        source: 'Drawing 12',
        dated: '2019-03-01',
      }),
    );
  }
  const placed = cables.map(({ id, spans }) => ({ id, spanId: spans[0]!.id }));
  return { structureId, sectionId: section.id, ...(await surveyCampaign(engineer, structureId, placed, over)) };
}

/** One more campaign on the same cables, measured and estimated. */
export async function surveyCampaign(
  engineer: SignedIn,
  structureId: string,
  cables: { id: string; spanId: string }[],
  over: Partial<CreateCampaign> = {},
): Promise<Pick<SurveyedBridge, 'campaignId' | 'cables'>> {
  const campaign = campaignBody(over);
  await ok(engineer.post(`/structures/${structureId}/campaigns`, campaign));
  const measured = cables.map((cable) => ({ ...cable, measurementId: randomUUID() }));
  for (const { spanId, measurementId } of measured) {
    await ok(engineer.put(`/campaigns/${campaign.id}/measurements/${measurementId}`, measurementBody(spanId, frequencies)));
  }
  const saved = await ok(engineer.post(`/campaigns/${campaign.id}/estimates`, { measurementIds: null }));
  if (saved.body.refused.length > 0) throw new Error(JSON.stringify(saved.body.refused));
  return { campaignId: campaign.id, cables: measured };
}

/** The reply, or an error that shows what the server said. */
export async function ok(call: Promise<Reply>): Promise<Reply> {
  const reply = await call;
  if (reply.status >= 300) throw new Error(`${reply.status} ${reply.text}`);
  return reply;
}
