import type { ReportTexts } from '@strandnote/core/report-content';
import { sql } from 'drizzle-orm';
import { check, index, integer, jsonb, type PgTableExtraConfigValue, pgTable, text, unique, uniqueIndex, uuid } from 'drizzle-orm/pg-core';
import { cables } from './cables.ts';
import { campaigns } from './campaigns.ts';
import { clients } from './clients.ts';
import { files } from './files.ts';
import { isSha256, moment, oneOf, tenantColumns, tenantKey, withinFirm } from './tenant.ts';

export const reports = pgTable(
  'reports',
  {
    ...tenantColumns,
    campaignId: uuid('campaign_id').notNull(),
    clientId: uuid('client_id').notNull(),
    number: text('number').notNull(),
    title: text('title').notNull(),
    createdAt: moment('created_at').notNull().defaultNow(),
  },
  (table) => [
    tenantKey(table),
    unique('reports_number').on(table.firmId, table.number),
    index('reports_by_campaign').on(table.firmId, table.campaignId),
    withinFirm(table, table.campaignId, campaigns, 'reports_campaign'),
    withinFirm(table, table.clientId, clients, 'reports_client'),
  ],
);

export const revisionStates = ['draft', 'in check', 'returned', 'approved', 'issued', 'superseded', 'withdrawn'] as const;
export type StoredRevisionState = (typeof revisionStates)[number];
export const signatureMeanings = ['prepared', 'checked and approved', 'issued'] as const;
export const commentStates = ['open', 'closed'] as const;

export const revisions = pgTable(
  'revisions',
  {
    ...tenantColumns,
    reportId: uuid('report_id').notNull(),
    letter: text('letter').notNull(),
    state: text('state').notNull().default('draft').$type<StoredRevisionState>(),
    authorUserId: text('author_user_id').notNull(),
    deputyUserId: text('deputy_user_id'),
    texts: jsonb('texts').notNull().$type<ReportTexts>(),
    textVersion: integer('text_version').notNull().default(1),
    /** The client it was addressed to when it was issued; null until then. */
    addressedClientId: uuid('addressed_client_id'),
    verificationCode: text('verification_code').notNull().unique(),
    approvedSubmissionId: uuid('approved_submission_id'),
    unsignedFileId: uuid('unsigned_file_id'),
    signedFileId: uuid('signed_file_id'),
    approvedAt: moment('approved_at'),
    issuedAt: moment('issued_at'),
    supersededAt: moment('superseded_at'),
    supersededBy: uuid('superseded_by'),
    withdrawnAt: moment('withdrawn_at'),
    withdrawnReason: text('withdrawn_reason'),
    returnedReason: text('returned_reason'),
    changedAt: moment('changed_at').notNull().defaultNow(),
    createdAt: moment('created_at').notNull().defaultNow(),
  },
  // The type is written out because revisions and submissions refer to each other.
  (table): PgTableExtraConfigValue[] => [
    tenantKey(table),
    unique('revisions_letter').on(table.firmId, table.reportId, table.letter),
    uniqueIndex('revisions_one_current').on(table.firmId, table.reportId).where(sql`state = 'issued'`),
    uniqueIndex('revisions_one_open').on(table.firmId, table.reportId).where(sql`state in ('draft', 'in check', 'returned', 'approved')`),
    withinFirm(table, table.reportId, reports, 'revisions_report'),
    withinFirm(table, table.addressedClientId, clients, 'revisions_client'),
    withinFirm(table, table.unsignedFileId, files, 'revisions_unsigned_file'),
    withinFirm(table, table.signedFileId, files, 'revisions_signed_file'),
    withinFirm(table, table.approvedSubmissionId, submissions, 'revisions_approved_submission'),
    withinFirm(table, table.supersededBy, table, 'revisions_superseded_by'),
    oneOf(table.state, revisionStates),
  ],
);

/** The cables that a revision covers. */
export const revisionCables = pgTable(
  'revision_cables',
  { ...tenantColumns, revisionId: uuid('revision_id').notNull(), cableId: uuid('cable_id').notNull() },
  (table) => [
    tenantKey(table),
    unique('revision_cables_once').on(table.firmId, table.revisionId, table.cableId),
    withinFirm(table, table.revisionId, revisions, 'revision_cables_revision'),
    withinFirm(table, table.cableId, cables, 'revision_cables_cable'),
  ],
);

/** Content as it was frozen: canonical JSON, hashed; append-only. */
export const submissions = pgTable(
  'submissions',
  {
    ...tenantColumns,
    revisionId: uuid('revision_id').notNull(),
    number: integer('number').notNull(),
    content: text('content').notNull(),
    contentSha256: text('content_sha256').notNull(),
    submittedBy: text('submitted_by').notNull(),
    submittedAt: moment('submitted_at').notNull().defaultNow(),
    /** By the database's own clock, to be compared with the times of contributions. */
    frozenAt: moment('frozen_at').notNull().default(sql`clock_timestamp()`),
  },
  (table) => [
    tenantKey(table),
    unique('submissions_number').on(table.firmId, table.revisionId, table.number),
    withinFirm(table, table.revisionId, revisions, 'submissions_revision'),
    check('submissions_number_from_one', sql`${table.number} >= 1`),
    check('submissions_hash_of_the_content', sql`${table.contentSha256} = encode(sha256(convert_to(${table.content}, 'UTF8')), 'hex')`),
  ],
);

/** Every row whose values a submission uses; append-only. */
export const submissionSources = pgTable(
  'submission_sources',
  {
    ...tenantColumns,
    submissionId: uuid('submission_id').notNull(),
    entity: text('entity').notNull(),
    entityId: uuid('entity_id').notNull(),
  },
  (table) => [
    tenantKey(table),
    unique('submission_sources_once').on(table.firmId, table.submissionId, table.entity, table.entityId),
    index('submission_sources_by_entity').on(table.firmId, table.entity, table.entityId),
    withinFirm(table, table.submissionId, submissions, 'submission_sources_submission'),
  ],
);

export const signatures = pgTable(
  'signatures',
  {
    ...tenantColumns,
    submissionId: uuid('submission_id').notNull(),
    revisionId: uuid('revision_id').notNull(),
    meaning: text('meaning').notNull().$type<(typeof signatureMeanings)[number]>(),
    userId: text('user_id').notNull(),
    name: text('name').notNull(),
    licenceNumber: text('licence_number').notNull().default(''),
    jurisdiction: text('jurisdiction').notNull().default(''),
    statement: text('statement').notNull(),
    contentSha256: text('content_sha256').notNull(),
    signedAt: moment('signed_at').notNull().defaultNow(),
  },
  (table) => [
    tenantKey(table),
    index('signatures_by_revision').on(table.firmId, table.revisionId),
    withinFirm(table, table.submissionId, submissions, 'signatures_submission'),
    withinFirm(table, table.revisionId, revisions, 'signatures_revision'),
    oneOf(table.meaning, signatureMeanings),
    isSha256(table.contentSha256),
  ],
);

/** A checker's tick: this cable of this submission was looked at. */
export const cableChecks = pgTable(
  'cable_checks',
  {
    ...tenantColumns,
    submissionId: uuid('submission_id').notNull(),
    cableId: uuid('cable_id').notNull(),
    checkedBy: text('checked_by').notNull(),
    checkedAt: moment('checked_at').notNull().defaultNow(),
  },
  (table) => [
    tenantKey(table),
    unique('cable_checks_once').on(table.firmId, table.submissionId, table.cableId),
    withinFirm(table, table.submissionId, submissions, 'cable_checks_submission'),
    withinFirm(table, table.cableId, cables, 'cable_checks_cable'),
  ],
);

export const checkComments = pgTable(
  'check_comments',
  {
    ...tenantColumns,
    revisionId: uuid('revision_id').notNull(),
    submissionId: uuid('submission_id').notNull(),
    cableId: uuid('cable_id'),
    field: text('field').notNull().default(''),
    text: text('text').notNull(),
    authorUserId: text('author_user_id').notNull(),
    state: text('state').notNull().default('open').$type<(typeof commentStates)[number]>(),
    answer: text('answer'),
    answeredBy: text('answered_by'),
    answeredAt: moment('answered_at'),
    closedBy: text('closed_by'),
    closedAt: moment('closed_at'),
    createdAt: moment('created_at').notNull().defaultNow(),
  },
  (table) => [
    tenantKey(table),
    index('check_comments_by_revision').on(table.firmId, table.revisionId),
    withinFirm(table, table.revisionId, revisions, 'check_comments_revision'),
    withinFirm(table, table.submissionId, submissions, 'check_comments_submission'),
    withinFirm(table, table.cableId, cables, 'check_comments_cable'),
    oneOf(table.state, commentStates),
  ],
);
