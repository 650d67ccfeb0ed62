import { expect, test } from 'vitest';
import { nextRevisionLetter } from '../../../apps/api/src/reports/revision-letter.ts';

test('letters revisions as columns are lettered', () => {
  expect(['A', 'Y', 'Z', 'AZ', 'ZZ'].map(nextRevisionLetter)).toEqual(['B', 'Z', 'AA', 'BA', 'AAA']);
});
