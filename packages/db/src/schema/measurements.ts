import { boolean, index, integer, pgTable, text, uuid } from 'drizzle-orm/pg-core';
import { spans } from './cables.ts';
import { campaigns } from './campaigns.ts';
import { moment, si, tenantColumns, tenantKey, withinFirm } from './tenant.ts';

type DampingState = 'none' | 'connected' | 'disconnected' | 'locked' | 'leaking';
const dampingState = (name: string) => text(name).notNull().$type<DampingState>();

/** One visit to one span in one campaign. */
export const measurements = pgTable(
  'measurements',
  {
    ...tenantColumns,
    campaignId: uuid('campaign_id').notNull(),
    spanId: uuid('span_id').notNull(),
    visitedAt: moment('visited_at').notNull(),
    sensorPosition: si('sensor_position'),
    excitation: text('excitation').notNull().$type<'ambient' | 'wind' | 'traffic' | 'mallet' | 'pull-release'>(),
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
    plane: text('plane').notNull().$type<'in-plane' | 'out-of-plane'>(),
    source: text('source').notNull().$type<'typed' | 'record'>(),
    used: boolean('used').notNull(),
    setAsideReason: text('set_aside_reason'),
  },
  (table) => [
    tenantKey(table),
    index('modal_peaks_by_measurement').on(table.firmId, table.measurementId),
    withinFirm(table, table.measurementId, measurements, 'modal_peaks_measurement'),
  ],
);
