import { expect } from 'vitest';

/** Expects the database to refuse with this SQLSTATE, whether asked through Drizzle, which wraps errors, or directly. */
export async function refused(work: Promise<unknown>, code: string, message?: RegExp): Promise<void> {
  const outcome = await work.then(
    () => ({ code: 'nothing was refused', message: '' }),
    (error: { code?: string; message: string; cause?: { code: string; message: string } }) => ({
      code: error.cause?.code ?? error.code ?? error.message,
      message: error.cause?.message ?? error.message,
    }),
  );
  expect(outcome.code, outcome.message).toBe(code);
  if (message) expect(outcome.message).toMatch(message);
}

export const insufficientPrivilege = '42501';
export const foreignKeyViolation = '23503';
export const uniqueViolation = '23505';
export const checkViolation = '23514';
