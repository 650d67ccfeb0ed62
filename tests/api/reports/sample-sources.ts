import type { Cable, CampaignCable, CampaignDetail, Measurement, ReferenceTension, Section, Span } from '@strandnote/api/contract';
import type { ReportSources } from '../../../apps/api/src/reports/build-content.ts';

/** An invented campaign in the shapes that the checklist has, for tests that need no database. */

const structureId = '00000000-0000-4000-8000-000000000001';
const campaignId = '00000000-0000-4000-8000-000000000002';
const numbered = (kind: number, index: number) => `00000000-0000-4000-80${kind}0-${String(index).padStart(12, '0')}`;

export function sampleSection(over: Partial<Section> = {}): Section {
  return {
    id: numbered(1, 1),
    structureId,
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
    ...over,
  };
}

export function sampleSpan(index: number, over: Partial<Span> = {}): Span {
  return {
    id: numbered(2, index),
    cableId: numbered(3, index),
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
    lowerEnd: { kind: 'unknown' },
    upperEnd: { kind: 'socket' },
    lowerDamper: 'none',
    upperDamper: 'none',
    damperPosition: null,
    ...over,
  };
}

export function sampleReference(index: number, over: Partial<ReferenceTension> = {}): ReferenceTension {
  return {
    id: numbered(4, index),
    cableId: numbered(3, index),
    kind: 'design',
    stage: 'In service',
    place: 'mean-chord',
    value: 2.5e6,
    relativeUncertainty: null,
    source: 'Drawing 12',
    dated: '2019-03-01',
    retiredAt: null,
    ...over,
  };
}

export function sampleCable(index: number, over: Partial<Cable> = {}): Cable {
  return {
    id: numbered(3, index),
    structureId,
    sectionId: numbered(1, 1),
    reference: `W-${String(index).padStart(2, '0')}`,
    ownerReference: '',
    paintedMark: '',
    kind: 'stay',
    position: index,
    lowerAnchor: null,
    upperAnchor: null,
    notes: '',
    section: sampleSection(),
    spans: [sampleSpan(index)],
    references: [sampleReference(index)],
    ...over,
  };
}

export function sampleMeasurement(index: number, over: Partial<Measurement> = {}): Measurement {
  return {
    id: numbered(5, index),
    campaignId,
    spanId: numbered(2, index),
    visitedAt: '2026-09-01T09:00:00.000Z',
    sensorPosition: 3,
    excitation: 'ambient',
    lowerDamperState: 'none',
    upperDamperState: 'none',
    bushingState: 'none',
    crossTied: false,
    steelTemperature: 17,
    note: '',
    peaks: [1.505, 3.012, 4.523, 6.041].map((frequency, mode) => ({
      id: numbered(6, index * 10 + mode),
      mode: mode + 1,
      frequency,
      standardUncertainty: null,
      plane: 'in-plane',
      source: 'typed',
      used: true,
      setAsideReason: null,
    })),
    version: 1,
    enteredBy: 'Ines Falk',
    ...over,
  };
}

export function sampleEntry(index: number, over: Partial<CampaignCable> = {}): CampaignCable {
  return {
    cable: sampleCable(index),
    notMeasuredReason: null,
    measurements: [sampleMeasurement(index)],
    estimates: [],
    lastSurvey: [],
    ...over,
  };
}

export function sampleCampaign(cables: CampaignCable[], over: Partial<CampaignDetail> = {}): CampaignDetail {
  return {
    id: campaignId,
    structureId,
    structureName: 'Orrin Bridge',
    number: 2,
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
    measuredCount: cables.length,
    structureTimeZone: 'Europe/London',
    elevation: null,
    cables,
    ...over,
  };
}

export function sampleSources(campaign: CampaignDetail, over: Partial<ReportSources> = {}): ReportSources {
  return {
    engineVersion: '1',
    firm: {
      id: numbered(7, 1),
      name: 'Falk and Reyes',
      timeZone: 'Europe/London',
      letterhead: { addressLines: ['1 Quay Street'], phone: '', email: '', registration: '' },
      reportPrefix: 'SN-',
      demonstration: false,
    },
    client: { id: numbered(8, 1), name: 'County Roads', address: '' },
    report: { number: 'SN-0001', title: 'Cable forces', letter: 'A' },
    author: { userId: 'author', name: 'Ines Falk' },
    structure: {
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
      cableCount: campaign.cables.length,
    },
    campaign,
    texts: { scope: 'All stays.', conditions: 'Dry.', deviations: 'None.', conclusion: 'See the table.' },
    ...over,
  };
}
