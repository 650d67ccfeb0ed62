import type { Actor } from '@strandnote/db';
import { type Request, type RequestHandler, type Response, Router } from 'express';
import { rateLimit } from 'express-rate-limit';
import { z } from 'zod';
import { currentPerson, type Person } from '../access/current-person.ts';
import { assertCan } from '../access/permissions.ts';
import { requireMember } from '../access/require-member.ts';
import type { AppDeps } from '../deps.ts';
import { AppError } from './errors.ts';
import { parse } from './parse.ts';
import type { Call, Route } from './route.ts';

const nothing = z.strictObject({});

/** The routes as an Express router. Every one is allowed, parsed and answered in the same way. */
export function registerRoutes(deps: AppDeps, routes: readonly Route[]): Router {
  const router = Router();
  for (const route of routes) {
    const handlers: RequestHandler[] = [handlerOf(deps, route)];
    if (route.perMinute !== undefined) handlers.unshift(limiter(route.perMinute));
    router[route.method](route.path, ...handlers);
  }
  return router;
}

function limiter(perMinute: number): RequestHandler {
  return rateLimit({
    windowMs: 60_000,
    limit: perMinute,
    standardHeaders: 'draft-8',
    legacyHeaders: false,
    handler: () => {
      throw new AppError('too-many-requests', 'Too many attempts. Wait a minute and try again.');
    },
  });
}

function handlerOf(deps: AppDeps, route: Route): RequestHandler {
  return async (request, response) => {
    const who = await whoCalls(deps, route, request);
    const params = route.params ? parse(route.params, withoutFirm(request.params)) : undefined;
    // What a route does not name is refused: a misspelt field would otherwise be lost in silence.
    const query = parse(route.query ?? nothing, request.query);
    const body = parse(route.body ?? nothing, request.body ?? {});
    const call = { deps, params, query, body, who, request, response } as Call<never, never, never, never>;
    const reply = await route.handle(call);
    if (route.reply !== 'file') send(response, route, route.reply.parse(reply));
  };
}

/** The reply was parsed on the way out too: what the contract does not name is not sent. */
function send(response: Response, { status = 200 }: Route, reply: unknown): void {
  response.status(status).json(reply);
}

async function whoCalls(deps: AppDeps, route: Route, request: Request): Promise<Actor | Person | null> {
  if (route.access === 'public') return null;
  const person = await currentPerson(deps, request);
  if (route.access === 'signed-in') return person;
  const actor = await requireMember(deps, person, String(request.params.firmId));
  assertCan(actor, route.access);
  return actor;
}

function withoutFirm({ firmId: _firmId, ...rest }: Request['params']): Record<string, unknown> {
  return rest;
}
