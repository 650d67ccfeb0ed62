import { expect, test } from 'vitest';
import { changesOf, isSameEntry } from '../../../apps/api/src/http/same-entry.ts';

const stored = { id: 'a', name: 'Harbour', point: { x: 1, y: 2 }, createdAt: new Date(0) };

test('what was sent is the same when the row holds it, in whatever order', () => {
  expect(isSameEntry(stored, { id: 'a', point: { y: 2, x: 1 } })).toBe(true);
  expect(isSameEntry(stored, {})).toBe(true);
  expect(isSameEntry(stored, { name: undefined })).toBe(true);
});

test('null is not the same as a value, nor nothing the same as null', () => {
  expect(isSameEntry(stored, { name: null })).toBe(false);
  expect(isSameEntry({ name: null }, { name: null })).toBe(true);
  expect(isSameEntry(stored, { point: { x: 1, y: 3 } })).toBe(false);
});

test('tells only of the fields that differ', () => {
  expect(changesOf(stored, { name: 'Port', point: { x: 1, y: 2 } })).toEqual({ from: { name: 'Harbour' }, to: { name: 'Port' } });
});
