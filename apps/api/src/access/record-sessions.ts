import { type Db, withFirm } from '@strandnote/db';
import { fromNodeHeaders } from 'better-auth/node';
import type { RequestHandler } from 'express';
import { recordEvent } from '../audit/record-event.ts';
import type { AppDeps } from '../deps.ts';
import { membershipsOf } from './require-member.ts';

/** Signing in and out are written down in every firm of the person. */
export function recordSessions(deps: AppDeps): RequestHandler {
  return async (request, response, next) => {
    if (request.path.endsWith('/sign-out')) {
      const session = await deps.auth.api.getSession({ headers: fromNodeHeaders(request.headers) });
      if (session) await recordEverywhere(deps.db, session.user.id, 'session.ended');
    }
    if (request.path.endsWith('/sign-in/email')) {
      response.once('finish', () => {
        const cookie = String(response.getHeader('set-cookie') ?? '');
        if (response.statusCode !== 200 || cookie === '') return;
        const headers = new Headers({ cookie: cookie.split(';')[0] ?? '' });
        deps.auth.api
          .getSession({ headers })
          .then((session) => (session ? recordEverywhere(deps.db, session.user.id, 'session.started') : undefined))
          .catch((error: unknown) => deps.log.error({ err: error }, 'a sign-in could not be written down'));
      });
    }
    next();
  };
}

async function recordEverywhere(db: Db, userId: string, act: 'session.started' | 'session.ended'): Promise<void> {
  for (const membership of await membershipsOf(db, userId)) {
    const actor = { firmId: membership.firm_id, userId, name: membership.member_name, clientId: membership.client_id };
    await withFirm(db, actor, (tx) => recordEvent(tx, actor, act, { kind: 'member', id: membership.member_id }));
  }
}
