import { customType, index, integer, pgTable, text, unique, uuid } from 'drizzle-orm/pg-core';
import { moment, tenantColumns, tenantKey, withinFirm } from './tenant.ts';

const bytea = customType<{ data: Buffer; driverData: Buffer }>({ dataType: () => 'bytea' });

/** A stored file; append-only, so that an issued PDF is never altered. */
export const files = pgTable(
  'files',
  {
    ...tenantColumns,
    kind: text('kind').notNull().$type<'report-unsigned' | 'report-signed' | 'record'>(),
    name: text('name').notNull(),
    mediaType: text('media_type').notNull(),
    bytes: integer('bytes').notNull(),
    sha256: text('sha256').notNull(),
    createdAt: moment('created_at').notNull().defaultNow(),
  },
  (table) => [tenantKey(table), index('files_by_hash').on(table.sha256)],
);

/** Its bytes, at most 1 MiB a row. */
export const fileChunks = pgTable(
  'file_chunks',
  {
    ...tenantColumns,
    fileId: uuid('file_id').notNull(),
    index: integer('index').notNull(),
    data: bytea('data').notNull(),
  },
  (table) => [
    tenantKey(table),
    unique('file_chunks_place').on(table.firmId, table.fileId, table.index),
    withinFirm(table, table.fileId, files, 'file_chunks_file'),
  ],
);
