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

/** The outcome of recomputing the firm's whole chain. */
export const auditVerification = z.object({
  events: z.number().int(),
  intact: z.boolean(),
  head: z.string(),
  firstProblem: z.object({ sequence: z.number().int(), message: z.string() }).nullable(),
});
export type AuditVerification = z.infer<typeof auditVerification>;
