import { sql } from 'drizzle-orm';
import { check, customType, index, integer, pgTable, text, unique, uuid } from 'drizzle-orm/pg-core';
import { isSha256, moment, oneOf, tenantColumns, tenantKey, withinFirm } from './tenant.ts';

const bytea = customType<{ data: Buffer; driverData: Buffer }>({ dataType: () => 'bytea' });

export const fileKinds = ['report-unsigned', 'report-signed', 'record'] as const;

/** A stored file; append-only, so that an issued PDF is never altered. */
export const files = pgTable(
  'files',
  {
    ...tenantColumns,
    kind: text('kind').notNull().$type<(typeof fileKinds)[number]>(),
    name: text('name').notNull(),
    mediaType: text('media_type').notNull(),
    bytes: integer('bytes').notNull(),
    sha256: text('sha256').notNull(),
    createdAt: moment('created_at').notNull().defaultNow(),
  },
  (table) => [
    tenantKey(table),
    index('files_by_hash').on(table.sha256),
    oneOf(table.kind, fileKinds),
    isSha256(table.sha256),
    check('files_bytes_not_negative', sql`${table.bytes} >= 0`),
  ],
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
    check('file_chunks_at_most_one_mebibyte', sql`octet_length(${table.data}) between 1 and 1048576 and ${table.index} >= 0`),
  ],
);
