import { expect, test } from 'vitest';
import {
  checklistRows,
  foundRows,
  nextToMeasure,
  progressOf,
  reportedMeasurement,
} from '../../../apps/mobile/src/features/site/checklist-rows.ts';
import { differencesOf } from '../../../apps/mobile/src/features/site/measurement-differences.ts';
import { sisterFrequencies, sisterOf } from '../../../apps/mobile/src/features/site/sister-cable.ts';
import { overlaySurvey } from '../../../apps/mobile/src/features/site/survey-overlay.ts';
import { instantText, readInstant } from '../../../apps/mobile/src/features/site/visit-time.ts';
import type { OutboxEntry } from '../../../apps/mobile/src/lib/outbox-state.ts';
import { cableNamed, campaignOf, designTension, entryOf, frequencies, peaksAt, visitTo } from './surveyed-cable.ts';

const measured = entryOf(cableNamed('W-01u', { references: [designTension(2.5e6)] }), { measurements: [visitTo('span W-01u')] });
const waiting = entryOf(cableNamed('W-02u', { paintedMark: '17 B' }));
const excused = entryOf(cableNamed('W-03u'), { notMeasuredReason: 'no access' });
const survey = campaignOf([measured, waiting, excused]);

function waitingEntry(path: string, body: unknown): OutboxEntry {
  const request = { id: path, userId: 'ida', key: path, path, body, subject: '', refreshes: [] };
  return { ...request, method: 'PUT', queuedAt: '', state: 'waiting', attempts: 0, refusal: null };
}

test('each cable is measured, to measure, or left out with a reason', () => {
  const rows = checklistRows(survey);
  expect(rows.map(({ name, state }) => `${name} ${state}`)).toEqual(['W-01u measured', 'W-02u to measure', 'W-03u not measured']);
  expect(rows[0]!.decision.zone).toBe('within');
  expect(rows[0]!.bar).toMatchObject({ reference: 2.5e6, lowerLimit: 2.25e6, upperLimit: 2.75e6 });
  expect(progressOf(rows)).toMatchObject({ done: 2, of: 3, label: '1 of 3 measured, 1 not to be measured' });
});

test('a saved estimate stands until other peaks are entered on the device', () => {
  const visit = visitTo('span W-01u');
  const [row] = checklistRows(survey);
  const saved = {
    id: 'estimate',
    measurementId: visit.id,
    spanId: visit.spanId,
    campaignId: 'campaign',
    engineVersion: '1',
    input: {
      cable: { length: 1, massPerLength: 1 },
      peaks: frequencies.map((frequency, index) => ({ mode: index + 1, frequency })),
      options: {},
    },
    output: { ...row!.output!, tension: 1 },
    createdBy: 'Ida Falk',
    createdAt: '2026-09-01T10:00:00.000Z',
    stale: false,
  };
  const kept = campaignOf([{ ...measured, estimates: [saved] }]);
  expect(checklistRows(kept)[0]).toMatchObject({ saved: true, output: { tension: 1 } });
  const changed = visitTo('span W-01u', { peaks: peaksAt([1.506, ...frequencies.slice(1)]) });
  expect(checklistRows(campaignOf([{ ...measured, estimates: [saved], measurements: [changed] }]))[0]!.saved).toBe(false);
});

test('a cable is found by its reference and by its painted mark, however it is typed', () => {
  const rows = checklistRows(survey);
  expect(foundRows(rows, 'w02', false).map(({ name }) => name)).toEqual(['W-02u']);
  expect(foundRows(rows, '17b', false).map(({ name }) => name)).toEqual(['W-02u']);
  expect(foundRows(rows, '', true).map(({ name }) => name)).toEqual(['W-02u']);
});

test('the next cable is the next that waits, round the end of the list', () => {
  const rows = checklistRows(campaignOf([waiting, measured, entryOf(cableNamed('W-04u')), excused]));
  expect(nextToMeasure(rows, 'span W-02u')?.name).toBe('W-04u');
  expect(nextToMeasure(rows, 'span W-04u')?.name).toBe('W-02u');
  expect(nextToMeasure(checklistRows(campaignOf([measured, excused])), 'span W-01u')).toBeNull();
});

test('of several visits the latest with a peak to use speaks', () => {
  const [first, second] = ['2026-09-01T09:00:00.000Z', '2026-09-01T15:00:00.000Z'];
  const visits = [visitTo('s', { id: 'a', visitedAt: first }), visitTo('s', { id: 'b', visitedAt: second, peaks: [] })];
  expect(reportedMeasurement(visits, 's')?.id).toBe('a');
});

test('what waits on the device is part of the checklist; what belongs to another campaign is not', () => {
  const id = '3f0c8f0e-94b0-4e0c-8f7a-0f7a1a3f7c11';
  const spanId = '7d9fce0e-0d0e-4c1f-9a62-6c3a5e8f1a22';
  const { enteredBy: _by, campaignId: _campaign, id: _id, ...body } = visitTo(spanId);
  const named = entryOf(cableNamed('W-02u', { spans: [{ ...waiting.cable.spans[0]!, id: spanId }] }));
  const peaks = body.peaks.map((peak, index) => ({ ...peak, id: `3f0c8f0e-94b0-4e0c-8f7a-0f7a1a3f7c2${index}` }));
  const entries = [
    waitingEntry(`/firms/f/campaigns/campaign/measurements/${id}`, { ...body, peaks }),
    waitingEntry('/firms/f/campaigns/campaign/cables/cable W-03u', { notMeasuredReason: null }),
    waitingEntry(`/firms/f/campaigns/other/measurements/${id}`, { ...body, peaks: [] }),
  ];
  const after = overlaySurvey(campaignOf([named, excused]), entries, 'Ida Falk');
  expect(after.cables[0]!.measurements).toMatchObject([{ id, enteredBy: 'Ida Falk', peaks: { length: 5 } }]);
  expect(after.measuredCount).toBe(1);
  expect(after.cables[1]!.notMeasuredReason).toBeNull();
});

test('the sister stands across the structure; without coordinates the reference tells it', () => {
  const at = (reference: string, y: number, x = 40) =>
    entryOf(cableNamed(reference, { lowerAnchor: { x, y, z: 0 }, upperAnchor: { x: 0, y, z: 50 } }), {
      measurements: [visitTo(`span ${reference}`)],
    });
  const own = at('S7', 8);
  expect(sisterOf({ cables: [own, at('S8', 8), at('N7', -8), at('N8', -8, 48)] }, own)?.cable.reference).toBe('N7');
  expect(sisterOf({ cables: [measured, waiting, entryOf(cableNamed('W-01d'))] }, measured)?.cable.reference).toBe('W-01d');
  expect(sisterOf({ cables: [measured, waiting] }, measured)).toBeNull();
  expect(sisterFrequencies(measured).get('in-plane 2')).toBe(3.012);
});

test('two versions of a measurement are told apart in words, peak by peak', () => {
  const mine = visitTo('s', { note: 'mine', peaks: peaksAt([1.505, 3.012]) });
  const theirs = visitTo('s', { note: '', peaks: peaksAt([1.505, 3.02]), lowerDamperState: 'leaking' });
  expect(differencesOf(mine, theirs, String)).toEqual([
    { what: 'Mode 2, in plane', mine: '3.012 Hz', theirs: '3.02 Hz' },
    { what: 'Lower damper', mine: 'none', theirs: 'leaking' },
    { what: 'Note', mine: 'mine', theirs: '–' },
  ]);
});

test('the time of a visit is that of a clock at the structure, in winter and in summer', () => {
  expect(instantText('2026-07-01T09:00:00.000Z', 'Europe/London')).toBe('2026-07-01 10:00');
  expect(readInstant('2026-07-01 10:00', 'Europe/London')).toBe('2026-07-01T09:00:00.000Z');
  expect(readInstant('1.12.2026 10.40', 'America/New_York')).toBe('2026-12-01T15:40:00.000Z');
  expect(readInstant('2026-02-30 10:00', 'UTC')).toBeNull();
  expect(readInstant('yesterday', 'UTC')).toBeNull();
});
