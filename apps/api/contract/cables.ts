import { z } from 'zod';
import { id, isoDate, isoTime, listOf, optionalText, point, propertySource, quantity, typedText } from './primitives.ts';

// A cable section: what a metre of the cable is made of. Masses of sheath and grout are asked for; a typed 0 is an answer.
const sectionFields = {
  name: typedText(80),
  strandKey: z.string().nullable(),
  strandCount: z.number().int().min(1).max(1000).nullable(),
  steelArea: quantity('The steel area', { above: 0, to: 1 }),
  modulus: quantity('The elastic modulus', { from: 1e9, to: 1e12 }),
  modulusSource: propertySource,
  steelMass: quantity('The mass of the steel', { above: 0, to: 10_000 }),
  steelMassSource: propertySource,
  sheathMass: quantity('The mass of the sheath', { from: 0, to: 1000 }),
  groutMass: quantity('The mass of the grout', { from: 0, to: 5000 }),
  addedMassSource: propertySource,
  /** Standard uncertainty of the whole mass as a fraction; null takes the default of the sources. */
  massRelativeUncertainty: quantity('The uncertainty of the mass', { above: 0, to: 0.5 }).nullable(),
  bendingStiffnessLow: quantity('The lower bound of the bending stiffness', { above: 0, to: 1e12 }),
  bendingStiffnessHigh: quantity('The upper bound of the bending stiffness', { above: 0, to: 1e12 }),
  breakingLoad: quantity('The breaking load', { above: 0, to: 1e9 }),
  breakingLoadSource: propertySource,
};
const boundsInOrder = (section: { bendingStiffnessLow?: number | undefined; bendingStiffnessHigh?: number | undefined }) =>
  section.bendingStiffnessLow === undefined ||
  section.bendingStiffnessHigh === undefined ||
  section.bendingStiffnessLow <= section.bendingStiffnessHigh;
const boundsRule = { path: ['bendingStiffnessHigh'], message: 'The upper bound must not be below the lower bound.' };

export const createSection = z.strictObject({ id, ...sectionFields }).refine(boundsInOrder, boundsRule);
export type CreateSection = z.infer<typeof createSection>;
export const editSection = z.strictObject(sectionFields).partial().refine(boundsInOrder, boundsRule);
export type EditSection = z.infer<typeof editSection>;
export const section = z.object({ id, structureId: id, ...sectionFields });
export type Section = z.infer<typeof section>;
export const sectionList = listOf(section);

export const cableKind = z.enum(['stay', 'hanger', 'external-tendon', 'tie-rod', 'guy']);
export type CableKind = z.infer<typeof cableKind>;

/** How an end of a span is held, as far as the drawings say. */
export const spanEnd = z.discriminatedUnion('kind', [
  z.strictObject({ kind: z.enum(['unknown', 'hinged', 'clamped', 'socket', 'fork-in-plane', 'fork-across', 'guide-bushing']) }),
  z.strictObject({
    kind: z.literal('fixity'),
    low: quantity('The lower fixity', { from: 0, to: 1 }),
    high: quantity('The upper fixity', { from: 0, to: 1 }),
  }),
  z.strictObject({ kind: z.literal('stiffness'), rotationalStiffness: quantity('The rotational stiffness', { from: 0, to: 1e15 }) }),
]);
export type SpanEnd = z.infer<typeof spanEnd>;

export const damperFitted = z.enum(['none', 'fitted']);

const tolerance = (name: string) => quantity(name, { above: 0, to: 5 });
const spanFields = {
  name: optionalText(40),
  /** Chord between working points (m) and its tolerance (m, half-width of a rectangular distribution). */
  chordLength: quantity('The chord', { above: 0, to: 3000 }),
  chordLengthSource: propertySource,
  chordLengthTolerance: tolerance('The tolerance of the chord'),
  lowerDeduction: quantity('The lower deduction', { from: 0, to: 100 }),
  lowerDeductionTolerance: tolerance('The tolerance of the lower deduction'),
  upperDeduction: quantity('The upper deduction', { from: 0, to: 100 }),
  upperDeductionTolerance: tolerance('The tolerance of the upper deduction'),
  deductionSource: propertySource,
  inclination: quantity('The inclination', { from: 0, to: Math.PI / 2 }),
  lowerEnd: spanEnd,
  upperEnd: spanEnd,
  lowerDamper: damperFitted,
  upperDamper: damperFitted,
  /** Distance of the damper from its end of the free length (m); null where none is fitted. */
  damperPosition: quantity('The position of the damper', { above: 0, to: 100 }).nullable(),
};
const freeLengthRule = {
  path: ['chordLength'],
  message: 'The deductions leave no free length: the chord must be longer than both together.',
};
const leavesLength = (span: { chordLength: number; lowerDeduction: number; upperDeduction: number }) =>
  span.chordLength - span.lowerDeduction - span.upperDeduction > 0;
export const writeSpan = z.strictObject({ id, ...spanFields }).refine(leavesLength, freeLengthRule);
export type WriteSpan = z.infer<typeof writeSpan>;
export const span = z.object({ id, cableId: id, position: z.number().int(), ...spanFields });
export type Span = z.infer<typeof span>;

const cableFields = {
  sectionId: id,
  reference: typedText(40),
  ownerReference: optionalText(40),
  paintedMark: optionalText(40),
  kind: cableKind,
  position: z.number().int().min(0).max(10_000),
  lowerAnchor: point.nullable(),
  upperAnchor: point.nullable(),
  notes: optionalText(),
};
const spansOfCable = z.array(writeSpan).min(1, 'A cable has at least one span.').max(40, 'At most 40 spans.');
export const createCable = z.strictObject({ id, ...cableFields, spans: spansOfCable });
export type CreateCable = z.infer<typeof createCable>;
export const editCable = z.strictObject({ ...cableFields, spans: spansOfCable }).partial();
export type EditCable = z.infer<typeof editCable>;

export const referenceKind = z.enum(['design', 'lift-off', 'load-cell', 'last-survey', 'sister']);
export const referencePlace = z.enum(['mean-chord', 'lower-end', 'upper-end']);
const referenceFields = {
  kind: referenceKind,
  stage: typedText(120),
  place: referencePlace,
  value: quantity('The reference tension', { above: 0, to: 1e9 }),
  relativeUncertainty: quantity('The uncertainty of the reference', { from: 0, to: 0.5 }).nullable(),
  source: typedText(200),
  dated: isoDate.nullable(),
};
export const createReference = z.strictObject({ id, ...referenceFields });
export type CreateReference = z.infer<typeof createReference>;
export const referenceTension = z.object({ id, cableId: id, ...referenceFields, retiredAt: isoTime.nullable() });
export type ReferenceTension = z.infer<typeof referenceTension>;

/** A cable with its spans, its section and the tensions it is compared with. */
export const cable = z.object({
  id,
  structureId: id,
  ...cableFields,
  section,
  spans: z.array(span),
  references: z.array(referenceTension),
});
export type Cable = z.infer<typeof cable>;
export const cableList = listOf(cable);

/** One point of a cable's tension history: an estimate of a campaign (N). */
export const tensionOfCampaign = z.object({
  campaignId: id,
  campaignName: z.string(),
  startsOn: isoDate,
  spanId: id,
  tension: z.number(),
  interval95: z.tuple([z.number(), z.number()]),
  bracket: z.object({ hinged: z.number(), clamped: z.number() }),
  steelTemperature: z.number().nullable(),
  checked: z.boolean(),
});
export type TensionOfCampaign = z.infer<typeof tensionOfCampaign>;
export const cableDetail = cable.extend({ structureName: z.string(), history: z.array(tensionOfCampaign) });
export type CableDetail = z.infer<typeof cableDetail>;
