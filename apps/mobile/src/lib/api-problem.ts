import { problem } from '@strandnote/api/contract';

/** Why a request brought nothing, in kinds that a screen can act on. */
export type ProblemKind =
  | 'offline' // no answer: no signal, or the server is away
  | 'signed-out' // the session has ended
  | 'refused' // input or state is not acceptable: `message` and `fieldErrors` say what would be
  | 'not-allowed'
  | 'not-found'
  | 'failed'; // the server or the reply is at fault

export interface FieldError {
  /** Path in the body that was sent: "spans.0.chordLength". */
  field: string;
  message: string;
}

export class ApiProblem extends Error {
  override readonly name = 'ApiProblem';
  constructor(
    readonly kind: ProblemKind,
    readonly status: number,
    /** Stable: "own-work", "changed-elsewhere"; screens branch on this, never on the message. */
    readonly code: string,
    message: string,
    readonly fieldErrors: FieldError[] = [],
  ) {
    super(message);
  }
}

export function offlineProblem(): ApiProblem {
  return new ApiProblem('offline', 0, 'offline', 'There is no connection to the server. What you typed stays here.');
}

/** Reads a reply that is not a success. The server sends Problem Details; anything in between may send something else. */
export async function problemOfReply(reply: Response): Promise<ApiProblem> {
  const body: unknown = await reply.json().catch(() => null);
  const parsed = problem.safeParse(body);
  if (!parsed.success) return new ApiProblem(kindOf(reply.status), reply.status, 'unexpected', sentenceFor(reply.status));
  const { code, detail, title, errors } = parsed.data;
  return new ApiProblem(kindOf(reply.status), reply.status, code, detail || title, errors ?? []);
}

function kindOf(status: number): ProblemKind {
  if (status === 401) return 'signed-out';
  if (status === 403) return 'not-allowed';
  if (status === 404) return 'not-found';
  // A gateway that cannot reach the server answers in its place.
  if (status === 502 || status === 503 || status === 504) return 'offline';
  return status >= 400 && status < 500 ? 'refused' : 'failed';
}

function sentenceFor(status: number): string {
  switch (kindOf(status)) {
    case 'signed-out':
      return 'You are signed out. Sign in and try again.';
    case 'not-found':
      return 'There is nothing here, or it is not yours to see.';
    case 'not-allowed':
      return 'Your role does not allow this.';
    case 'offline':
      return 'The server is not reachable now. Try again in a moment.';
    default:
      return status === 429
        ? 'Too many attempts. Wait a minute and try again.'
        : `The server could not answer (${status}). Nothing was changed; try again.`;
  }
}
