import type { Actor } from '@strandnote/db';
import type { Request, Response } from 'express';
import type { z } from 'zod';
import type { Person } from '../access/current-person.ts';
import type { Act } from '../access/permissions.ts';
import type { AppDeps } from '../deps.ts';

type Method = 'get' | 'post' | 'put' | 'patch' | 'delete';
type Schema = z.ZodType;
type Maybe = Schema | undefined;
type Output<S> = S extends Schema ? z.output<S> : undefined;

/** What a handler is given: everything parsed, the person known, the act allowed. */
export interface Call<Params, Body, Who, Query = undefined> {
  deps: AppDeps;
  params: Params;
  query: Query;
  body: Body;
  who: Who;
  request: Request;
  response: Response;
}

interface Shape<P, B, R, Q> {
  method: Method;
  /** Below /api/v1; in a firm below /firms/:firmId. */
  path: string;
  summary: string;
  params?: P;
  /** What may follow the question mark; left out, nothing may. */
  query?: Q;
  /** Left out, nothing may be sent. */
  body?: B;
  /** The reply's schema; 'file' for bytes that the handler sends itself. */
  reply: R;
  status?: 200 | 201;
  /** Attempts a minute from one address. */
  perMinute?: number;
}
// biome-ignore lint/suspicious/noConfusingVoidType: what the handler of a file promises, which has nothing to give back
type Reply<R> = R extends Schema ? z.input<R> : void;

/** Any route, as the server, the API description and the test matrix read it. */
export interface Route extends Shape<Schema | undefined, Schema | undefined, Schema | 'file', Schema | undefined> {
  /** An act of the permission table, or who may come without one. */
  access: Act | 'public' | 'signed-in';
  // The parts are tied together by the three functions below; here only their handler's outside is seen.
  handle: (call: Call<never, never, never, never>) => Promise<unknown>;
}

/** Needs no account. */
export function publicRoute<P extends Maybe, B extends Maybe, R extends Schema | 'file', Q extends Maybe = undefined>(
  route: Shape<P, B, R, Q> & { handle: (call: Call<Output<P>, Output<B>, null, Output<Q>>) => Promise<Reply<R>> },
): Route {
  return { ...route, access: 'public' } as Route;
}

/** Needs an account, but no firm. */
export function personRoute<P extends Maybe, B extends Maybe, R extends Schema | 'file', Q extends Maybe = undefined>(
  route: Shape<P, B, R, Q> & { handle: (call: Call<Output<P>, Output<B>, Person, Output<Q>>) => Promise<Reply<R>> },
): Route {
  return { ...route, access: 'signed-in' } as Route;
}

/** Belongs to a firm: its act is checked against the member's roles before the handler runs. */
export function firmRoute<P extends Maybe, B extends Maybe, R extends Schema | 'file', Q extends Maybe = undefined>(
  route: Shape<P, B, R, Q> & { access: Act; handle: (call: Call<Output<P>, Output<B>, Actor, Output<Q>>) => Promise<Reply<R>> },
): Route {
  return { ...route, path: `/firms/:firmId${route.path}` } as Route;
}
