import type { DampingState, Measurement, ReferenceTension } from '@strandnote/api/contract';

export type Excitation = Measurement['excitation'];
export type Plane = Measurement['peaks'][number]['plane'];

export const dampingWords: Record<DampingState, string> = {
  none: 'none',
  connected: 'connected',
  disconnected: 'disconnected',
  locked: 'locked',
  leaking: 'leaking',
};

export const excitationWords: Record<Excitation, string> = {
  ambient: 'ambient',
  wind: 'wind',
  traffic: 'traffic',
  mallet: 'mallet',
  'pull-release': 'pull and release',
};

export const planeWords: Record<Plane, string> = { 'in-plane': 'in plane', 'out-of-plane': 'out of plane' };

export const referenceWords: Record<ReferenceTension['kind'], string> = {
  design: 'design',
  'lift-off': 'lift-off reading',
  'load-cell': 'load cell',
  'last-survey': 'last survey',
  sister: 'sister cable',
};

/** The words as the options of a list or a group of choices. */
export function optionsOf<Value extends string>(words: Record<Value, string>): { value: Value; label: string }[] {
  return (Object.entries(words) as [Value, string][]).map(([value, label]) => ({ value, label }));
}
