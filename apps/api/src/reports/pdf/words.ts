import type {
  FrozenCable,
  FrozenEnd,
  FrozenInput,
  FrozenMeasurement,
  FrozenPeak,
  FrozenReference,
  Zone,
} from '@strandnote/core/report-content';

/** The words of the report, the same for the same thing everywhere. */

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

export const zoneMeanings: Record<Zone, string> = {
  within: 'the whole 95 % interval lies between the agreed limits',
  'within-not-proven': 'the tension lies between the limits, its interval crosses one',
  'outside-not-proven': 'the tension lies beyond a limit, its interval crosses it',
  outside: 'the whole 95 % interval lies beyond a limit',
  'bounds-only': 'the data allow bounds, but no single tension',
  'no-limit-agreed': 'nothing was agreed to judge by',
  'not-comparable': 'stage, traffic or temperature of the reference differ',
  'not-measured': 'listed with the reason',
};

/** The zones that want a look first, the worst at the head. */
export const zonesByConcern: readonly Zone[] = [
  'outside',
  'outside-not-proven',
  'within-not-proven',
  'bounds-only',
  'not-comparable',
  'no-limit-agreed',
  'not-measured',
  'within',
];

export const cableKindWords: Record<FrozenCable['kind'], string> = {
  stay: 'stay',
  hanger: 'hanger',
  'external-tendon': 'external tendon',
  'tie-rod': 'tie rod',
  guy: 'guy',
};

export const sourceWords: Record<NonNullable<FrozenInput['source']>, string> = {
  weighed: 'weighed',
  supplier: 'supplier’s sheet',
  'as-built': 'as-built drawing',
  design: 'design drawing',
  taped: 'taped on site',
  assumed: 'assumed',
};

export const inputWords: Record<FrozenInput['quantity'], string> = {
  'chord-length': 'Chord between working points',
  'lower-deduction': 'Deduction at the lower end',
  'upper-deduction': 'Deduction at the upper end',
  'free-length': 'Free length',
  inclination: 'Inclination of the chord',
  'steel-area': 'Area of steel',
  modulus: 'Modulus of elasticity',
  'steel-mass': 'Mass of steel',
  'sheath-mass': 'Mass of sheath',
  'grout-mass': 'Mass of grout',
  'mass-per-length': 'Mass per length',
  'bending-stiffness-low': 'Bending stiffness, strands sliding',
  'bending-stiffness-high': 'Bending stiffness, fully bonded',
  'breaking-load': 'Breaking load',
};

export const referenceWords: Record<FrozenReference['kind'], string> = {
  design: 'design tension',
  'lift-off': 'lift-off reading',
  'load-cell': 'load-cell reading',
  'last-survey': 'last survey',
  sister: 'sister cable',
};

export const placeWords: Record<FrozenReference['place'], string> = {
  'mean-chord': 'mean of the chord',
  'lower-end': 'lower end',
  'upper-end': 'upper end',
};

export const excitationWords: Record<FrozenMeasurement['excitation'], string> = {
  ambient: 'ambient',
  wind: 'wind',
  traffic: 'traffic',
  mallet: 'mallet',
  'pull-release': 'pull and release',
};

export const planeWords: Record<FrozenPeak['plane'], string> = { 'in-plane': 'in plane', 'out-of-plane': 'out of plane' };

const endWords: Record<string, string> = {
  unknown: 'not known',
  hinged: 'hinged',
  clamped: 'clamped',
  socket: 'socket or bearing plate',
  'fork-in-plane': 'fork or clevis, in the plane of its pin',
  'fork-across': 'fork or clevis, across its pin',
  'guide-bushing': 'guide bushing',
  fixity: 'range of fixity given',
  stiffness: 'rotational stiffness given',
};

export function wordsOfEnd({ kind }: FrozenEnd): string {
  return endWords[kind] ?? kind;
}

/** "1 cable", "12 cables"; numbers from the reader's point of view, not the program's. */
export function counted(count: number, one: string, many = `${one}s`): string {
  return `${count} ${count === 1 ? one : many}`;
}

/** "a, b and c" */
export function listed(items: readonly string[]): string {
  return items.length < 2 ? (items[0] ?? '') : `${items.slice(0, -1).join(', ')} and ${items.at(-1)}`;
}

export function capitalised(text: string): string {
  return text.charAt(0).toUpperCase() + text.slice(1);
}
