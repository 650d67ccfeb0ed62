import type { ErrorRequestHandler, Response } from 'express';
import { AppError } from './errors.ts';

/** SQLSTATEs of the rules that the database keeps by itself, as what they mean to the person. */
const rulesOfTheDatabase: Record<string, (message: string) => AppError> = {
  SN001: (message) => new AppError('own-work', message),
  SN002: (message) => new AppError('forbidden', message),
  SN003: (message) => new AppError('stale-content', message),
  SN006: (message) => new AppError('conflict', message),
  '22003': () => new AppError('invalid-input', 'A number is larger than can be stored.'),
  '23505': () => new AppError('conflict', 'There is one like this already, perhaps made at this very moment. Look again, then try again.'),
  '40001': () => new AppError('conflict', 'Somebody else changed this at the same moment. Try again.'),
  '40P01': () => new AppError('conflict', 'Somebody else changed this at the same moment. Try again.'),
};

/** The last handler: every error becomes Problem Details (RFC 9457), without a stack. */
export const errorHandler: ErrorRequestHandler = (error, request, response, next) => {
  if (response.headersSent) return next(error);
  const known = asAppError(error);
  if (known) return sendProblem(response, known);
  request.log.error({ err: error }, 'request failed');
  response
    .status(500)
    .type('application/problem+json')
    .send(
      JSON.stringify({
        type: 'about:blank',
        title: 'Something failed',
        status: 500,
        code: 'internal',
        detail: 'The server could not answer. Nothing was changed; try again.',
      }),
    );
};

export function sendProblem(response: Response, error: AppError): void {
  const { code, status, message, errors, extension } = error;
  const problem = { ...extension, type: 'about:blank', title: titles[status] ?? 'Not accepted', status, code, detail: message };
  response
    .status(status)
    .type('application/problem+json')
    .send(JSON.stringify(errors.length > 0 ? { ...problem, errors } : problem));
}

const titles: Record<number, string> = {
  401: 'Signed out',
  403: 'Not allowed',
  404: 'Not found',
  409: 'In conflict',
  413: 'Too large',
  429: 'Too many attempts',
};

function asAppError(error: unknown): AppError | null {
  if (error instanceof AppError) return error;
  const { cause, code, type, status } = error as {
    cause?: { code?: string; message?: string };
    code?: string;
    type?: string;
    status?: number;
  };
  const rule = rulesOfTheDatabase[cause?.code ?? code ?? ''];
  if (rule) return rule(cause?.message ?? (error as Error).message);
  if (type === 'entity.too.large') return new AppError('too-large', 'That is more than the server takes at once.');
  if (type === 'entity.parse.failed') return new AppError('invalid-input', 'The request is not valid JSON.');
  if (status === 404) return new AppError('not-found', 'There is nothing here.');
  if (error instanceof URIError || (status !== undefined && status >= 400 && status < 500))
    return new AppError('invalid-input', 'The request could not be read.');
  return null;
}
