import type { CampaignCable, CampaignDetail, Estimate, Measurement, Section, Span, SpanEnd } from '@strandnote/api/contract';
import { defaultRelativeUncertainty, fixityOfDetail, freeLength, massPerLength } from '@strandnote/core';
import type { FrozenEnd, FrozenInput, FrozenMeasurement, FrozenReference, FrozenSpan } from '@strandnote/core/report-content';
import { decideSpan } from './decide-span.ts';

interface Surroundings {
  entry: CampaignCable;
  campaign: CampaignDetail;
  reference: FrozenReference | null;
}

/** One span of a cable as a report freezes it: its inputs with their sources, what was measured, and what came out. */
export function freezeSpan(span: Span, { entry, campaign, reference }: Surroundings): FrozenSpan {
  const measurement = reportedMeasurement(entry, span.id);
  const estimate = measurement && reportedEstimate(entry, measurement);
  const last = entry.lastSurvey.find(({ spanId }) => spanId === span.id);
  return {
    id: span.id,
    name: span.name,
    inputs: [...lengthInputs(span), ...sectionInputs(entry.cable.section)],
    lowerEnd: freezeEnd(span.lowerEnd),
    upperEnd: freezeEnd(span.upperEnd),
    lowerDamper: span.lowerDamper,
    upperDamper: span.upperDamper,
    measurement: measurement && freezeMeasurement(measurement),
    estimate: estimate && freezeEstimate(estimate),
    decision: decideSpan({
      estimate: estimate?.output ?? null,
      notMeasuredReason: entry.notMeasuredReason,
      reference,
      stage: campaign.stage,
      basis: campaign.basis,
    }),
    lastSurvey: last
      ? { tension: last.tension, campaignName: last.campaignName, startsOn: last.startsOn, steelTemperature: last.steelTemperature }
      : null,
  };
}

/** Of several visits to a span the report takes the last that gave a peak to use, and the last of all if none did. */
export function reportedMeasurement(entry: CampaignCable, spanId: string): Measurement | null {
  const visits = entry.measurements
    .filter((measurement) => measurement.spanId === spanId)
    .toSorted((a, b) => Date.parse(b.visitedAt) - Date.parse(a.visitedAt) || a.id.localeCompare(b.id));
  return visits.find(({ peaks }) => peaks.some(({ used }) => used)) ?? visits[0] ?? null;
}

/** A visit whose peaks are all set aside speaks for no tension, whatever was computed from it before. */
export function reportedEstimate(entry: CampaignCable, measurement: Measurement): Estimate | null {
  if (!measurement.peaks.some(({ used }) => used)) return null;
  return entry.estimates.find(({ measurementId }) => measurementId === measurement.id) ?? null;
}

function freezeEstimate({ id, engineVersion, createdAt, input, output }: Estimate): FrozenSpan['estimate'] {
  return { id, engineVersion, createdAt, input, output };
}

function freezeMeasurement(measurement: Measurement): FrozenMeasurement {
  const { campaignId: _campaign, spanId: _span, version: _version, peaks, ...visit } = measurement;
  const inOrder = peaks.toSorted(
    (a, b) => a.mode - b.mode || a.plane.localeCompare(b.plane) || a.frequency - b.frequency || a.id.localeCompare(b.id),
  );
  return { ...visit, peaks: inOrder.map(({ id: _id, ...peak }) => peak) };
}

function lengthInputs(span: Span): FrozenInput[] {
  const rectangular = (tolerance: number) => tolerance / Math.sqrt(3);
  const free = freeLength(span);
  return [
    input('chord-length', span.chordLength, rectangular(span.chordLengthTolerance), span.chordLengthSource),
    input('lower-deduction', span.lowerDeduction, rectangular(span.lowerDeductionTolerance), span.deductionSource),
    input('upper-deduction', span.upperDeduction, rectangular(span.upperDeductionTolerance), span.deductionSource),
    input('free-length', free.length, free.standardUncertainty, null),
    input('inclination', span.inclination, null, null),
  ];
}

function sectionInputs(section: Section): FrozenInput[] {
  const mass = massPerLength(section);
  const steel = section.steelMass * defaultRelativeUncertainty(section.steelMassSource);
  const added = defaultRelativeUncertainty(section.addedMassSource);
  return [
    input('steel-area', section.steelArea, null, null),
    input('modulus', section.modulus, null, section.modulusSource),
    input('steel-mass', section.steelMass, steel, section.steelMassSource),
    input('sheath-mass', section.sheathMass, section.sheathMass * added, section.addedMassSource),
    input('grout-mass', section.groutMass, section.groutMass * added, section.addedMassSource),
    input('mass-per-length', mass.value, mass.value * mass.relativeUncertainty, null),
    input('bending-stiffness-low', section.bendingStiffnessLow, null, null),
    input('bending-stiffness-high', section.bendingStiffnessHigh, null, null),
    input('breaking-load', section.breakingLoad, null, section.breakingLoadSource),
  ];
}

function input(
  quantity: FrozenInput['quantity'],
  value: number,
  standardUncertainty: number | null,
  source: FrozenInput['source'],
): FrozenInput {
  return { quantity, value, standardUncertainty, source };
}

function freezeEnd(end: SpanEnd): FrozenEnd {
  switch (end.kind) {
    case 'unknown':
      return { kind: end.kind, fixity: [0, 1], rotationalStiffness: null };
    case 'hinged':
      return { kind: end.kind, fixity: [0, 0], rotationalStiffness: null };
    case 'clamped':
      return { kind: end.kind, fixity: [1, 1], rotationalStiffness: null };
    case 'fixity':
      return { kind: end.kind, fixity: [end.low, end.high], rotationalStiffness: null };
    case 'stiffness':
      return { kind: end.kind, fixity: null, rotationalStiffness: end.rotationalStiffness };
    default:
      return { kind: end.kind, fixity: fixityOfDetail[end.kind], rotationalStiffness: null };
  }
}
