import { bigint, index, jsonb, pgTable, primaryKey, text, uuid } from 'drizzle-orm/pg-core';
import { moment, tenantColumns, tenantKey } from './tenant.ts';

/** Who entered or changed a value, written by a trigger on every contributing table; append-only. */
export const contributions = pgTable(
  'contributions',
  {
    ...tenantColumns,
    entity: text('entity').notNull(),
    entityId: uuid('entity_id').notNull(),
    userId: text('user_id').notNull(),
    at: moment('at').notNull(),
  },
  (table) => [tenantKey(table), index('contributions_by_entity').on(table.firmId, table.entity, table.entityId)],
);

/** What happened; append-only. The database stamps sequence, previous hash and hash. */
export const auditEvents = pgTable(
  'audit_events',
  {
    firmId: uuid('firm_id').notNull(),
    // Stamped by the database: what is given here is overwritten.
    sequence: bigint('sequence', { mode: 'number' }).notNull().default(0),
    at: moment('at').notNull(),
    actorUserId: text('actor_user_id').notNull(),
    actorName: text('actor_name').notNull(),
    act: text('act').notNull(),
    subjectKind: text('subject_kind').notNull(),
    subjectId: text('subject_id').notNull(),
    details: jsonb('details').notNull().$type<Record<string, unknown>>(),
    previousHash: text('previous_hash').notNull().default(''),
    hash: text('hash').notNull().default(''),
  },
  (table) => [
    primaryKey({ columns: [table.firmId, table.sequence] }),
    index('audit_events_by_subject').on(table.firmId, table.subjectKind, table.subjectId),
  ],
);

/** The last event of each firm; its row is locked while an event is added. */
export const auditHeads = pgTable('audit_heads', {
  firmId: uuid('firm_id').primaryKey(),
  sequence: bigint('sequence', { mode: 'number' }).notNull(),
  hash: text('hash').notNull(),
});
