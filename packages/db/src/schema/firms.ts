import { boolean, index, integer, jsonb, pgTable, text, unique, uuid } from 'drizzle-orm/pg-core';
import { clients } from './clients.ts';
import { moment, tenantColumns, tenantKey, withinFirm } from './tenant.ts';

export interface StoredLetterhead {
  addressLines: string[];
  phone: string;
  email: string;
  registration: string;
}

/** A firm is its own tenant: its id is the firm of its row. */
export const firms = pgTable('firms', {
  id: uuid('id').primaryKey(),
  name: text('name').notNull(),
  timeZone: text('time_zone').notNull(),
  letterhead: jsonb('letterhead').$type<StoredLetterhead>().notNull(),
  reportPrefix: text('report_prefix').notNull().default('SN-'),
  nextReportNumber: integer('next_report_number').notNull().default(1),
  demonstration: boolean('demonstration').notNull().default(false),
  createdAt: moment('created_at').notNull().defaultNow(),
});

/** A person in a firm. `clientId` is set if and only if the role is client. */
export const members = pgTable(
  'members',
  {
    ...tenantColumns,
    userId: text('user_id').notNull(),
    name: text('name').notNull(),
    email: text('email').notNull(),
    roles: text('roles').array().notNull().$type<('admin' | 'engineer' | 'checker' | 'client')[]>(),
    clientId: uuid('client_id'),
    licenceNumber: text('licence_number').notNull().default(''),
    licenceJurisdiction: text('licence_jurisdiction').notNull().default(''),
    active: boolean('active').notNull().default(true),
    units: text('units').notNull().default('si').$type<'si' | 'us'>(),
    createdAt: moment('created_at').notNull().defaultNow(),
  },
  (table) => [
    tenantKey(table),
    unique('members_user').on(table.firmId, table.userId),
    index('members_by_user').on(table.userId),
    withinFirm(table, table.clientId, clients, 'members_client'),
  ],
);

export const invitations = pgTable(
  'invitations',
  {
    ...tenantColumns,
    name: text('name').notNull(),
    email: text('email').notNull(),
    roles: text('roles').array().notNull().$type<('admin' | 'engineer' | 'checker' | 'client')[]>(),
    clientId: uuid('client_id'),
    tokenSha256: text('token_sha256').notNull().unique(),
    expiresAt: moment('expires_at').notNull(),
    acceptedAt: moment('accepted_at'),
    revokedAt: moment('revoked_at'),
    invitedBy: text('invited_by').notNull(),
    createdAt: moment('created_at').notNull().defaultNow(),
  },
  (table) => [tenantKey(table), withinFirm(table, table.clientId, clients, 'invitations_client')],
);
