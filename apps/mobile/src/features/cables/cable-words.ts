import type { PropertySource, SpanEnd } from '@strandnote/api/contract';

export const sourceWords: Record<PropertySource, string> = {
  weighed: 'weighed',
  supplier: 'supplier’s sheet',
  'as-built': 'as-built drawing',
  design: 'design drawing',
  taped: 'taped on site',
  assumed: 'assumed',
};

export const endWords: Record<SpanEnd['kind'], string> = {
  unknown: 'unknown',
  socket: 'socket or bearing plate (fixity 0.7 to 1)',
  'fork-in-plane': 'fork or clevis, in the plane of its pin (0 to 0.3)',
  'fork-across': 'fork or clevis, across its pin (0.7 to 1)',
  'guide-bushing': 'guide bushing (0.5 to 1)',
  hinged: 'hinged (0)',
  clamped: 'clamped (1)',
  fixity: 'fixity given as a range',
  stiffness: 'rotational stiffness given',
};

export const referenceKindWords = {
  design: 'design',
  'lift-off': 'lift-off',
  'load-cell': 'load cell',
  'last-survey': 'last survey',
  sister: 'sister span',
} as const;

export const placeWords = {
  'mean-chord': 'mean chord tension',
  'lower-end': 'at the lower end',
  'upper-end': 'at the upper end',
} as const;
