import { sql } from 'drizzle-orm';
import { check, index, integer, jsonb, pgTable, text, unique, uuid } from 'drizzle-orm/pg-core';
import { cables, type referenceKinds } from './cables.ts';
import { structures } from './structures.ts';
import { moment, oneOf, si, tenantColumns, tenantKey, withinFirm } from './tenant.ts';

export interface StoredInstrument {
  name: string;
  serial: string;
  calibratedOn: string | null;
  calibrationDue: string | null;
}

export interface StoredBasis {
  referenceKind: (typeof referenceKinds)[number] | null;
  lowerLimit: number | null;
  upperLimit: number | null;
  decisionRule: string;
  criticalContact: string;
}

export const campaignStates = ['open', 'closed'] as const;

export const campaigns = pgTable(
  'campaigns',
  {
    ...tenantColumns,
    structureId: uuid('structure_id').notNull(),
    number: integer('number').notNull(),
    name: text('name').notNull(),
    startsOn: text('starts_on').notNull(),
    endsOn: text('ends_on'),
    crew: text('crew').notNull().default(''),
    instruments: jsonb('instruments').notNull().$type<StoredInstrument[]>(),
    weather: text('weather').notNull().default(''),
    steelTemperature: si('steel_temperature'),
    airTemperature: si('air_temperature'),
    traffic: text('traffic').notNull().default(''),
    stage: text('stage').notNull(),
    basis: jsonb('basis').notNull().$type<StoredBasis>(),
    state: text('state').notNull().default('open').$type<(typeof campaignStates)[number]>(),
    createdAt: moment('created_at').notNull().defaultNow(),
  },
  (table) => [
    tenantKey(table),
    unique('campaigns_number').on(table.firmId, table.structureId, table.number),
    withinFirm(table, table.structureId, structures, 'campaigns_structure'),
    oneOf(table.state, campaignStates),
    check('campaigns_number_from_one', sql`${table.number} >= 1`),
    // Days as text compare like days.
    check('campaigns_days_in_order', sql`${table.startsOn} ~ '^\\d{4}-\\d\\d-\\d\\d$' and ${table.endsOn} >= ${table.startsOn}`),
  ],
);

/** The cables that a campaign is to survey, each with the reason where it was not. */
export const campaignCables = pgTable(
  'campaign_cables',
  {
    ...tenantColumns,
    campaignId: uuid('campaign_id').notNull(),
    cableId: uuid('cable_id').notNull(),
    notMeasuredReason: text('not_measured_reason'),
  },
  (table) => [
    tenantKey(table),
    unique('campaign_cables_once').on(table.firmId, table.campaignId, table.cableId),
    index('campaign_cables_by_cable').on(table.firmId, table.cableId),
    withinFirm(table, table.campaignId, campaigns, 'campaign_cables_campaign'),
    withinFirm(table, table.cableId, cables, 'campaign_cables_cable'),
  ],
);
