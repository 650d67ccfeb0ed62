import { describe, expect, test } from 'vitest';
import { putMeasurement } from '../../../apps/api/contract/index.ts';
import { checkEntry, hasProblems, usablePeaks } from '../../../apps/mobile/src/features/site/check-entry.ts';
import { draftOf, type EntryDraft, newDraft, reduceDraft } from '../../../apps/mobile/src/features/site/entry-draft.ts';
import { measurementBody } from '../../../apps/mobile/src/features/site/measurement-body.ts';
import { readEntry } from '../../../apps/mobile/src/lib/quantity-entry.ts';
import { cableNamed, peaksAt, visitTo } from './surveyed-cable.ts';

const timeZone = 'Europe/London';
const span = cableNamed('W-07u').spans[0]!;
const check = (draft: EntryDraft) => checkEntry(draft, { span, timeZone });

function draftWith(texts: string[], change: Partial<EntryDraft['peaks'][number]>[] = []): EntryDraft {
  const draft = draftOf(visitTo(span.id, { peaks: peaksAt(texts.map(() => 1)) }), { system: 'si', timeZone });
  const peaks = draft.peaks.map((peak, index) => ({ ...peak, frequency: readEntry(texts[index]!, 'frequency', 'si'), ...change[index] }));
  return { ...draft, peaks };
}

/** Messages by the number of the row. */
function rowsWith(draft: EntryDraft): Record<number, string> {
  const { peaks } = check(draft);
  return Object.fromEntries(draft.peaks.flatMap(({ id }, index) => (peaks[id] ? [[index + 1, Object.values(peaks[id]).join(' ')]] : [])));
}

describe('peaks', () => {
  test('a slip of the decimal mark is found in its own row, and the rows after it stay right', () => {
    const draft = draftWith(['1.505', '3.012', '45.23', '6.041', '7.567']);
    expect(rowsWith(draft)).toEqual({ 3: expect.stringContaining('between 3.012 Hz (mode 2) and 6.041 Hz (mode 4)') });
    expect(usablePeaks(draft, check(draft).peaks).map(({ mode }) => mode)).toEqual([1, 2, 4, 5]);
  });

  test('of two rows that contradict each other, the one that is unlike the others is blamed', () => {
    expect(Object.keys(rowsWith(draftWith(['1.505', '3.012', '4.523', '6.041', '7567', '9.10'])))).toEqual(['5']);
    expect(Object.keys(rowsWith(draftWith(['1.505', '0.3012', '4.523'])))).toEqual(['2']);
  });

  test('a mode that is entered twice is said in the second row; set aside with a reason it is not', () => {
    const twice = draftWith(['1.505', '3.012', '3.020'], [{}, {}, { mode: '2' }]);
    expect(rowsWith(twice)[3]).toMatch(/Mode 2 is entered twice \(3\.012 Hz\)/);
    expect(rowsWith(draftWith(['1.505', '3.012', '3.020'], [{}, {}, { mode: '2', used: false }]))[3]).toBe(
      'Say why this peak is set aside.',
    );
    expect(rowsWith(draftWith(['1.505', '3.012', '3.020'], [{}, {}, { mode: '2', used: false, setAsideReason: 'foreign peak' }]))).toEqual(
      {},
    );
  });

  test('the same mode in both planes is two modes', () => {
    expect(rowsWith(draftWith(['1.505', '1.498'], [{}, { mode: '1', plane: 'out-of-plane' }]))).toEqual({});
  });

  test('zero, letters and a mode number that is none are refused, each beside itself', () => {
    const draft = draftWith(['0', 'abc', '4.5'], [{}, {}, { mode: '2.5' }]);
    expect(rowsWith(draft)).toEqual({
      1: 'The frequency must be more than 0 Hz.',
      2: expect.stringContaining('“abc” is not a number'),
      3: expect.stringContaining('no mode number'),
    });
  });

  test('a decimal comma is read, and an empty row is no fault', () => {
    const draft = draftWith(['1,505', '']);
    expect(rowsWith(draft)).toEqual({});
    expect(usablePeaks(draft, {}).map(({ frequency }) => frequency)).toEqual([1.505]);
  });
});

describe('answers', () => {
  test('nothing is answered for the person: every question of a new visit is open', () => {
    const draft = newDraft({ system: 'si', now: new Date('2026-09-01T09:00:00Z'), timeZone });
    expect(Object.keys(check(draft).visit).sort()).toEqual(['bushing', 'crossTied', 'excitation', 'lowerDamper', 'upperDamper']);
  });

  test('a sensor beyond the free length is refused in the units of the person', () => {
    const draft = draftOf(visitTo(span.id), { system: 'us', timeZone });
    const beyond = reduceDraft(draft, { type: 'visitAnswered', change: { sensor: readEntry('300', 'length', 'us') } });
    expect(check(beyond).visit.sensor).toBe('The position of the sensor must be 258 ft or less.');
  });
});

test('a draft without problems is a body that the server takes, without its empty rows', () => {
  const id = '3f0c8f0e-94b0-4e0c-8f7a-0f7a1a3f7c11';
  const spanWithId = { ...span, id };
  const draft = reduceDraft(draftOf(visitTo(id, { peaks: [] }), { system: 'si', timeZone }), { type: 'peakAdded' });
  const filled = reduceDraft(draft, {
    type: 'peakChanged',
    id: draft.peaks[0]!.id,
    change: { frequency: readEntry('1,505', 'frequency', 'si') },
  });
  const withEmpty = reduceDraft(filled, { type: 'peakAdded' });
  expect(hasProblems(check(withEmpty))).toBe(false);
  const body = measurementBody(withEmpty, spanWithId, timeZone);
  expect(putMeasurement.parse(body).peaks.map(({ mode, frequency }) => [mode, frequency])).toEqual([[1, 1.505]]);
  expect(body.visitedAt).toBe('2026-09-01T09:00:00.000Z');
});
