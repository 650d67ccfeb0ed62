import { reportContent } from '@strandnote/core/report-content';
import { z } from 'zod';
import { id, isoTime, listOf, sha256 } from './primitives.ts';
import { signature } from './reports.ts';

export const issuedState = z.enum(['issued', 'superseded', 'withdrawn']);

export const issuedReport = z.object({
  revisionId: id,
  reportNumber: z.string(),
  title: z.string(),
  letter: z.string(),
  structureName: z.string(),
  campaignName: z.string(),
  clientName: z.string(),
  state: issuedState,
  issuedAt: isoTime,
  supersededByLetter: z.string().nullable(),
  withdrawnReason: z.string().nullable(),
  sha256,
  bytes: z.number().int(),
  verificationCode: z.string(),
});
export type IssuedReport = z.infer<typeof issuedReport>;
export const issuedList = listOf(issuedReport);

export const issuedDetail = issuedReport.extend({ content: reportContent, contentSha256: sha256, signatures: z.array(signature) });
export type IssuedDetail = z.infer<typeof issuedDetail>;
