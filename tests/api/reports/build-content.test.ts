import type { CampaignCable, CampaignDetail, Measurement } from '@strandnote/api/contract';
import { estimateTension } from '@strandnote/core';
import { reportContent } from '@strandnote/core/report-content';
import { expect, test } from 'vitest';
import { estimateInputOf } from '../../../apps/api/src/estimates/estimate-input.ts';
import { buildReportContent } from '../../../apps/api/src/reports/build-content.ts';
import { canonicalJson, sha256OfJson } from '../../../apps/api/src/reports/canonical-json.ts';
import { findBlockers } from '../../../apps/api/src/reports/find-blockers.ts';
import { estimated } from './estimated-entry.ts';
import {
  sampleCable,
  sampleCampaign,
  sampleEntry,
  sampleMeasurement,
  sampleReference,
  sampleSection,
  sampleSources,
  sampleSpan,
} from './sample-sources.ts';

function contentOf(entries: CampaignCable[], over: Partial<CampaignDetail> = {}) {
  return buildReportContent(sampleSources(sampleCampaign(entries, over)));
}

test('puts together content that its own schema accepts, and the same content each time', () => {
  const content = contentOf([estimated(sampleEntry(1)), sampleEntry(2, { measurements: [], notMeasuredReason: 'Scaffold' })]);
  expect(reportContent.parse(content)).toEqual(content);
  expect(sha256OfJson(content)).toBe(sha256OfJson(JSON.parse(canonicalJson(content))));
  expect(sha256OfJson(content)).toBe(
    sha256OfJson(contentOf([estimated(sampleEntry(1)), sampleEntry(2, { measurements: [], notMeasuredReason: 'Scaffold' })])),
  );
});

test('lists each input with its value, its standard uncertainty and its source', () => {
  const [cable] = contentOf([estimated(sampleEntry(1))]).cables;
  const inputs = Object.fromEntries(cable!.spans[0]!.inputs.map((input) => [input.quantity, input]));
  expect(inputs['chord-length']).toMatchObject({ value: 80, source: 'as-built' });
  // A rectangular distribution of half-width 0.03 m: 0.03/√3 (JCGM 100:2008, 4.3.7).
  expect(inputs['chord-length']!.standardUncertainty).toBeCloseTo(0.0173205, 7);
  expect(inputs['free-length']!.value).toBeCloseTo(78.5, 12);
  // √((0.03² + 0.06² + 0.06²)/3) m
  expect(inputs['free-length']!.standardUncertainty).toBeCloseTo(0.0519615, 7);
  expect(inputs['mass-per-length']!.value).toBe(45);
  expect(inputs['sheath-mass']).toMatchObject({ value: 5, source: 'as-built' });
  expect(inputs['sheath-mass']!.standardUncertainty).toBeCloseTo(0.15, 12);
  expect(cable!.spans[0]!.lowerEnd).toEqual({ kind: 'unknown', fixity: [0, 1], rotationalStiffness: null });
});

test('freezes the tension that the core computes from the same inputs', () => {
  const entry = sampleEntry(1);
  const [cable] = contentOf([estimated(entry)]).cables;
  const input = estimateInputOf(entry.cable, entry.measurements[0]!);
  expect(cable!.spans[0]!.estimate!.output).toEqual(estimateTension(input.cable, input.peaks, input.options));
});

test('reports the last visit that gave a peak to use', () => {
  const early = sampleMeasurement(1);
  const late = sampleMeasurement(2, { spanId: early.spanId, visitedAt: '2026-09-02T09:00:00.000Z' });
  const unusable = sampleMeasurement(3, {
    spanId: early.spanId,
    visitedAt: '2026-09-03T09:00:00.000Z',
    peaks: late.peaks.map((peak) => ({ ...peak, used: false, setAsideReason: 'Clipped' })),
  });
  const reported = (measurements: Measurement[]) => contentOf([sampleEntry(1, { measurements })]).cables[0]!.spans[0]!.measurement!.id;
  expect(reported([early, late])).toBe(late.id);
  expect(reported([unusable, late, early])).toBe(late.id);
  expect(reported([unusable])).toBe(unusable.id);
});

test('compares with the latest reference of the agreed kind, at the stage of the campaign and at the mean chord', () => {
  const references = [
    sampleReference(1, { value: 1e6, dated: '2010-01-01' }),
    sampleReference(2, { value: 2e6, dated: '2020-01-01', place: 'upper-end' }),
    sampleReference(3, { value: 3e6, dated: '2022-01-01', stage: 'Before closure' }),
    sampleReference(4, { value: 4e6, dated: '2023-01-01', retiredAt: '2024-01-01T00:00:00.000Z' }),
    sampleReference(5, { value: 5e6, dated: '2024-01-01', kind: 'lift-off' }),
  ];
  const cable = sampleCable(1, { references, lowerAnchor: { x: 0, y: 0, z: 2 }, upperAnchor: { x: 60, y: 0, z: 52 } });
  const frozen = contentOf([sampleEntry(1, { cable })]).cables[0]!.referenceTension!;
  expect(frozen.value).toBe(2e6);
  // Half the weight of 45 kg/m over a rise of 50 m.
  expect(frozen.meanChordValue).toBeCloseTo(2e6 - (45 * 9.80665 * 50) / 2, 6);
});

test('says what stands in the way of submitting', () => {
  const entries = [
    estimated(sampleEntry(1)),
    sampleEntry(2, { measurements: [] }),
    sampleEntry(3),
    estimated(sampleEntry(4)),
    { ...estimated(sampleEntry(5)), notMeasuredReason: 'Scaffold' },
    sampleEntry(6, { measurements: [], notMeasuredReason: 'Scaffold' }),
  ];
  const content = contentOf(entries);
  const stale = new Set([entries[3]!.estimates[0]!.id]);
  const blockers = findBlockers(content, stale).map(({ message }) => message);
  expect(blockers).toEqual([
    'W-02 was not measured: enter its peaks, or say why it was not measured.',
    'W-03 has no estimate: save one, or say why the cable was not measured.',
    'W-04 has changed since its estimate was saved: save the estimate again.',
    'W-05 is marked as not measured, but it has an estimate: clear the reason, or set its peaks aside.',
  ]);
  const empty = { ...content, texts: { scope: ' ', conditions: '', deviations: '', conclusion: '' } };
  expect(findBlockers(empty, stale).filter(({ cableId }) => cableId === null)).toHaveLength(4);
});

test('asks for each span of a cable that has several', () => {
  const spans = [sampleSpan(1, { name: 'North' }), sampleSpan(2, { name: 'South' })];
  const entry = sampleEntry(1, { cable: sampleCable(1, { spans }) });
  const blockers = findBlockers(contentOf([estimated(entry)]), new Set());
  expect(blockers.map(({ message }) => message)).toEqual([
    'W-01, span South, was not measured: enter its peaks, or say why it was not measured.',
  ]);
});

test('gives bounds only where the ends are unknown and the cable is mostly a beam', () => {
  const section = sampleSection({ bendingStiffnessLow: 4e7, bendingStiffnessHigh: 5e7 });
  const entry = estimated(sampleEntry(1, { cable: sampleCable(1, { section }) }));
  expect(contentOf([entry]).cables[0]!.spans[0]!.decision.zone).toBe('bounds-only');
});
