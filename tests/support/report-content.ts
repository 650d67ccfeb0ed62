import { decide, estimateTension, massPerLength, surveyedCable, tensionAt } from '@strandnote/core';
import type {
  FrozenCable,
  FrozenInput,
  FrozenMeasurement,
  FrozenReference,
  FrozenSpan,
  ReportContent,
} from '@strandnote/core/report-content';
import { reportFrame, uuid } from './report-frame.ts';
import { chordOf, peaksOf, type Stay, section, spanOf, stays, surveyedSection, toModalPeak, visitOf } from './simulated-stays.ts';

/**
 * The content of a report on an invented cable-stayed bridge, with frequencies simulated from the core's own models and
 * estimates by the core: every zone, cables that were not measured, peaks set aside, dampers, a cable with warnings.
 */

const made = new Map<number, ReportContent>();

/**
 * @param count how many of the bridge's 56 stays the report covers
 * @returns the same content each time; do not change it, copy it
 */
export function sampleReportContent(count: 12 | 56 = 12): ReportContent {
  let content = made.get(count);
  if (!content) {
    content = { ...reportFrame, cables: stays().slice(0, count).map(freezeStay) };
    made.set(count, content);
  }
  return content;
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
