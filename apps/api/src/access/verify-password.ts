import type { Actor } from '@strandnote/db';
import type { AppDeps } from '../deps.ts';
import { AppError } from '../http/errors.ts';

/**
 * A signature asks for the password again, so that an unlocked screen cannot sign.
 *
 * @throws AppError `wrong-password` beside the field
 */
export async function verifyPassword(deps: AppDeps, actor: Pick<Actor, 'userId'>, password: string): Promise<void> {
  const context = await deps.auth.$context;
  const accounts = await context.internalAdapter.findAccounts(actor.userId);
  const hash = accounts.find(({ providerId }) => providerId === 'credential')?.password;
  if (hash && (await context.password.verify({ hash, password }))) return;
  const message = 'This is not your password. Nothing was signed.';
  throw new AppError('wrong-password', message, { errors: [{ field: 'password', message }] });
}
