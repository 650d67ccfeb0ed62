import {
  type Cable,
  decide,
  estimateTension,
  type ModalPeak,
  massPerLength,
  naturalFrequencies,
  strandSection,
  surveyedCable,
  tensionAt,
} from '@strandnote/core';
import type {
  FrozenCable,
  FrozenInput,
  FrozenMeasurement,
  FrozenReference,
  FrozenSpan,
  ReportContent,
} from '@strandnote/core/report-content';

/**
 * The content of a report on an invented cable-stayed bridge, with frequencies simulated from the core's own models and
 * estimates by the core: every zone, cables that were not measured, peaks set aside, dampers, a cable with warnings.
 */

type Story =
  | 'plain'
  | 'high'
  | 'slightly-high'
  | 'near-the-limit'
  | 'not-measured'
  | 'two-poor-peaks'
  | 'other-stage'
  | 'no-reference'
  | 'wrong-mode'
  | 'damped';

/** What happens to the cables of the bridge, by their place in the survey; the others are as they should be. */
const stories: Record<number, Story> = {
  1: 'high',
  2: 'near-the-limit',
  3: 'slightly-high',
  4: 'not-measured',
  5: 'two-poor-peaks',
  6: 'other-stage',
  7: 'no-reference',
  8: 'wrong-mode',
  9: 'damped',
  40: 'not-measured',
};
const trueOverDesign: Partial<Record<Story, number>> = { high: 1.135, 'slightly-high': 1.072, 'near-the-limit': 1.042 };

const section = {
  ...strandSection('y1860s7-15.7', 37),
  steelMassSource: 'supplier',
  sheathMass: 6.4,
  groutMass: 0,
  addedMassSource: 'supplier',
  massRelativeUncertainty: null,
} as const;
const surveyedSection = {
  ...section,
  bendingStiffnessLow: section.bendingStiffnessBounds[0],
  bendingStiffnessHigh: section.bendingStiffnessBounds[1],
};

interface Stay {
  index: number;
  reference: string;
  lower: { x: number; y: number; z: number };
  upper: { x: number; y: number; z: number };
  design: number;
  story: Story;
}

const made = new Map<number, ReportContent>();

/**
 * @param count how many of the bridge's 56 stays the report covers
 * @returns the same content each time; do not change it, copy it
 */
export function sampleReportContent(count: 12 | 56 = 12): ReportContent {
  let content = made.get(count);
  if (!content) {
    content = { ...frame, cables: stays().slice(0, count).map(freezeStay) };
    made.set(count, content);
  }
  return content;
}

function stays(): Stay[] {
  const offsets = [18, 32, 46, 60, 74, 88, 102];
  const fan = [...offsets.map((offset) => -offset).reverse(), ...offsets];
  const places = [
    { letter: 'W', x: -125 },
    { letter: 'E', x: 125 },
  ].flatMap(({ letter, x }) => (['u', 'd'] as const).flatMap((side) => fan.map((offset, order) => ({ letter, x, side, offset, order }))));
  return places.map(({ letter, x, side, offset, order }, index): Stay => {
    const y = side === 'u' ? 10.5 : -10.5;
    const lower = { x: x + offset, y, z: 0 };
    const upper = { x: x + Math.sign(offset) * 1.1, y: y * 0.4, z: 30 + 5.5 * offsets.indexOf(Math.abs(offset)) };
    const { inclination } = chordOf({ lower, upper });
    const reference = `${letter}-${String(order + 1).padStart(2, '0')}${side}`;
    return {
      index,
      reference,
      lower,
      upper,
      design: Math.round(1.9e6 / Math.sin(inclination) / 1e4) * 1e4,
      story: stories[index] ?? 'plain',
    };
  });
}

function chordOf({ lower, upper }: Pick<Stay, 'lower' | 'upper'>) {
  const [run, rise] = [Math.hypot(upper.x - lower.x, upper.y - lower.y), upper.z - lower.z];
  return { length: Math.hypot(run, rise), inclination: Math.atan2(rise, run), rise };
}

function spanOf(stay: Stay) {
  const chord = chordOf(stay);
  return {
    chordLength: Math.round(chord.length * 1000) / 1000,
    chordLengthTolerance: 0.03,
    lowerDeduction: 1.25,
    lowerDeductionTolerance: 0.05,
    upperDeduction: 0.9,
    upperDeductionTolerance: 0.05,
    inclination: chord.inclination,
    lowerEnd: { kind: 'socket' },
    upperEnd: { kind: 'unknown' },
    damperPosition: stay.story === 'damped' ? 1.6 : null,
  } as const;
}

function freezeStay(stay: Stay): FrozenCable {
  return {
    id: uuid(3, stay.index),
    reference: stay.reference,
    ownerReference: `MFC/${stay.reference.slice(0, 1)}/${stay.index + 101}`,
    paintedMark: String(stay.index + 1),
    kind: 'stay',
    sectionName: '37 × 15.7 mm sheathed strand',
    lowerAnchor: stay.lower,
    upperAnchor: stay.upper,
    referenceTension: referenceOf(stay),
    notMeasuredReason: stay.story === 'not-measured' ? 'Scaffold of the painters at the lower end; no safe reach.' : null,
    spans: [freezeSpan(stay)],
  };
}

function referenceOf(stay: Stay): FrozenReference | null {
  if (stay.story === 'no-reference') return null;
  const hung = { massPerLength: massPerLength(surveyedSection).value, rise: chordOf(stay).rise };
  return {
    kind: 'design',
    stage: stay.story === 'other-stage' ? 'Deck closed, before surfacing' : 'In service',
    place: 'lower-end',
    value: stay.design,
    meanChordValue: tensionAt(stay.design, 'lower-end', 'mean-chord', hung),
    relativeUncertainty: null,
    source: 'Drawing MFC-S-204, revision 3',
    dated: '2014-05-02',
  };
}

function freezeSpan(stay: Stay): FrozenSpan {
  const span = spanOf(stay);
  const measured = stay.story !== 'not-measured';
  const peaks = measured ? peaksOf(stay) : [];
  const input = {
    cable: surveyedCable(surveyedSection, span, visitOf(stay)),
    peaks: peaks.filter(({ used }) => used).map(toModalPeak),
    options: { sensorPosition: 3 },
  };
  const output = measured ? estimateTension(input.cable, input.peaks, input.options) : null;
  const reference = referenceOf(stay);
  const [lowerLimit, upperLimit] = reference ? [0.95 * reference.meanChordValue, 1.05 * reference.meanChordValue] : [null, null];
  const { zone, reason, toReference } = decide({
    estimate: output,
    lowerLimit,
    upperLimit,
    reference: reference?.meanChordValue ?? null,
    notComparable: stay.story === 'other-stage' ? 'The design tension is given for another stage: deck closed, before surfacing.' : null,
  });
  return {
    id: uuid(2, stay.index),
    name: '',
    inputs: inputsOf(stay),
    lowerEnd: { kind: 'socket', fixity: [0.7, 1], rotationalStiffness: null },
    upperEnd: { kind: 'unknown', fixity: [0, 1], rotationalStiffness: null },
    lowerDamper: stay.story === 'damped' ? 'fitted' : 'none',
    upperDamper: 'none',
    measurement: measured ? { ...visitOf(stay), ...measurementFrame(stay), peaks } : null,
    estimate: output && {
      id: uuid(5, stay.index),
      engineVersion: output.engineVersion,
      createdAt: '2026-09-03T10:20:00.000Z',
      input,
      output,
    },
    decision: { zone, reason, lowerLimit, upperLimit, toReference },
    lastSurvey:
      stay.index % 3 === 0
        ? null
        : {
            tension: stay.design * (0.985 + 0.004 * (stay.index % 5)),
            campaignName: 'Spring survey 2021',
            startsOn: '2021-04-12',
            steelTemperature: 9,
          },
  };
}

function visitOf(stay: Stay) {
  return {
    lowerDamperState: stay.story === 'damped' ? 'connected' : 'none',
    upperDamperState: 'none',
    bushingState: 'none',
    crossTied: false,
  } as const;
}

function measurementFrame({
  index,
  story,
}: Stay): Omit<FrozenMeasurement, 'peaks' | 'lowerDamperState' | 'upperDamperState' | 'bushingState' | 'crossTied'> {
  return {
    id: uuid(4, index),
    visitedAt: new Date(Date.UTC(2026, 8, 1, 7, 30) + index * 12 * 60_000).toISOString(),
    enteredBy: 'Ines Falk',
    sensorPosition: 3,
    excitation: index % 4 === 0 ? 'mallet' : 'ambient',
    steelTemperature: 14 + (index % 5) * 0.5,
    note: story === 'wrong-mode' ? 'Strong vibration of the deck near 1.1 Hz while a train of lorries passed.' : '',
  };
}

type Peak = FrozenMeasurement['peaks'][number];

/** Frequencies of the true cable with noise of 0.15 %, as a survey reads them. */
function peaksOf(stay: Stay): Peak[] {
  const cable: Cable = {
    ...surveyedCable(surveyedSection, spanOf(stay), { ...visitOf(stay), lowerDamperState: 'none' }),
    ends: [{ fixity: [0.9, 0.9] }, { fixity: [0.75, 0.75] }],
  };
  const tension = stay.design * (trueOverDesign[stay.story] ?? 1 + 0.012 * Math.sin(stay.index * 1.7));
  const bendingStiffness = Math.sqrt(surveyedSection.bendingStiffnessLow * surveyedSection.bendingStiffnessHigh);
  const frequencies = naturalFrequencies(cable, { tension, bendingStiffness }, 8);
  const noise = seededNoise(stay.index + 1);
  const read = frequencies.map((frequency, order) => ({
    mode: order + 1,
    frequency: Number((frequency * (1 + 0.0015 * noise())).toFixed(4)),
  }));
  if (stay.story === 'two-poor-peaks') return read.slice(0, 2).map((peak) => toPeak(peak, { standardUncertainty: 0.11 * peak.frequency }));
  if (stay.story === 'wrong-mode')
    return [...read.slice(0, 3), { mode: 4, frequency: Number((read[3]!.frequency * 1.021).toFixed(4)) }, ...read.slice(4, 6)].map((peak) =>
      toPeak(peak, { standardUncertainty: Number((0.0015 * peak.frequency).toFixed(4)) }),
    );
  const foreign =
    stay.index % 6 === 2
      ? [
          toPeak(
            { mode: 9, frequency: 7.431 },
            { used: false, setAsideReason: 'A mode of the deck: it stands at the same place on the sister cable.' },
          ),
        ]
      : [];
  return [
    ...read.map((peak) => toPeak(peak, { source: 'record', standardUncertainty: Number((0.0015 * peak.frequency).toFixed(4)) })),
    ...foreign,
  ];
}

function toPeak(peak: { mode: number; frequency: number }, over: Partial<Peak> = {}): Peak {
  return { ...peak, standardUncertainty: null, plane: 'in-plane', source: 'typed', used: true, setAsideReason: null, ...over };
}

function toModalPeak({ mode, frequency, standardUncertainty, plane }: Peak): ModalPeak {
  return { mode, frequency, plane, ...(standardUncertainty === null ? {} : { standardUncertainty }) };
}

function inputsOf(stay: Stay): FrozenInput[] {
  const span = spanOf(stay);
  const rectangular = (tolerance: number) => tolerance / Math.sqrt(3);
  const length = span.chordLength - span.lowerDeduction - span.upperDeduction;
  const mass = massPerLength(surveyedSection);
  const input = (
    quantity: FrozenInput['quantity'],
    value: number,
    standardUncertainty: number | null,
    source: FrozenInput['source'],
  ): FrozenInput => ({ quantity, value, standardUncertainty, source });
  return [
    input('chord-length', span.chordLength, rectangular(0.03), 'as-built'),
    input('lower-deduction', span.lowerDeduction, rectangular(0.05), 'taped'),
    input('upper-deduction', span.upperDeduction, rectangular(0.05), 'design'),
    input('free-length', length, Math.hypot(rectangular(0.03), rectangular(0.05), rectangular(0.05)), null),
    input('inclination', span.inclination, null, null),
    input('steel-area', section.steelArea, null, null),
    input('modulus', section.modulus, null, 'supplier'),
    input('steel-mass', section.steelMass, section.steelMass * 0.01, 'supplier'),
    input('sheath-mass', section.sheathMass, section.sheathMass * 0.01, 'supplier'),
    input('grout-mass', 0, 0, 'supplier'),
    input('mass-per-length', mass.value, mass.value * mass.relativeUncertainty, null),
    input('bending-stiffness-low', surveyedSection.bendingStiffnessLow, null, null),
    input('bending-stiffness-high', surveyedSection.bendingStiffnessHigh, null, null),
    input('breaking-load', section.breakingLoad, null, 'supplier'),
  ];
}

/** Normal deviates that are the same in every run (Park and Miller's generator, Box and Muller's pairs). */
function seededNoise(seed: number): () => number {
  let state = (seed * 7919) % 2147483647;
  const uniform = () => {
    state = (state * 48271) % 2147483647;
    return state / 2147483647;
  };
  return () => Math.sqrt(-2 * Math.log(uniform())) * Math.cos(2 * Math.PI * uniform());
}

function uuid(kind: number, index: number): string {
  return `00000000-0000-4000-80${kind}0-${String(index + 1).padStart(12, '0')}`;
}

const frame: Omit<ReportContent, 'cables'> = {
  version: 1,
  engineVersion: '1.0.0',
  firm: {
    name: 'Falk and Reyes, Structural Engineers',
    addressLines: ['1 Quay Street', 'Port Ansel'],
    phone: '+00 5550 1234',
    email: 'office@falk-reyes.example',
    registration: 'Registered in Ansel no. 004417',
    demonstration: true,
  },
  client: { id: uuid(8, 0), name: 'Ansel County Roads', address: 'County Hall, 40 Mill Lane, Port Ansel' },
  report: { number: 'SN-0231', title: 'Cable tensions of Marrow Firth Crossing, autumn 2026', letter: 'B' },
  author: { userId: 'author', name: 'Ines Falk' },
  structure: {
    id: uuid(9, 0),
    name: 'Marrow Firth Crossing',
    reference: 'AC-0117',
    kind: 'cable-stayed',
    ownerName: 'Ansel County',
    place: 'Marrow Firth, Ansel County',
    timeZone: 'Europe/London',
    elevation: {
      deck: [
        { x: -245, z: 0 },
        { x: 245, z: 0 },
      ],
      supports: [
        [
          { x: -125, z: -24 },
          { x: -125, z: 66 },
        ],
        [
          { x: 125, z: -24 },
          { x: 125, z: 66 },
        ],
      ],
    },
  },
  campaign: {
    id: uuid(7, 0),
    number: 4,
    name: 'Autumn survey 2026',
    startsOn: '2026-09-01',
    endsOn: '2026-09-03',
    crew: 'Ines Falk, Tomas Reyes',
    instruments: [
      { name: 'Accelerometer, three axes, 10 V/g', serial: 'A-2217', calibratedOn: '2026-02-11', calibrationDue: '2027-02-11' },
      { name: 'Logger, 24 bit, 200 samples/s', serial: 'L-0032', calibratedOn: '2025-11-20', calibrationDue: '2026-11-20' },
      { name: 'Contact thermometer', serial: 'T-9', calibratedOn: null, calibrationDue: null },
    ],
    weather: 'Dry, overcast, wind 3 to 6 m/s from the west',
    steelTemperature: 15,
    airTemperature: 14,
    traffic: 'One lane in each direction, lorries allowed',
    stage: 'In service',
    basis: {
      referenceKind: 'design',
      lowerLimit: 0.95,
      upperLimit: 1.05,
      decisionRule: 'A cable is within or outside when its whole 95 % interval is; otherwise it is reported as not proven.',
      criticalContact: 'Duty engineer of Ansel County Roads, +00 5550 9900',
    },
  },
  texts: {
    scope:
      'Tension of the stays of the crossing by ambient vibration, for comparison with the design tensions at the finished stage. Anchorages, sockets and dampers were not inspected.',
    conditions:
      'The survey took place on three dry days. The deck carried its usual traffic on one lane in each direction; the other lanes were closed for the crew.\n\nSteel temperature was read on the sunny and the shaded side of four stays in the morning and in the afternoon.',
    deviations: 'Two stays could not be reached because of the painters’ scaffold; they are listed with the reason.',
    conclusion:
      'The tensions agree with the design within the agreed limits except where the table says otherwise. We recommend a lift-off reading of the stay found outside, before the resurfacing in spring, and a second visit to the stays that were not measured.',
  },
};
