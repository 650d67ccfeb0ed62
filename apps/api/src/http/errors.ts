/** Codes that a client may branch on, with the status that each travels under. */
const statusOf = {
  'invalid-input': 400,
  'signed-out': 401,
  'wrong-password': 400,
  forbidden: 403,
  'own-work': 403,
  'wrong-origin': 403,
  'not-found': 404,
  conflict: 409,
  'changed-elsewhere': 409,
  'stale-content': 409,
  blocked: 409,
  gone: 410,
  'too-large': 413,
  'too-many-requests': 429,
} as const;

export type AppErrorCode = keyof typeof statusOf;

export interface FieldProblem {
  field: string;
  message: string;
}

/** A refusal in words that the person can act on. */
export class AppError extends Error {
  override readonly name = 'AppError';
  readonly status: number;
  readonly errors: FieldProblem[];
  /** Further members of the problem document, such as what is stored instead. */
  readonly extension: Record<string, unknown>;

  constructor(
    readonly code: AppErrorCode,
    message: string,
    { errors = [], extension = {} }: { errors?: FieldProblem[]; extension?: Record<string, unknown> } = {},
  ) {
    super(message);
    this.status = statusOf[code];
    this.errors = errors;
    this.extension = extension;
  }

  /** Bad input of one field. */
  static ofField(field: string, message: string): AppError {
    return new AppError('invalid-input', message, { errors: [{ field, message }] });
  }
}
