import { sql } from 'drizzle-orm';
import { check, index, integer, jsonb, pgTable, text, unique, uuid } from 'drizzle-orm/pg-core';
import { structures } from './structures.ts';
import { moment, notNegative, oneOf, positive, si, tenantColumns, tenantKey, withinFirm } from './tenant.ts';

export const propertySources = ['weighed', 'supplier', 'as-built', 'design', 'taped', 'assumed'] as const;
export const cableKinds = ['stay', 'hanger', 'external-tendon', 'tie-rod', 'guy'] as const;
export const damperFittings = ['none', 'fitted'] as const;
export const referenceKinds = ['design', 'lift-off', 'load-cell', 'last-survey', 'sister'] as const;
export const referencePlaces = ['mean-chord', 'lower-end', 'upper-end'] as const;
const source = (name: string) => text(name).notNull().$type<(typeof propertySources)[number]>();

export const sections = pgTable(
  'sections',
  {
    ...tenantColumns,
    structureId: uuid('structure_id').notNull(),
    name: text('name').notNull(),
    strandKey: text('strand_key'),
    strandCount: integer('strand_count'),
    steelArea: si('steel_area').notNull(),
    modulus: si('modulus').notNull(),
    modulusSource: source('modulus_source'),
    steelMass: si('steel_mass').notNull(),
    steelMassSource: source('steel_mass_source'),
    sheathMass: si('sheath_mass').notNull(),
    groutMass: si('grout_mass').notNull(),
    addedMassSource: source('added_mass_source'),
    massRelativeUncertainty: si('mass_relative_uncertainty'),
    bendingStiffnessLow: si('bending_stiffness_low').notNull(),
    bendingStiffnessHigh: si('bending_stiffness_high').notNull(),
    breakingLoad: si('breaking_load').notNull(),
    breakingLoadSource: source('breaking_load_source'),
    createdAt: moment('created_at').notNull().defaultNow(),
  },
  (table) => [
    tenantKey(table),
    index('sections_by_structure').on(table.firmId, table.structureId),
    withinFirm(table, table.structureId, structures, 'sections_structure'),
    oneOf(table.modulusSource, propertySources),
    oneOf(table.steelMassSource, propertySources),
    oneOf(table.addedMassSource, propertySources),
    oneOf(table.breakingLoadSource, propertySources),
    positive('sections_positive', table.steelArea, table.modulus, table.steelMass, table.bendingStiffnessLow, table.breakingLoad),
    positive('sections_uncertainty_is_never_zero', table.massRelativeUncertainty),
    notNegative('sections_not_negative', table.sheathMass, table.groutMass),
    check(
      'sections_bounds_in_order',
      sql`${table.bendingStiffnessLow} <= ${table.bendingStiffnessHigh} and ${table.bendingStiffnessHigh} < 'Infinity'`,
    ),
  ],
);

export interface StoredPoint {
  x: number;
  y: number;
  z: number;
}

export const cables = pgTable(
  'cables',
  {
    ...tenantColumns,
    structureId: uuid('structure_id').notNull(),
    sectionId: uuid('section_id').notNull(),
    reference: text('reference').notNull(),
    ownerReference: text('owner_reference').notNull().default(''),
    paintedMark: text('painted_mark').notNull().default(''),
    kind: text('kind').notNull().$type<(typeof cableKinds)[number]>(),
    position: integer('position').notNull(),
    lowerAnchor: jsonb('lower_anchor').$type<StoredPoint>(),
    upperAnchor: jsonb('upper_anchor').$type<StoredPoint>(),
    notes: text('notes').notNull().default(''),
    createdAt: moment('created_at').notNull().defaultNow(),
  },
  (table) => [
    tenantKey(table),
    unique('cables_reference').on(table.firmId, table.structureId, table.reference),
    withinFirm(table, table.structureId, structures, 'cables_structure'),
    withinFirm(table, table.sectionId, sections, 'cables_section'),
    oneOf(table.kind, cableKinds),
  ],
);

export type StoredSpanEnd =
  | { kind: 'unknown' | 'hinged' | 'clamped' | 'socket' | 'fork-in-plane' | 'fork-across' | 'guide-bushing' }
  | { kind: 'fixity'; low: number; high: number }
  | { kind: 'stiffness'; rotationalStiffness: number };

export const spans = pgTable(
  'spans',
  {
    ...tenantColumns,
    cableId: uuid('cable_id').notNull(),
    position: integer('position').notNull(),
    name: text('name').notNull().default(''),
    chordLength: si('chord_length').notNull(),
    chordLengthSource: source('chord_length_source'),
    chordLengthTolerance: si('chord_length_tolerance').notNull(),
    lowerDeduction: si('lower_deduction').notNull(),
    lowerDeductionTolerance: si('lower_deduction_tolerance').notNull(),
    upperDeduction: si('upper_deduction').notNull(),
    upperDeductionTolerance: si('upper_deduction_tolerance').notNull(),
    deductionSource: source('deduction_source'),
    inclination: si('inclination').notNull(),
    lowerEnd: jsonb('lower_end').notNull().$type<StoredSpanEnd>(),
    upperEnd: jsonb('upper_end').notNull().$type<StoredSpanEnd>(),
    lowerDamper: text('lower_damper').notNull().$type<(typeof damperFittings)[number]>(),
    upperDamper: text('upper_damper').notNull().$type<(typeof damperFittings)[number]>(),
    damperPosition: si('damper_position'),
    /** A span that a later drawing no longer shows; its measurements stay. */
    retiredAt: moment('retired_at'),
  },
  (table) => [
    tenantKey(table),
    index('spans_by_cable').on(table.firmId, table.cableId),
    withinFirm(table, table.cableId, cables, 'spans_cable'),
    oneOf(table.chordLengthSource, propertySources),
    oneOf(table.deductionSource, propertySources),
    oneOf(table.lowerDamper, damperFittings),
    oneOf(table.upperDamper, damperFittings),
    positive('spans_tolerances_are_never_zero', table.chordLengthTolerance, table.lowerDeductionTolerance, table.upperDeductionTolerance),
    notNegative('spans_not_negative', table.lowerDeduction, table.upperDeduction, table.inclination),
    positive('spans_damper_position_positive', table.damperPosition),
    check(
      'spans_leave_a_free_length',
      sql`${table.chordLength} - ${table.lowerDeduction} - ${table.upperDeduction} > 0 and ${table.chordLength} < 'Infinity'`,
    ),
  ],
);

export const referenceTensions = pgTable(
  'reference_tensions',
  {
    ...tenantColumns,
    cableId: uuid('cable_id').notNull(),
    kind: text('kind').notNull().$type<(typeof referenceKinds)[number]>(),
    stage: text('stage').notNull(),
    place: text('place').notNull().$type<(typeof referencePlaces)[number]>(),
    value: si('value').notNull(),
    relativeUncertainty: si('relative_uncertainty'),
    source: text('source').notNull(),
    dated: text('dated'),
    retiredAt: moment('retired_at'),
    createdAt: moment('created_at').notNull().defaultNow(),
  },
  (table) => [
    tenantKey(table),
    index('reference_tensions_by_cable').on(table.firmId, table.cableId),
    withinFirm(table, table.cableId, cables, 'reference_tensions_cable'),
    oneOf(table.kind, referenceKinds),
    oneOf(table.place, referencePlaces),
    positive('reference_tensions_positive', table.value),
    notNegative('reference_tensions_not_negative', table.relativeUncertainty),
  ],
);
