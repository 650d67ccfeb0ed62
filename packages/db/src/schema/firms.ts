import { sql } from 'drizzle-orm';
import { type AnyPgColumn, boolean, check, index, integer, jsonb, pgTable, text, unique, uuid } from 'drizzle-orm/pg-core';
import { clients } from './clients.ts';
import { isSha256, moment, oneOf, tenantColumns, tenantKey, withinFirm } from './tenant.ts';

export interface StoredLetterhead {
  addressLines: string[];
  phone: string;
  email: string;
  registration: string;
}

export const memberRoles = ['admin', 'engineer', 'checker', 'client'] as const;
export const unitSystems = ['si', 'us'] as const;

/**
 * Row-level security tells clients from staff by their organisation: the role of client stands alone and names one, and no other
 * role does.
 */
function clientStandsAlone(name: string, { roles, clientId }: { roles: AnyPgColumn; clientId: AnyPgColumn }) {
  const known = sql.raw(`array[${memberRoles.map((role) => `'${role}'`).join(', ')}]`);
  return check(
    name,
    sql`cardinality(${roles}) >= 1 and ${roles} <@ ${known} and case when 'client' = any(${roles})
      then cardinality(${roles}) = 1 and ${clientId} is not null else ${clientId} is null end`,
  );
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
    roles: text('roles').array().notNull().$type<(typeof memberRoles)[number][]>(),
    clientId: uuid('client_id'),
    licenceNumber: text('licence_number').notNull().default(''),
    licenceJurisdiction: text('licence_jurisdiction').notNull().default(''),
    active: boolean('active').notNull().default(true),
    units: text('units').notNull().default('si').$type<(typeof unitSystems)[number]>(),
    createdAt: moment('created_at').notNull().defaultNow(),
  },
  (table) => [
    tenantKey(table),
    unique('members_user').on(table.firmId, table.userId),
    index('members_by_user').on(table.userId),
    withinFirm(table, table.clientId, clients, 'members_client'),
    clientStandsAlone('members_client_stands_alone', table),
    oneOf(table.units, unitSystems),
  ],
);

export const invitations = pgTable(
  'invitations',
  {
    ...tenantColumns,
    name: text('name').notNull(),
    email: text('email').notNull(),
    roles: text('roles').array().notNull().$type<(typeof memberRoles)[number][]>(),
    clientId: uuid('client_id'),
    tokenSha256: text('token_sha256').notNull().unique(),
    expiresAt: moment('expires_at').notNull(),
    acceptedAt: moment('accepted_at'),
    revokedAt: moment('revoked_at'),
    invitedBy: text('invited_by').notNull(),
    createdAt: moment('created_at').notNull().defaultNow(),
  },
  (table) => [
    tenantKey(table),
    withinFirm(table, table.clientId, clients, 'invitations_client'),
    clientStandsAlone('invitations_client_stands_alone', table),
    isSha256(table.tokenSha256),
  ],
);
