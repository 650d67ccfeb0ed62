import { fromNodeHeaders } from 'better-auth/node';
import type { Request } from 'express';
import type { AppDeps } from '../deps.ts';
import { AppError } from '../http/errors.ts';

export interface Person {
  userId: string;
  name: string;
  email: string;
}

/** @throws AppError `signed-out` */
export async function currentPerson(deps: AppDeps, request: Request): Promise<Person> {
  const session = await deps.auth.api.getSession({ headers: fromNodeHeaders(request.headers) });
  if (!session) throw new AppError('signed-out', 'Sign in first.');
  const { id, name, email } = session.user;
  return { userId: id, name, email };
}
