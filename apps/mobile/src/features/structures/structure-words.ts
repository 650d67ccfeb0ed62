import type { CableKind, StructureKind } from '@strandnote/api/contract';

export const structureKindWords: Record<StructureKind, string> = {
  'cable-stayed': 'cable-stayed bridge',
  arch: 'arch bridge',
  suspension: 'suspension bridge',
  roof: 'roof',
  mast: 'mast',
  other: 'other structure',
};

export const cableKindWords: Record<CableKind, string> = {
  stay: 'stay',
  hanger: 'hanger',
  'external-tendon': 'external tendon',
  'tie-rod': 'tie rod',
  guy: 'guy',
};

/** Options of a list from a table of words. */
export function optionsOf<Value extends string>(words: Record<Value, string>): { value: Value; label: string }[] {
  return (Object.entries(words) as [Value, string][]).map(([value, label]) => ({ value, label: label[0]!.toUpperCase() + label.slice(1) }));
}
