import { verification } from '@strandnote/api/contract';
import { z } from 'zod';
import { AppError } from '../http/errors.ts';
import { publicRoute } from '../http/route.ts';
import { findByKey } from './verification.queries.ts';
import { readVerificationCode } from './verification-code.ts';

export const verificationRoutes = [
  publicRoute({
    method: 'get',
    path: '/verification/:code',
    summary: 'Whether an issued report is genuine and current; by the code printed in it or the SHA-256 of its file',
    params: z.object({ code: z.string().max(200) }),
    reply: verification,
    // A code has 80 random bits; the limit keeps anyone from trying, and from loading the database.
    perMinute: 30,
    handle: async ({ deps, params }) => {
      const key = readVerificationKey(params.code);
      const found = key === null ? null : await findByKey(deps.db, key);
      if (!found) throw new AppError('not-found', 'No issued report has this code. Compare it with the code printed in the report.');
      return found;
    },
  }),
];

function readVerificationKey(typed: string): string | null {
  const hash = typed.trim().toLowerCase();
  return /^[0-9a-f]{64}$/.test(hash) ? hash : readVerificationCode(typed);
}
