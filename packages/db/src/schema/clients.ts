import { pgTable, text } from 'drizzle-orm/pg-core';
import { moment, tenantColumns, tenantKey } from './tenant.ts';

export const clients = pgTable(
  'clients',
  {
    ...tenantColumns,
    name: text('name').notNull(),
    contactName: text('contact_name').notNull().default(''),
    contactEmail: text('contact_email').notNull().default(''),
    address: text('address').notNull().default(''),
    createdAt: moment('created_at').notNull().defaultNow(),
  },
  (table) => [tenantKey(table)],
);
