/**
 * What a submission freezes and an issued PDF carries: everything that its tensions were computed from, what came out,
 * and what was said about it. The JSON is stored as canonical text, hashed, signed for, and parsed by this schema on the
 * way out. It is a format of its own and changes only with its version, whatever happens to tables and wire shapes.
 * Quantities are SI.
 */
import { z } from 'zod';
import { estimateInput, tensionEstimate } from './fit/stored-estimate.ts';

export { estimateInput, type StoredEstimate, type StoredEstimateInput, tensionEstimate } from './fit/stored-estimate.ts';

const source = z.enum(['weighed', 'supplier', 'as-built', 'design', 'taped', 'assumed']);
const point = z.strictObject({ x: z.number(), y: z.number(), z: z.number() });
const vertex = z.strictObject({ x: z.number(), z: z.number() });
const nullableNumber = z.number().nullable();
const interval = z.tuple([z.number(), z.number()]);

/** The report's few texts, written by the engineer. */
export const reportTexts = z.strictObject({
  scope: z.string().max(4000, 'At most 4000 characters.'),
  conditions: z.string().max(4000, 'At most 4000 characters.'),
  deviations: z.string().max(4000, 'At most 4000 characters.'),
  conclusion: z.string().max(4000, 'At most 4000 characters.'),
});
export type ReportTexts = z.infer<typeof reportTexts>;

/** Zones of the decision rule, and why none is given where none is. */
export const zone = z.enum([
  'within',
  'within-not-proven',
  'outside-not-proven',
  'outside',
  'bounds-only',
  'no-limit-agreed',
  'not-comparable',
  'not-measured',
]);
export type Zone = z.infer<typeof zone>;

export const frozenReference = z.strictObject({
  kind: z.enum(['design', 'lift-off', 'load-cell', 'last-survey', 'sister']),
  stage: z.string(),
  place: z.enum(['mean-chord', 'lower-end', 'upper-end']),
  /** As given (N), and brought to the mean chord (N) where the place differs. */
  value: z.number(),
  meanChordValue: z.number(),
  relativeUncertainty: nullableNumber,
  source: z.string(),
  dated: z.string().nullable(),
});
export type FrozenReference = z.infer<typeof frozenReference>;

export const frozenDecision = z.strictObject({
  zone,
  /** Why this zone, in a sentence. */
  reason: z.string(),
  /** Limits (N), null where none was agreed on that side. */
  lowerLimit: nullableNumber,
  upperLimit: nullableNumber,
  /** Tension over the reference, minus one; null without a reference. */
  toReference: nullableNumber,
});
export type FrozenDecision = z.infer<typeof frozenDecision>;

export const frozenPeak = z.strictObject({
  mode: z.number().int(),
  frequency: z.number(),
  standardUncertainty: nullableNumber,
  plane: z.enum(['in-plane', 'out-of-plane']),
  source: z.enum(['typed', 'record']),
  used: z.boolean(),
  setAsideReason: z.string().nullable(),
});
export type FrozenPeak = z.infer<typeof frozenPeak>;

const damping = z.enum(['none', 'connected', 'disconnected', 'locked', 'leaking']);
export const frozenMeasurement = z.strictObject({
  id: z.string(),
  visitedAt: z.string(),
  enteredBy: z.string(),
  sensorPosition: nullableNumber,
  excitation: z.enum(['ambient', 'wind', 'traffic', 'mallet', 'pull-release']),
  lowerDamperState: damping,
  upperDamperState: damping,
  bushingState: damping,
  crossTied: z.boolean(),
  steelTemperature: nullableNumber,
  note: z.string(),
  peaks: z.array(frozenPeak),
});
export type FrozenMeasurement = z.infer<typeof frozenMeasurement>;

/** One input of a span in words and numbers, as a reader of the report wants to see it. */
export const frozenInput = z.strictObject({
  quantity: z.enum([
    'chord-length',
    'lower-deduction',
    'upper-deduction',
    'free-length',
    'inclination',
    'steel-area',
    'modulus',
    'steel-mass',
    'sheath-mass',
    'grout-mass',
    'mass-per-length',
    'bending-stiffness-low',
    'bending-stiffness-high',
    'breaking-load',
  ]),
  value: z.number(),
  standardUncertainty: nullableNumber,
  source: source.nullable(),
});
export type FrozenInput = z.infer<typeof frozenInput>;

/** How an end is held, in the words of the drawings, with the range of fixity that follows. */
export const frozenEnd = z.strictObject({ kind: z.string(), fixity: interval.nullable(), rotationalStiffness: nullableNumber });
export type FrozenEnd = z.infer<typeof frozenEnd>;

export const frozenSpan = z.strictObject({
  id: z.string(),
  name: z.string(),
  inputs: z.array(frozenInput),
  lowerEnd: frozenEnd,
  upperEnd: frozenEnd,
  lowerDamper: z.enum(['none', 'fitted']),
  upperDamper: z.enum(['none', 'fitted']),
  measurement: frozenMeasurement.nullable(),
  estimate: z
    .strictObject({ id: z.string(), engineVersion: z.string(), createdAt: z.string(), input: estimateInput, output: tensionEstimate })
    .nullable(),
  decision: frozenDecision,
  lastSurvey: z
    .strictObject({ tension: z.number(), campaignName: z.string(), startsOn: z.string(), steelTemperature: nullableNumber })
    .nullable(),
});
export type FrozenSpan = z.infer<typeof frozenSpan>;

export const frozenCable = z.strictObject({
  id: z.string(),
  reference: z.string(),
  ownerReference: z.string(),
  paintedMark: z.string(),
  kind: z.enum(['stay', 'hanger', 'external-tendon', 'tie-rod', 'guy']),
  sectionName: z.string(),
  lowerAnchor: point.nullable(),
  upperAnchor: point.nullable(),
  referenceTension: frozenReference.nullable(),
  notMeasuredReason: z.string().nullable(),
  spans: z.array(frozenSpan),
});
export type FrozenCable = z.infer<typeof frozenCable>;

export const reportContent = z.strictObject({
  version: z.literal(1),
  engineVersion: z.string(),
  firm: z.strictObject({
    name: z.string(),
    addressLines: z.array(z.string()),
    phone: z.string(),
    email: z.string(),
    registration: z.string(),
    demonstration: z.boolean(),
  }),
  client: z.strictObject({ id: z.string(), name: z.string(), address: z.string() }),
  report: z.strictObject({ number: z.string(), title: z.string(), letter: z.string() }),
  author: z.strictObject({ userId: z.string(), name: z.string() }),
  structure: z.strictObject({
    id: z.string(),
    name: z.string(),
    reference: z.string(),
    kind: z.string(),
    ownerName: z.string(),
    place: z.string(),
    timeZone: z.string(),
    elevation: z.strictObject({ deck: z.array(vertex), supports: z.array(z.array(vertex)) }).nullable(),
  }),
  campaign: z.strictObject({
    id: z.string(),
    number: z.number().int(),
    name: z.string(),
    startsOn: z.string(),
    endsOn: z.string().nullable(),
    crew: z.string(),
    instruments: z.array(
      z.strictObject({ name: z.string(), serial: z.string(), calibratedOn: z.string().nullable(), calibrationDue: z.string().nullable() }),
    ),
    weather: z.string(),
    steelTemperature: nullableNumber,
    airTemperature: nullableNumber,
    traffic: z.string(),
    stage: z.string(),
    basis: z.strictObject({
      referenceKind: z.string().nullable(),
      lowerLimit: nullableNumber,
      upperLimit: nullableNumber,
      decisionRule: z.string(),
      criticalContact: z.string(),
    }),
  }),
  texts: reportTexts,
  cables: z.array(frozenCable),
});
export type ReportContent = z.infer<typeof reportContent>;
