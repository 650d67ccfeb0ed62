import { z } from 'zod';
import { ApiProblem, offlineProblem } from './api-problem.ts';

// better-auth answers in its own shapes; only what the app shows of them is described here.
const sessionRow = z.object({
  id: z.string(),
  token: z.string(),
  createdAt: z.coerce.date(),
  updatedAt: z.coerce.date(),
  expiresAt: z.coerce.date(),
  ipAddress: z.string().nullish(),
  userAgent: z.string().nullish(),
});
export type SessionRow = z.infer<typeof sessionRow>;

const identityProblem = z.object({ code: z.string().optional(), message: z.string().optional() });

const sentences: Record<string, string> = {
  INVALID_EMAIL_OR_PASSWORD: 'E-mail address and password do not belong together. Type both again, or ask for a new password.',
  INVALID_EMAIL: 'An e-mail address looks like name@firm.example.',
  INVALID_TOKEN: 'This link has been used or is too old. Ask for a new one.',
  PASSWORD_TOO_SHORT: 'A password has at least 12 characters.',
  PASSWORD_TOO_LONG: 'A password has at most 128 characters.',
};

export async function signIn(email: string, password: string): Promise<void> {
  await call('sign-in/email', { email, password });
}

export async function signOut(): Promise<void> {
  await call('sign-out', {});
}

/** Answers alike whether the address is known or not. */
export async function requestPasswordReset(email: string): Promise<void> {
  await call('request-password-reset', { email, redirectTo: '/reset-password' });
}

export async function resetPassword(token: string, newPassword: string): Promise<void> {
  await call('reset-password', { token, newPassword });
}

export async function listSessions(): Promise<SessionRow[]> {
  return z.array(sessionRow).parse(await call('list-sessions'));
}

export async function revokeSession(token: string): Promise<void> {
  await call('revoke-session', { token });
}

/** Ends every session of the person, this one too. */
export async function revokeSessions(): Promise<void> {
  await call('revoke-sessions', {});
}

async function call(path: string, body?: unknown): Promise<unknown> {
  const reply = await fetch(`/api/auth/${path}`, {
    method: body === undefined ? 'GET' : 'POST',
    credentials: 'same-origin',
    ...(body === undefined ? {} : { headers: { 'content-type': 'application/json' }, body: JSON.stringify(body) }),
  }).catch(() => {
    throw offlineProblem();
  });
  const answer: unknown = await reply.json().catch(() => null);
  if (reply.ok) return answer;
  const { code = 'unexpected' } = identityProblem.safeParse(answer).data ?? {};
  throw new ApiProblem(kindOf(reply.status, code), reply.status, code, sentences[code] ?? sentenceFor(reply.status));
}

function kindOf(status: number, code: string): ApiProblem['kind'] {
  if (code in sentences) return 'refused';
  if (status === 401) return 'signed-out';
  if (status >= 502 && status <= 504) return 'offline';
  return status < 500 ? 'refused' : 'failed';
}

function sentenceFor(status: number): string {
  if (status === 429) return 'Too many attempts. Wait a minute and try again.';
  if (status === 401) return 'You are signed out. Sign in and try again.';
  return `The server could not answer (${status}). Try again in a moment.`;
}
