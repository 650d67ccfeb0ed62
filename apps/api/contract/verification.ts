import { z } from 'zod';
import { issuedState } from './issued.ts';
import { isoTime, sha256 } from './primitives.ts';

/** The code printed in a report: groups of letters and digits that cannot be mistaken for one another. */
export const verificationCode = z.string().regex(/^[0-9A-HJKMNP-TV-Z]{4}(-[0-9A-HJKMNP-TV-Z]{4}){3}$/);

/** What anyone who holds the code may know of an issued report. */
export const verification = z.object({
  code: z.string(),
  reportNumber: z.string(),
  letter: z.string(),
  firmName: z.string(),
  structureName: z.string(),
  state: issuedState,
  issuedAt: isoTime,
  supersededByLetter: z.string().nullable(),
  supersededAt: isoTime.nullable(),
  withdrawnAt: isoTime.nullable(),
  sha256,
  demonstration: z.boolean(),
});
export type Verification = z.infer<typeof verification>;
