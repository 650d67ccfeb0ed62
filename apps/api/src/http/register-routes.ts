import type { Actor } from '@strandnote/db';
import { type Request, type RequestHandler, type Response, Router } from 'express';
import { rateLimit } from 'express-rate-limit';
import { currentPerson, type Person } from '../access/current-person.ts';
import { assertCan } from '../access/permissions.ts';
import { requireMember } from '../access/require-member.ts';
import type { AppDeps } from '../deps.ts';
import { AppError } from './errors.ts';
import { parse } from './parse.ts';
import type { Call, Route } from './route.ts';

/** The routes as an Express router. Every one is parsed, allowed and answered in the same way. */
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
    if (route.method !== 'get') assertOwnOrigin(deps, request);
    const who = await whoCalls(deps, route, request);
    const params = route.params ? parse(route.params, withoutFirm(request.params)) : undefined;
    const body = route.body ? parse(route.body, request.body ?? {}) : undefined;
    const call = { deps, params, body, who, request, response } as Call<never, never, never>;
    const reply = await route.handle(call);
    if (route.reply === 'file') return;
    send(response, route, reply);
  };
}

/** The reply is parsed on the way out too: what the contract does not name is not sent. */
function send(response: Response, route: Route, reply: unknown): void {
  if (route.reply === 'file') return;
  response
    .set('Cache-Control', 'no-store')
    .status(route.status ?? 200)
    .json(route.reply.parse(reply));
}

async function whoCalls(deps: AppDeps, route: Route, request: Request): Promise<Actor | Person | null> {
  if (route.access === 'public') return null;
  const person = await currentPerson(deps, request);
  if (route.access === 'signed-in') return person;
  const actor = await requireMember(deps, person, String(request.params['firmId']));
  assertCan(actor, route.access);
  return actor;
}

function withoutFirm({ firmId: _firmId, ...rest }: Request['params']): Record<string, unknown> {
  return rest;
}

/**
 * Requests that change something come from our own pages: browsers say where from, and a page of somebody else's cannot hide it.
 * Programs that send no Origin carry no cookie of a browser either and are let through to the sign-in check.
 */
function assertOwnOrigin(deps: AppDeps, request: Request): void {
  const site = request.get('sec-fetch-site');
  const origin = request.get('origin');
  const foreign =
    (site !== undefined && site !== 'same-origin' && site !== 'none') || (origin !== undefined && !isOwn(deps, request, origin));
  if (foreign) throw new AppError('wrong-origin', 'This request does not come from a page of this server.');
}

function isOwn(deps: AppDeps, request: Request, origin: string): boolean {
  return origin === new URL(deps.env.publicUrl).origin || origin === `${request.protocol}://${request.get('host')}`;
}
