import { sql } from 'drizzle-orm';
import { boolean, check, index, integer, pgTable, text, uniqueIndex, uuid } from 'drizzle-orm/pg-core';
import { spans } from './cables.ts';
import { campaigns } from './campaigns.ts';
import { moment, notNegative, oneOf, positive, si, tenantColumns, tenantKey, withinFirm } from './tenant.ts';

export const dampingStates = ['none', 'connected', 'disconnected', 'locked', 'leaking'] as const;
export const excitations = ['ambient', 'wind', 'traffic', 'mallet', 'pull-release'] as const;
export const planes = ['in-plane', 'out-of-plane'] as const;
export const peakSources = ['typed', 'record'] as const;
const dampingState = (name: string) => text(name).notNull().$type<(typeof dampingStates)[number]>();

/** One visit to one span in one campaign. */
export const measurements = pgTable(
  'measurements',
  {
    ...tenantColumns,
    campaignId: uuid('campaign_id').notNull(),
    spanId: uuid('span_id').notNull(),
    visitedAt: moment('visited_at').notNull(),
    sensorPosition: si('sensor_position'),
    excitation: text('excitation').notNull().$type<(typeof excitations)[number]>(),
    lowerDamperState: dampingState('lower_damper_state'),
    upperDamperState: dampingState('upper_damper_state'),
    bushingState: dampingState('bushing_state'),
    crossTied: boolean('cross_tied').notNull(),
    steelTemperature: si('steel_temperature'),
    note: text('note').notNull().default(''),
    version: integer('version').notNull().default(1),
    enteredBy: text('entered_by').notNull(),
    createdAt: moment('created_at').notNull().defaultNow(),
  },
  (table) => [
    tenantKey(table),
    index('measurements_by_campaign').on(table.firmId, table.campaignId),
    index('measurements_by_span').on(table.firmId, table.spanId),
    withinFirm(table, table.campaignId, campaigns, 'measurements_campaign'),
    withinFirm(table, table.spanId, spans, 'measurements_span'),
    oneOf(table.excitation, excitations),
    oneOf(table.lowerDamperState, dampingStates),
    oneOf(table.upperDamperState, dampingStates),
    oneOf(table.bushingState, dampingStates),
    notNegative('measurements_sensor_not_negative', table.sensorPosition),
    check('measurements_version_from_one', sql`${table.version} >= 1`),
  ],
);

export const modalPeaks = pgTable(
  'modal_peaks',
  {
    ...tenantColumns,
    measurementId: uuid('measurement_id').notNull(),
    mode: integer('mode').notNull(),
    frequency: si('frequency').notNull(),
    standardUncertainty: si('standard_uncertainty'),
    plane: text('plane').notNull().$type<(typeof planes)[number]>(),
    source: text('source').notNull().$type<(typeof peakSources)[number]>(),
    used: boolean('used').notNull(),
    setAsideReason: text('set_aside_reason'),
  },
  (table) => [
    tenantKey(table),
    index('modal_peaks_by_measurement').on(table.firmId, table.measurementId),
    withinFirm(table, table.measurementId, measurements, 'modal_peaks_measurement'),
    // A mode is used once: of two peaks of one mode, one is set aside.
    uniqueIndex('modal_peaks_mode_used_once').on(table.firmId, table.measurementId, table.mode, table.plane).where(sql`used`),
    oneOf(table.plane, planes),
    oneOf(table.source, peakSources),
    check('modal_peaks_mode_from_one', sql`${table.mode} >= 1`),
    positive('modal_peaks_positive', table.frequency),
    positive('modal_peaks_uncertainty_is_never_zero', table.standardUncertainty),
    check('modal_peaks_set_aside_with_a_reason', sql`${table.used} or ${table.setAsideReason} is not null`),
  ],
);
