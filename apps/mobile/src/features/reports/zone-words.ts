import type { Zone } from '@strandnote/core/report-content';

/** The zones in words; the same words in the report. */
export const zoneWords: Record<Zone, string> = {
  within: 'within',
  'within-not-proven': 'within, not proven',
  'outside-not-proven': 'outside, not proven',
  outside: 'outside',
  'bounds-only': 'bounds only',
  'no-limit-agreed': 'no limit agreed',
  'not-comparable': 'not comparable',
  'not-measured': 'not measured',
};

export const zoneTone: Record<Zone, 'verdigris' | 'ochre' | 'minium' | 'muted'> = {
  within: 'verdigris',
  'within-not-proven': 'ochre',
  'outside-not-proven': 'ochre',
  outside: 'minium',
  'bounds-only': 'muted',
  'no-limit-agreed': 'muted',
  'not-comparable': 'muted',
  'not-measured': 'muted',
};

/** What wants a look first comes first. */
export const zonesByUrgency: readonly Zone[] = [
  'outside',
  'outside-not-proven',
  'within-not-proven',
  'bounds-only',
  'not-comparable',
  'no-limit-agreed',
  'within',
  'not-measured',
];
