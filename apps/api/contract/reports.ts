import { reportContent, reportTexts } from '@strandnote/core/report-content';
import { z } from 'zod';
import { id, isoTime, listOf, optionalText, sha256, typedText } from './primitives.ts';

export const revisionState = z.enum(['draft', 'in check', 'returned', 'approved', 'issued', 'superseded', 'withdrawn']);
export type RevisionState = z.infer<typeof revisionState>;

export const createReport = z.strictObject({
  id,
  revisionId: id,
  title: typedText(160),
  clientId: id,
  /** The cables it covers; null for all of the campaign. */
  cableIds: z.array(id).min(1, 'Choose at least one cable.').nullable(),
});
export type CreateReport = z.infer<typeof createReport>;

export const createRevision = z.strictObject({ id });
export type CreateRevision = z.infer<typeof createRevision>;

export const revisionSummary = z.object({
  id,
  reportId: id,
  reportNumber: z.string(),
  title: z.string(),
  structureName: z.string(),
  campaignId: id,
  campaignName: z.string(),
  clientName: z.string(),
  letter: z.string(),
  state: revisionState,
  authorName: z.string(),
  submissionNumber: z.number().int(),
  changedAt: isoTime,
});
export type RevisionSummary = z.infer<typeof revisionSummary>;

export const report = z.object({
  id,
  number: z.string(),
  title: z.string(),
  campaignId: id,
  structureName: z.string(),
  clientName: z.string(),
  revisions: z.array(revisionSummary),
});
export type Report = z.infer<typeof report>;
export const reportList = listOf(report);

export const editRevision = z.strictObject({ texts: reportTexts, deputyUserId: z.string().nullable(), textVersion: z.number().int() });
export type EditRevision = z.infer<typeof editRevision>;

export const signature = z.object({
  meaning: z.enum(['prepared', 'checked and approved', 'issued']),
  name: z.string(),
  licenceNumber: z.string(),
  jurisdiction: z.string(),
  statement: z.string(),
  contentSha256: sha256,
  signedAt: isoTime,
  submissionNumber: z.number().int(),
});
export type Signature = z.infer<typeof signature>;

export const submitRevision = z.strictObject({
  submissionId: id,
  name: typedText(120),
  /** Hash of the content that the preparer saw; refused when the content has changed since. */
  contentSha256: sha256,
});
export type SubmitRevision = z.infer<typeof submitRevision>;

export const returnRevision = z.strictObject({ reason: typedText(2000) });
export type ReturnRevision = z.infer<typeof returnRevision>;

export const approveRevision = z.strictObject({
  password: z.string().min(1, 'Type your password to sign.'),
  name: typedText(120),
  licenceNumber: typedText(80),
  jurisdiction: typedText(80),
  contentSha256: sha256,
  meaningUnderstood: z.literal(true, 'Confirm what the signature means.'),
});
export type ApproveRevision = z.infer<typeof approveRevision>;

export const issueRevision = z.strictObject({ password: z.string().min(1, 'Type your password to sign.') });
export type IssueRevision = z.infer<typeof issueRevision>;

export const withdrawRevision = z.strictObject({ reason: typedText(2000) });
export type WithdrawRevision = z.infer<typeof withdrawRevision>;

export const createComment = z.strictObject({ id, cableId: id.nullable(), field: optionalText(80), text: typedText(2000) });
export type CreateComment = z.infer<typeof createComment>;
/** The engineer answers; the checker closes or opens again. */
export const editComment = z.strictObject({ answer: typedText(2000).optional(), state: z.enum(['open', 'closed']).optional() });
export type EditComment = z.infer<typeof editComment>;

export const checkComment = z.object({
  id,
  cableId: id.nullable(),
  cableReference: z.string().nullable(),
  field: z.string(),
  text: z.string(),
  authorName: z.string(),
  createdAt: isoTime,
  submissionNumber: z.number().int(),
  state: z.enum(['open', 'closed']),
  answer: z.string().nullable(),
  answeredBy: z.string().nullable(),
  answeredAt: isoTime.nullable(),
});
export type CheckComment = z.infer<typeof checkComment>;

/** Acts on a revision that a screen offers, each allowed now or with the reason why not. */
export const revisionAct = z.enum([
  'edit',
  'submit',
  'recall',
  'tick',
  'remark',
  'answer',
  'return',
  'approve',
  'issue',
  'withdraw',
  'start-next-revision',
]);
export type RevisionAct = z.infer<typeof revisionAct>;
/** null: allowed; a sentence: why not; absent: not this member's business. */
export const may = z.partialRecord(revisionAct, z.string().nullable());
export type May = z.infer<typeof may>;

export const tick = z.object({ cableId: id, checkedBy: z.string(), checkedAt: isoTime });

export const revision = revisionSummary.extend({
  texts: reportTexts,
  textVersion: z.number().int(),
  deputyUserId: z.string().nullable(),
  authorUserId: z.string(),
  /** As it would be frozen now (draft, returned), or as it was frozen. */
  content: reportContent,
  contentSha256: sha256,
  /** What stands in the way of submitting, in words; empty when nothing does. */
  blockers: z.array(z.object({ cableId: id.nullable(), message: z.string() })),
  ticks: z.array(tick),
  comments: z.array(checkComment),
  signatures: z.array(signature),
  /** What the preparer and the checker sign, in words. */
  statements: z.object({ prepared: z.string(), checked: z.string() }),
  returnedReason: z.string().nullable(),
  withdrawnReason: z.string().nullable(),
  verificationCode: z.string(),
  pdfReady: z.boolean(),
  may,
});
export type Revision = z.infer<typeof revision>;
