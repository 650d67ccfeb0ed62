import { expect, test } from 'vitest';
import { estimateInputOf } from '../../../apps/api/src/estimates/estimate-input.ts';
import { draftOf } from '../../../apps/mobile/src/features/site/entry-draft.ts';
import { findingsOf } from '../../../apps/mobile/src/features/site/entry-findings.ts';
import { expectedFrequencies } from '../../../apps/mobile/src/features/site/expected-frequencies.ts';
import { estimateMeasurement } from '../../../apps/mobile/src/features/site/live-estimate.ts';
import { numberingFindings } from '../../../apps/mobile/src/features/site/numbering-audit.ts';
import { deafnessOf } from '../../../apps/mobile/src/features/site/sensor-hearing.ts';
import type { ShowQuantity } from '../../../apps/mobile/src/features/site/show-quantity.ts';
import { estimateTension } from '../../../packages/core/src/index.ts';
import { formatNumber, fromSi, unitOf } from '../../../packages/core/src/units/index.ts';
import { cableNamed, frequencies, peaksAt, visitTo } from './surveyed-cable.ts';

const cable = cableNamed('W-07u');
const span = cable.spans[0]!;
const show: ShowQuantity = (si, kind) => `${formatNumber(fromSi(si ?? 0, kind, 'si'), 1)} ${unitOf(kind, 'si').symbol}`;
const findings = (over: Parameters<typeof visitTo>[1], changed = span) =>
  findingsOf(draftOf(visitTo(span.id, over), { system: 'si', timeZone: 'UTC' }), {
    section: cable.section,
    span: changed,
    timeZone: 'UTC',
    show,
  });

test('the phone fits what the server fits, digit by digit', () => {
  const measurement = visitTo(span.id, { peaks: peaksAt(frequencies).toReversed() });
  const ordered = { ...measurement, peaks: measurement.peaks.toSorted((a, b) => a.mode - b.mode) };
  const input = estimateInputOf(cable, ordered);
  const server = estimateTension(input.cable, input.peaks, input.options);
  expect(estimateMeasurement(cable.section, span, measurement).output).toEqual(server);
});

test('a measurement that did not change is not computed twice', () => {
  const measurement = visitTo(span.id);
  expect(estimateMeasurement(cable.section, span, measurement)).toBe(estimateMeasurement(cable.section, span, measurement));
});

test('a cross-tied cable is refused in words', () => {
  expect(findings({ crossTied: true }).outcome?.problem).toMatchObject({
    code: 'cross-tied',
    message: expect.stringContaining('cross-tied'),
  });
});

test('a connected damper whose place nobody entered is said beside the answer', () => {
  expect(findings({ lowerDamperState: 'connected' }).problems.visit.lowerDamper).toMatch(/distance from the end/);
});

test('two peaks are fitted, and what is missing is said', () => {
  const { outcome, notes } = findings({ peaks: peaksAt(frequencies.slice(0, 2)) });
  expect(outcome?.output?.tension).toBeGreaterThan(2e6);
  expect(notes.map(({ message }) => message).join(' ')).toMatch(/fewer than four modes/);
});

test('a row with a fault stays out of the fit, and the note says so', () => {
  const { outcome, notes, residuals } = findings({ peaks: peaksAt([1.505, 3.012, 45.23, 6.041]) });
  expect(outcome?.output?.residuals.map(({ mode }) => mode)).toEqual([1, 2, 4]);
  expect(residuals.has('peak 3')).toBe(false);
  expect(notes).toContainEqual({ severity: 'caution', message: 'Computed without mode 3.' });
});

test('a frequency in kHz is asked about beside its row', () => {
  expect(findings({ peaks: peaksAt([1.505, 3.012, 4.523, 6041]) }).questions.get('peak 4')).toMatch(
    /thousand times above|outside what cables/,
  );
});

test('a chord typed in millimetres is asked about, not refused', () => {
  const { outcome, notes } = findings({}, { ...span, chordLength: 2400 });
  expect(notes.map(({ message }) => message).join(' ')).toMatch(/2\u2009398\.5 m, which is longer than any stay/);
  expect(outcome?.output).not.toBeNull();
});

test('expected frequencies lie where the fit says that they lie', () => {
  const fit = estimateMeasurement(cable.section, span, visitTo(span.id)).output!;
  const expected = expectedFrequencies(cable.section, span, { fit, tension: null });
  for (const [index, frequency] of frequencies.entries()) expect(Math.abs(expected[index]! / frequency - 1)).toBeLessThan(0.005);
});

test('a fundamental that was taken for the second mode is found, and the right numbers are offered', () => {
  const shifted = visitTo(span.id, { peaks: peaksAt(frequencies).map((peak) => ({ ...peak, mode: peak.mode + 1 })) });
  const draft = draftOf(shifted, { system: 'si', timeZone: 'UTC' });
  const numbering = numberingFindings(draft, { section: cable.section, span, tension: null })!;
  expect(numbering.fits).toBeNull();
  expect(Object.values(numbering.alternatives[0]!.modes)).toEqual([1, 2, 3, 4, 5]);
  const right = numberingFindings(draftOf(visitTo(span.id), { system: 'si', timeZone: 'UTC' }), {
    section: cable.section,
    span,
    tension: 2.5e6,
  })!;
  expect(right).toMatchObject({ fits: expect.stringMatching(/ : 1$/), alternatives: [] });
});

test('a sensor at a node cannot hear that mode, and near an end it is told only when it hears next to nothing', () => {
  expect(deafnessOf(4, 0.25)).toMatch(/near a node of mode 4 and feels only 0 %/);
  expect(deafnessOf(1, 0.03)).toBeNull();
  expect(deafnessOf(1, 0.005)).toMatch(/near the end that it feels only 2 % of mode 1/);
  expect(deafnessOf(3, null)).toBeNull();
});
