import { jsonb, pgTable, text, uuid } from 'drizzle-orm/pg-core';
import { clients } from './clients.ts';
import { moment, oneOf, tenantColumns, tenantKey, withinFirm } from './tenant.ts';

export interface StoredElevation {
  deck: { x: number; z: number }[];
  supports: { x: number; z: number }[][];
}

export const structureKinds = ['cable-stayed', 'arch', 'suspension', 'roof', 'mast', 'other'] as const;

export const structures = pgTable(
  'structures',
  {
    ...tenantColumns,
    name: text('name').notNull(),
    reference: text('reference').notNull().default(''),
    kind: text('kind').notNull().$type<(typeof structureKinds)[number]>(),
    ownerName: text('owner_name').notNull().default(''),
    clientId: uuid('client_id'),
    place: text('place').notNull().default(''),
    timeZone: text('time_zone').notNull(),
    elevation: jsonb('elevation').$type<StoredElevation>(),
    notes: text('notes').notNull().default(''),
    createdAt: moment('created_at').notNull().defaultNow(),
  },
  (table) => [tenantKey(table), withinFirm(table, table.clientId, clients, 'structures_client'), oneOf(table.kind, structureKinds)],
);
