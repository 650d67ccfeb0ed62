import type { StoredEstimate, StoredEstimateInput } from '@strandnote/core/report-content';
import { index, jsonb, pgTable, text, uuid } from 'drizzle-orm/pg-core';
import { spans } from './cables.ts';
import { campaigns } from './campaigns.ts';
import { measurements } from './measurements.ts';
import { isSha256, moment, tenantColumns, tenantKey, withinFirm } from './tenant.ts';

/** The result of one fit; append-only. */
export const estimates = pgTable(
  'estimates',
  {
    ...tenantColumns,
    measurementId: uuid('measurement_id').notNull(),
    spanId: uuid('span_id').notNull(),
    campaignId: uuid('campaign_id').notNull(),
    engineVersion: text('engine_version').notNull(),
    input: jsonb('input').notNull().$type<StoredEstimateInput>(),
    output: jsonb('output').notNull().$type<StoredEstimate>(),
    inputSha256: text('input_sha256').notNull(),
    createdBy: text('created_by').notNull(),
    createdAt: moment('created_at').notNull().defaultNow(),
  },
  (table) => [
    tenantKey(table),
    index('estimates_by_measurement').on(table.firmId, table.measurementId, table.createdAt),
    index('estimates_by_span').on(table.firmId, table.spanId, table.createdAt),
    withinFirm(table, table.measurementId, measurements, 'estimates_measurement'),
    withinFirm(table, table.spanId, spans, 'estimates_span'),
    index('estimates_by_campaign').on(table.firmId, table.campaignId),
    withinFirm(table, table.campaignId, campaigns, 'estimates_campaign'),
    isSha256(table.inputSha256),
  ],
);
