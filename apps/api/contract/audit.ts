import { z } from 'zod';
import { isoTime, listOf } from './primitives.ts';

export const auditEvent = z.object({
  sequence: z.number().int(),
  at: isoTime,
  actorName: z.string(),
  act: z.string(),
  subjectKind: z.string(),
  subjectId: z.string(),
  details: z.record(z.string(), z.unknown()),
  hash: z.string(),
});
export type AuditEvent = z.infer<typeof auditEvent>;
export const auditList = listOf(auditEvent);
/** The page before an event: the trail is read backwards, 200 events at a time. */
export const auditQuery = z.strictObject({ before: z.coerce.number().int().min(1).max(Number.MAX_SAFE_INTEGER).optional() });

/** The outcome of recomputing the firm's whole chain. */
export const auditVerification = z.object({
  events: z.number().int(),
  intact: z.boolean(),
  head: z.string(),
  firstProblem: z.object({ sequence: z.number().int(), message: z.string() }).nullable(),
});
export type AuditVerification = z.infer<typeof auditVerification>;
