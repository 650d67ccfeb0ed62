import type { Cable, CampaignCable, CampaignDetail, Measurement, ModalPeak } from '@strandnote/api/contract';

/** An invented stay, its campaign and its visits, for the tests of the site. */

export function cableNamed(reference: string, over: Partial<Cable> = {}): Cable {
  return {
    id: `cable ${reference}`,
    structureId: 'structure',
    sectionId: 'section',
    reference,
    ownerReference: '',
    paintedMark: '',
    kind: 'stay',
    position: 0,
    lowerAnchor: null,
    upperAnchor: null,
    notes: '',
    section: {
      id: 'section',
      structureId: 'structure',
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
    },
    spans: [
      {
        id: `span ${reference}`,
        cableId: `cable ${reference}`,
        position: 0,
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
    references: [],
    ...over,
  };
}

export function designTension(value: number, over: Partial<Cable['references'][number]> = {}): Cable['references'][number] {
  return {
    id: `design ${value}`,
    cableId: 'cable',
    kind: 'design',
    stage: 'In service',
    place: 'mean-chord',
    value,
    relativeUncertainty: null,
    source: 'Drawing 12',
    dated: '2019-03-01',
    retiredAt: null,
    ...over,
  };
}

export function peaksAt(frequencies: readonly number[]): ModalPeak[] {
  return frequencies.map((frequency, index) => ({
    id: `peak ${index + 1}`,
    mode: index + 1,
    frequency,
    standardUncertainty: null,
    plane: 'in-plane',
    source: 'typed',
    used: true,
    setAsideReason: null,
  }));
}

/** Of this cable under about 2.5 MN. */
export const frequencies = [1.505, 3.012, 4.523, 6.041, 7.567];

export function visitTo(spanId: string, over: Partial<Measurement> = {}): Measurement {
  return {
    id: `visit to ${spanId}`,
    campaignId: 'campaign',
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
    peaks: peaksAt(frequencies),
    version: 1,
    enteredBy: 'Ida Falk',
    ...over,
  };
}

export function entryOf(cable: Cable, over: Partial<CampaignCable> = {}): CampaignCable {
  return { cable, notMeasuredReason: null, measurements: [], estimates: [], lastSurvey: [], ...over };
}

export function campaignOf(cables: CampaignCable[], over: Partial<CampaignDetail> = {}): CampaignDetail {
  return {
    id: 'campaign',
    structureId: 'structure',
    structureName: 'Orrin Bridge',
    structureTimeZone: 'Europe/London',
    elevation: null,
    number: 1,
    name: 'Autumn survey',
    startsOn: '2026-09-01',
    endsOn: null,
    crew: '',
    instruments: [],
    weather: '',
    steelTemperature: 16,
    airTemperature: 15,
    traffic: 'Open',
    stage: 'In service',
    basis: { referenceKind: 'design', lowerLimit: 0.9, upperLimit: 1.1, decisionRule: '', criticalContact: '' },
    state: 'open',
    cableCount: cables.length,
    measuredCount: 0,
    cables,
    ...over,
  };
}
