import type { IncomingMessage } from 'node:http';
import { type Logger, pino } from 'pino';
import type { Env } from './env.ts';

/**
 * The log. Secrets never reach it: of a request it keeps method, path and address, never a header, a body or what follows the
 * question mark; of a failed query the statement, never the values.
 */
export function createLog({ LOG_LEVEL }: Pick<Env, 'LOG_LEVEL'>, stream?: { write: (line: string) => void }): Logger {
  const options = {
    level: LOG_LEVEL,
    serializers: { err: describeError },
    redact: { paths: ['cookie', 'authorization', 'password', 'token', '*.cookie', '*.password', '*.token'], censor: 'kept back' },
  };
  return stream ? pino(options, stream) : pino(options);
}

/** What a line of the log says of a request. */
export function describeRequest(request: IncomingMessage & { id?: unknown; originalUrl?: string }) {
  return {
    id: request.id,
    method: request.method,
    path: withoutSecrets(request.originalUrl ?? request.url ?? ''),
    from: request.socket?.remoteAddress,
  };
}

/** Invitations travel in the path, the token of a new password in the query. Express serves addresses in capitals too. */
function withoutSecrets(address: string): string {
  return address.replace(/[?#].*$/, '').replace(/(\/(?:invitations?|reset-password)\/)[^/]+/i, '$1…');
}

/** An error without the values of its query: those may be a password's hash or a person's address. */
export function describeError(error: unknown): Record<string, unknown> {
  if (!(error instanceof Error)) return { message: 'something that is no error was thrown' };
  const { cause, code, query } = error as { cause?: unknown; code?: unknown; query?: unknown };
  // A failed query carries its values in its message, and so at the head of its stack.
  const message = typeof query === 'string' ? `Failed query: ${query}` : error.message;
  const calls = (error.stack ?? '').split('\n').filter((line) => /^\s+at /.test(line));
  return {
    type: error.name,
    message,
    stack: [message, ...calls].join('\n'),
    ...(code === undefined ? {} : { code }),
    ...(cause instanceof Error ? { cause: describeError(cause) } : {}),
  };
}
