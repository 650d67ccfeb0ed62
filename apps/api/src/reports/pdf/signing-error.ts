import { AppError } from '../../http/errors.ts';

/** A certificate or a file that cannot be signed with, in words that the administrator can act on. */
export class SigningError extends AppError {
  constructor(message: string) {
    super('blocked', message);
  }
}
