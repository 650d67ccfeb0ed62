import type { Request, RequestHandler } from 'express';
import type { Env } from '../env.ts';
import { AppError } from './errors.ts';

const loopbackNames = ['127.0.0.1', 'localhost', '[::1]'];

/**
 * Requests that change something come from our own pages: browsers say where from, and a page of somebody else's cannot hide it.
 * Programs that send no Origin carry no cookie of a browser either and are let through to the sign-in check.
 */
export function requireOwnOrigin(env: Pick<Env, 'publicUrl'>): RequestHandler {
  const own = ownOrigins(env.publicUrl);
  return (request, _response, next) => {
    if (isSafe(request)) return next();
    const site = request.get('sec-fetch-site');
    const origin = request.get('origin');
    const foreign = (site !== undefined && site !== 'same-origin' && site !== 'none') || (origin !== undefined && !own.includes(origin));
    if (foreign) throw new AppError('wrong-origin', 'This request does not come from a page of this server.');
    next();
  };
}

function isSafe({ method }: Request): boolean {
  return method === 'GET' || method === 'HEAD' || method === 'OPTIONS';
}

/** On loopback a machine has several names for itself; anywhere else the public address is the only one. */
export function ownOrigins(publicUrl: string): string[] {
  const { origin, protocol, hostname, port } = new URL(publicUrl);
  if (!loopbackNames.includes(hostname)) return [origin];
  return loopbackNames.map((name) => `${protocol}//${name}${port === '' ? '' : `:${port}`}`);
}
