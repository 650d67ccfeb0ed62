import { expect, test } from 'vitest';
import { answersOf, draftOf, inSystem, newDraft, reduceDraft } from '../../../apps/mobile/src/features/site/entry-draft.ts';
import { pastedColumn } from '../../../apps/mobile/src/features/site/paste-column.ts';
import { cableNamed, peaksAt, visitTo } from './surveyed-cable.ts';

const begin = { system: 'si', now: new Date('2026-12-01T10:40:00Z'), timeZone: 'Europe/London' } as const;
const span = cableNamed('W-07u').spans[0]!;

test('a new draft asks for the first six modes and answers nothing', () => {
  const draft = newDraft(begin);
  expect(draft.peaks.map(({ mode, frequency }) => [mode, frequency.text])).toEqual(
    ['1', '2', '3', '4', '5', '6'].map((mode) => [mode, '']),
  );
  expect(draft.visit).toMatchObject({ lowerDamper: null, upperDamper: null, bushing: null, crossTied: null, excitation: null });
  expect(draft.visit.visitedAt).toBe('2026-12-01 10:40');
});

test('a pasted column fills the rows from where it was pasted and adds those that are missing', () => {
  const draft = newDraft(begin);
  const filled = reduceDraft(draft, { type: 'columnPasted', id: draft.peaks[4]!.id, frequencies: ['6,1', '7,4', '8,6'] });
  expect(filled.peaks.map(({ mode, frequency }) => `${mode} ${frequency.text}`)).toEqual([
    '1 ',
    '2 ',
    '3 ',
    '4 ',
    '5 6,1',
    '6 7,4',
    '7 8,6',
  ]);
  expect(filled.peaks[6]!.frequency.si).toBe(8.6);
});

test('renumbering changes the rows named, and sets a foreign peak aside with its reason', () => {
  const draft = draftOf(visitTo(span.id), { system: 'si', timeZone: 'Europe/London' });
  const [first, second] = draft.peaks;
  const { peaks } = reduceDraft(draft, { type: 'peaksRenumbered', modes: { [first!.id]: 2, [second!.id]: null } });
  expect(peaks[0]).toMatchObject({ mode: '2', used: true });
  expect(peaks[1]).toMatchObject({ mode: '2', used: false, setAsideReason: 'foreign peak' });
  expect(peaks[2]).toBe(draft.peaks[2]);
});

test('a draft typed in metres means the same when it is opened in feet', () => {
  const draft = inSystem(
    draftOf(visitTo(span.id, { sensorPosition: 3.048, steelTemperature: 10 }), { system: 'si', timeZone: 'UTC' }),
    'us',
  );
  expect([draft.visit.sensor.text, draft.visit.sensor.si]).toEqual(['10', 3.048]);
  expect([draft.visit.steelTemperature.text, draft.visit.steelTemperature.si]).toEqual(['50', 10]);
});

test('the answers of the cable before are taken whole, but neither its peaks nor its note', () => {
  const answers = answersOf(visitTo(span.id, { lowerDamperState: 'connected', crossTied: true, note: 'rust' }), 'si');
  expect(answers).toMatchObject({ lowerDamper: 'connected', crossTied: 'yes', excitation: 'ambient' });
  expect(answers).not.toHaveProperty('note');
});

test('what was stored opens as it was', () => {
  const peaks = [{ ...peaksAt([1.2345678])[0]!, standardUncertainty: 0.002, used: false, setAsideReason: 'too weak' }];
  const draft = draftOf(visitTo(span.id, { peaks, version: 4 }), { system: 'si', timeZone: 'UTC' });
  expect(draft.version).toBe(4);
  expect(draft.peaks[0]).toMatchObject({ frequency: { text: '1.2345678', si: 1.2345678 }, uncertainty: { si: 0.002 }, used: false });
});

test.each([
  ['one a line', '1.214\n2.431\n3.655\n', ['1.214', '2.431', '3.655']],
  ['with a column of mode numbers', '1\t1,214\r\n2\t2,431\r\n', ['1,214', '2,431']],
  ['with a head and units', 'f\n1.214 Hz\n2.431 Hz', ['1.214', '2.431']],
])('a column from a spreadsheet is read: %s', (_name, text, expected) => {
  expect(pastedColumn(text)).toEqual(expected);
});

test('a single value belongs to the field that it was pasted into', () => {
  expect(pastedColumn('1.214')).toBeNull();
  expect(pastedColumn('1.214\n')).toBeNull();
});
